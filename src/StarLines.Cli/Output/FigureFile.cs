using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.Plotting;
using StarLines.Runs.Output;

namespace StarLines.Cli.Output;

/// <summary>Writes figures to files; further pages get a number before the ending.</summary>
internal static class FigureFile
{
    /// <summary>Writes the pages.</summary>
    public static void Write(string path, IReadOnlyList<Figure> figures, FigureOptions options, Terminal terminal)
    {
        FigureFormat format = FigureFormats.FromPath(path);
        for (int i = 0; i < figures.Count; i++)
        {
            Figure figure = figures[i];
            string page = i == 0 ? path : WithSuffix(path, (i + 1).ToString(CultureInfo.InvariantCulture));
            AtomicFile.Write(page, stream => figure.Save(stream, format, options));
            terminal.SayDetail($"Wrote {page}.");
        }

        if (FigureFonts.Problem is { } problem)
        {
            terminal.SayRemark(problem.Sentence);
        }
    }

    /// <summary>The path of the figure of one spectrum: as given for the only one, else with the name of the spectrum put in.</summary>
    public static string PathFor(string path, string source, bool isOnly) =>
        isOnly ? path : WithSuffix(path, SpectrumName.Of(source));

    private static string WithSuffix(string path, string suffix)
    {
        string folder = Path.GetDirectoryName(path) ?? "";
        return Path.Combine(folder, $"{Path.GetFileNameWithoutExtension(path)}-{suffix}{Path.GetExtension(path)}");
    }
}
