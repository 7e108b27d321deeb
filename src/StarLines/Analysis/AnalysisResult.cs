using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Lines;
using StarLines.Velocities;
using StarLines.Velocities.Barycentre;

namespace StarLines.Analysis;

/// <summary>What was measured on a spectrum.</summary>
public sealed record AnalysisResult
{
    /// <summary>The spectrum as it was measured: with uncertainties, and with outliers and excluded ranges marked.</summary>
    public required Spectrum Spectrum { get; init; }

    /// <summary>Whether the uncertainties were taken from the flux.</summary>
    public required bool NoiseFromFlux { get; init; }

    /// <summary>The continuum, after its last refinement.</summary>
    public required ContinuumFit Continuum { get; init; }

    /// <summary>One velocity a template, in the order asked for; empty where none was asked for.</summary>
    public IReadOnlyList<VelocityResult> Velocities { get; init; } = [];

    /// <summary>The reduction to the barycentre; null where target, site or time are missing.</summary>
    public BarycentricResult? Barycentre { get; init; }

    /// <summary>The lines; null where none were asked for.</summary>
    public LineMeasurementSet? Lines { get; init; }

    /// <summary>Velocity by which the line list was shifted, km/s in the frame of the spectrum.</summary>
    public double LineVelocityKmPerS { get; init; } = double.NaN;

    /// <summary>What was assumed or found odd on the way, besides the remarks of the spectrum itself.</summary>
    public IReadOnlyList<Remark> Remarks { get; init; } = [];
}
