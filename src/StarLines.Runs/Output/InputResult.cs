using System.Collections.Generic;
using StarLines.Lines;
using StarLines.Runs.Inputs;

namespace StarLines.Runs.Output;

/// <summary>What came of one input.</summary>
internal sealed class InputResult(RunInput input)
{
    /// <summary>Everything that was asked for was done.</summary>
    internal const string Done = "done";

    /// <summary>Something could not be done.</summary>
    internal const string Failed = "failed";

    internal RunInput Input { get; } = input;

    /// <summary>SHA-256 of the file; empty where there is none.</summary>
    internal string Sha256 { get; set; } = "";

    /// <summary>What went wrong, one sentence; empty where nothing did.</summary>
    internal string Error { get; set; } = "";

    internal double Seconds { get; set; }

    internal List<SpectraRow> Spectra { get; } = [];

    internal List<Velocities.VelocityRow> Velocities { get; } = [];

    internal List<LineRow> Lines { get; } = [];

    /// <summary>Units of the flux of the spectra.</summary>
    internal List<string> FluxUnits { get; } = [];

    /// <summary>Files written, relative to the folder of the results.</summary>
    internal List<string> Files { get; } = [];

    internal string State => Error.Length == 0 ? Done : Failed;
}
