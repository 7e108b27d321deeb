using System;
using System.Globalization;
using System.Text;

namespace StarLines.Fits.Writing;

/// <summary>FITS text is printable ASCII: accents are dropped, what has no ASCII form becomes a question mark.</summary>
internal static class AsciiText
{
    internal static string From(string text)
    {
        if (IsPlain(text))
        {
            return text;
        }

        StringBuilder ascii = new(text.Length);
        foreach (char letter in text.Normalize(NormalizationForm.FormD))
        {
            if (letter is >= ' ' and <= '~')
            {
                ascii.Append(letter);
            }
            else if (CharUnicodeInfo.GetUnicodeCategory(letter) != UnicodeCategory.NonSpacingMark)
            {
                ascii.Append(char.IsControl(letter) ? ' ' : '?');
            }
        }

        return ascii.ToString();
    }

    private static bool IsPlain(ReadOnlySpan<char> text) => text.IndexOfAnyExceptInRange(' ', '~') < 0;
}
