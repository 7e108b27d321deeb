using System;
using System.Buffers.Binary;

namespace StarLines.Fits;

/// <summary>A keyword of up to eight characters as one number, so that a header is searched eight bytes at a time.</summary>
internal static class KeywordCode
{
    internal const int Length = 8;

    private const ulong LetterBits = 0x4040404040404040;
    private const ulong LowerBits = 0x2020202020202020;

    internal static readonly ulong End = Of("END");
    internal static readonly ulong Blank = Of("");
    internal static readonly ulong Comment = Of("COMMENT");
    internal static readonly ulong History = Of("HISTORY");
    internal static readonly ulong Hierarch = Of("HIERARCH");
    internal static readonly ulong Continue = Of("CONTINUE");
    internal static readonly ulong Extension = Of("XTENSION");

    /// <summary>The code of a keyword as a program writes it; 0 if it is longer than eight characters or not ASCII.</summary>
    internal static ulong Of(ReadOnlySpan<char> keyword)
    {
        if (keyword.Length > Length)
        {
            return 0;
        }

        ulong code = 0;
        for (int i = 0; i < Length; i++)
        {
            char letter = i < keyword.Length ? char.ToUpperInvariant(keyword[i]) : ' ';
            if (letter > 0x7E)
            {
                return 0;
            }

            code |= (ulong)letter << (8 * i);
        }

        return code;
    }

    /// <summary>The code of the keyword of a card, lower-case letters raised.</summary>
    internal static ulong OfCard(ReadOnlySpan<byte> card)
    {
        ulong code = BinaryPrimitives.ReadUInt64LittleEndian(card);
        ulong lower = code & LetterBits & ((code & LowerBits) << 1);
        return lower == 0 ? code : Raise(code);
    }

    /// <summary>Whether the keyword of a card has lower-case letters.</summary>
    internal static bool IsLowered(ReadOnlySpan<byte> card) => OfCard(card) != BinaryPrimitives.ReadUInt64LittleEndian(card);

    private static ulong Raise(ulong code)
    {
        for (int shift = 0; shift < 64; shift += 8)
        {
            ulong letter = (code >> shift) & 0xFF;
            if (letter is >= 'a' and <= 'z')
            {
                code ^= 0x20UL << shift;
            }
        }

        return code;
    }
}
