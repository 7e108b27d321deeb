using System;
using System.Globalization;

namespace StarLines.Tables.VoTables;

/// <summary>A FIELD of a VOTable: the facts needed to decode its cells.</summary>
internal sealed class VoField
{
    /// <summary>Elements allowed in one cell; more is damage.</summary>
    internal const int MostElements = 1 << 27;

    internal string? Name { get; init; }

    internal string Datatype { get; init; } = "";

    internal string Unit { get; init; } = "";

    internal string Ucd { get; init; } = "";

    internal string Precision { get; init; } = "";

    internal string Description { get; set; } = "";

    internal string Null { get; set; } = "";

    /// <summary>Number of elements in a cell; −1 where each cell states its own.</summary>
    internal int ElementCount { get; init; } = 1;

    /// <summary>True for text.</summary>
    internal bool IsText => Datatype is "char" or "unicodeChar";

    /// <summary>True where a cell may hold several numbers.</summary>
    internal bool IsArray => !IsText && (ElementCount != 1 || Datatype is "floatComplex" or "doubleComplex" or "bit");

    /// <summary>Bytes of one element; 0 for an unknown type.</summary>
    internal int ElementSize => Datatype switch
    {
        "boolean" or "unsignedByte" or "char" or "bit" => 1,
        "short" or "unicodeChar" => 2,
        "int" or "float" => 4,
        "long" or "double" or "floatComplex" => 8,
        "doubleComplex" => 16,
        _ => 0,
    };

    /// <summary>Type of the column.</summary>
    internal ColumnType Type => Datatype switch
    {
        "float" or "double" => ColumnType.Double,
        "short" or "int" or "long" or "unsignedByte" => ColumnType.Long,
        "boolean" => ColumnType.Bool,
        _ => ColumnType.Text,
    };

    /// <summary>Reads the attribute <c>arraysize</c>; −1 for a variable size, null for nonsense.</summary>
    internal static int? CountOf(string arraysize)
    {
        if (arraysize.Length == 0)
        {
            return 1;
        }

        if (arraysize.EndsWith('*') || arraysize.EndsWith("*s", StringComparison.Ordinal))
        {
            return -1;
        }

        long count = 1;
        foreach (string factor in arraysize.Split('x'))
        {
            if (!int.TryParse(factor, NumberStyles.None, CultureInfo.InvariantCulture, out int size) || (count *= size) > MostElements)
            {
                return null;
            }
        }

        return (int)count;
    }

    /// <summary>Adds unit, description, content descriptor and digits to a column.</summary>
    internal TableColumn Noted(TableColumn column)
    {
        bool significant = Precision.StartsWith('E');
        string digits = Precision.TrimStart('E', 'F');
        bool known = int.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out int count) && column.Type == ColumnType.Double;
        int? decimals = known && !significant && count <= 20 ? count : null;
        int? significantDigits = known && significant && count is >= 1 and <= 17 ? count : null;
        return column.Noted(Unit, Description, Ucd, decimals, significantDigits);
    }
}
