using System;
using System.Globalization;

namespace StarLines.Fits;

/// <summary>The mandatory keywords of an HDU and the size of its data that follows from them.</summary>
internal sealed class HduLayout
{
    private const int MaximumAxes = 999;

    private HduLayout(string extension, int bitPix, long[] axes, long parameterCount, long groupCount, bool isGroups, long dataBytes)
    {
        Extension = extension;
        BitPix = bitPix;
        Axes = axes;
        ParameterCount = parameterCount;
        GroupCount = groupCount;
        IsGroups = isGroups;
        DataBytes = dataBytes;
    }

    /// <summary>The value of XTENSION; empty for the primary HDU.</summary>
    internal string Extension { get; }

    internal int BitPix { get; }

    internal long[] Axes { get; }

    internal long ParameterCount { get; }

    internal long GroupCount { get; }

    internal bool IsGroups { get; }

    /// <summary>The size of the data that the header states, without padding.</summary>
    internal long DataBytes { get; }

    internal static HduLayout Of(FitsHeader header, HduContext context)
    {
        string extension = context.Number > 0 && header.TryGetString("XTENSION", out string? name) ? name.ToUpperInvariant() : "";
        long bitPix = header.RequireInteger("BITPIX", -64, 64);
        if (bitPix is not (8 or 16 or 32 or 64 or -32 or -64))
        {
            throw context.Error("BITPIX", $"found {bitPix.ToString(CultureInfo.InvariantCulture)}, expected 8, 16, 32, 64, -32 or -64; correct the header.");
        }

        long[] axes = AxesOf(header, context, "NAXIS");
        bool groups = axes.Length > 0 && axes[0] == 0 && header.TryGetCard("GROUPS", out FitsCard? card) && card.Text == "T";
        bool hasParameters = context.Number > 0 || groups;
        long parameters = hasParameters ? header.OptionalInteger("PCOUNT", 0, long.MaxValue, 0) : 0;
        long count = hasParameters ? header.OptionalInteger("GCOUNT", 0, long.MaxValue, 1) : 1;
        return new HduLayout(extension, (int)bitPix, axes, parameters, count, groups, SizeOf(bitPix, groups ? axes.AsSpan(1) : axes, axes.Length, parameters, count, context));
    }

    /// <summary>The axes that a keyword such as NAXIS or ZNAXIS and its numbered companions state.</summary>
    internal static long[] AxesOf(FitsHeader header, HduContext context, string keyword)
    {
        long[] axes = new long[header.RequireInteger(keyword, 0, MaximumAxes)];
        for (int i = 0; i < axes.Length; i++)
        {
            string numbered = keyword + (i + 1).ToString(CultureInfo.InvariantCulture);
            axes[i] = header.RequireInteger(numbered, 0, long.MaxValue);
            RefuseContradiction(header, context, numbered);
        }

        return axes;
    }

    /// <summary>The product of the axes; one zero makes it zero whatever the others are.</summary>
    internal static long PixelsOf(ReadOnlySpan<long> axes, HduContext context, string keyword)
    {
        if (axes.IsEmpty || axes.Contains(0))
        {
            return 0;
        }

        long pixels = 1;
        foreach (long axis in axes)
        {
            if (pixels > long.MaxValue / axis)
            {
                throw context.Error(keyword, "the product of the axes is beyond 64 bits; the header is damaged.");
            }

            pixels *= axis;
        }

        return pixels;
    }

    private static long SizeOf(long bitPix, ReadOnlySpan<long> axes, int axisCount, long parameters, long groups, HduContext context)
    {
        if (axisCount == 0)
        {
            return 0;
        }

        long pixels = PixelsOf(axes, context, "NAXIS");
        UInt128 bytes = ((UInt128)pixels + (UInt128)parameters) * (UInt128)(Math.Abs(bitPix) / 8);
        UInt128 limit = (UInt128)(long.MaxValue / 2);
        if (groups > 0 && bytes > limit / (UInt128)groups)
        {
            throw context.Error("NAXIS1", "the size of the data is beyond 64 bits; the header is damaged.");
        }

        return (long)(bytes * (UInt128)groups);
    }

    /// <summary>An axis length that stands twice with different values leaves the size of the data open.</summary>
    private static void RefuseContradiction(FitsHeader header, HduContext context, string keyword)
    {
        if (header.HasContradiction(keyword))
        {
            throw context.Error(keyword, "the keyword stands twice with different values; correct the header.");
        }
    }
}
