using System;
using System.Globalization;
using System.Text;

namespace StarLines.Tables.Delimited;

/// <summary>Numbers to UTF-8 text in invariant culture, with the digits a column asks for.</summary>
internal static class NumberText
{
    /// <summary>The longest text of a double: 309 digits, sign, point and 20 decimals.</summary>
    internal const int MaximumLength = 340;

    private static readonly string[] s_fixed = MakeFormats('F', 20);
    private static readonly string[] s_general = MakeFormats('G', 17);

    /// <summary>Writes a finite number or an infinity; the destination holds <see cref="MaximumLength"/> bytes.</summary>
    /// <returns>Number of bytes written.</returns>
    internal static int Write(double value, TableColumn column, Span<byte> destination)
    {
        if (!double.IsFinite(value))
        {
            return Encoding.ASCII.GetBytes(double.IsNaN(value) ? "nan" : value > 0.0 ? "inf" : "-inf", destination);
        }

        value.TryFormat(destination, out int written, FormatOf(column), CultureInfo.InvariantCulture);
        return destination[0] == (byte)'-' && IsZero(destination[1..written]) ? DropSign(destination, written) : written;
    }

    /// <summary>The text of a number.</summary>
    internal static string Format(double value, TableColumn column)
    {
        Span<byte> buffer = stackalloc byte[MaximumLength];
        return Encoding.ASCII.GetString(buffer[..Write(value, column, buffer)]);
    }

    private static ReadOnlySpan<char> FormatOf(TableColumn column)
    {
        if (column.Decimals is int decimals)
        {
            return s_fixed[Math.Clamp(decimals, 0, 20)];
        }

        return column.SignificantDigits is int digits ? s_general[Math.Clamp(digits, 1, 17)] : "R";
    }

    /// <summary>A small negative number rounded to nothing is printed as 0.00, not as -0.00.</summary>
    private static bool IsZero(ReadOnlySpan<byte> digits) => !digits.ContainsAnyExcept((byte)'0', (byte)'.');

    private static int DropSign(Span<byte> text, int length)
    {
        text[1..length].CopyTo(text);
        return length - 1;
    }

    private static string[] MakeFormats(char kind, int most)
    {
        string[] formats = new string[most + 1];
        for (int i = 0; i <= most; i++)
        {
            formats[i] = kind + i.ToString(CultureInfo.InvariantCulture);
        }

        return formats;
    }
}
