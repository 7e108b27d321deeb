using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.IO;

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
            SpectrumReadOptions options = reading.From(parsed);
            int code = new InputLoop(terminal, reading.Files(parsed), options).ForEachInput("inspecting", name =>
            {
                SpectrumFileInspection file = name == InputLoop.StandardInput
                    ? SpectrumReader.Inspect(terminal.In, InputLoop.StandardInputName, options)
                    : SpectrumReader.Inspect(name, options);
                provenance.AddInput(name);
                sheets.Add(isTable ? "" : SpectrumSheet.Write(file));
                foreach (Spectrum spectrum in isTable ? file.Spectra : [])
                {
                    summaries.Add(SpectrumSummary.Of(spectrum));
                }

                if (file.Problem.Length > 0)
                {
                    throw new SpectrumFormatException(file.Problem);
                }
            });
            if (!isTable)
            {
                terminal.Out.Write(string.Concat(sheets));
            }
            else if (summaries.Count > 0)
            {
                sink.Write(SpectrumSummaryTable.Create(summaries), provenance);
            }

            return code;
        });
        return command;
    }
}
