using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Security.Cryptography;
using System.Threading;
using StarLines.Analysis;
using StarLines.IO;
using StarLines.Lines;
using StarLines.Plotting;
using StarLines.Runs.Inputs;
using StarLines.Runs.Output;
using StarLines.Velocities;

namespace StarLines.Runs;

/// <summary>The work on one input: read, measure, write its spectra and figures. Used by several threads.</summary>
internal sealed class InputWork(RunPlan plan, RunSetup setup)
{
    private const string NormalizedFolder = "normalized";
    private const string FigureFolder = "plots";

    /// <summary>Does all that the plan asks of an input; whatever goes wrong is in the result.</summary>
    /// <exception cref="OperationCanceledException">The run was stopped.</exception>
    internal InputResult Do(RunInput input, CancellationToken stop)
    {
        var result = new InputResult(input);
        long start = Stopwatch.GetTimestamp();
        try
        {
            result.Sha256 = Sha256Of(input.Path);
            IReadOnlyList<Spectrum> spectra = SpectrumReader.Read(input.Name, input.Reading);
            for (int k = 0; k < spectra.Count; k++)
            {
                stop.ThrowIfCancellationRequested();
                string part = spectra.Count == 1 ? "" : FormattableString.Invariant($"+{k + 1}");
                Measure(spectra[k], input.Stem + part, result);
            }
        }
        catch (Exception problem) when (problem is not OperationCanceledException)
        {
            Note(result, RunError.Sentence(problem, input.Name));
        }

        result.Seconds = Stopwatch.GetElapsedTime(start).TotalSeconds;
        if (result.Spectra.Count == 0)
        {
            result.Spectra.Add(new SpectraRow(input.Name, null, result.State, result.Error, result.Seconds));
        }

        return result;
    }

    private void Measure(Spectrum spectrum, string stem, InputResult result)
    {
        long start = Stopwatch.GetTimestamp();
        SpectrumSummary summary = SpectrumSummary.Of(spectrum);
        string error = "";
        try
        {
            AnalysisResult analysis = SpectrumAnalysis.Analyse(spectrum, setup.Options);
            Collect(analysis, spectrum.FluxUnit, result);
            Write(analysis, stem, result);
        }
        catch (Exception problem) when (problem is not OperationCanceledException)
        {
            // One spectrum of a file that cannot be measured leaves the others alone.
            error = RunError.Sentence(problem, spectrum.Metadata.Source);
            Note(result, error);
        }

        result.Spectra.Add(new SpectraRow(
            spectrum.Metadata.Source,
            summary,
            error.Length == 0 ? InputResult.Done : InputResult.Failed,
            error,
            Stopwatch.GetElapsedTime(start).TotalSeconds));
    }

    private static void Collect(AnalysisResult analysis, string fluxUnit, InputResult result)
    {
        string file = analysis.Spectrum.Metadata.Source;
        string target = analysis.Spectrum.Metadata.Target;
        foreach (VelocityResult velocity in analysis.Velocities)
        {
            result.Velocities.AddRange(VelocityTable.RowsOf(file, target, velocity));
        }

        foreach (LineMeasurement line in analysis.Lines?.Lines ?? [])
        {
            result.Lines.Add(new LineRow(file, target, line));
        }

        result.FluxUnits.Add(fluxUnit);
    }

    private void Write(AnalysisResult analysis, string stem, InputResult result)
    {
        if (plan.Steps.HasFlag(RunSteps.Continuum))
        {
            Save(result, NormalizedFolder, $"{stem}.normalized.fits", stream =>
                SpectrumWriter.WriteNormalized(analysis.Spectrum, analysis.Continuum, stream));
        }

        if (!plan.Steps.HasFlag(RunSteps.Figures))
        {
            return;
        }

        SaveFigure(result, $"{stem}.spectrum", SpectrumFigure.Create(analysis.Spectrum, analysis.Continuum));
        if (analysis.Lines is { } lines)
        {
            IReadOnlyList<LineMark> marks = LineMark.FromMeasurements(lines.Lines);
            SaveFigure(result, $"{stem}.normalized", NormalizedFigure.Create(analysis.Spectrum, analysis.Continuum, marks));
            IReadOnlyList<Figure> pages = LineFigure.FromMeasurements(
                analysis.Spectrum, analysis.Continuum, lines, plan.LinePanels == 0 ? null : plan.LinePanels);
            for (int page = 0; page < pages.Count; page++)
            {
                string number = pages.Count == 1 ? "" : FormattableString.Invariant($"-{page + 1}");
                SaveFigure(result, $"{stem}.lines{number}", pages[page]);
            }
        }

        if (CorrelationFigure.FromResults(analysis.Spectrum, analysis.Velocities) is { } correlation)
        {
            SaveFigure(result, $"{stem}.correlation", correlation);
        }
    }

    private void SaveFigure(InputResult result, string name, Figure figure) => Save(
        result,
        FigureFolder,
        name + (plan.FigureFormat == FigureFormat.Png ? ".png" : ".svg"),
        stream => figure.Save(stream, plan.FigureFormat));

    private void Save(InputResult result, string folder, string name, Action<Stream> write)
    {
        AtomicFile.Write(Path.Combine(plan.OutputFolder, folder, name), write);
        result.Files.Add($"{folder}/{name}");
    }

    private static void Note(InputResult result, string error) =>
        result.Error = result.Error.Length == 0 ? error : $"{result.Error} {error}";

    private static string Sha256Of(string path)
    {
        if (!File.Exists(path))
        {
            return "";
        }

        using FileStream stream = File.OpenRead(path);
        return Convert.ToHexStringLower(SHA256.HashData(stream));
    }
}
