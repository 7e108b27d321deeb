using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Tables.Delimited;

namespace StarLines.Tables;

/// <summary>One named column of values of one type, with what a reader needs to understand it. The values never change.</summary>
/// <remarks>A missing value is NaN in a column of real numbers and null in the others.</remarks>
public sealed class TableColumn
{
    private readonly Array _values;

    /// <summary>Makes a column of real numbers.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; NaN where missing; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<double> values)
        : this(name, ColumnType.Double, values.ToArray())
    {
    }

    /// <summary>Makes a column of whole numbers, none of them missing.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<long> values)
        : this(name, ColumnType.Long, ToNullable(values))
    {
    }

    /// <summary>Makes a column of whole numbers.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; null where missing; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<long?> values)
        : this(name, ColumnType.Long, values.ToArray())
    {
    }

    /// <summary>Makes a column of text.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; null where missing; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<string?> values)
        : this(name, ColumnType.Text, values.ToArray())
    {
    }

    /// <summary>Makes a column of truth values, none of them missing.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<bool> values)
        : this(name, ColumnType.Bool, ToNullable(values))
    {
    }

    /// <summary>Makes a column of truth values.</summary>
    /// <param name="name">Name, not empty.</param>
    /// <param name="values">One value a row; null where missing; copied.</param>
    /// <exception cref="ArgumentException">The name is empty.</exception>
    public TableColumn(string name, ReadOnlySpan<bool?> values)
        : this(name, ColumnType.Bool, values.ToArray())
    {
    }

    private TableColumn(string name, ColumnType type, Array values)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        Name = name;
        Type = type;
        _values = values;
    }

    /// <summary>Name, never empty.</summary>
    public string Name { get; }

    /// <summary>What the cells hold.</summary>
    public ColumnType Type { get; }

    /// <summary>Number of rows.</summary>
    public int Count => _values.Length;

    /// <summary>Unit as the VOUnit standard writes it, such as <c>Angstrom</c> or <c>km/s</c>; empty where there is none.</summary>
    public string Unit { get; init; } = "";

    /// <summary>One sentence on what the column holds.</summary>
    public string Description { get; init; } = "";

    /// <summary>Unified content descriptor (UCD1+), such as <c>em.wl</c>.</summary>
    public string Ucd { get; init; } = "";

    /// <summary>Digits after the decimal point in text formats, 0 to 20; null for <see cref="SignificantDigits"/> or all that are needed.</summary>
    public int? Decimals { get; init; }

    /// <summary>Significant digits in text formats, 1 to 17, where <see cref="Decimals"/> is null; null for all that are needed.</summary>
    public int? SignificantDigits { get; init; }

    /// <summary>Values of a column of real numbers.</summary>
    /// <exception cref="InvalidOperationException">The column is of another type.</exception>
    public ReadOnlySpan<double> Doubles => Values<double>(ColumnType.Double);

    /// <summary>Values of a column of whole numbers.</summary>
    /// <exception cref="InvalidOperationException">The column is of another type.</exception>
    public ReadOnlySpan<long?> Longs => Values<long?>(ColumnType.Long);

    /// <summary>Values of a column of text.</summary>
    /// <exception cref="InvalidOperationException">The column is of another type.</exception>
    public ReadOnlySpan<string?> Texts => Values<string?>(ColumnType.Text);

    /// <summary>Values of a column of truth values.</summary>
    /// <exception cref="InvalidOperationException">The column is of another type.</exception>
    public ReadOnlySpan<bool?> Bools => Values<bool?>(ColumnType.Bool);

    /// <summary>True for a column of real or whole numbers.</summary>
    public bool IsNumeric => Type is ColumnType.Double or ColumnType.Long;

    /// <summary>Says whether a value is missing.</summary>
    /// <param name="rowIndex">Row, from 0.</param>
    /// <returns>True for NaN and null.</returns>
    public bool IsMissing(int rowIndex) => Type switch
    {
        ColumnType.Double => double.IsNaN(Doubles[rowIndex]),
        ColumnType.Long => Longs[rowIndex] is null,
        ColumnType.Text => Texts[rowIndex] is null,
        _ => Bools[rowIndex] is null,
    };

    /// <summary>The numbers of a numeric column.</summary>
    /// <returns>A new array; NaN where missing. Whole numbers beyond 2⁵³ are rounded.</returns>
    /// <exception cref="InvalidOperationException">The column is not numeric.</exception>
    public double[] ToDoubles()
    {
        if (Type != ColumnType.Long)
        {
            return Doubles.ToArray();
        }

        double[] values = new double[Count];
        ReadOnlySpan<long?> longs = Longs;
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = longs[i] ?? double.NaN;
        }

        return values;
    }

    /// <summary>One value as the text formats print it.</summary>
    /// <param name="rowIndex">Row, from 0.</param>
    /// <returns>The text in invariant culture; null where missing.</returns>
    public string? TextAt(int rowIndex) => IsMissing(rowIndex) ? null : Type switch
    {
        ColumnType.Double => NumberText.Format(Doubles[rowIndex], this),
        ColumnType.Long => Longs[rowIndex]!.Value.ToString(CultureInfo.InvariantCulture),
        ColumnType.Text => Texts[rowIndex],
        _ => Bools[rowIndex]!.Value ? "true" : "false",
    };

    /// <summary>The same column under another name.</summary>
    /// <param name="name">The name.</param>
    /// <returns>A new column that shares the values.</returns>
    public TableColumn Renamed(string name) =>
        new TableColumn(name, Type, _values).Noted(Unit, Description, Ucd, Decimals, SignificantDigits);

    /// <summary>The same values with other notes.</summary>
    internal TableColumn Noted(string unit, string description, string ucd, int? decimals, int? significantDigits) => new(Name, Type, _values)
    {
        Unit = unit,
        Description = description,
        Ucd = ucd,
        Decimals = decimals,
        SignificantDigits = significantDigits,
    };

    /// <summary>Makes a column of rows already in an array that nobody else holds.</summary>
    internal static TableColumn Owning<T>(string name, ColumnType type, T[] values) => new(name, type, values);

    /// <summary>Joins columns of one type end to end, keeping the notes of the first.</summary>
    internal static TableColumn Joined(IReadOnlyList<TableColumn> parts)
    {
        TableColumn first = parts[0];
        int count = 0;
        foreach (TableColumn part in parts)
        {
            count = checked(count + part.Count);
        }

        Array values = first.Type switch
        {
            ColumnType.Double => new double[count],
            ColumnType.Long => new long?[count],
            ColumnType.Text => new string?[count],
            _ => new bool?[count],
        };
        int at = 0;
        foreach (TableColumn part in parts)
        {
            Array.Copy(part._values, 0, values, at, part.Count);
            at += part.Count;
        }

        return new TableColumn(first.Name, first.Type, values)
            .Noted(first.Unit, first.Description, first.Ucd, first.Decimals, first.SignificantDigits);
    }

    private static T?[] ToNullable<T>(ReadOnlySpan<T> values)
        where T : struct
    {
        T?[] copy = new T?[values.Length];
        for (int i = 0; i < copy.Length; i++)
        {
            copy[i] = values[i];
        }

        return copy;
    }

    private ReadOnlySpan<T> Values<T>(ColumnType type) => Type == type
        ? (T[])_values
        : throw new InvalidOperationException($"The column {Name} is of type {Type}, not {type}.");
}
