using System;

namespace StarLines.Fits.Numerics;

/// <summary>Facts about the types of stored values.</summary>
internal static class ElementTypes
{
    internal static ElementType OfBitPix(int bitPix) => bitPix switch
    {
        8 => ElementType.Byte,
        16 => ElementType.Int16,
        32 => ElementType.Int32,
        64 => ElementType.Int64,
        -32 => ElementType.Float32,
        -64 => ElementType.Float64,
        _ => throw new ArgumentOutOfRangeException(nameof(bitPix)),
    };

    /// <summary>The type of a TFORM letter; null for a letter that is none (P and Q are handled before).</summary>
    internal static ElementType? OfLetter(char letter) => letter switch
    {
        'L' => ElementType.Logical,
        'X' => ElementType.Bit,
        'B' => ElementType.Byte,
        'I' => ElementType.Int16,
        'J' => ElementType.Int32,
        'K' => ElementType.Int64,
        'A' => ElementType.Text,
        'E' => ElementType.Float32,
        'D' => ElementType.Float64,
        'C' => ElementType.Complex32,
        'M' => ElementType.Complex64,
        _ => null,
    };

    /// <summary>Bytes of one element; bits are packed and have none of their own.</summary>
    internal static int SizeOf(ElementType type) => type switch
    {
        ElementType.Int16 => 2,
        ElementType.Int32 or ElementType.Float32 => 4,
        ElementType.Int64 or ElementType.Float64 or ElementType.Complex32 => 8,
        ElementType.Complex64 => 16,
        _ => 1,
    };

    /// <summary>Bytes of a number of elements; the caller has checked that they fit 64 bits.</summary>
    internal static long BytesOf(ElementType type, long count) => type == ElementType.Bit ? (count + 7) / 8 : count * SizeOf(type);

    internal static bool IsInteger(ElementType type) => type is ElementType.Byte or ElementType.Int16 or ElementType.Int32 or ElementType.Int64;

    internal static bool IsComplex(ElementType type) => type is ElementType.Complex32 or ElementType.Complex64;
}
