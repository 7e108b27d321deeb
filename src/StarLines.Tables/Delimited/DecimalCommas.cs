using System;
using System.Buffers;

namespace StarLines.Tables.Delimited;

/// <summary>Numbers with a decimal comma, as spreadsheets of many countries write them.</summary>
internal static class DecimalCommas
{
    private static readonly SearchValues<byte> s_digits = SearchValues.Create("0123456789,+-eE"u8);

    /// <summary>Turns the comma into a point in columns whose every filled cell, below the first row, is a number with at most one comma and no point.</summary>
    internal static void Replace(byte[] bytes, DelimitedText text)
    {
        int first = text.Count > 1 ? 1 : 0;
        for (int c = 0; c < text.CellCount(first); c++)
        {
            if (!IsDecimalComma(text, first, c))
            {
                continue;
            }

            for (int r = 0; r < text.Count; r++)
            {
                if (c < text.CellCount(r) && (r >= first || LooksDecimal(text.Bytes(text.Cell(r, c)))))
                {
                    DelimitedCell cell = text.Cell(r, c);
                    bytes.AsSpan(cell.Start, cell.Length).Replace((byte)',', (byte)'.');
                }
            }
        }
    }

    private static bool IsDecimalComma(DelimitedText text, int first, int column)
    {
        bool any = false;
        for (int r = first; r < text.Count; r++)
        {
            if (column >= text.CellCount(r))
            {
                return false;
            }

            DelimitedCell cell = text.Cell(r, column);
            ReadOnlySpan<byte> bytes = text.Bytes(cell);
            if (cell.Quoted || (bytes.Length > 0 && !LooksDecimal(bytes)))
            {
                return false;
            }

            any |= bytes.Contains((byte)',');
        }

        return any;
    }

    private static bool LooksDecimal(ReadOnlySpan<byte> cell)
    {
        int comma = cell.IndexOf((byte)',');
        return !cell.ContainsAnyExcept(s_digits)
            && cell.IndexOfAnyInRange((byte)'0', (byte)'9') >= 0
            && (comma < 0 || cell[(comma + 1)..].IndexOf((byte)',') < 0);
    }
}
