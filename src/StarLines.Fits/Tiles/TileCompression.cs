using System;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tiles;

/// <summary>The algorithm of ZCMPTYPE with its parameters.</summary>
internal sealed class TileCompression
{
    private const int MaximumParameters = 99;

    private readonly string name;
    private readonly int blockSize;
    private readonly int bytesPerPixel;

    private TileCompression(string name, int blockSize, int bytesPerPixel)
    {
        this.name = name;
        this.blockSize = blockSize;
        this.bytesPerPixel = bytesPerPixel;
    }

    internal static TileCompression Of(FitsHeader header, HduData data)
    {
        string name = header.TryGetString("ZCMPTYPE", out string? text) ? text.ToUpperInvariant() : "";
        if (name is not ("RICE_1" or "RICE_ONE" or "GZIP_1" or "GZIP_2" or "PLIO_1" or "NOCOMPRESS"))
        {
            throw data.Context.Error("ZCMPTYPE", $"found '{name}', expected RICE_1, GZIP_1, GZIP_2, PLIO_1 or NOCOMPRESS; uncompress the file with funpack first.");
        }

        long block = Parameter(header, "BLOCKSIZE") ?? RiceDecoder.DefaultBlockSize;
        long bytes = Parameter(header, "BYTEPIX") ?? RiceDecoder.DefaultBytesPerPixel;
        if (name.StartsWith("RICE", StringComparison.Ordinal) && (block is < 1 or > 1 << 16 || bytes is not (1 or 2 or 4)))
        {
            throw data.Context.Error("ZVAL1", FormattableString.Invariant($"BLOCKSIZE {block} and BYTEPIX {bytes} are none of RICE_1; correct the header."));
        }

        return new TileCompression(name, (int)block, (int)bytes);
    }

    /// <summary>Integers of a tile.</summary>
    internal void Decode(ReadOnlySpan<byte> bytes, ElementType type, Span<long> pixels, HduContext context)
    {
        switch (name)
        {
            case "RICE_1" or "RICE_ONE":
                RiceDecoder.Decode(bytes, blockSize, bytesPerPixel, pixels, context);
                break;
            case "PLIO_1":
                PlioDecoder.Decode(bytes, pixels, context);
                break;
            default:
                ElementDecoder.ToStoredIntegers(Unpack(bytes, type, pixels.Length, context, out byte[] unpacked), unpacked, pixels);
                break;
        }
    }

    /// <summary>Real numbers of a tile that was compressed without loss.</summary>
    internal void DecodeReals(ReadOnlySpan<byte> bytes, ElementType type, Span<double> pixels, HduContext context)
    {
        if (name is "RICE_1" or "RICE_ONE" or "PLIO_1")
        {
            throw context.Error("ZSCALE", $"{name} holds integers, and nothing says how they become real numbers; the header is damaged.");
        }

        _ = Unpack(bytes, type, pixels.Length, context, out byte[] unpacked);
        ElementDecoder.ToDoubles(type, unpacked, Scaling.None, pixels);
    }

    private ElementType Unpack(ReadOnlySpan<byte> bytes, ElementType type, int pixels, HduContext context, out byte[] unpacked)
    {
        if (name != "NOCOMPRESS")
        {
            return GzipTile.Read(bytes, type, name == "GZIP_2", pixels, context, out unpacked);
        }

        unpacked = bytes.ToArray();
        return unpacked.Length == (long)pixels * ElementTypes.SizeOf(type) ? type : throw GzipTile.WrongSize(context, unpacked.Length, pixels);
    }

    /// <summary>The value ZVALn of the parameter that ZNAMEn names.</summary>
    private static long? Parameter(FitsHeader header, string name)
    {
        for (int i = 1; i <= MaximumParameters; i++)
        {
            string number = i.ToString(CultureInfo.InvariantCulture);
            if (!header.TryGetString("ZNAME" + number, out string? found))
            {
                return null;
            }

            if (found.Equals(name, StringComparison.OrdinalIgnoreCase))
            {
                return header.RequireInteger("ZVAL" + number, 1, int.MaxValue);
            }
        }

        return null;
    }
}
