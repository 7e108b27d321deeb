using System.CommandLine;
using StarLines.Cli.Output;

namespace StarLines.Cli.Options;

/// <summary><c>--out</c> and <c>--format</c> of a command that gives a table.</summary>
internal sealed class TableOutput
{
    private readonly Option<string?> _out = Make.One<string?>(
        "--out", "PATH", "Write the table to a file; the ending gives the format.", static text => text);

    private readonly Option<OutputFormat?> _format = Make.One<OutputFormat?>(
        "--format",
        "FORMAT",
        "ecsv, csv, json, fits, votable or parquet; else by the ending of --out, else ecsv. A terminal gets an aligned table.",
        static text => Values.Word(text, OutputFormats.Words),
        "ecsv", "csv", "json", "fits", "votable", "parquet");

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(_out);
        command.Add(_format);
    }

    /// <summary>Whether the user asked for a table in so many words.</summary>
    public bool IsAsked(ParseResult parsed) => parsed.GetValue(_out) is not null || parsed.GetValue(_format) is not null;

    /// <summary>Where the table goes; decided before any work, so that a wrong ending costs nothing.</summary>
    public TableSink Open(ParseResult parsed, Terminal terminal)
    {
        string? path = parsed.GetValue(_out);
        OutputFormat? asked = parsed.GetValue(_format);
        OutputFormat format = asked
            ?? (path is not null and not "-" ? OutputFormats.OfFile(path)
                : terminal.OutIsTerminal ? OutputFormat.Aligned
                : OutputFormat.Ecsv);
        return new TableSink(terminal, path == "-" ? null : path, format);
    }
}
