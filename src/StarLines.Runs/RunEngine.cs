using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.IO;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using StarLines.Runs.Inputs;
using StarLines.Runs.Output;
using StarLines.Runs.Plans;

namespace StarLines.Runs;

/// <summary>The whole job on any number of spectra.</summary>
public static class RunEngine
{
    private const string PlanName = "plan.toml";
    private const string JournalName = "journal.jsonl";

    /// <summary>
    /// Runs a plan. The folder of the results receives the tables <c>lines</c>, <c>velocities</c> and <c>spectra</c>, the folders
    /// <c>normalized</c> and <c>plots</c>, <c>plan.toml</c> and <c>journal.jsonl</c>. Inputs are worked on <see cref="RunPlan.Jobs"/> at a time;
    /// all but the journal, which has the order and times of the work, is the same whatever their number. One bad input never stops the others.
    /// </summary>
    /// <param name="plan">The plan.</param>
    /// <param name="context">What the tables say about their making.</param>
    /// <param name="progress">Told of every input that ends, from the thread that did it; null for nobody.</param>
    /// <param name="stop">Stops the run: inputs begun are left, files begun are removed, no table is written.</param>
    /// <exception cref="RunPlanException">The plan cannot be run; nothing was done.</exception>
    /// <exception cref="IOException">A line list cannot be read, or the folder of the results cannot be written.</exception>
    /// <exception cref="OperationCanceledException">The run was stopped.</exception>
    public static RunOutcome Run(
        RunPlan plan, RunContext context, IProgress<RunProgress>? progress = null, CancellationToken stop = default)
    {
        ArgumentNullException.ThrowIfNull(plan);
        ArgumentNullException.ThrowIfNull(context);
        Check(plan);
        IReadOnlyList<RunInput> inputs = InputExpansion.Expand(plan.Inputs, plan.Reading);
        RunSetup setup = RunSetup.Of(plan);
        Directory.CreateDirectory(plan.OutputFolder);
        AtomicFile.Write(
            Path.Combine(plan.OutputFolder, PlanName), stream => stream.Write(Encoding.UTF8.GetBytes(PlanFile.Write(plan))));
        InputResult[] results = Work(plan, setup, inputs, progress, stop);
        IReadOnlyList<string> tables = new ResultTables(plan, context, setup.Lists).Write(results);
        return Outcome(results, tables);
    }

    private static void Check(RunPlan plan)
    {
        if (plan.Inputs.Count == 0)
        {
            throw new RunPlanException("The run has no input; name files, folders, patterns or a manifest.");
        }

        if (plan.OutputFolder.Length == 0)
        {
            throw new RunPlanException("The run has no folder for its results; give --out DIR.");
        }

        if (plan.Jobs < 1)
        {
            throw new RunPlanException(FormattableString.Invariant($"The number of jobs is {plan.Jobs}; it must be 1 or more."));
        }

        if (plan.Steps == RunSteps.None)
        {
            throw new RunPlanException("The run has no step; name some of continuum, velocity, lines, figures.");
        }
    }

    private static InputResult[] Work(
        RunPlan plan, RunSetup setup, IReadOnlyList<RunInput> inputs, IProgress<RunProgress>? progress, CancellationToken stop)
    {
        var results = new InputResult[inputs.Count];
        var work = new InputWork(plan, setup);
        using var journal = new RunJournal(Path.Combine(plan.OutputFolder, JournalName));
        var how = new ParallelOptions { MaxDegreeOfParallelism = plan.Jobs, CancellationToken = stop };
        int ended = 0;

        // Inputs are handed out one by one in their order; each result has its own place.
        Parallel.ForEach(Partitioner.Create(Numbered(inputs), EnumerablePartitionerOptions.NoBuffering), how, item =>
        {
            InputResult result = work.Do(item.Input, stop);
            results[item.Index] = result;
            journal.Append(result);
            progress?.Report(new RunProgress(Interlocked.Increment(ref ended), inputs.Count, result.Input.Name, result.Error));
        });
        return results;
    }

    private static IEnumerable<(int Index, RunInput Input)> Numbered(IReadOnlyList<RunInput> inputs)
    {
        for (int i = 0; i < inputs.Count; i++)
        {
            yield return (i, inputs[i]);
        }
    }

    private static RunOutcome Outcome(InputResult[] results, IReadOnlyList<string> tables)
    {
        int failed = 0;
        int unusable = 0;
        int spectra = 0;
        int lines = 0;
        int velocities = 0;
        var files = new List<string>(tables);
        foreach (InputResult result in results)
        {
            int done = result.Spectra.FindAll(static row => row.State == InputResult.Done).Count;
            failed += result.Error.Length == 0 ? 0 : 1;
            unusable += done == 0 ? 1 : 0;
            spectra += done;
            lines += result.Lines.Count;
            velocities += result.Velocities.Count;
            files.AddRange(result.Files);
        }

        files.Add(PlanName);
        files.Add(JournalName);
        return new RunOutcome(results.Length, failed, unusable, spectra, lines, velocities, files);
    }
}
