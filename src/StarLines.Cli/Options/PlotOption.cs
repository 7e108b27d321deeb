using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using StarLines.Cli.Output;
using StarLines.Plotting;

namespace StarLines.Cli.Options;

/// <summary><c>--plot</c>: a figure beside the table.</summary>
internal sealed class PlotOption
{
    private readonly Option<string?> _path = Make.One<string?>(
        "--plot", "PATH", "Write a figure too, .png or .svg; with several spectra their names are put in.", CheckedPath);

    /// <summary>Adds the option to a command.</summary>
    public void AddTo(Command command) => command.Add(_path);

    /// <summary>Whether a figure is asked for.</summary>
    public bool IsAsked(ParseResult parsed) => parsed.GetValue(_path) is not null;

    /// <summary>Writes the figures of a spectrum where they are asked for.</summary>
    /// <param name="parsed">The command line.</param>
    /// <param name="source">The spectrum they are of.</param>
    /// <param name="isOnly">Whether it is the only one.</param>
    /// <param name="figures">The pages.</param>
    /// <param name="terminal">Hears what was written.</param>
    public void Write(ParseResult parsed, string source, bool isOnly, IReadOnlyList<Figure> figures, Terminal terminal)
    {
        if (parsed.GetValue(_path) is { } path)
        {
            FigureFile.Write(FigureFile.PathFor(path, source, isOnly), figures, new FigureOptions(), terminal);
        }
    }

    /// <summary>A path whose ending names a format of figures.</summary>
    public static string CheckedPath(string path) => Path.GetExtension(path).ToUpperInvariant() is ".PNG" or ".SVG"
        ? path
        : throw new System.FormatException($"a figure is written as .png or .svg; '{path}' ends in neither.");
}
