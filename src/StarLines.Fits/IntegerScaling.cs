using System;
using StarLines.Fits.Numerics;

namespace StarLines.Fits;

/// <summary>Stored integers to integer values.</summary>
internal static class IntegerScaling
{
    /// <summary>What an undefined element becomes.</summary>
    internal const long Missing = long.MinValue;

    /// <summary>Applies scale and zero, which must be whole numbers; undefined elements become <see cref="Missing"/>.</summary>
    internal static void Apply(Span<long> values, in Scaling scaling, HduContext context, string zeroKeyword)
    {
        if (scaling.IsIdentity && scaling.Null is null)
        {
            return;
        }

        if (scaling.Scale != Math.Truncate(scaling.Scale) || scaling.Zero != Math.Truncate(scaling.Zero) || Math.Abs(scaling.Zero) > Scaling.UnsignedOffset)
        {
            throw context.Error(zeroKeyword, "the scaled values are no whole numbers; read them as real numbers.");
        }

        for (int i = 0; i < values.Length; i++)
        {
            values[i] = values[i] == scaling.Null ? Missing : Scaled(values[i], scaling, context, zeroKeyword);
        }
    }

    private static long Scaled(long stored, in Scaling scaling, HduContext context, string zeroKeyword)
    {
        Int128 value = (Int128)scaling.Zero + ((Int128)scaling.Scale * stored);
        return value >= long.MinValue && value <= long.MaxValue
            ? (long)value
            : throw context.Error(zeroKeyword, "an integer is beyond 64 bits; read the values as real numbers.");
    }
}
