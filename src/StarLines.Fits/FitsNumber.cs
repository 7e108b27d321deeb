using System;
using System.Globalization;
using System.Numerics;

namespace StarLines.Fits;

/// <summary>Numbers as FITS writes them: exponents with E or D, no infinities, no NaN.</summary>
internal static class FitsNumber
{
    /// <summary>A number fills at most one card.</summary>
    private const int MaximumLength = 80;

    internal static FitsValueKind Classify(ReadOnlySpan<byte> value)
    {
        if (value.IsEmpty)
        {
            return FitsValueKind.Undefined;
        }

        if (value.Length == 1 && value[0] is (byte)'T' or (byte)'F')
        {
            return FitsValueKind.Logical;
        }

        if (value[0] == '(')
        {
            return TryParseComplex(value, out _) ? FitsValueKind.Complex : FitsValueKind.Invalid;
        }

        return IsInteger(value) ? FitsValueKind.WholeNumber : TryParse(value, out _) ? FitsValueKind.Real : FitsValueKind.Invalid;
    }

    internal static bool TryParseInteger(ReadOnlySpan<byte> value, out long number) =>
        long.TryParse(value, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out number);

    /// <summary>A real or whole number; false for anything else, NaN, infinity, and numbers beyond the range of a double.</summary>
    internal static bool TryParse(ReadOnlySpan<byte> value, out double number)
    {
        number = 0.0;
        if (value.IsEmpty || value.Length > MaximumLength)
        {
            return false;
        }

        Span<byte> buffer = stackalloc byte[MaximumLength];
        for (int i = 0; i < value.Length; i++)
        {
            byte letter = value[i];
            if (letter is (byte)'D' or (byte)'d')
            {
                letter = (byte)'E';
            }
            else if (!char.IsAsciiDigit((char)letter) && letter is not ((byte)'+' or (byte)'-' or (byte)'.' or (byte)'E' or (byte)'e'))
            {
                return false;
            }

            buffer[i] = letter;
        }

        const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
        return double.TryParse(buffer[..value.Length], Style, CultureInfo.InvariantCulture, out number) && double.IsFinite(number);
    }

    internal static bool TryParseComplex(ReadOnlySpan<byte> value, out Complex number)
    {
        number = default;
        int comma = value.IndexOf((byte)',');
        if (comma < 0 || value[0] != '(' || value[^1] != ')'
            || !TryParse(CardText.Trim(value[1..comma]), out double real)
            || !TryParse(CardText.Trim(value[(comma + 1)..^1]), out double imaginary))
        {
            return false;
        }

        number = new Complex(real, imaginary);
        return true;
    }

    private static bool IsInteger(ReadOnlySpan<byte> value)
    {
        ReadOnlySpan<byte> digits = value[0] is (byte)'+' or (byte)'-' ? value[1..] : value;
        return !digits.IsEmpty && digits.IndexOfAnyExceptInRange((byte)'0', (byte)'9') < 0;
    }
}
