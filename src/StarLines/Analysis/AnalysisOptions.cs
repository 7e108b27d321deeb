using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Templates;
using StarLines.Velocities;

namespace StarLines.Analysis;

/// <summary>What is measured on a spectrum, and how.</summary>
public sealed record AnalysisOptions
{
    /// <summary>Ranges that nothing uses, in the spectrum's own medium and frame.</summary>
    public IReadOnlyList<WavelengthRange> Exclude { get; init; } = [];

    /// <summary>Whether cosmic-ray hits and dead pixels are looked for and left out.</summary>
    public bool FindOutliers { get; init; } = true;

    /// <summary>Settings of the continuum.</summary>
    public ContinuumOptions Continuum { get; init; } = ContinuumOptions.Default;

    /// <summary>Whether velocities are measured.</summary>
    public bool MeasureVelocities { get; init; } = true;

    /// <summary>The built-in templates; null for none.</summary>
    public StellarTemplates? StellarTemplates { get; init; }

    /// <summary>Which of the built-in templates give a result, in this order.</summary>
    public IReadOnlyList<string> StellarTemplateNames { get; init; } =
        [StellarTemplates.BalmerName, StellarTemplates.MetalName, StellarTemplates.BothName];

    /// <summary>Templates besides the built-in ones.</summary>
    public IReadOnlyList<LineTemplate> Templates { get; init; } = [];

    /// <summary>Settings of the velocities.</summary>
    public VelocityOptions Velocity { get; init; } = new();

    /// <summary>The lines to measure; null for none.</summary>
    public LineList? Lines { get; init; }

    /// <summary>Velocity by which the line list is shifted, km/s in the frame of the spectrum; null to take the measured one.</summary>
    public double? LineVelocityKmPerS { get; init; }

    /// <summary>Settings of the lines; the velocity in it is not used.</summary>
    public LineMeasureOptions Measure { get; init; } = new();

    /// <summary>Most rounds of fitting the continuum again with the fitted lines divided out; 0 for none.</summary>
    public int ContinuumRounds { get; init; } = 3;
}
