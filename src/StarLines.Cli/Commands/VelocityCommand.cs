using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.Plotting;
using StarLines.Velocities;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines velocity</c>: radial velocities by cross-correlation, reduced to the barycentre.</summary>
internal static class VelocityCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var settings = new AnalysisSettings();
        var table = new TableOutput();
        var plot = new PlotOption();
        var command = new VerbCommand(
            "velocity",
            "Radial velocity by cross-correlation with line templates, reduced to the barycentre of the solar system.",
            "starlines velocity examples/night/wren-47.fits");
        reading.AddTo(command);
        settings.AddVelocityTo(command);
        settings.AddContinuumTo(command);
        table.AddTo(command);
        plot.AddTo(command);
        command.SetAction(parsed =>
        {
            TableSink sink = table.Open(parsed, terminal);
            AnalysisOptions options = settings.From(parsed, provenance);
            var rows = new List<VelocityRow>();
            bool isOnly = reading.Files(parsed).Count == 1;
            int code = new InputLoop(terminal, reading.Files(parsed), reading.From(parsed)).ForEachSpectrum("measuring", spectrum =>
            {
                AnalysisResult result = SpectrumAnalysis.Analyse(spectrum, options);
                Remarks.Say(terminal, result);
                provenance.AddInput(spectrum.Metadata.Source);
                foreach (VelocityResult velocity in result.Velocities)
                {
                    rows.AddRange(VelocityTable.RowsOf(spectrum.Metadata.Source, spectrum.Metadata.Target, velocity));
                }

                if (plot.IsAsked(parsed) && CorrelationFigure.FromResults(result.Spectrum, result.Velocities) is { } figure)
                {
                    plot.Write(parsed, spectrum.Metadata.Source, isOnly, [figure], terminal);
                }
            });
            if (code != ExitCode.NoInput)
            {
                sink.Write(VelocityTable.ToTable(rows), provenance);
            }

            return code;
        });
        return command;
    }
}
