using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.IO;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Tables;
using StarLines.Velocities;

namespace StarLines.Runs.Output;

/// <summary>Writes the tables of a run, rows in the order of the inputs.</summary>
internal sealed class ResultTables(RunPlan plan, RunContext context, IReadOnlyList<LineList> lists)
{
    private readonly List<string> _files = [];

    /// <summary>Writes all tables.</summary>
    /// <returns>Their names.</returns>
    internal IReadOnlyList<string> Write(IReadOnlyList<InputResult> results)
    {
        var spectra = new List<SpectraRow>();
        var velocities = new List<VelocityRow>();
        var lines = new List<LineRow>();
        foreach (InputResult result in results)
        {
            spectra.AddRange(result.Spectra);
            velocities.AddRange(result.Velocities);
            lines.AddRange(result.Lines);
        }

        if (plan.Steps.HasFlag(RunSteps.Lines))
        {
            Save(LineTable.ToTable(lines, SharedUnit(results)), "lines", results);
        }

        if (plan.Steps.HasFlag(RunSteps.Velocity))
        {
            Save(VelocityTable.ToTable(velocities), "velocities", results);
        }

        Save(SpectraTable.Create(spectra, plan.TimesInTable), "spectra", results);
        return _files;
    }

    private static string SharedUnit(IReadOnlyList<InputResult> results)
    {
        string? shared = null;
        foreach (InputResult result in results)
        {
            foreach (string unit in result.FluxUnits)
            {
                if (shared is not null && shared != unit)
                {
                    return "";
                }

                shared = unit;
            }
        }

        return shared ?? "";
    }

    private void Save(Table table, string name, IReadOnlyList<InputResult> results)
    {
        AddProvenance(table.Metadata, results);
        (string ending, TableFormat format) = plan.Format switch
        {
            RunTableFormat.Csv => ("csv", TableFormat.Csv),
            RunTableFormat.Json => ("json", TableFormat.Json),
            RunTableFormat.VoTable => ("vot", TableFormat.VoTable),
            RunTableFormat.Parquet => ("parquet", TableFormat.Parquet),
            RunTableFormat.Fits => ("fits", TableFormat.Auto),
            _ => ("ecsv", TableFormat.Ecsv),
        };
        string file = $"{name}.{ending}";
        AtomicFile.Write(Path.Combine(plan.OutputFolder, file), stream =>
        {
            if (plan.Format == RunTableFormat.Fits)
            {
                FitsTableMapping.Write(table, stream);
            }
            else
            {
                TableWriter.Write(table, stream, format);
            }
        });
        _files.Add(file);
    }

    private void AddProvenance(TableMetadata metadata, IReadOnlyList<InputResult> results)
    {
        metadata["program"] = context.Program;
        metadata["command_line"] = context.CommandLine;
        metadata["date_utc"] = context.DateUtc.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);
        var inputs = new List<MetadataValue>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (InputResult result in results)
        {
            if (seen.Add(result.Input.Path))
            {
                inputs.Add(Entry("file", result.Input.Path, result.Sha256));
            }
        }

        metadata["inputs"] = MetadataValue.FromList(inputs);
        if (lists.Count != 0)
        {
            var entries = new List<MetadataValue>();
            foreach (LineList list in lists)
            {
                entries.Add(Entry("name", list.Name, list.Sha256));
            }

            metadata["line_lists"] = MetadataValue.FromList(entries);
        }
    }

    private static MetadataValue Entry(string key, string name, string sha256)
    {
        var entry = new TableMetadata { [key] = name };
        if (sha256.Length != 0)
        {
            entry["sha256"] = sha256;
        }

        return entry;
    }
}
