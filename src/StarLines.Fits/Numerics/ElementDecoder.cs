using System;

namespace StarLines.Fits.Numerics;

/// <summary>Stored values of any type to doubles or integers.</summary>
internal static class ElementDecoder
{
    /// <summary>Decodes elements that lie side by side. Complex numbers give two doubles each, logicals 1, 0 or NaN, bits 1 or 0.</summary>
    internal static void ToDoubles(ElementType type, ReadOnlySpan<byte> source, in Scaling scaling, Span<double> destination)
    {
        switch (type)
        {
            case ElementType.Float32 or ElementType.Complex32:
                BigEndian.SingleToDouble(source, destination);
                Rescale(destination, scaling);
                break;
            case ElementType.Float64 or ElementType.Complex64:
                BigEndian.DoubleToDouble(source, destination);
                Rescale(destination, scaling);
                break;
            case ElementType.Byte:
                BigEndian.IntegerToDouble<StoredByte>(source, scaling, destination);
                break;
            case ElementType.Int16:
                BigEndian.IntegerToDouble<StoredInt16>(source, scaling, destination);
                break;
            case ElementType.Int32:
                BigEndian.IntegerToDouble<StoredInt32>(source, scaling, destination);
                break;
            case ElementType.Int64 when scaling.IsUnsigned64:
                BigEndian.Unsigned64ToDouble(source, scaling.Null, destination);
                break;
            case ElementType.Int64:
                BigEndian.IntegerToDouble<StoredInt64>(source, scaling, destination);
                break;
            case ElementType.Bit:
                BitsToDoubles(source, destination);
                break;
            case ElementType.Logical:
                LogicalsToDoubles(source, destination);
                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(type));
        }
    }

    /// <summary>Decodes integers as they are stored, and bits as 1 or 0.</summary>
    internal static void ToStoredIntegers(ElementType type, ReadOnlySpan<byte> source, Span<long> destination)
    {
        switch (type)
        {
            case ElementType.Byte:
                BigEndian.IntegerToInteger<StoredByte>(source, destination);
                break;
            case ElementType.Int16:
                BigEndian.IntegerToInteger<StoredInt16>(source, destination);
                break;
            case ElementType.Int32:
                BigEndian.IntegerToInteger<StoredInt32>(source, destination);
                break;
            case ElementType.Int64:
                BigEndian.IntegerToInteger<StoredInt64>(source, destination);
                break;
            case ElementType.Bit:
                for (int i = 0; i < destination.Length; i++)
                {
                    destination[i] = BitAt(source, i);
                }

                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(type));
        }
    }

    internal static void Rescale(Span<double> values, in Scaling scaling)
    {
        if (scaling.IsIdentity)
        {
            return;
        }

        double scale = scaling.Scale;
        double zero = scaling.Zero;
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = zero + (scale * values[i]);
        }
    }

    internal static int BitAt(ReadOnlySpan<byte> source, int index) => (source[index / 8] >> (7 - (index % 8))) & 1;

    private static void BitsToDoubles(ReadOnlySpan<byte> source, Span<double> destination)
    {
        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = BitAt(source, i);
        }
    }

    private static void LogicalsToDoubles(ReadOnlySpan<byte> source, Span<double> destination)
    {
        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = source[i] switch { (byte)'T' => 1.0, (byte)'F' => 0.0, _ => double.NaN };
        }
    }
}
