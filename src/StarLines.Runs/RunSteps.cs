using System;

namespace StarLines.Runs;

/// <summary>The steps of a run.</summary>
[Flags]
public enum RunSteps
{
    /// <summary>None.</summary>
    None = 0,

    /// <summary>Normalized spectra are written.</summary>
    Continuum = 1,

    /// <summary>Velocities are measured.</summary>
    Velocity = 2,

    /// <summary>Lines are measured.</summary>
    Lines = 4,

    /// <summary>Figures are drawn of what was measured.</summary>
    Figures = 8,

    /// <summary>All of them.</summary>
    All = Continuum | Velocity | Lines | Figures,
}
