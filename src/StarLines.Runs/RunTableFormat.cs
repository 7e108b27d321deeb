namespace StarLines.Runs;

/// <summary>Formats of the tables of a run.</summary>
public enum RunTableFormat
{
    /// <summary>Enhanced character-separated values.</summary>
    Ecsv,

    /// <summary>Comma-separated values.</summary>
    Csv,

    /// <summary>JSON.</summary>
    Json,

    /// <summary>FITS binary table.</summary>
    Fits,

    /// <summary>VOTable.</summary>
    VoTable,

    /// <summary>Apache Parquet.</summary>
    Parquet,
}
