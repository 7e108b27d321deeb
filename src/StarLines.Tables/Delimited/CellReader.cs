using System;
using System.Buffers.Text;
using System.Globalization;

namespace StarLines.Tables.Delimited;

/// <summary>UTF-8 cells to values in invariant culture.</summary>
internal static class CellReader
{
    /// <summary>Reads a whole number that fills the cell.</summary>
    internal static bool TryLong(ReadOnlySpan<byte> cell, out long value)
    {
        if (cell.Length > 1 && cell[0] == (byte)'+' && cell[1] != (byte)'-')
        {
            cell = cell[1..];
        }

        return Utf8Parser.TryParse(cell, out value, out int used) && used == cell.Length && used > 0;
    }

    /// <summary>Reads a real number that fills the cell; <c>nan</c>, <c>inf</c> and <c>infinity</c> in any case count, a D may mark the exponent.</summary>
    internal static bool TryDouble(ReadOnlySpan<byte> cell, out double value)
    {
        const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
        if (cell.Length == 0)
        {
            value = double.NaN;
            return false;
        }

        bool numeric = cell[^1] is (>= (byte)'0' and <= (byte)'9') or (byte)'.';
        if (numeric && double.TryParse(cell, Style, CultureInfo.InvariantCulture, out value))
        {
            return true;
        }

        return numeric ? TryFortran(cell, out value) : TryWord(cell, out value);
    }

    /// <summary>Reads <c>true</c> or <c>false</c> in any case.</summary>
    internal static bool TryBool(ReadOnlySpan<byte> cell, out bool value)
    {
        value = Is(cell, "true");
        return value || Is(cell, "false");
    }

    /// <summary>True for a whole number written with zeros in front, which a number would lose.</summary>
    internal static bool IsPadded(ReadOnlySpan<byte> cell) => cell.Length > 1 && cell[0] == (byte)'0' && !cell.ContainsAnyExceptInRange((byte)'0', (byte)'9');

    private static bool TryFortran(ReadOnlySpan<byte> cell, out double value)
    {
        Span<byte> copy = stackalloc byte[64];
        int mark = cell.IndexOfAny((byte)'D', (byte)'d');
        if (mark <= 0 || cell.Length > copy.Length)
        {
            value = double.NaN;
            return false;
        }

        cell.CopyTo(copy);
        copy[mark] = (byte)'E';
        return double.TryParse(copy[..cell.Length], NumberStyles.Float, CultureInfo.InvariantCulture, out value);
    }

    private static bool TryWord(ReadOnlySpan<byte> cell, out double value)
    {
        bool negative = cell[0] == (byte)'-';
        ReadOnlySpan<byte> word = cell[0] is (byte)'-' or (byte)'+' ? cell[1..] : cell;
        bool infinite = Is(word, "inf") || Is(word, "infinity");
        value = !infinite ? double.NaN : negative ? double.NegativeInfinity : double.PositiveInfinity;
        return infinite || Is(word, "nan");
    }

    private static bool Is(ReadOnlySpan<byte> cell, string word)
    {
        if (cell.Length != word.Length)
        {
            return false;
        }

        for (int i = 0; i < word.Length; i++)
        {
            if ((cell[i] | 0x20) != word[i])
            {
                return false;
            }
        }

        return true;
    }
}
