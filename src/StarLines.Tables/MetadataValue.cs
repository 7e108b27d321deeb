using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.Tables;

/// <summary>One value of a table's metadata: a scalar, a list, or a map. It never changes, apart from the map it may hold.</summary>
public sealed class MetadataValue
{
    private readonly object? _value;

    private MetadataValue(MetadataKind kind, object? value)
    {
        Kind = kind;
        _value = value;
    }

    /// <summary>No value.</summary>
    public static MetadataValue Null { get; } = new(MetadataKind.Null, null);

    /// <summary>What the value is.</summary>
    public MetadataKind Kind { get; }

    /// <summary>The value as text in invariant culture; empty for nothing, a list or a map.</summary>
    public string Text => _value switch
    {
        string text => text,
        long number => number.ToString(CultureInfo.InvariantCulture),
        double number => number.ToString("R", CultureInfo.InvariantCulture),
        bool truth => truth ? "true" : "false",
        _ => "",
    };

    /// <summary>The members of a list; empty for everything else.</summary>
    public IReadOnlyList<MetadataValue> Items => _value as MetadataValue[] ?? [];

    /// <summary>The entries of a map; empty for everything else.</summary>
    public TableMetadata Map => _value as TableMetadata ?? [];

    /// <summary>Makes a text.</summary>
    /// <param name="value">The text.</param>
    public static implicit operator MetadataValue(string value) => FromText(value);

    /// <summary>Makes a whole number.</summary>
    /// <param name="value">The number.</param>
    public static implicit operator MetadataValue(long value) => FromInteger(value);

    /// <summary>Makes a real number.</summary>
    /// <param name="value">The number.</param>
    public static implicit operator MetadataValue(double value) => FromReal(value);

    /// <summary>Makes a truth value.</summary>
    /// <param name="value">The truth value.</param>
    public static implicit operator MetadataValue(bool value) => FromBoolean(value);

    /// <summary>Makes a map.</summary>
    /// <param name="value">The entries.</param>
    public static implicit operator MetadataValue(TableMetadata value) => FromMap(value);

    /// <summary>Makes a list.</summary>
    /// <param name="values">The members.</param>
    public static implicit operator MetadataValue(MetadataValue[] values) => FromList(values);

    /// <summary>Makes a text.</summary>
    /// <param name="value">The text.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromText(string value)
    {
        ArgumentNullException.ThrowIfNull(value);
        return new MetadataValue(MetadataKind.Text, value);
    }

    /// <summary>Makes a whole number.</summary>
    /// <param name="value">The number.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromInteger(long value) => new(MetadataKind.Integer, value);

    /// <summary>Makes a real number.</summary>
    /// <param name="value">The number.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromReal(double value) => new(MetadataKind.Real, value);

    /// <summary>Makes a truth value.</summary>
    /// <param name="value">The truth value.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromBoolean(bool value) => new(MetadataKind.Boolean, value);

    /// <summary>Makes a list of texts.</summary>
    /// <param name="values">The texts; copied.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromTexts(IReadOnlyCollection<string> values)
    {
        ArgumentNullException.ThrowIfNull(values);
        var items = new List<MetadataValue>(values.Count);
        foreach (string value in values)
        {
            items.Add(FromText(value));
        }

        return FromList(items);
    }

    /// <summary>Makes a list.</summary>
    /// <param name="values">The members; copied.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromList(IReadOnlyCollection<MetadataValue> values)
    {
        ArgumentNullException.ThrowIfNull(values);
        return new MetadataValue(MetadataKind.List, (MetadataValue[])[.. values]);
    }

    /// <summary>Makes a map.</summary>
    /// <param name="value">The entries; held, not copied.</param>
    /// <returns>The value.</returns>
    public static MetadataValue FromMap(TableMetadata value)
    {
        ArgumentNullException.ThrowIfNull(value);
        return new MetadataValue(MetadataKind.Map, value);
    }

    /// <summary>The value as a real number.</summary>
    /// <returns>The number; NaN where the value is none.</returns>
    public double ToReal() => _value switch
    {
        double real => real,
        long whole => whole,
        _ => double.NaN,
    };

    /// <inheritdoc/>
    public override string ToString() => Kind switch
    {
        MetadataKind.List => "[" + string.Join(", ", (IEnumerable<MetadataValue>)Items) + "]",
        MetadataKind.Map => Map.ToString(),
        _ => Text,
    };
}
