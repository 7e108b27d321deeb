using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines inspect</c>: what a file holds and whether it can be trusted.</summary>
internal static class InspectCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var table = new TableOutput();
        var command = new VerbCommand(
            "inspect",
            "What a file holds and whether it can be trusted: wavelengths, medium, frame, signal-to-noise, target, site, time.",
            "starlines inspect examples/night/wren-47.fits");
        reading.AddTo(command);
        table.AddTo(command);
        command.SetAction(parsed =>
        {
            bool isTable = table.IsAsked(parsed);
            TableSink sink = table.Open(parsed, terminal);
            var summaries = new List<SpectrumSummary>();
            var sheets = new List<string>();
            var loop = new InputLoop(terminal, reading.Files(parsed), reading.From(parsed)) { SaysRemarks = isTable };
            int code = loop.ForEach("inspecting", spectrum =>
            {
                provenance.AddInput(spectrum.Metadata.Source);
                SpectrumSummary summary = SpectrumSummary.Of(spectrum);
                summaries.Add(summary);
                sheets.Add(SpectrumSheet.Write(summary));
            });
            if (isTable && summaries.Count > 0)
            {
                sink.Write(SpectrumSummaryTable.Create(summaries), provenance);
            }
            else
            {
                terminal.Out.Write(string.Join('\n', sheets));
            }

            return code;
        });
        return command;
    }
}
