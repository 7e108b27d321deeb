using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits.Tables;

namespace StarLines.Fits.Writing;

/// <summary>The cards and rows of a binary table that is written.</summary>
internal sealed class TableBytes
{
    private readonly IReadOnlyList<FitsColumnData> columns;

    internal TableBytes(IReadOnlyList<FitsColumnData> columns)
    {
        this.columns = columns;
        RowCount = columns[0].RowCount;
        foreach (FitsColumnData column in columns)
        {
            RowBytes += column.Width;
        }
    }

    internal long RowBytes { get; }

    internal long RowCount { get; }

    internal CardWriter Cards(string name)
    {
        CardWriter cards = new();
        cards.Add("XTENSION", "BINTABLE", "binary table");
        cards.Add("BITPIX", 8L, "bytes");
        cards.Add("NAXIS", 2L, "rows and columns");
        cards.Add("NAXIS1", RowBytes, "bytes of a row");
        cards.Add("NAXIS2", RowCount, "rows");
        cards.Add("PCOUNT", 0L, "no heap");
        cards.Add("GCOUNT", 1L, "one group");
        cards.Add("TFIELDS", columns.Count, "columns");
        for (int i = 0; i < columns.Count; i++)
        {
            AddColumn(cards, i + 1, columns[i]);
        }

        if (name.Length > 0)
        {
            cards.Add("EXTNAME", name, "name of this HDU");
        }

        return cards;
    }

    internal ReadOnlySpan<byte> Encode(long firstRow, int rows, byte[] buffer)
    {
        int at = 0;
        for (long row = firstRow; row < firstRow + rows; row++)
        {
            foreach (FitsColumnData column in columns)
            {
                int width = (int)column.Width;
                column.Encode(row, buffer.AsSpan(at, width));
                at += width;
            }
        }

        return buffer.AsSpan(0, at);
    }

    private static void AddColumn(CardWriter cards, int number, FitsColumnData column)
    {
        cards.Add(ColumnReader.Numbered("TTYPE", number), column.Name, "");
        cards.Add(ColumnReader.Numbered("TFORM", number), column.Repeat.ToString(CultureInfo.InvariantCulture) + column.Letter, "");
        AddText(cards, "TUNIT", number, column.Unit);
        if (column.Missing is long missing)
        {
            cards.Add(ColumnReader.Numbered("TNULL", number), missing, "undefined");
        }

        AddText(cards, "TUCD", number, column.Ucd);
        AddText(cards, "TUTYP", number, column.Utype);
        AddText(cards, "TCOMM", number, column.Description);
    }

    private static void AddText(CardWriter cards, string prefix, int number, string text)
    {
        if (!string.IsNullOrWhiteSpace(text))
        {
            cards.Add(ColumnReader.Numbered(prefix, number), text, "");
        }
    }
}
