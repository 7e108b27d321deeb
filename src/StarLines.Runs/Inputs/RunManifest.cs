using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.IO;
using StarLines.IO;
using StarLines.Tables;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;

namespace StarLines.Runs.Inputs;

/// <summary>
/// A list of inputs: CSV or ECSV with the column <c>file</c> (relative to the manifest) and, where wanted, <c>target</c>, <c>ra</c>,
/// <c>dec</c> (degrees), <c>site</c>, <c>time</c> (UTC), <c>medium</c>, <c>frame</c> and <c>resolving_power</c>; an empty cell says nothing.
/// </summary>
internal static class RunManifest
{
    /// <summary>Reads a manifest; false where the file is none, as it has another ending or no column <c>file</c>.</summary>
    /// <exception cref="RunPlanException">A cell is wrong.</exception>
    internal static bool TryRead(
        string path, SpectrumReadOptions reading, [NotNullWhen(true)] out IReadOnlyList<(string Name, SpectrumReadOptions Reading)>? inputs)
    {
        inputs = null;
        string ending = Path.GetExtension(path).ToUpperInvariant();
        if (ending is not (".CSV" or ".ECSV") || !File.Exists(path) || !TryReadTable(path, out Table? table)
            || !table.TryFind("file", out TableColumn? files) || files.Type != ColumnType.Text)
        {
            return false;
        }

        string folder = Path.GetDirectoryName(path) ?? "";
        var rows = new List<(string, SpectrumReadOptions)>(table.RowCount);
        for (int row = 0; row < table.RowCount; row++)
        {
            if (files.TextAt(row) is { Length: > 0 } file)
            {
                rows.Add((Path.Combine(folder, file), OptionsOf(path, table, row, reading)));
            }
        }

        inputs = rows;
        return true;
    }

    private static bool TryReadTable(string path, [NotNullWhen(true)] out Table? table)
    {
        try
        {
            using FileStream stream = File.OpenRead(path);
            table = TableReader.Read(stream, TableFormat.Auto, path);
            return true;
        }
        catch (TableFormatException)
        {
            // Not a table: whatever it is, the reader of spectra says what is wrong with it.
            table = null;
            return false;
        }
    }

    private static SpectrumReadOptions OptionsOf(string path, Table table, int row, SpectrumReadOptions reading)
    {
        SpectrumReadOptions options = reading;
        foreach (TableColumn column in table.Columns)
        {
            if (column.TextAt(row) is not { Length: > 0 } text)
            {
                continue;
            }

            try
            {
                options = column.Name switch
                {
                    "target" => options with { Target = text },
                    "ra" => options with { RightAscensionDegrees = Number(text) },
                    "dec" => options with { DeclinationDegrees = Number(text) },
                    "site" => options with { Site = ObservingSites.Parse(text) },
                    "time" => options with { MidExposureUtc = UtcTime.Parse(text) },
                    "medium" => options with { Medium = Word<Medium>(text) },
                    "frame" => options with { Frame = Word<VelocityFrame>(text) },
                    "resolving_power" => options with { ResolvingPower = Number(text) },
                    _ => options,
                };
            }
            catch (FormatException problem)
            {
                throw new RunPlanException(
                    FormattableString.Invariant($"{path}, row {row + 1}, column {column.Name}: {problem.Message}"), problem);
            }
        }

        return options;
    }

    private static double Number(string text) =>
        double.TryParse(text, System.Globalization.NumberStyles.Float, System.Globalization.CultureInfo.InvariantCulture, out double value)
            ? value
            : throw new FormatException($"'{text}' is not a number.");

    private static T Word<T>(string text)
        where T : struct, Enum => Enum.TryParse(text, ignoreCase: true, out T value) && Enum.IsDefined(value)
            ? value
            : throw new FormatException($"'{text}' is none of {string.Join(", ", Enum.GetNames<T>()).ToLowerInvariant()}.");
}
