using System;
using System.Buffers.Binary;

namespace StarLines.Fits.Tiles;

/// <summary>
/// PLIO_1: a list of 16-bit instructions that paint runs of pixels with a value that goes up and down; for masks.
/// Source: FITS Standard 4.0, section 10.4.3.
/// </summary>
internal static class PlioDecoder
{
    private const int WordBytes = 2;
    private const int OperandBits = 12;
    private const int OperandMask = (1 << OperandBits) - 1;

    internal static void Decode(ReadOnlySpan<byte> bytes, Span<long> pixels, HduContext context)
    {
        pixels.Clear();
        int words = bytes.Length / WordBytes;
        if (!TryReadHeader(bytes, words, out int next, out int end))
        {
            throw Damaged(context);
        }

        int at = 0;
        long value = 1;
        while (next < end && at < pixels.Length)
        {
            int word = Word(bytes, next++);
            int operand = word & OperandMask;
            switch (word >> OperandBits)
            {
                case 0: // zeros
                    at += operand;
                    break;
                case 1: // the value itself, high part in the next word
                    if (next >= end)
                    {
                        throw Damaged(context);
                    }

                    value = ((long)Word(bytes, next++) << OperandBits) + operand;
                    break;
                case 2: // the value goes up
                    value += operand;
                    break;
                case 3: // the value goes down
                    value -= operand;
                    break;
                case 4: // a run of the value
                    pixels.Slice(at, Math.Min(operand, pixels.Length - at)).Fill(value);
                    at += operand;
                    break;
                case 5: // zeros, then the value once
                    at += operand;
                    Paint(pixels, at - 1, value);
                    break;
                case 6: // up, and one pixel
                    value += operand;
                    Paint(pixels, at++, value);
                    break;
                case 7: // down, and one pixel
                    value -= operand;
                    Paint(pixels, at++, value);
                    break;
                default:
                    throw Damaged(context);
            }
        }
    }

    /// <summary>The header has either three words, the third being the length, or its own length in the second and the length of the list in the fourth and fifth.</summary>
    private static bool TryReadHeader(ReadOnlySpan<byte> bytes, int words, out int first, out int end)
    {
        first = 0;
        end = 0;
        if (words < 3)
        {
            return false;
        }

        int third = (short)Word(bytes, 2);
        if (third > 0)
        {
            first = 3;
            end = third;
        }
        else if (words >= 5)
        {
            first = Word(bytes, 1);
            end = (Word(bytes, 4) << 15) + Word(bytes, 3);
        }

        return first >= 3 && end >= first && end <= words;
    }

    private static int Word(ReadOnlySpan<byte> bytes, int index) => BinaryPrimitives.ReadUInt16BigEndian(bytes[(index * WordBytes)..]);

    private static void Paint(Span<long> pixels, int index, long value)
    {
        if (index >= 0 && index < pixels.Length)
        {
            pixels[index] = value;
        }
    }

    private static FitsFormatException Damaged(HduContext context) =>
        context.Error("COMPRESSED_DATA", "a PLIO_1 tile is damaged: its instructions are none of the algorithm.");
}
