namespace StarLines.Tables;

/// <summary>What the cells of a column hold.</summary>
public enum ColumnType
{
    /// <summary>Real numbers; NaN is a missing value.</summary>
    Double,

    /// <summary>Whole numbers of 64 bits, or missing.</summary>
    Long,

    /// <summary>Text, or missing.</summary>
    Text,

    /// <summary>True, false or missing.</summary>
    Bool,
}
