namespace StarLines.Tables;

/// <summary>What an entry of a table's metadata is.</summary>
public enum MetadataKind
{
    /// <summary>Nothing.</summary>
    Null,

    /// <summary>Text.</summary>
    Text,

    /// <summary>A whole number.</summary>
    Integer,

    /// <summary>A real number.</summary>
    Real,

    /// <summary>True or false.</summary>
    Boolean,

    /// <summary>A list of values.</summary>
    List,

    /// <summary>Named values in order.</summary>
    Map,
}
