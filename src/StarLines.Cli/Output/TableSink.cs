using System.IO;
using StarLines.IO;
using StarLines.Runs.Output;
using StarLines.Tables;

namespace StarLines.Cli.Output;

/// <summary>Where a table goes and in which format.</summary>
internal sealed class TableSink(Terminal terminal, string? path, OutputFormat format)
{
    /// <summary>The file, or null for standard output.</summary>
    public string? Path { get; } = path;

    /// <summary>Writes a table whole or not at all.</summary>
    /// <param name="table">The table.</param>
    /// <param name="provenance">What its metadata say about its making.</param>
    public void Write(Table table, Provenance provenance)
    {
        provenance.WriteTo(table.Metadata);
        if (Path is null)
        {
            terminal.Out.Flush();
            WriteTo(table, terminal.OutStream);
            terminal.OutStream.Flush();
            return;
        }

        AtomicFile.Write(Path, stream => WriteTo(table, stream));
        terminal.SayDetail($"Wrote {Path}.");
    }

    private void WriteTo(Table table, Stream stream)
    {
        if (format == OutputFormat.Fits)
        {
            FitsTableMapping.Write(table, stream);
            return;
        }

        TableFormat plain = format switch
        {
            OutputFormat.Ecsv => TableFormat.Ecsv,
            OutputFormat.Csv => TableFormat.Csv,
            OutputFormat.Json => TableFormat.Json,
            OutputFormat.VoTable => TableFormat.VoTable,
            OutputFormat.Parquet => TableFormat.Parquet,
            _ => TableFormat.Aligned,
        };
        TableWriter.Write(table, stream, plain);
    }
}
