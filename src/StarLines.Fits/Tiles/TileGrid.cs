using System;

namespace StarLines.Fits.Tiles;

/// <summary>How an image of any number of axes is cut into tiles, first axis fastest; the tiles at the far edges are smaller.</summary>
internal sealed class TileGrid
{
    private readonly long[] axes;
    private readonly long[] tile;
    private readonly long[] counts;

    internal TileGrid(long[] axes, long[] tile)
    {
        this.axes = axes;
        this.tile = tile;
        counts = new long[axes.Length];
        TileCount = 1;
        for (int i = 0; i < axes.Length; i++)
        {
            counts[i] = ((axes[i] - 1) / tile[i]) + 1;
            TileCount *= counts[i];
        }
    }

    internal long TileCount { get; }

    /// <summary>Where a tile starts and how large it is.</summary>
    internal void Locate(long index, Span<long> start, Span<long> size)
    {
        for (int i = 0; i < axes.Length; i++)
        {
            start[i] = index % counts[i] * tile[i];
            size[i] = Math.Min(tile[i], axes[i] - start[i]);
            index /= counts[i];
        }
    }

    /// <summary>The place in the image of the first pixel of each run of a tile along the first axis, one after another.</summary>
    internal long RunStart(ReadOnlySpan<long> start, ReadOnlySpan<long> size, long run)
    {
        long place = start[0];
        long stride = axes[0];
        for (int i = 1; i < axes.Length; i++)
        {
            place += (start[i] + (run % size[i])) * stride;
            stride *= axes[i];
            run /= size[i];
        }

        return place;
    }

    internal static long PixelsOf(ReadOnlySpan<long> size)
    {
        long pixels = 1;
        foreach (long length in size)
        {
            pixels *= length;
        }

        return pixels;
    }
}
