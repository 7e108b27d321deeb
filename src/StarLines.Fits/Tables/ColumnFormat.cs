using System;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tables;

/// <summary>What a TFORM of a binary table says.</summary>
/// <param name="Repeat">Elements in a cell; for a variable-length column the repeat of its descriptor, 0 or 1.</param>
/// <param name="Descriptor">P or Q for a variable-length column, else NUL.</param>
/// <param name="Letter">The letter of the element type.</param>
/// <param name="Type">The element type.</param>
/// <param name="SubstringLength">The length of each string in a cell of several strings (rAw); 0 where the cell is one string.</param>
internal readonly record struct ColumnFormat(long Repeat, char Descriptor, char Letter, ElementType Type, int SubstringLength)
{
    internal bool IsVariable => Descriptor != '\0';

    /// <summary>Bytes of a cell in the row.</summary>
    internal long Width => IsVariable ? Repeat * (Descriptor == 'P' ? 8 : 16) : ElementTypes.BytesOf(Type, Repeat);

    /// <summary>Reads a TFORM such as 1D, 400E, 16A, 1PE(400).</summary>
    /// <returns>Null where it is none.</returns>
    internal static ColumnFormat? Parse(string form, long rowBytes)
    {
        ReadOnlySpan<char> text = form.AsSpan().Trim();
        int digits = text.IndexOfAnyExceptInRange('0', '9');
        if (digits < 0)
        {
            return null;
        }

        long repeat = 1;
        if (digits > 0 && !long.TryParse(text[..digits], NumberStyles.None, CultureInfo.InvariantCulture, out repeat))
        {
            return null;
        }

        char letter = char.ToUpperInvariant(text[digits]);
        ReadOnlySpan<char> rest = text[(digits + 1)..];

        // No element is under a bit, so a larger repeat cannot fit the row, whatever its size in bytes overflows to.
        return repeat > rowBytes * 8 ? null : letter is 'P' or 'Q' ? Variable(repeat, letter, rest) : Fixed(repeat, letter, rest);
    }

    private static ColumnFormat? Fixed(long repeat, char letter, ReadOnlySpan<char> rest)
    {
        if (ElementTypes.OfLetter(letter) is not ElementType type)
        {
            return null;
        }

        _ = int.TryParse(rest, NumberStyles.None, CultureInfo.InvariantCulture, out int substring);
        return new ColumnFormat(repeat, '\0', letter, type, type == ElementType.Text && substring > 0 && substring < repeat ? substring : 0);
    }

    private static ColumnFormat? Variable(long repeat, char descriptor, ReadOnlySpan<char> rest)
    {
        if (repeat > 1 || rest.IsEmpty || ElementTypes.OfLetter(char.ToUpperInvariant(rest[0])) is not ElementType type)
        {
            return null;
        }

        return new ColumnFormat(repeat, descriptor, char.ToUpperInvariant(rest[0]), type, 0);
    }
}
