using StarLines.Profiles;

namespace StarLines.Lines;

/// <summary>How lines are measured.</summary>
public sealed record LineMeasureOptions
{
    /// <summary>Velocity that shifts the rest wavelengths of the list into the frame of the spectrum, km/s, receding positive.</summary>
    public double VelocityKmPerS { get; init; }

    /// <summary>The shape that is fitted.</summary>
    public ProfileShape Profile { get; init; } = ProfileShape.Gaussian;

    /// <summary>What the flux of a pixel stands for.</summary>
    public PixelSampling Sampling { get; init; } = PixelSampling.Integrated;

    /// <summary>Resolving power λ/FWHM of the instrument; null takes that of the spectrum's metadata, where there is one.</summary>
    public double? ResolvingPower { get; init; }

    /// <summary>Significance, in standard deviations, below which a line becomes a limit; above 0.</summary>
    public double DetectionSignificance { get; init; } = 3.0;

    /// <summary>Half of the fitted window in units of the line's full width at half maximum; 1 to 20.</summary>
    public double WindowHalfWidthFwhm { get; init; } = 2.5;

    /// <summary>How far the centre may lie from its prediction, in units of the expected full width at half maximum; above 0.</summary>
    public double SearchFwhm { get; init; } = 1.0;

    /// <summary>Whether the local continuum is part of the fit, with the global one and its uncertainty as prior; if not, the global one is taken as exact.</summary>
    public bool IncludeContinuumError { get; init; } = true;

    /// <summary>Whether the uncertainties of the spectrum were estimated from its flux, which the lines then say.</summary>
    public bool NoiseFromFlux { get; init; }
}
