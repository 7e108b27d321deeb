using System;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Angles as people and headers write them.</summary>
internal static class Sexagesimal
{
    /// <summary>Reads <c>d m s</c>, <c>d:m:s</c>, <c>12h34m56.7s</c>, <c>-12d34'56"</c> or a plain number.</summary>
    /// <param name="text">The text.</param>
    /// <param name="value">The value in units of its first part (hours or degrees).</param>
    /// <param name="parts">How many numbers stood in the text: 1 for a plain number, 2 or 3 for a sexagesimal one.</param>
    /// <param name="inHours">Whether the first part was marked with <c>h</c>.</param>
    internal static bool TryParse(ReadOnlySpan<char> text, out double value, out int parts, out bool inHours)
    {
        value = 0.0;
        parts = 0;
        inHours = false;
        text = text.Trim();
        bool negative = false;
        if (text.Length > 0 && (text[0] is '-' or '+' or '\u2212'))
        {
            negative = text[0] != '+';
            text = text[1..].TrimStart();
        }

        double unit = 1.0;
        while (text.Length > 0)
        {
            int length = NumberLength(text);
            if (length == 0 || parts == 3
                || !double.TryParse(text[..length], NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent, CultureInfo.InvariantCulture, out double number)
                || (parts > 0 && number >= 60.0 && !(number == 60.0)))
            {
                return false;
            }

            value += number * unit;
            unit /= 60.0;
            parts++;
            text = text[length..];
            if (parts == 1 && text.TrimStart() is [('h' or 'H'), ..])
            {
                inHours = true;
            }

            text = text.TrimStart(" \t:hHdDmMsS\u00B0'\"\u2032\u2033");
        }

        value = negative ? -value : value;
        return parts > 0;
    }

    /// <summary>Reads a longitude or latitude in degrees; a trailing or leading N, S, E or W gives the sign.</summary>
    internal static bool TryParseGeographic(string text, out double degrees)
    {
        degrees = 0.0;
        ReadOnlySpan<char> span = text.AsSpan().Trim();
        bool flip = false;
        if (span.Length > 1 && char.ToUpperInvariant(span[^1]) is 'N' or 'S' or 'E' or 'W')
        {
            // 12d34m56s ends in the sign for seconds, not in a compass point.
            bool compass = span[^1] != 's' || !span.Contains('m');
            flip = compass && char.ToUpperInvariant(span[^1]) is 'S' or 'W';
            span = compass ? span[..^1] : span;
        }
        else if (span.Length > 1 && char.ToUpperInvariant(span[0]) is 'N' or 'S' or 'E' or 'W')
        {
            flip = char.ToUpperInvariant(span[0]) is 'S' or 'W';
            span = span[1..];
        }

        if (!TryParse(span, out degrees, out _, out _))
        {
            return false;
        }

        degrees = flip ? -degrees : degrees;
        return true;
    }

    private static int NumberLength(ReadOnlySpan<char> text)
    {
        int i = 0;
        while (i < text.Length && (char.IsAsciiDigit(text[i]) || text[i] == '.'))
        {
            i++;
        }

        // An exponent belongs to the number only where digits follow.
        if (i > 0 && i < text.Length && (text[i] is 'e' or 'E'))
        {
            int j = i + 1;
            j += j < text.Length && text[j] is '+' or '-' ? 1 : 0;
            int digits = j;
            while (j < text.Length && char.IsAsciiDigit(text[j]))
            {
                j++;
            }

            i = j > digits ? j : i;
        }

        return i;
    }
}
