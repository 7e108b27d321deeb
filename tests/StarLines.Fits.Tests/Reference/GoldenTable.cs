using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.TestSupport;

namespace StarLines.Fits.Tests.Reference;

/// <summary>The golden CSV tables: a row of names, a row of units, then data; see tests/Data/golden/README.md.</summary>
internal static class GoldenTable
{
    internal static string PathOf(params string[] parts) => ReferenceData.DataFile(["golden", .. parts]);

    internal static List<Dictionary<string, string>> Read(params string[] parts)
    {
        string[] lines = File.ReadAllLines(PathOf(parts));
        string[] names = Split(lines[0]);
        List<Dictionary<string, string>> rows = [];
        for (int i = 2; i < lines.Length; i++)
        {
            string[] fields = Split(lines[i]);
            Dictionary<string, string> row = [];
            for (int j = 0; j < names.Length; j++)
            {
                row[names[j]] = j < fields.Length ? fields[j] : "";
            }

            rows.Add(row);
        }

        return rows;
    }

    internal static double Number(string text) => text.ToUpperInvariant() switch
    {
        "NAN" or "" => double.NaN,
        "INF" or "+INF" => double.PositiveInfinity,
        "-INF" => double.NegativeInfinity,
        _ => double.Parse(text, CultureInfo.InvariantCulture),
    };

    /// <summary>Fields between commas; quotes may hold commas.</summary>
    private static string[] Split(string line)
    {
        List<string> fields = [];
        int start = 0;
        bool quoted = false;
        for (int i = 0; i <= line.Length; i++)
        {
            if (i == line.Length || (line[i] == ',' && !quoted))
            {
                fields.Add(line[start..i].Trim('"'));
                start = i + 1;
            }
            else if (line[i] == '"')
            {
                quoted = !quoted;
            }
        }

        return [.. fields];
    }
}
