using System;
using System.Globalization;

namespace StarLines.Fits.Tables;

/// <summary>What a TFORM of an ASCII table says.</summary>
/// <param name="Letter">A, I, F, E or D.</param>
/// <param name="Width">Characters of a cell.</param>
/// <param name="Decimals">Digits behind the decimal point where none is written.</param>
internal sealed record AsciiFormat(char Letter, int Width, int Decimals)
{
    internal static AsciiFormat? Parse(string form)
    {
        ReadOnlySpan<char> text = form.AsSpan().Trim();
        char letter = text.IsEmpty ? '\0' : char.ToUpperInvariant(text[0]);
        if (letter is not ('A' or 'I' or 'F' or 'E' or 'D'))
        {
            return null;
        }

        int point = text.IndexOf('.');
        ReadOnlySpan<char> widthText = point < 0 ? text[1..] : text[1..point];
        int width = 1;
        int decimals = 0;
        return (widthText.IsEmpty || TryDigits(widthText, out width)) && (point < 0 || TryDigits(text[(point + 1)..], out decimals))
            ? new AsciiFormat(letter, width, decimals)
            : null;
    }

    private static bool TryDigits(ReadOnlySpan<char> text, out int number) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out number);
}
