using System.Collections.Generic;
using StarLines.IO;
using StarLines.Plotting;
using StarLines.Profiles;

namespace StarLines.Runs;

/// <summary>What a run does: its inputs and every setting. <see cref="Plans.PlanFile"/> reads and writes it as TOML.</summary>
public sealed record RunPlan
{
    /// <summary>Inputs in order: files (also <c>FILE#HDU:ROW</c>), folders, patterns with * and ?, and manifests (CSV or ECSV with a column <c>file</c>).</summary>
    public IReadOnlyList<string> Inputs { get; init; } = [];

    /// <summary>Folder of the results; not part of the plan's file.</summary>
    public string OutputFolder { get; init; } = "";

    /// <summary>How many inputs are worked on at a time; it changes no result and is not part of the plan's file.</summary>
    public int Jobs { get; init; } = 1;

    /// <summary>The steps.</summary>
    public RunSteps Steps { get; init; } = RunSteps.All;

    /// <summary>Format of the tables.</summary>
    public RunTableFormat Format { get; init; } = RunTableFormat.Ecsv;

    /// <summary>Whether the table of spectra says how long each input took; then no two runs give the same bytes.</summary>
    public bool TimesInTable { get; init; }

    /// <summary>What is said of all inputs; a manifest may say more of each.</summary>
    public SpectrumReadOptions Reading { get; init; } = SpectrumReadOptions.Default;

    /// <summary>Ranges that nothing uses, in the medium and frame of the spectra.</summary>
    public IReadOnlyList<WavelengthRange> Exclude { get; init; } = [];

    /// <summary>Whether cosmic-ray hits and dead pixels are looked for and left out.</summary>
    public bool FindOutliers { get; init; } = true;

    /// <summary>Stiffness of the continuum, Å; null to let the data choose.</summary>
    public double? StiffnessAngstrom { get; init; }

    /// <summary>Templates: <c>balmer</c>, <c>metal</c>, <c>both</c> (all three rows), or names or paths of line lists.</summary>
    public IReadOnlyList<string> Templates { get; init; } = ["both"];

    /// <summary>Velocities are looked for within plus and minus this, km/s.</summary>
    public double SearchHalfRangeKmPerS { get; init; } = 1000.0;

    /// <summary>Line lists to be measured, by name or path.</summary>
    public IReadOnlyList<string> LineLists { get; init; } = ["balmer", "metals-fgk"];

    /// <summary>Velocity by which the line lists are shifted, km/s; null to take the measured one.</summary>
    public double? LineVelocityKmPerS { get; init; }

    /// <summary>Shape of the fitted profiles.</summary>
    public ProfileShape Profile { get; init; } = ProfileShape.Gaussian;

    /// <summary>Whether a pixel is the mean over its width or the value at its centre.</summary>
    public PixelSampling Sampling { get; init; } = PixelSampling.Integrated;

    /// <summary>Format of the figures.</summary>
    public FigureFormat FigureFormat { get; init; } = FigureFormat.Png;

    /// <summary>Largest number of lines of a spectrum that get a panel, the most significant ones; 0 for all.</summary>
    public int LinePanels { get; init; } = 12;
}
