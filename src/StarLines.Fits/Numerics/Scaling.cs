namespace StarLines.Fits.Numerics;

/// <summary>How a stored number becomes a value: value = zero + scale × stored, and which stored integer means "undefined".</summary>
internal readonly record struct Scaling(double Scale, double Zero, long? Null)
{
    /// <summary>The offset by which FITS stores unsigned 64-bit integers.</summary>
    internal const double UnsignedOffset = 9223372036854775808.0;

    internal static Scaling None { get; } = new(1.0, 0.0, null);

    internal bool IsIdentity => Scale == 1.0 && Zero == 0.0;

    /// <summary>Whether 64-bit integers are unsigned, stored with the offset 2^63.</summary>
    internal bool IsUnsigned64 => Scale == 1.0 && Zero == UnsignedOffset;
}
