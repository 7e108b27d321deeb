using System;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tiles;

/// <summary>A tile-compressed image. Source: FITS Standard 4.0, section 10.1.</summary>
internal sealed class TileImage
{
    /// <summary>No algorithm here packs more than this many bytes of pixels into one (runs of 4095 in PLIO_1 are the extreme).</summary>
    private const long MaximumRatio = 8192;

    private readonly TileGrid grid;
    private readonly TileDecoder decoder;

    private TileImage(int bitPix, long[] axes, long pixelCount, TileGrid grid, TileDecoder decoder)
    {
        BitPix = bitPix;
        Axes = axes;
        PixelCount = pixelCount;
        this.grid = grid;
        this.decoder = decoder;
    }

    internal int BitPix { get; }

    internal long[] Axes { get; }

    internal long PixelCount { get; }

    internal static TileImage Open(HduData data, FitsHeader header, FitsTable table)
    {
        HduContext context = data.Context;
        long bitPix = header.RequireInteger("ZBITPIX", -64, 64);
        if (bitPix is not (8 or 16 or 32 or 64 or -32 or -64))
        {
            throw context.Error("ZBITPIX", FormattableString.Invariant($"found {bitPix}, expected 8, 16, 32, 64, -32 or -64; correct the header."));
        }

        long[] axes = HduLayout.AxesOf(header, context, "ZNAXIS");
        long pixels = HduLayout.PixelsOf(axes, context, "ZNAXIS");
        long limit = data.Options.MaximumDecompressedBytes / sizeof(double);
        if (pixels > limit || pixels > data.StoredBytes * MaximumRatio)
        {
            throw context.Error("ZNAXIS1", FormattableString.Invariant(
                $"the image has {pixels} pixels in {data.StoredBytes} compressed bytes; the header is wrong, or the image is larger than {nameof(FitsOptions.MaximumDecompressedBytes)} allows ({limit} pixels)."));
        }

        TileGrid grid = new(axes, pixels == 0 ? OneEach(axes) : TileOf(header, axes));
        if (pixels > 0 && grid.TileCount != table.StatedRowCount)
        {
            throw context.Error("ZNAXIS1", FormattableString.Invariant($"the image is cut into {grid.TileCount} tiles (ZNAXISn, ZTILEn), but the table has {table.StatedRowCount} rows; correct the header."));
        }

        return new TileImage((int)bitPix, axes, pixels, grid, TileDecoder.Open(data, header, table, (int)bitPix));
    }

    internal void ReadDoubles(long firstIndex, Scaling scaling, Span<double> destination)
    {
        double[] tile = [];
        for (long index = 0; index < grid.TileCount && PixelCount > 0; index++)
        {
            if (Covers(index, firstIndex, destination.Length, out long pixels))
            {
                Resize(ref tile, pixels);
                decoder.ReadDoubles(index, scaling, tile.AsSpan(0, (int)pixels));
                Scatter<double>(index, tile, firstIndex, destination);
            }
        }
    }

    internal void ReadStoredIntegers(long firstIndex, Span<long> destination)
    {
        long[] tile = [];
        for (long index = 0; index < grid.TileCount && PixelCount > 0; index++)
        {
            if (Covers(index, firstIndex, destination.Length, out long pixels))
            {
                Resize(ref tile, pixels);
                decoder.ReadIntegers(index, tile.AsSpan(0, (int)pixels));
                Scatter<long>(index, tile, firstIndex, destination);
            }
        }
    }

    private static void Resize<T>(ref T[] tile, long pixels) => tile = tile.Length < pixels ? new T[pixels] : tile;

    private static long[] OneEach(long[] axes) => Array.ConvertAll(axes, _ => 1L);

    /// <summary>ZTILEn; by default a tile is one row of the image.</summary>
    private static long[] TileOf(FitsHeader header, long[] axes)
    {
        long[] tile = new long[axes.Length];
        for (int i = 0; i < axes.Length; i++)
        {
            string keyword = "ZTILE" + (i + 1).ToString(CultureInfo.InvariantCulture);
            tile[i] = Math.Min(axes[i], header.OptionalInteger(keyword, 1, long.MaxValue, i == 0 ? axes[0] : 1));
        }

        return tile;
    }

    /// <summary>Whether any pixel of a tile may lie in the wanted range.</summary>
    private bool Covers(long index, long firstIndex, int count, out long pixels)
    {
        Span<long> start = stackalloc long[Axes.Length];
        Span<long> size = stackalloc long[Axes.Length];
        grid.Locate(index, start, size);
        pixels = TileGrid.PixelsOf(size);
        long first = grid.RunStart(start, size, 0);
        long last = grid.RunStart(start, size, (pixels / size[0]) - 1) + size[0] - 1;
        return count > 0 && last >= firstIndex && first < firstIndex + count;
    }

    private void Scatter<T>(long index, ReadOnlySpan<T> tile, long firstIndex, Span<T> destination)
    {
        Span<long> start = stackalloc long[Axes.Length];
        Span<long> size = stackalloc long[Axes.Length];
        grid.Locate(index, start, size);
        int length = (int)size[0];
        long runs = TileGrid.PixelsOf(size) / length;
        for (long run = 0; run < runs; run++)
        {
            long place = grid.RunStart(start, size, run) - firstIndex;
            int skip = (int)Math.Clamp(-place, 0, length);
            int take = (int)Math.Clamp(destination.Length - (place + skip), 0, length - skip);
            if (take > 0)
            {
                tile.Slice((int)(run * length) + skip, take).CopyTo(destination[(int)(place + skip)..]);
            }
        }
    }
}
