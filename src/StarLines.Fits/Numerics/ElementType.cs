namespace StarLines.Fits.Numerics;

/// <summary>The types of stored values, as images (BITPIX) and columns (TFORM letter) share them.</summary>
internal enum ElementType
{
    /// <summary>L: a byte T, F or 0.</summary>
    Logical,

    /// <summary>X: bits, the highest first.</summary>
    Bit,

    /// <summary>B or BITPIX 8.</summary>
    Byte,

    /// <summary>I or BITPIX 16.</summary>
    Int16,

    /// <summary>J or BITPIX 32.</summary>
    Int32,

    /// <summary>K or BITPIX 64.</summary>
    Int64,

    /// <summary>E or BITPIX -32.</summary>
    Float32,

    /// <summary>D or BITPIX -64.</summary>
    Float64,

    /// <summary>C: two float32.</summary>
    Complex32,

    /// <summary>M: two float64.</summary>
    Complex64,

    /// <summary>A: characters.</summary>
    Text,
}
