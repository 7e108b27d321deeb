using System;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tiles;

/// <summary>The content of single tiles: one row of the table each.</summary>
internal sealed class TileDecoder
{
    private readonly HduContext context;
    private readonly TileCompression compression;
    private readonly Quantization quantization;
    private readonly FitsColumn? compressed;
    private readonly FitsColumn? gzipped;
    private readonly FitsColumn? plain;
    private readonly ElementType type;

    private TileDecoder(HduContext context, TileCompression compression, Quantization quantization, FitsTable table, int bitPix)
    {
        this.context = context;
        this.compression = compression;
        this.quantization = quantization;
        compressed = table.FindColumn("COMPRESSED_DATA");
        gzipped = table.FindColumn("GZIP_COMPRESSED_DATA");
        plain = table.FindColumn("UNCOMPRESSED_DATA");
        type = ElementTypes.OfBitPix(bitPix);
    }

    internal static TileDecoder Open(HduData data, FitsHeader header, FitsTable table, int bitPix)
    {
        TileDecoder decoder = new(data.Context, TileCompression.Of(header, data), Quantization.Of(header, data.Context, table), table, bitPix);
        return (decoder.compressed ?? decoder.gzipped ?? decoder.plain) is null
            ? throw data.Context.Error("TTYPE1", "a tile-compressed image needs a column COMPRESSED_DATA; correct the header.")
            : decoder;
    }

    /// <summary>Scaled pixels.</summary>
    internal void ReadDoubles(long tile, Scaling scaling, Span<double> pixels)
    {
        if (compressed is not null && compressed.CountElements(tile) > 0)
        {
            ReadCompressed(tile, scaling, pixels);
        }
        else if (gzipped is not null && gzipped.CountElements(tile) > 0)
        {
            // A tile that could not be quantized is kept as it was.
            GzipTile.Read(gzipped.ReadBytes(tile).Span, type, isShuffled: false, pixels.Length, context, out byte[] bytes);
            ElementDecoder.ToDoubles(type, bytes, scaling, pixels);
        }
        else
        {
            double[] values = PlainColumn(tile).ReadDoubles(tile);
            RequireCount(values.Length, pixels.Length);
            values.CopyTo(pixels);
            ElementDecoder.Rescale(pixels, scaling);
        }
    }

    /// <summary>Stored integers of an integer image.</summary>
    internal void ReadIntegers(long tile, Span<long> pixels)
    {
        if (compressed is not null && compressed.CountElements(tile) > 0)
        {
            compression.Decode(compressed.ReadBytes(tile).Span, type, pixels, context);
            return;
        }

        FitsColumn column = PlainColumn(tile);
        long[] values = column.ReadIntegers(tile);
        RequireCount(values.Length, pixels.Length);
        values.CopyTo(pixels);
    }

    private void ReadCompressed(long tile, Scaling scaling, Span<double> pixels)
    {
        ReadOnlySpan<byte> bytes = compressed!.ReadBytes(tile).Span;
        bool isReal = !ElementTypes.IsInteger(type);
        if (isReal && !quantization.IsUsed)
        {
            compression.DecodeReals(bytes, type, pixels, context);
            ElementDecoder.Rescale(pixels, scaling);
            return;
        }

        long[] integers = new long[pixels.Length];
        compression.Decode(bytes, isReal ? ElementType.Int32 : type, integers, context);
        if (isReal)
        {
            quantization.Restore(tile, integers, pixels);
            ElementDecoder.Rescale(pixels, scaling);
            return;
        }

        for (int i = 0; i < integers.Length; i++)
        {
            pixels[i] = integers[i] == scaling.Null ? double.NaN : scaling.Zero + (scaling.Scale * integers[i]);
        }
    }

    private FitsColumn PlainColumn(long tile) => plain is not null && plain.CountElements(tile) > 0
        ? plain
        : throw context.Error("COMPRESSED_DATA", FormattableString.Invariant($"tile {tile + 1} has no data; the file is damaged."));

    private void RequireCount(int found, int expected)
    {
        if (found != expected)
        {
            throw context.Error("COMPRESSED_DATA", FormattableString.Invariant($"a tile has {found} pixels, expected {expected}; the file is damaged."));
        }
    }
}
