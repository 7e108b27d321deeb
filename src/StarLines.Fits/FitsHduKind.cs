namespace StarLines.Fits;

/// <summary>What an HDU holds.</summary>
public enum FitsHduKind
{
    /// <summary>A header without data.</summary>
    Empty,

    /// <summary>An array of pixels.</summary>
    Image,

    /// <summary>A tile-compressed image; it is read like an image.</summary>
    CompressedImage,

    /// <summary>A binary table.</summary>
    BinaryTable,

    /// <summary>An ASCII table.</summary>
    AsciiTable,

    /// <summary>Random groups; the header can be read, the data cannot.</summary>
    RandomGroups,

    /// <summary>An extension of another type; the header can be read, the data cannot.</summary>
    Other,

    /// <summary>An HDU whose structure is broken; <see cref="FitsHdu.Damage"/> says how.</summary>
    Damaged,
}
