using StarLines.Analysis;

namespace StarLines.Runs.Output;

/// <summary>One row of the table of spectra.</summary>
/// <param name="File">The spectrum, or the input where none could be read.</param>
/// <param name="Summary">What the spectrum is; null where none could be read.</param>
/// <param name="State"><c>done</c> or <c>failed</c>.</param>
/// <param name="Error">What went wrong, one sentence, or an empty string.</param>
/// <param name="Seconds">Time that it took, s.</param>
internal sealed record SpectraRow(string File, SpectrumSummary? Summary, string State, string Error, double Seconds);
