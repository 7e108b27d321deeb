using System;
using System.CommandLine;
using System.Globalization;
using System.IO;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.Runs;
using StarLines.Runs.Plans;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines run</c>: the whole job on any number of spectra.</summary>
internal static class RunCommand
{
    private static readonly (string Word, RunTableFormat Value)[] Formats =
    [
        ("ecsv", RunTableFormat.Ecsv), ("csv", RunTableFormat.Csv), ("json", RunTableFormat.Json),
        ("fits", RunTableFormat.Fits), ("votable", RunTableFormat.VoTable), ("parquet", RunTableFormat.Parquet),
    ];

    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var inputs = new Argument<string[]>("INPUT")
        {
            Description = "Files, folders, patterns in quotes, or a manifest (CSV with a column file).",
            Arity = ArgumentArity.ZeroOrMore,
        };
        var reading = new ReadingOptions(inputs);
        var settings = new AnalysisSettings();
        Option<string?> output = Make.One<string?>("--out", "DIR", "The folder of the results.", static text => text);
        Option<string?> planFile = Make.One<string?>("--plan", "PLAN.toml", "Settings of an earlier run; other options win over it.", static text => text);
        Option<int?> jobs = Make.One<int?>("--jobs", "N", "Spectra worked on at a time; else one a processor.", static text => Values.Whole(text, 1));
        Option<RunSteps?> only = Make.One<RunSteps?>(
            "--only", "STEPS", "Only these steps, separated by commas: continuum, velocity, lines, figures.", static text => Steps(text));
        Option<RunTableFormat?> format = Make.One<RunTableFormat?>(
            "--format", "FORMAT", "Format of the tables: ecsv (default), csv, json, fits, votable or parquet.",
            static text => Values.Word(text, Formats), "ecsv", "csv", "json", "fits", "votable", "parquet");
        var command = new VerbCommand(
            "run",
            "The whole job on any number of spectra: tables of lines, velocities and spectra, normalized spectra and figures.",
            "starlines run examples/night --out out/night");
        reading.AddTo(command);
        command.Add(output);
        command.Add(planFile);
        command.Add(jobs);
        command.Add(only);
        command.Add(format);
        settings.AddLinesTo(command);
        settings.AddVelocityTo(command);
        settings.AddContinuumTo(command);
        command.SetAction(parsed =>
        {
            RunPlan plan = parsed.GetValue(planFile) is { } file ? ReadPlan(file) : new RunPlan();
            string[] named = parsed.GetValue(inputs) ?? [];
            plan = settings.Override(parsed, plan) with
            {
                Inputs = named.Length > 0 ? named : plan.Inputs,
                OutputFolder = parsed.GetValue(output) ?? plan.OutputFolder,
                Jobs = parsed.GetValue(jobs) ?? Environment.ProcessorCount,
                Steps = parsed.GetValue(only) ?? plan.Steps,
                Format = parsed.GetValue(format) ?? plan.Format,
                Reading = reading.Override(parsed, plan.Reading),
            };
            RunOutcome outcome = Run(plan, terminal, provenance);
            terminal.SayRemark(Sentence(outcome, plan));
            return outcome.Failed == 0 ? ExitCode.Done
                : outcome.Unusable == outcome.Inputs ? ExitCode.NoInput
                : ExitCode.SomeFailed;
        });
        return command;
    }

    private static RunOutcome Run(RunPlan plan, Terminal terminal, Provenance provenance)
    {
        RunOutcome? outcome = null;
        try
        {
            terminal.WithPercentage("running", advance =>
            {
                var progress = new Listener(told =>
                {
                    if (told.Error.Length > 0)
                    {
                        terminal.SayError(told.Error);
                    }

                    advance((double)told.Ended / told.Total);
                });
                outcome = RunEngine.Run(plan, provenance.ToRunContext(), progress, terminal.Stop);
            });
            return outcome!;
        }
        catch (RunPlanException problem)
        {
            throw new UsageException(problem.Message);
        }
        catch (FileNotFoundException problem)
        {
            throw new UsageException(problem.Message);
        }
    }

    private static RunPlan ReadPlan(string file)
    {
        try
        {
            return PlanFile.Read(file);
        }
        catch (Exception problem) when (problem is RunPlanException or IOException or UnauthorizedAccessException)
        {
            throw new UsageException(ErrorSentence.Of(problem, file));
        }
    }

    private static RunSteps Steps(string text)
    {
        RunSteps steps = RunSteps.None;
        foreach (string word in text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            steps |= Values.Word(
                word,
                ("continuum", RunSteps.Continuum), ("velocity", RunSteps.Velocity), ("lines", RunSteps.Lines), ("figures", RunSteps.Figures));
        }

        return steps == RunSteps.None ? throw new FormatException("name at least one step.") : steps;
    }

    private static string Sentence(RunOutcome outcome, RunPlan plan) => string.Create(
        CultureInfo.InvariantCulture,
        $"{outcome.Spectra} spectra of {outcome.Inputs} inputs, {outcome.Lines} lines, {outcome.Velocities} velocities, {outcome.Failed} inputs failed; the results are in {plan.OutputFolder}.");

    private sealed class Listener(Action<RunProgress> hear) : IProgress<RunProgress>
    {
        public void Report(RunProgress value) => hear(value);
    }
}
