using System;
using System.Numerics;

namespace StarLines.Fits.Tiles;

/// <summary>
/// RICE_1: differences of neighbouring pixels, folded to non-negative numbers; in each block the low bits are stored as they are and the high part
/// as that many zeros and a one. Source: FITS Standard 4.0, section 10.4.1.
/// </summary>
internal static class RiceDecoder
{
    internal const int DefaultBlockSize = 32;
    internal const int DefaultBytesPerPixel = 4;

    internal static void Decode(ReadOnlySpan<byte> bytes, int blockSize, int bytesPerPixel, Span<long> pixels, HduContext context)
    {
        // Bits of the split value, and its value that marks a block stored as it is.
        (int splitBits, int plainSplit) = bytesPerPixel switch { 1 => (3, 6), 2 => (4, 14), _ => (5, 25) };
        int pixelBits = 8 * bytesPerPixel;
        BitReader reader = new(bytes);
        uint last = reader.Read(pixelBits);
        for (int start = 0; start < pixels.Length; start += blockSize)
        {
            Span<long> block = pixels.Slice(start, Math.Min(blockSize, pixels.Length - start));
            int split = (int)reader.Read(splitBits) - 1;
            for (int i = 0; i < block.Length; i++)
            {
                uint folded = split < 0 ? 0 : split == plainSplit ? reader.Read(pixelBits) : (reader.ReadZeros() << split) | reader.Read(split);
                uint difference = (folded & 1) == 0 ? folded >> 1 : ~(folded >> 1);
                last = unchecked(last + difference);
                block[i] = Signed(last, bytesPerPixel);
            }

            if (reader.IsBeyondEnd || split > plainSplit)
            {
                throw context.Error("COMPRESSED_DATA", "a RICE_1 tile is damaged: its bits do not make the pixels that it should hold.");
            }
        }
    }

    /// <summary>Bytes are unsigned, as in images of BITPIX 8; the others are signed.</summary>
    private static long Signed(uint value, int bytesPerPixel) => unchecked(bytesPerPixel switch { 1 => (byte)value, 2 => (short)value, _ => (int)value });

    /// <summary>Bits from the highest on. Beyond the end it gives zeros, or one zero-run of no length, and remembers.</summary>
    private ref struct BitReader(ReadOnlySpan<byte> bytes)
    {
        private readonly ReadOnlySpan<byte> bytes = bytes;
        private ulong held;
        private int heldBits;
        private int next;

        internal bool IsBeyondEnd { get; private set; }

        internal uint Read(int count)
        {
            if (count == 0)
            {
                return 0;
            }

            Fill();
            if (heldBits < count)
            {
                IsBeyondEnd = true;
                return 0;
            }

            uint value = (uint)(held >> (64 - count));
            held <<= count;
            heldBits -= count;
            return value;
        }

        /// <summary>The number of zeros before the next one; the one is taken too.</summary>
        internal uint ReadZeros()
        {
            uint zeros = 0;
            while (true)
            {
                Fill();
                if (heldBits == 0)
                {
                    IsBeyondEnd = true;
                    return 0;
                }

                int run = Math.Min(BitOperations.LeadingZeroCount(held), heldBits);
                zeros += (uint)run;
                if (run < heldBits)
                {
                    // Two shifts, as a shift by 64 would do nothing.
                    held = held << run << 1;
                    heldBits -= run + 1;
                    return zeros;
                }

                held = 0;
                heldBits = 0;
            }
        }

        private void Fill()
        {
            while (heldBits <= 56 && next < bytes.Length)
            {
                held |= (ulong)bytes[next++] << (56 - heldBits);
                heldBits += 8;
            }
        }
    }
}
