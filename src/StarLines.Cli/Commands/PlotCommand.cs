using System;
using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.Plotting;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines plot</c>: a figure of a spectrum and of what was measured on it.</summary>
internal static class PlotCommand
{
    private enum Kind
    {
        Normalized,
        Spectrum,
        Lines,
        Correlation,
    }

    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var settings = new AnalysisSettings();
        var look = new FigureLook();
        Option<Kind> kind = Make.One(
            "--kind",
            "KIND",
            "spectrum (with its continuum), normalized (with lines named, default), lines (fits and residuals) or correlation.",
            static text => Values.Word(
                text,
                ("normalized", Kind.Normalized), ("spectrum", Kind.Spectrum), ("lines", Kind.Lines), ("correlation", Kind.Correlation)),
            "spectrum", "normalized", "lines", "correlation");
        Option<string?> output = Make.One<string?>(
            "--out", "PATH", "The figure, .png or .svg; else NAME.KIND.png beside the spectrum.", PlotOption.CheckedPath);
        var command = new VerbCommand(
            "plot",
            "Draws a spectrum with its continuum, its lines with their names, the fits with residuals, or the correlation function.",
            "starlines plot examples/night/wren-47.fits --lines metals-fgk --range 5150:5450 --out wren-47.png");
        reading.AddTo(command);
        command.Add(kind);
        command.Add(output);
        look.AddTo(command);
        settings.AddLinesTo(command);
        settings.AddVelocityTo(command);
        settings.AddContinuumTo(command);
        command.SetAction(parsed =>
        {
            Kind what = parsed.GetValue(kind);
            AnalysisOptions options = Options(settings.From(parsed, provenance), what);
            FigureOptions drawing = look.From(parsed);
            string? path = parsed.GetValue(output);
            bool isOnly = reading.Files(parsed).Count == 1;
            IReadOnlyList<SpectrumView> views = look.Views(parsed, reading.Ranges(parsed));
            var loop = new InputLoop(terminal, reading.Files(parsed), reading.From(parsed) with { Ranges = [] });
            return loop.ForEachSpectrum("drawing", spectrum =>
            {
                AnalysisResult result = SpectrumAnalysis.Analyse(spectrum, options);
                string source = spectrum.Metadata.Source;
                string word = what.ToString().ToLowerInvariant();
                string file = path is null
                    ? System.IO.Path.Combine(System.IO.Path.GetDirectoryName(source.Split('#')[0]) ?? "", $"{SpectrumName.Of(source)}.{word}.png")
                    : FigureFile.PathFor(path, source, isOnly);
                FigureFile.Write(file, Draw(result, what, views), drawing, terminal);
            });
        });
        return command;
    }

    private static AnalysisOptions Options(AnalysisOptions options, Kind what)
    {
        if (what == Kind.Lines && options.Lines is null)
        {
            throw new UsageException("--kind lines draws the fits of a list: give --lines.");
        }

        bool needsLines = what is Kind.Lines or Kind.Normalized;
        return options with
        {
            MeasureVelocities = what == Kind.Correlation,
            Lines = needsLines ? options.Lines : null,
        };
    }

    private static List<LinePanel> Panels(AnalysisResult result, IReadOnlyList<SpectrumView> views)
    {
        var panels = new List<LinePanel>();
        foreach (LinePanel panel in LinePanel.FromMeasurements(result.Spectrum, result.Continuum, result.Lines!))
        {
            foreach (SpectrumView view in views)
            {
                if (view.Range is not { } range || range.Contains(panel.CentreAngstrom))
                {
                    panels.Add(panel);
                    break;
                }
            }
        }

        return panels;
    }

    private static List<Figure> Draw(AnalysisResult result, Kind what, IReadOnlyList<SpectrumView> views)
    {
        var figures = new List<Figure>();
        switch (what)
        {
            case Kind.Lines:
                figures.AddRange(LineFigure.Pages(Panels(result, views), result.Spectrum.Metadata.Target));
                break;
            case Kind.Correlation:
                if (CorrelationFigure.FromResults(result.Spectrum, result.Velocities) is { } correlation)
                {
                    figures.Add(correlation);
                }

                break;
            default:
                foreach (SpectrumView view in views)
                {
                    figures.Add(what == Kind.Spectrum
                        ? SpectrumFigure.Create(result.Spectrum, result.Continuum, view)
                        : NormalizedFigure.Create(result.Spectrum, result.Continuum, LineMark.FromMeasurements(result.Lines?.Lines ?? []), view));
                }

                break;
        }

        return figures.Count > 0
            ? figures
            : throw new InvalidOperationException($"{result.Spectrum.Metadata.Source}: nothing could be measured, so there is nothing to draw.");
    }
}
