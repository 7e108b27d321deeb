using System;
using System.Collections.Generic;

namespace StarLines.Tables;

/// <summary>Says once how the members of a record become the columns of a table, then turns any number of records into tables.</summary>
/// <typeparam name="T">The record.</typeparam>
public sealed class TableMap<T>
{
    private readonly List<Func<IReadOnlyList<T>, TableColumn>> _columns = [];

    /// <summary>Adds a column of real numbers.</summary>
    /// <param name="name">Name of the column.</param>
    /// <param name="value">Gives the value of a record; NaN where missing.</param>
    /// <param name="unit">Unit, or empty.</param>
    /// <param name="description">What it holds.</param>
    /// <param name="ucd">Unified content descriptor, or empty.</param>
    /// <param name="decimals">Digits after the point in text formats; null for <paramref name="significantDigits"/>.</param>
    /// <param name="significantDigits">Significant digits in text formats; null for all that are needed.</param>
    /// <returns>This map.</returns>
    public TableMap<T> Double(
        string name,
        Func<T, double> value,
        string unit = "",
        string description = "",
        string ucd = "",
        int? decimals = null,
        int? significantDigits = null)
    {
        _columns.Add(rows => new TableColumn(name, (ReadOnlySpan<double>)Collect(rows, value))
        {
            Unit = unit,
            Description = description,
            Ucd = ucd,
            Decimals = decimals,
            SignificantDigits = significantDigits,
        });
        return this;
    }

    /// <summary>Adds a column of whole numbers.</summary>
    /// <param name="name">Name of the column.</param>
    /// <param name="value">Gives the value of a record; null where missing.</param>
    /// <param name="unit">Unit, or empty.</param>
    /// <param name="description">What it holds.</param>
    /// <param name="ucd">Unified content descriptor, or empty.</param>
    /// <returns>This map.</returns>
    public TableMap<T> Long(string name, Func<T, long?> value, string unit = "", string description = "", string ucd = "")
    {
        _columns.Add(rows => new TableColumn(name, (ReadOnlySpan<long?>)Collect(rows, value))
        {
            Unit = unit,
            Description = description,
            Ucd = ucd,
        });
        return this;
    }

    /// <summary>Adds a column of text.</summary>
    /// <param name="name">Name of the column.</param>
    /// <param name="value">Gives the value of a record; null where missing.</param>
    /// <param name="description">What it holds.</param>
    /// <param name="ucd">Unified content descriptor, or empty.</param>
    /// <returns>This map.</returns>
    public TableMap<T> Text(string name, Func<T, string?> value, string description = "", string ucd = "")
    {
        _columns.Add(rows => new TableColumn(name, (ReadOnlySpan<string?>)Collect(rows, value))
        {
            Description = description,
            Ucd = ucd,
        });
        return this;
    }

    /// <summary>Adds a column of truth values.</summary>
    /// <param name="name">Name of the column.</param>
    /// <param name="value">Gives the value of a record; null where missing.</param>
    /// <param name="description">What it holds.</param>
    /// <param name="ucd">Unified content descriptor, or empty.</param>
    /// <returns>This map.</returns>
    public TableMap<T> Bool(string name, Func<T, bool?> value, string description = "", string ucd = "")
    {
        _columns.Add(rows => new TableColumn(name, (ReadOnlySpan<bool?>)Collect(rows, value))
        {
            Description = description,
            Ucd = ucd,
        });
        return this;
    }

    /// <summary>Turns records into a table.</summary>
    /// <param name="rows">The records; may be empty.</param>
    /// <param name="metadata">Metadata of the table; null for none.</param>
    /// <param name="name">Name of the table; may be empty.</param>
    /// <returns>A table of one row a record.</returns>
    /// <exception cref="ArgumentException">No column was added, or two have one name.</exception>
    public Table ToTable(IReadOnlyList<T> rows, TableMetadata? metadata = null, string name = "")
    {
        ArgumentNullException.ThrowIfNull(rows);
        var columns = new TableColumn[_columns.Count];
        for (int i = 0; i < columns.Length; i++)
        {
            columns[i] = _columns[i](rows);
        }

        return new Table(columns, metadata, name);
    }

    private static TValue[] Collect<TValue>(IReadOnlyList<T> rows, Func<T, TValue> value)
    {
        var values = new TValue[rows.Count];
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = value(rows[i]);
        }

        return values;
    }
}
