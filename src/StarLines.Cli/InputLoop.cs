using System;
using System.Collections.Generic;
using System.IO;
using StarLines.IO;

namespace StarLines.Cli;

/// <summary>Reads the inputs of a command one after the other; one that fails is said in one sentence and the others go on.</summary>
internal sealed class InputLoop(Terminal terminal, IReadOnlyList<string> names, SpectrumReadOptions options)
{
    /// <summary>The name that stands for standard input.</summary>
    public const string StandardInput = "-";

    /// <summary>Whether what was guessed while reading is said on standard error.</summary>
    public bool SaysRemarks { get; init; } = true;

    /// <summary>Does something with every spectrum of every input.</summary>
    /// <param name="what">What is done, such as <c>measuring</c>.</param>
    /// <param name="action">What to do; what it throws counts against its input.</param>
    /// <returns>The exit code.</returns>
    public int ForEach(string what, Action<Spectrum> action)
    {
        IReadOnlyList<string> inputs = InputNames.Expand(names);
        int failed = 0;
        terminal.WithProgress(what, inputs.Count, step =>
        {
            foreach (string name in inputs)
            {
                terminal.Stop.ThrowIfCancellationRequested();
                failed += Try(name, action) ? 0 : 1;
                step();
            }
        });
        return failed == 0 ? ExitCode.Done : failed == inputs.Count ? ExitCode.NoInput : ExitCode.SomeFailed;
    }

    private bool Try(string name, Action<Spectrum> action)
    {
        try
        {
            foreach (Spectrum spectrum in Read(name))
            {
                terminal.Stop.ThrowIfCancellationRequested();
                SayRemarks(spectrum);
                action(spectrum);
            }

            return true;
        }
        catch (Exception problem) when (problem is not (OperationCanceledException or UsageException))
        {
            terminal.SayError(ErrorSentence.Of(problem, name));
            return false;
        }
    }

    private IReadOnlyList<Spectrum> Read(string name) => name == StandardInput
        ? SpectrumReader.Read(terminal.In, "standard-input", options)
        : SpectrumReader.Read(name, options);

    private void SayRemarks(Spectrum spectrum)
    {
        if (!SaysRemarks)
        {
            return;
        }

        foreach (Remark remark in spectrum.Metadata.Remarks)
        {
            terminal.SayRemark($"{spectrum.Metadata.Source}: {remark.Sentence}");
        }
    }
}
