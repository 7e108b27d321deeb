using System;
using System.Buffers.Binary;

namespace StarLines.Fits.Numerics;

/// <summary>A stored integer; the loops over integers are compiled once for each type.</summary>
internal interface IStoredInteger
{
    static abstract int Size { get; }

    static abstract long Read(ReadOnlySpan<byte> bytes);
}

/// <summary>An unsigned byte.</summary>
internal readonly struct StoredByte : IStoredInteger
{
    public static int Size => 1;

    public static long Read(ReadOnlySpan<byte> bytes) => bytes[0];
}

/// <summary>A 16-bit integer.</summary>
internal readonly struct StoredInt16 : IStoredInteger
{
    public static int Size => 2;

    public static long Read(ReadOnlySpan<byte> bytes) => BinaryPrimitives.ReadInt16BigEndian(bytes);
}

/// <summary>A 32-bit integer.</summary>
internal readonly struct StoredInt32 : IStoredInteger
{
    public static int Size => 4;

    public static long Read(ReadOnlySpan<byte> bytes) => BinaryPrimitives.ReadInt32BigEndian(bytes);
}

/// <summary>A 64-bit integer.</summary>
internal readonly struct StoredInt64 : IStoredInteger
{
    public static int Size => 8;

    public static long Read(ReadOnlySpan<byte> bytes) => BinaryPrimitives.ReadInt64BigEndian(bytes);
}
