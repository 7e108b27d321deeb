using System.Collections.Generic;

namespace StarLines.Runs;

/// <summary>How a run ended.</summary>
/// <param name="Inputs">Number of inputs.</param>
/// <param name="Failed">Number of those that failed, wholly or in part.</param>
/// <param name="Unusable">Number of those of which nothing could be used.</param>
/// <param name="Spectra">Number of spectra that were measured.</param>
/// <param name="Lines">Rows of the table of lines.</param>
/// <param name="Velocities">Rows of the table of velocities.</param>
/// <param name="Files">Files written, relative to the folder of the results, in order.</param>
public sealed record RunOutcome(
    int Inputs, int Failed, int Unusable, int Spectra, int Lines, int Velocities, IReadOnlyList<string> Files);
