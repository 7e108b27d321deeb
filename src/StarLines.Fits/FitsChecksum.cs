namespace StarLines.Fits;

/// <summary>The two checksums of an HDU.</summary>
/// <param name="Data">What DATASUM says of the data.</param>
/// <param name="Hdu">What CHECKSUM says of header and data together.</param>
public readonly record struct FitsChecksum(FitsChecksumStatus Data, FitsChecksumStatus Hdu);
