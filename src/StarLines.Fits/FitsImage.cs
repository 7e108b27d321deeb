using System;
using System.Collections.Generic;
using StarLines.Fits.Numerics;
using StarLines.Fits.Tiles;

namespace StarLines.Fits;

/// <summary>An array of pixels, plain or tile-compressed. The first axis runs fastest. Pixels that a truncated file has lost, and undefined ones, are NaN.</summary>
public sealed class FitsImage
{
    /// <summary>Large files are converted piece by piece.</summary>
    private const int PiecePixels = 1 << 20;

    private readonly HduData data;
    private readonly ElementType type;
    private readonly Scaling scaling;
    private readonly TileImage? tiles;

    private FitsImage(HduData data, int bitPix, long[] axes, long pixelCount, Scaling scaling, TileImage? tiles)
    {
        this.data = data;
        this.scaling = scaling;
        this.tiles = tiles;
        type = ElementTypes.OfBitPix(bitPix);
        BitPix = bitPix;
        Axes = axes;
        PixelCount = pixelCount;
        StoredPixelCount = tiles is null ? Math.Min(pixelCount, data.StoredBytes / ElementTypes.SizeOf(type)) : pixelCount;
    }

    /// <summary>The lengths of the axes; NAXIS1 first.</summary>
    public IReadOnlyList<long> Axes { get; }

    /// <summary>The type of the stored pixels: 8, 16, 32, 64 for integers, -32, -64 for floats.</summary>
    public int BitPix { get; }

    /// <summary>The number of pixels: the product of the axes.</summary>
    public long PixelCount { get; }

    /// <summary>The number of pixels that are in the file; less than <see cref="PixelCount"/> if it was cut short.</summary>
    public long StoredPixelCount { get; }

    /// <summary>Whether the image is tile-compressed.</summary>
    public bool IsCompressed => tiles is not null;

    /// <summary>The factor BSCALE from stored to true values.</summary>
    public double Scale => scaling.Scale;

    /// <summary>The offset BZERO from stored to true values.</summary>
    public double Zero => scaling.Zero;

    /// <summary>The stored integer that means an undefined pixel (BLANK), if there is one.</summary>
    public long? Blank => scaling.Null;

    /// <summary>All pixels, scaled.</summary>
    /// <returns><see cref="PixelCount"/> values.</returns>
    /// <exception cref="FitsFormatException">Compressed data are damaged, or there are more pixels than an array can hold.</exception>
    public double[] ReadDoubles()
    {
        double[] values = GC.AllocateUninitializedArray<double>(CountForArray());
        ReadDoubles(0, values);
        return values;
    }

    /// <summary>Some pixels, scaled.</summary>
    /// <param name="firstIndex">The first pixel, counted from 0 through all axes.</param>
    /// <param name="values">Receives the pixels; its length says how many.</param>
    /// <exception cref="FitsFormatException">Compressed data are damaged.</exception>
    public void ReadDoubles(long firstIndex, Span<double> values)
    {
        RequireRange(firstIndex, values.Length);
        if (tiles is not null)
        {
            tiles.ReadDoubles(firstIndex, scaling, values);
            return;
        }

        int stored = Stored(firstIndex, values.Length);
        int size = ElementTypes.SizeOf(type);
        for (int done = 0; done < stored;)
        {
            int count = data.Source.InMemory ? stored : Math.Min(stored - done, PiecePixels);
            ReadOnlySpan<byte> bytes = data.Read((firstIndex + done) * size, count * size).Span;
            ElementDecoder.ToDoubles(type, bytes, scaling, values.Slice(done, count));
            done += count;
        }

        values[stored..].Fill(double.NaN);
    }

    /// <summary>All pixels of an integer image, scaled, exactly: for masks and flags.</summary>
    /// <returns><see cref="PixelCount"/> values; undefined or lost pixels are <see cref="long.MinValue"/>.</returns>
    /// <exception cref="FitsFormatException">The image holds real numbers, or values beyond 64 bits, or its compressed data are damaged.</exception>
    public long[] ReadIntegers()
    {
        long[] values = GC.AllocateUninitializedArray<long>(CountForArray());
        ReadIntegers(0, values);
        return values;
    }

    /// <summary>Some pixels of an integer image, scaled, exactly.</summary>
    /// <param name="firstIndex">The first pixel, counted from 0 through all axes.</param>
    /// <param name="destination">Receives the pixels; undefined or lost ones are <see cref="long.MinValue"/>.</param>
    /// <exception cref="FitsFormatException">The image holds real numbers, or values beyond 64 bits, or its compressed data are damaged.</exception>
    public void ReadIntegers(long firstIndex, Span<long> destination)
    {
        RequireRange(firstIndex, destination.Length);
        if (!ElementTypes.IsInteger(type))
        {
            throw data.Context.Error(tiles is null ? "BITPIX" : "ZBITPIX", "the image holds real numbers, expected integers.");
        }

        int stored = Stored(firstIndex, destination.Length);
        if (tiles is not null)
        {
            tiles.ReadStoredIntegers(firstIndex, destination);
        }
        else
        {
            int size = ElementTypes.SizeOf(type);
            for (int done = 0; done < stored;)
            {
                int count = Math.Min(stored - done, PiecePixels);
                ElementDecoder.ToStoredIntegers(type, data.Read((firstIndex + done) * size, count * size).Span, destination.Slice(done, count));
                done += count;
            }
        }

        IntegerScaling.Apply(destination[..stored], scaling, data.Context, "BZERO");
        destination[stored..].Fill(IntegerScaling.Missing);
    }

    internal static FitsImage Read(HduData data, FitsHeader header)
    {
        HduLayout layout = data.Layout;
        long pixels = HduLayout.PixelsOf(layout.Axes, data.Context, "NAXIS");
        RefuseMostlyMissing(data);
        return new FitsImage(data, layout.BitPix, layout.Axes, pixels, ScalingOf(header, data.Context, layout.BitPix, "BLANK"), null);
    }

    internal static FitsImage ReadCompressed(HduData data, FitsHeader header, FitsTable table)
    {
        TileImage tiles = TileImage.Open(data, header, table);
        Scaling scaling = ScalingOf(header, data.Context, tiles.BitPix, header.Contains("ZBLANK") ? "ZBLANK" : "BLANK");
        return new FitsImage(data, tiles.BitPix, tiles.Axes, tiles.PixelCount, scaling, tiles);
    }

    /// <summary>A file with less than half of its pixels is no spectrum with a gap but a damaged header or download.</summary>
    private static void RefuseMostlyMissing(HduData data)
    {
        if (data.StoredBytes < data.Layout.DataBytes / 2)
        {
            throw data.Context.Error("NAXIS1", FormattableString.Invariant(
                $"the header asks for {data.Layout.DataBytes} bytes of pixels, the file has {data.StoredBytes}; the header is wrong or the file is cut short, get it again."));
        }
    }

    private static Scaling ScalingOf(FitsHeader header, HduContext context, int bitPix, string blankKeyword)
    {
        double scale = header.TryGetDouble("BSCALE", out double factor) ? factor : 1.0;
        double zero = header.TryGetDouble("BZERO", out double offset) ? offset : 0.0;
        if (scale == 0.0)
        {
            context.Warn("scale-zero", "BSCALE", "BSCALE is 0, so that every pixel has the value of BZERO.");
        }

        long? blank = bitPix > 0 && header.TryGetInteger(blankKeyword, out long undefined) ? undefined : null;
        return new Scaling(scale, zero, blank);
    }

    private int Stored(long firstIndex, int count) => (int)Math.Clamp(StoredPixelCount - firstIndex, 0, count);

    private int CountForArray() => PixelCount <= Array.MaxLength
        ? (int)PixelCount
        : throw data.Context.Error("NAXIS", FormattableString.Invariant($"{PixelCount} pixels are more than fit one array; read them in parts."));

    private void RequireRange(long firstIndex, int count)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(firstIndex);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(firstIndex, PixelCount - count);
    }
}
