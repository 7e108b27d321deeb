using System;
using System.Buffers.Binary;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Fits.Numerics;

/// <summary>Big-endian floating-point numbers to doubles. Every kernel keeps NaN and infinity; source and destination must not overlap.</summary>
internal static class BigEndian
{
    /// <summary>The shuffle that turns the bytes of eight 32-bit words around. It stays inside each half of the vector, which the hardware does in one step.</summary>
    internal static Vector256<byte> WordOrder => Vector256.Create(
        (byte)3, 2, 1, 0, 7, 6, 5, 4, 11, 10, 9, 8, 15, 14, 13, 12,
        19, 18, 17, 16, 23, 22, 21, 20, 27, 26, 25, 24, 31, 30, 29, 28);

    /// <summary>Float32 to double, vectorized; source holds four bytes for each destination element.</summary>
    internal static void SingleToDouble(ReadOnlySpan<byte> source, Span<double> destination)
    {
        int i = 0;
        if (Vector256.IsHardwareAccelerated && BitConverter.IsLittleEndian)
        {
            ref byte from = ref MemoryMarshal.GetReference(source);
            ref double to = ref MemoryMarshal.GetReference(destination);
            int last = Math.Min(source.Length / sizeof(float), destination.Length) - Vector256<float>.Count;
            for (; i <= last; i += Vector256<float>.Count)
            {
                Vector256<float> values = Vector256.Shuffle(Vector256.LoadUnsafe(ref from, (nuint)i * sizeof(float)), WordOrder).AsSingle();
                (Vector256<double> low, Vector256<double> high) = Vector256.Widen(values);
                low.StoreUnsafe(ref to, (nuint)i);
                high.StoreUnsafe(ref to, (nuint)(i + Vector256<double>.Count));
            }
        }

        SingleToDoublePlainly(source[(i * sizeof(float))..], destination[i..]);
    }

    /// <summary>Float32 to double, the clear loop.</summary>
    internal static void SingleToDoublePlainly(ReadOnlySpan<byte> source, Span<double> destination)
    {
        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = BinaryPrimitives.ReadSingleBigEndian(source[(i * sizeof(float))..]);
        }
    }

    /// <summary>Float64 to double; source holds eight bytes for each destination element.</summary>
    internal static void DoubleToDouble(ReadOnlySpan<byte> source, Span<double> destination)
    {
        Span<ulong> target = MemoryMarshal.Cast<double, ulong>(destination);
        source[..(target.Length * sizeof(ulong))].CopyTo(MemoryMarshal.AsBytes(target));
        if (BitConverter.IsLittleEndian)
        {
            BinaryPrimitives.ReverseEndianness(target, target);
        }
    }

    /// <summary>Float64 to double, the clear loop.</summary>
    internal static void DoubleToDoublePlainly(ReadOnlySpan<byte> source, Span<double> destination)
    {
        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = BinaryPrimitives.ReadDoubleBigEndian(source[(i * sizeof(double))..]);
        }
    }

    /// <summary>Integers to scaled doubles; the stored value that means "undefined" becomes NaN.</summary>
    internal static void IntegerToDouble<T>(ReadOnlySpan<byte> source, in Scaling scaling, Span<double> destination)
        where T : struct, IStoredInteger
    {
        double scale = scaling.Scale;
        double zero = scaling.Zero;
        long missing = scaling.Null ?? 0;
        bool hasMissing = scaling.Null.HasValue;
        for (int i = 0; i < destination.Length; i++)
        {
            long stored = T.Read(source[(i * T.Size)..]);
            destination[i] = hasMissing && stored == missing ? double.NaN : zero + (scale * stored);
        }
    }

    /// <summary>Unsigned 64-bit integers, stored with the offset 2^63, to the nearest doubles.</summary>
    internal static void Unsigned64ToDouble(ReadOnlySpan<byte> source, long? missing, Span<double> destination)
    {
        for (int i = 0; i < destination.Length; i++)
        {
            long stored = BinaryPrimitives.ReadInt64BigEndian(source[(i * sizeof(long))..]);
            destination[i] = stored == missing ? double.NaN : unchecked((ulong)stored ^ 0x8000000000000000UL);
        }
    }

    /// <summary>Integers as they are stored.</summary>
    internal static void IntegerToInteger<T>(ReadOnlySpan<byte> source, Span<long> destination)
        where T : struct, IStoredInteger
    {
        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = T.Read(source[(i * T.Size)..]);
        }
    }
}
