using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.IO;
using StarLines.Plotting;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines normalize</c>: spectra with their continuum and the normalized flux.</summary>
internal static class NormalizeCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var settings = new AnalysisSettings();
        var output = new SpectrumOutput("normalized");
        var plot = new PlotOption();
        var command = new VerbCommand(
            "normalize",
            "Fits the continuum and writes wavelength, flux, uncertainty, continuum and normalized flux to NAME.normalized.fits.",
            "starlines normalize examples/night/wren-47.fits --out wren-47.normalized.fits");
        reading.AddTo(command);
        settings.AddContinuumTo(command);
        output.AddTo(command);
        plot.AddTo(command);
        command.SetAction(parsed =>
        {
            AnalysisOptions options = settings.From(parsed, provenance) with { MeasureVelocities = false };
            var written = new HashSet<string>();
            bool isOnly = reading.Files(parsed).Count == 1;
            return new InputLoop(terminal, reading.Files(parsed), reading.From(parsed)).ForEachSpectrum("normalizing", spectrum =>
            {
                AnalysisResult result = SpectrumAnalysis.Analyse(spectrum, options);
                string source = spectrum.Metadata.Source;
                IReadOnlyList<string> history = provenance.History(source);
                output.Write(
                    parsed,
                    source,
                    terminal,
                    (stream, format) => SpectrumWriter.WriteNormalized(result.Spectrum, result.Continuum, stream, format, history),
                    written);
                if (plot.IsAsked(parsed))
                {
                    plot.Write(parsed, source, isOnly, [SpectrumFigure.Create(result.Spectrum, result.Continuum)], terminal);
                }
            });
        });
        return command;
    }
}
