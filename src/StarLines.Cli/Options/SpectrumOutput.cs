using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using StarLines.Cli.Output;
using StarLines.IO;
using StarLines.Runs.Output;

namespace StarLines.Cli.Options;

/// <summary><c>--out</c> and <c>--format</c> of a command that gives spectra: a file for one, a folder for any number.</summary>
/// <param name="suffix">What follows the spectrum's name in the name of its output, such as <c>normalized</c>; or an empty string.</param>
internal sealed class SpectrumOutput(string suffix)
{
    private readonly Option<string?> _out = Make.One<string?>(
        "--out", "PATH", "A file for one spectrum, whose ending gives the format, or a folder for any number.", static text => text);

    private readonly Option<OutputFormat?> _format = Make.One<OutputFormat?>(
        "--format",
        "FORMAT",
        "fits (default), ecsv, csv, json, votable or parquet.",
        static text => Values.Word(text, OutputFormats.Words),
        "fits", "ecsv", "csv", "json", "votable", "parquet");

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(_out);
        command.Add(_format);
    }

    /// <summary>Whether a place was named.</summary>
    public bool IsGiven(ParseResult parsed) => parsed.GetValue(_out) is not null;

    /// <summary>Writes one spectrum whole or not at all.</summary>
    /// <param name="parsed">The command line.</param>
    /// <param name="source">The spectrum it comes from.</param>
    /// <param name="terminal">Standard output, for <c>--out -</c>.</param>
    /// <param name="write">Writes the content in a format.</param>
    /// <param name="written">The paths written before, for a clash of names.</param>
    public void Write(
        ParseResult parsed, string source, Terminal terminal, Action<Stream, SpectrumFormat> write, ISet<string> written)
    {
        string? place = parsed.GetValue(_out);
        OutputFormat? asked = parsed.GetValue(_format);
        if (place == "-")
        {
            terminal.Out.Flush();
            write(terminal.OutStream, FormatOf(asked ?? OutputFormat.Ecsv));
            return;
        }

        bool isFile = place is not null && !Directory.Exists(place) && Path.GetExtension(place).Length > 0;
        OutputFormat format = asked ?? (isFile ? OutputFormats.OfFile(place!) : OutputFormat.Fits);
        string path = isFile ? place! : Path.Combine(place ?? Folder(source), FileName(source, format));
        if (!written.Add(Path.GetFullPath(path)))
        {
            throw new UsageException(
                $"--out {path} would be written twice: name a folder for several spectra, and give files of one name different folders.");
        }

        AtomicFile.Write(path, stream => write(stream, FormatOf(format)));
        terminal.SayDetail($"Wrote {path}.");
    }

    private string FileName(string source, OutputFormat format)
    {
        string stem = suffix.Length == 0 ? SpectrumName.Of(source) : SpectrumName.Of(source) + "." + suffix;
        string extension = format switch
        {
            OutputFormat.Fits => ".fits",
            OutputFormat.Csv => ".csv",
            OutputFormat.Json => ".json",
            OutputFormat.VoTable => ".vot",
            OutputFormat.Parquet => ".parquet",
            _ => ".ecsv",
        };
        return stem + extension;
    }

    private static string Folder(string source) => Path.GetDirectoryName(source.Split('#')[0]) ?? "";

    private static SpectrumFormat FormatOf(OutputFormat format) => format switch
    {
        OutputFormat.Fits => SpectrumFormat.FitsTable,
        OutputFormat.Csv => SpectrumFormat.Csv,
        OutputFormat.Json => SpectrumFormat.Json,
        OutputFormat.VoTable => SpectrumFormat.VoTable,
        OutputFormat.Parquet => SpectrumFormat.Parquet,
        _ => SpectrumFormat.Ecsv,
    };
}
