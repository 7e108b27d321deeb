using System;

namespace StarLines.Fits.Tiles;

/// <summary>How the integers of a quantized tile become real numbers. Source: FITS Standard 4.0, section 10.2.</summary>
internal sealed class Quantization
{
    /// <summary>The stored integer that stands for an exact zero in SUBTRACTIVE_DITHER_2.</summary>
    private const long ExactZero = -2147483646;

    /// <summary>The stored integer for NaN where ZBLANK is absent, the value every writer uses.</summary>
    private const long DefaultBlank = -2147483648;

    private readonly Values? scale;
    private readonly Values? zero;
    private readonly Values? blank;
    private readonly bool isDithered;
    private readonly bool keepsZeros;
    private readonly long seed;

    private Quantization(Values? scale, Values? zero, Values? blank, string method, long seed)
    {
        this.scale = scale;
        this.zero = zero;
        this.blank = blank;
        this.seed = seed;
        isDithered = method.StartsWith("SUBTRACTIVE_DITHER", StringComparison.Ordinal);
        keepsZeros = method == "SUBTRACTIVE_DITHER_2";
    }

    /// <summary>Whether real numbers were quantized at all.</summary>
    internal bool IsUsed => scale is not null;

    internal static Quantization Of(FitsHeader header, HduContext context, FitsTable table)
    {
        string method = header.TryGetString("ZQUANTIZ", out string? text) ? text.ToUpperInvariant() : "NO_DITHER";
        if (method is not ("NO_DITHER" or "NONE" or "" or "SUBTRACTIVE_DITHER_1" or "SUBTRACTIVE_DITHER_2"))
        {
            throw context.Error("ZQUANTIZ", $"found '{method}', expected NO_DITHER, SUBTRACTIVE_DITHER_1 or SUBTRACTIVE_DITHER_2; correct the header.");
        }

        long seed = header.OptionalInteger("ZDITHER0", 0, int.MaxValue, 1);
        return new Quantization(Values.Of(header, table, "ZSCALE"), Values.Of(header, table, "ZZERO"), Values.Of(header, table, "ZBLANK"), method, seed);
    }

    /// <summary>Real numbers from the integers of a tile, which counts from 0.</summary>
    internal void Restore(long tile, ReadOnlySpan<long> integers, Span<double> pixels)
    {
        double factor = scale!.At(tile);
        double offset = zero?.At(tile) ?? 0.0;
        long missing = blank is null ? DefaultBlank : (long)blank.At(tile);
        DitherSequence dither = new(tile + seed - 1);
        for (int i = 0; i < pixels.Length; i++)
        {
            double shift = isDithered ? 0.5 - dither.Next() : 0.0;
            pixels[i] = integers[i] == missing ? double.NaN
                : keepsZeros && integers[i] == ExactZero ? 0.0
                : ((integers[i] + shift) * factor) + offset;
        }
    }

    /// <summary>A number that is a column, one for each tile, or a keyword, one for all.</summary>
    private sealed class Values(FitsColumn? column, double value)
    {
        internal double At(long tile) => column is null ? value : column.ReadDoubles(tile) is [double first, ..] ? first : double.NaN;

        internal static Values? Of(FitsHeader header, FitsTable table, string name)
        {
            FitsColumn? column = table.FindColumn(name);
            return column is not null || header.Contains(name)
                ? new Values(column, column is null && header.TryGetDouble(name, out double value) ? value : 0.0)
                : null;
        }
    }
}
