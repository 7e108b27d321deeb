using System;
using System.Buffers.Binary;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Fits.Numerics;

/// <summary>The ones' complement sum of big-endian 32-bit words. Source: FITS Standard 4.0, appendix J.</summary>
internal static class Checksum
{
    /// <summary>The sum of bytes, whose missing tail counts as zeros, added to a sum.</summary>
    internal static uint Add(ReadOnlySpan<byte> bytes, uint sum)
    {
        int whole = bytes.Length / 4 * 4;
        ulong total = sum + SumWords(MemoryMarshal.Cast<byte, uint>(bytes[..whole]));
        if (whole < bytes.Length)
        {
            Span<byte> tail = stackalloc byte[4];
            tail.Clear();
            bytes[whole..].CopyTo(tail);
            total += BinaryPrimitives.ReadUInt32BigEndian(tail);
        }

        return Fold(total);
    }

    /// <summary>Carries added back until 32 bits are left.</summary>
    internal static uint Fold(ulong total)
    {
        while (total > uint.MaxValue)
        {
            total = (total & uint.MaxValue) + (total >> 32);
        }

        return (uint)total;
    }

    /// <summary>The sum of big-endian words, vectorized. Two words go into each 64-bit lane sum, which has room for 2^31 of them.</summary>
    internal static ulong SumWords(ReadOnlySpan<uint> words)
    {
        ulong total = 0;
        int i = 0;
        if (Vector256.IsHardwareAccelerated && BitConverter.IsLittleEndian)
        {
            Vector256<ulong> sums = Vector256<ulong>.Zero;
            for (; i <= words.Length - Vector256<uint>.Count; i += Vector256<uint>.Count)
            {
                Vector256<uint> ordered = Vector256.Shuffle(Vector256.Create(words[i..]).AsByte(), BigEndian.WordOrder).AsUInt32();
                (Vector256<ulong> low, Vector256<ulong> high) = Vector256.Widen(ordered);
                sums += low + high;
            }

            total = Vector256.Sum(sums);
        }

        return total + SumWordsPlainly(words[i..]);
    }

    /// <summary>The sum of big-endian words, the clear loop.</summary>
    internal static ulong SumWordsPlainly(ReadOnlySpan<uint> words)
    {
        ulong total = 0;
        foreach (uint word in words)
        {
            total += BitConverter.IsLittleEndian ? BinaryPrimitives.ReverseEndianness(word) : word;
        }

        return total;
    }

    /// <summary>The sixteen characters of CHECKSUM that make the sum of the HDU all ones. Source: FITS Standard 4.0, appendix J.2.</summary>
    /// <param name="sum">The sum of the HDU while CHECKSUM is sixteen zeros.</param>
    internal static string Encode(uint sum)
    {
        uint value = ~sum;
        Span<char> ascii = stackalloc char[16];
        Span<int> quarters = stackalloc int[4];
        for (int i = 0; i < 4; i++)
        {
            int oneByte = (int)((value >> (24 - (8 * i))) & 0xFF);
            quarters.Fill((oneByte / 4) + '0');
            quarters[0] += oneByte % 4;
            AvoidPunctuation(quarters);
            for (int j = 0; j < 4; j++)
            {
                ascii[(4 * j) + i] = (char)quarters[j];
            }
        }

        // The value starts in the second byte of a 32-bit word of the card, so the string is turned by one.
        return string.Concat(ascii[15..], ascii[..15]);
    }

    private static void AvoidPunctuation(Span<int> quarters)
    {
        for (bool changed = true; changed;)
        {
            changed = false;
            for (int j = 0; j < 4; j += 2)
            {
                if (IsPunctuation(quarters[j]) || IsPunctuation(quarters[j + 1]))
                {
                    quarters[j]++;
                    quarters[j + 1]--;
                    changed = true;
                }
            }
        }
    }

    private static bool IsPunctuation(int character) => character is (>= 0x3A and <= 0x40) or (>= 0x5B and <= 0x60);
}
