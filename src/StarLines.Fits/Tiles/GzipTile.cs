using System;
using System.IO;
using System.IO.Compression;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tiles;

/// <summary>GZIP_1 and GZIP_2 tiles: gzip of the big-endian pixels; in GZIP_2 all first bytes come first, then all second bytes, and so on.</summary>
internal static class GzipTile
{
    private const int MaximumPixelBytes = 8;

    /// <summary>Unpacks a tile. Integers may be stored in fewer or more bytes than their image has.</summary>
    /// <returns>The type that the unpacked pixels have.</returns>
    internal static ElementType Read(ReadOnlySpan<byte> packed, ElementType type, bool isShuffled, int pixels, HduContext context, out byte[] unpacked)
    {
        byte[] buffer = new byte[((long)pixels * MaximumPixelBytes) + 1];
        int count = Gunzip(packed, buffer, context);
        int size = count / Math.Max(1, pixels);
        if (size * (long)pixels != count || (ElementTypes.IsInteger(type) ? size is not (1 or 2 or 4 or 8) : size != ElementTypes.SizeOf(type)))
        {
            throw WrongSize(context, count, pixels);
        }

        unpacked = buffer[..count];
        if (isShuffled)
        {
            Unshuffle(buffer.AsSpan(0, count), size, unpacked);
        }

        return !ElementTypes.IsInteger(type) ? type
            : size switch { 1 => ElementType.Byte, 2 => ElementType.Int16, 4 => ElementType.Int32, _ => ElementType.Int64 };
    }

    internal static FitsFormatException WrongSize(HduContext context, int bytes, int pixels) =>
        context.Error("COMPRESSED_DATA", FormattableString.Invariant($"a tile of {pixels} pixels unpacks to {bytes} bytes; the file is damaged."));

    private static int Gunzip(ReadOnlySpan<byte> packed, byte[] buffer, HduContext context)
    {
        try
        {
            using MemoryStream input = new(packed.ToArray(), writable: false);
            using GZipStream gunzip = new(input, CompressionMode.Decompress);
            return gunzip.ReadAtLeast(buffer, buffer.Length, throwOnEndOfStream: false);
        }
        catch (InvalidDataException damage)
        {
            throw context.Error("COMPRESSED_DATA", "the gzip stream of a tile is damaged; get the file again.", damage);
        }
    }

    private static void Unshuffle(ReadOnlySpan<byte> shuffled, int size, Span<byte> pixels)
    {
        int count = shuffled.Length / size;
        for (int part = 0; part < size; part++)
        {
            for (int i = 0; i < count; i++)
            {
                pixels[(i * size) + part] = shuffled[(part * count) + i];
            }
        }
    }
}
