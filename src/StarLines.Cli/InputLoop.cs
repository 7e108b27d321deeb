using System;
using System.Collections.Generic;
using StarLines.IO;

namespace StarLines.Cli;

/// <summary>Reads the inputs of a command one after the other; one that fails is said in one sentence and the others go on.</summary>
internal sealed class InputLoop(Terminal terminal, IReadOnlyList<string> names, SpectrumReadOptions options)
{
    /// <summary>The name that stands for standard input.</summary>
    public const string StandardInput = "-";

    /// <summary>What standard input is called in tables and sentences.</summary>
    public const string StandardInputName = "standard-input";

    /// <summary>Whether what was guessed while reading is said on standard error.</summary>
    public bool SaysRemarks { get; init; } = true;

    /// <summary>Does something with every spectrum of every input.</summary>
    /// <param name="what">What is done, such as <c>measuring</c>.</param>
    /// <param name="action">What to do; what it throws counts against its input.</param>
    /// <returns>The exit code.</returns>
    public int ForEachSpectrum(string what, Action<Spectrum> action) => ForEachInput(what, name =>
    {
        IReadOnlyList<Spectrum> spectra = name == StandardInput
            ? SpectrumReader.Read(terminal.In, StandardInputName, options)
            : SpectrumReader.Read(name, options);
        foreach (Spectrum spectrum in spectra)
        {
            terminal.Stop.ThrowIfCancellationRequested();
            SayRemarks(spectrum);
            action(spectrum);
        }
    });

    /// <summary>Does something with every input.</summary>
    /// <param name="what">What is done, such as <c>inspecting</c>.</param>
    /// <param name="action">What to do; what it throws counts against its input.</param>
    /// <returns>The exit code.</returns>
    public int ForEachInput(string what, Action<string> action)
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

    private bool Try(string name, Action<string> action)
    {
        try
        {
            action(name);
            return true;
        }
        catch (Exception problem) when (problem is not (OperationCanceledException or UsageException))
        {
            terminal.SayError(ErrorSentence.Of(problem, name));
            return false;
        }
    }

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
