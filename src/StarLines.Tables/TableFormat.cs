namespace StarLines.Tables;

/// <summary>The formats of tables.</summary>
public enum TableFormat
{
    /// <summary>For reading: recognised by the first bytes, else <see cref="Csv"/>.</summary>
    Auto,

    /// <summary>Enhanced character-separated values 1.0, Astropy Proposal for Enhancement 6: a YAML header before the rows.</summary>
    Ecsv,

    /// <summary>Comma-separated values, RFC 4180; read with other separators, comments and no header row too.</summary>
    Csv,

    /// <summary>A JSON object with <c>metadata</c>, <c>columns</c> and <c>rows</c>.</summary>
    Json,

    /// <summary>VOTable 1.4 of the International Virtual Observatory Alliance.</summary>
    VoTable,

    /// <summary>Apache Parquet, compressed by Zstandard.</summary>
    Parquet,

    /// <summary>Columns aligned for a terminal; for writing only.</summary>
    Aligned,
}
