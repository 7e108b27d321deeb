using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tables;

/// <summary>Reads the column keywords of a table.</summary>
internal static class ColumnReader
{
    private const int MaximumColumns = 999;

    internal static List<FitsColumn> Read(TableLayout layout, FitsHeader header, bool isAscii)
    {
        int count = (int)header.RequireInteger("TFIELDS", 0, MaximumColumns);
        List<FitsColumn> columns = new(count);
        long offset = 0;
        for (int number = 1; number <= count; number++)
        {
            FitsColumn column = new(layout, header, number, isAscii ? Ascii(layout, header, number) : Binary(layout, header, number, offset));
            offset += column.Storage.Width;
            columns.Add(column);
        }

        if (!isAscii && offset < layout.RowBytes)
        {
            layout.Context.Warn("row-width", "NAXIS1", FormattableString.Invariant($"The columns fill {offset} of the {layout.RowBytes} bytes of a row; the rest was left out."));
        }

        return columns;
    }

    private static ColumnStorage Binary(TableLayout layout, FitsHeader header, int number, long offset)
    {
        (string keyword, string form) = RequireForm(layout, header, number);
        ColumnFormat format = ColumnFormat.Parse(form, layout.RowBytes)
            ?? throw layout.Context.Error(keyword, FormattableString.Invariant($"found '{form}', expected a repeat count that fits the row of {layout.RowBytes} bytes and one of L X B I J K A E D C M P Q; correct the header."));
        if (format.Width > layout.RowBytes - offset)
        {
            throw layout.Context.Error(keyword, FormattableString.Invariant($"the columns need at least {offset + format.Width} bytes, the row has {layout.RowBytes} (NAXIS1); correct the header."));
        }

        return new ColumnStorage(form, offset, format.Width, format, null);
    }

    private static ColumnStorage Ascii(TableLayout layout, FitsHeader header, int number)
    {
        (string keyword, string form) = RequireForm(layout, header, number);
        AsciiFormat format = AsciiFormat.Parse(form)
            ?? throw layout.Context.Error(keyword, $"found '{form}', expected Aw, Iw, Fw.d, Ew.d or Dw.d; correct the header.");
        long start = header.RequireInteger(Numbered("TBCOL", number), 1, Math.Max(1, layout.RowBytes)) - 1;
        if (format.Width > layout.RowBytes - start)
        {
            throw layout.Context.Error(keyword, FormattableString.Invariant($"the column ends at character {start + format.Width} of the row, which has {layout.RowBytes} (NAXIS1); correct the header."));
        }

        char letter = format.Letter;
        ElementType type = letter switch { 'A' => ElementType.Text, 'I' => ElementType.Int64, _ => ElementType.Float64 };
        return new ColumnStorage(form, start, format.Width, new ColumnFormat(type == ElementType.Text ? format.Width : 1, '\0', letter, type, 0), format);
    }

    private static (string Keyword, string Form) RequireForm(TableLayout layout, FitsHeader header, int number)
    {
        string keyword = Numbered("TFORM", number);
        return header.TryGetString(keyword, out string? form) && form.Length > 0
            ? (keyword, form)
            : throw layout.Context.Error(keyword, "the keyword is missing or blank, so that the row cannot be divided into columns; correct the header.");
    }

    internal static string Numbered(string prefix, int number) => prefix + number.ToString(CultureInfo.InvariantCulture);
}
