using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace StarLines.Tables;

/// <summary>Columns of equal length under different names, with metadata.</summary>
public sealed class Table
{
    private readonly TableColumn[] _columns;
    private readonly Dictionary<string, int> _indices = new(StringComparer.Ordinal);

    /// <summary>Makes a table.</summary>
    /// <param name="columns">The columns; at least one; all of one length; no name twice.</param>
    /// <param name="metadata">Named values that belong to the table; held, not copied; null for none.</param>
    /// <param name="name">Name of the table; may be empty.</param>
    /// <exception cref="ArgumentException">There is no column, the lengths differ, or a name stands twice.</exception>
    public Table(IReadOnlyCollection<TableColumn> columns, TableMetadata? metadata = null, string name = "")
    {
        ArgumentNullException.ThrowIfNull(columns);
        ArgumentNullException.ThrowIfNull(name);
        _columns = [.. columns];
        Metadata = metadata ?? [];
        Name = name;
        if (_columns.Length == 0)
        {
            throw new ArgumentException("A table needs at least one column.", nameof(columns));
        }

        for (int i = 0; i < _columns.Length; i++)
        {
            CheckColumn(_columns[i], i);
        }
    }

    /// <summary>Name of the table; may be empty.</summary>
    public string Name { get; }

    /// <summary>Named values that belong to the table.</summary>
    public TableMetadata Metadata { get; }

    /// <summary>The columns in order.</summary>
    public IReadOnlyList<TableColumn> Columns => _columns;

    /// <summary>Number of rows.</summary>
    public int RowCount => _columns[0].Count;

    /// <summary>Lines of the rows in the text they were read from; null where there are none.</summary>
    internal int[]? Lines { get; init; }

    /// <summary>The column of a name.</summary>
    /// <param name="name">The name, told apart by case.</param>
    /// <returns>The column.</returns>
    /// <exception cref="KeyNotFoundException">There is none; the message lists those that are there.</exception>
    public TableColumn this[string name] => TryFind(name, out TableColumn? column)
        ? column
        : throw new KeyNotFoundException($"There is no column {name}; the columns are {string.Join(", ", _indices.Keys)}.");

    /// <summary>Says whether a column is there, and gives it.</summary>
    /// <param name="name">The name, told apart by case.</param>
    /// <param name="column">Receives the column.</param>
    /// <returns>True where it is there.</returns>
    public bool TryFind(string name, [NotNullWhen(true)] out TableColumn? column)
    {
        column = _indices.TryGetValue(name, out int index) ? _columns[index] : null;
        return column is not null;
    }

    /// <summary>Where a row stands in the text it was read from, for messages.</summary>
    /// <param name="rowIndex">Row, from 0.</param>
    /// <returns>Line, from 1; 0 where the table was not read from ECSV or CSV.</returns>
    public int LineNumberOf(int rowIndex) => Lines is int[] lines ? lines[rowIndex] : 0;

    /// <summary>Joins tables of the same columns end to end; metadata and notes of the columns are those of the first.</summary>
    /// <param name="tables">The tables, at least one.</param>
    /// <returns>A table of all their rows.</returns>
    /// <exception cref="ArgumentException">There is no table, or the names or types of the columns differ.</exception>
    public static Table Concatenate(IReadOnlyList<Table> tables)
    {
        ArgumentNullException.ThrowIfNull(tables);
        if (tables.Count == 0)
        {
            throw new ArgumentException("There is no table to join.", nameof(tables));
        }

        Table first = tables[0];
        var columns = new TableColumn[first._columns.Length];
        for (int c = 0; c < columns.Length; c++)
        {
            var parts = new TableColumn[tables.Count];
            for (int t = 0; t < parts.Length; t++)
            {
                parts[t] = tables[t].ColumnLike(first._columns[c], columns.Length);
            }

            columns[c] = TableColumn.Joined(parts);
        }

        return new Table(columns, first.Metadata, first.Name);
    }

    private TableColumn ColumnLike(TableColumn wanted, int columnCount)
    {
        if (_columns.Length != columnCount || !TryFind(wanted.Name, out TableColumn? column) || column.Type != wanted.Type)
        {
            throw new ArgumentException($"A table to join has not the same columns as the first: {wanted.Name} ({wanted.Type}) is missing or others are there.");
        }

        return column;
    }

    private void CheckColumn(TableColumn column, int index)
    {
        if (column.Count != RowCount)
        {
            throw new ArgumentException(string.Create(
                CultureInfo.InvariantCulture, $"Column {column.Name} has {column.Count} rows; the first column has {RowCount}."));
        }

        if (!_indices.TryAdd(column.Name, index))
        {
            throw new ArgumentException($"Two columns are named {column.Name}.");
        }
    }
}
