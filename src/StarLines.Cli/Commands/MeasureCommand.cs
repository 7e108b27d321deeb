using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Plotting;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines measure</c>: centre, equivalent width, depth, width and flux of lines.</summary>
internal static class MeasureCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var settings = new AnalysisSettings();
        var table = new TableOutput();
        var plot = new PlotOption();
        Option<bool> detect = Make.Flag("--detect", "Find the lines in the spectrum itself, without a list.");
        var command = new VerbCommand(
            "measure",
            "Measures lines: centre, equivalent width, depth, width and flux, each with its uncertainty, or an upper limit.",
            "starlines measure examples/night/wren-47.fits --lines metals-fgk");
        reading.AddTo(command);
        settings.AddLinesTo(command);
        command.Add(detect);
        settings.AddContinuumTo(command);
        table.AddTo(command);
        plot.AddTo(command);
        command.SetAction(parsed =>
        {
            bool detects = parsed.GetValue(detect);
            CheckChoice(settings.HasLines(parsed), detects);
            TableSink sink = table.Open(parsed, terminal);
            AnalysisOptions options = settings.From(parsed, provenance) with { MeasureVelocities = false };
            var rows = new List<LineRow>();
            var units = new HashSet<string>();
            bool isOnly = reading.Files(parsed).Count == 1;
            int code = new InputLoop(terminal, reading.Files(parsed), reading.From(parsed)).ForEachSpectrum("measuring", spectrum =>
            {
                AnalysisResult result = detects
                    ? AnalyseDetected(spectrum, options)
                    : SpectrumAnalysis.Analyse(spectrum, options);
                Remarks.Say(terminal, result);
                provenance.AddInput(spectrum.Metadata.Source);
                units.Add(spectrum.FluxUnit);
                foreach (LineMeasurement line in result.Lines!.Lines)
                {
                    rows.Add(new LineRow(spectrum.Metadata.Source, spectrum.Metadata.Target, line));
                }

                if (plot.IsAsked(parsed))
                {
                    IReadOnlyList<Figure> pages = LineFigure.FromMeasurements(result.Spectrum, result.Continuum, result.Lines);
                    plot.Write(parsed, spectrum.Metadata.Source, isOnly, pages, terminal);
                }
            });
            if (code != ExitCode.NoInput)
            {
                sink.Write(LineTable.ToTable(rows, units.Count == 1 ? string.Concat(units) : ""), provenance);
            }

            return code;
        });
        return command;
    }

    private static void CheckChoice(bool hasList, bool detects)
    {
        if (hasList == detects)
        {
            throw new UsageException(detects
                ? "Give --lines or --detect, not both."
                : $"Say which lines: --lines with {string.Join(", ", LineListCatalog.Names)} or a file, or --detect.");
        }
    }

    private static AnalysisResult AnalyseDetected(Spectrum spectrum, AnalysisOptions options)
    {
        double velocity = options.LineVelocityKmPerS ?? 0.0;
        AnalysisResult plain = SpectrumAnalysis.Analyse(spectrum, options);
        var detection = new LineDetectOptions { VelocityKmPerS = velocity };
        LineList found = LineDetector.Detect(plain.Spectrum, plain.Continuum, detection);
        return SpectrumAnalysis.Analyse(spectrum, options with { Lines = found, LineVelocityKmPerS = velocity });
    }
}
