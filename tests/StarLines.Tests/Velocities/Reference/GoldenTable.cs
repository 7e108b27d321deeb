using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;

namespace StarLines.Tests.Velocities.Reference;

/// <summary>A table with two header rows, names and units, and commas between the cells.</summary>
internal sealed class GoldenTable
{
    private readonly Dictionary<string, int> _columns = new(StringComparer.Ordinal);
    private readonly List<string[]> _rows = [];

    public GoldenTable(string path)
    {
        string[] lines = File.ReadAllLines(path);
        string[] names = lines[0].Split(',');
        for (int i = 0; i < names.Length; i++)
        {
            _columns.Add(names[i], i);
        }

        for (int i = 2; i < lines.Length; i++)
        {
            _rows.Add(lines[i].Split(','));
        }
    }

    public int Count => _rows.Count;

    public string Text(int row, string column) => _rows[row][_columns[column]];

    public double Number(int row, string column) => double.Parse(Text(row, column), CultureInfo.InvariantCulture);
}
