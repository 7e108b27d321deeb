using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.TestSupport;

namespace StarLines.Tests.IO.Reference;

/// <summary>The golden tables: CSV with two header rows, names and units.</summary>
internal static class GoldenCsv
{
    /// <summary>The rows of a table, each by column name.</summary>
    public static List<Dictionary<string, string>> Rows(params string[] parts)
    {
        string[] lines = File.ReadAllLines(ReferenceData.DataFile(["golden", .. parts]));
        string[] names = Split(lines[0]);
        var rows = new List<Dictionary<string, string>>();
        for (int i = 2; i < lines.Length; i++)
        {
            string[] cells = Split(lines[i]);
            var row = new Dictionary<string, string>();
            for (int c = 0; c < names.Length; c++)
            {
                row[names[c]] = c < cells.Length ? cells[c] : "";
            }

            rows.Add(row);
        }

        return rows;
    }

    /// <summary>A number; NaN where the cell is empty or says so.</summary>
    public static double Number(string cell) => cell.ToLowerInvariant() switch
    {
        "" or "nan" => double.NaN,
        "inf" => double.PositiveInfinity,
        "-inf" => double.NegativeInfinity,
        _ => double.Parse(cell, CultureInfo.InvariantCulture),
    };

    public static string[] Split(string line)
    {
        var cells = new List<string>();
        bool quoted = false;
        int start = 0;
        for (int i = 0; i <= line.Length; i++)
        {
            if (i == line.Length || (line[i] == ',' && !quoted))
            {
                cells.Add(line[start..i].Trim('"'));
                start = i + 1;
            }
            else if (line[i] == '"')
            {
                quoted = !quoted;
            }
        }

        return [.. cells];
    }
}
