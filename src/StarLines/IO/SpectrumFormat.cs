namespace StarLines.IO;

/// <summary>The formats in which spectra are written.</summary>
public enum SpectrumFormat
{
    /// <summary>A FITS binary table of one row a pixel.</summary>
    FitsTable,

    /// <summary>A FITS image with the wavelengths in its axis keywords, errors and mask in extensions; for scales of equal steps only.</summary>
    FitsImage,

    /// <summary>ECSV.</summary>
    Ecsv,

    /// <summary>CSV; it has no place for metadata.</summary>
    Csv,

    /// <summary>VOTable.</summary>
    VoTable,

    /// <summary>JSON.</summary>
    Json,

    /// <summary>Parquet.</summary>
    Parquet,
}
