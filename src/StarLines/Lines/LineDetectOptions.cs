namespace StarLines.Lines;

/// <summary>How lines are looked for where there is no list.</summary>
public sealed record LineDetectOptions
{
    /// <summary>Velocity by which the lines found are shifted back to rest, km/s, receding positive.</summary>
    public double VelocityKmPerS { get; init; }

    /// <summary>Least significance of a line, standard deviations; above 0. Noise alone gives one false line in some 50 spectra of 20 000 pixels at 5.</summary>
    public double DetectionSignificance { get; init; } = 5.0;

    /// <summary>Resolving power λ/FWHM of the instrument; null takes that of the spectrum's metadata, where there is one.</summary>
    public double? ResolvingPower { get; init; }

    /// <summary>Widest line that is looked for, full width at half maximum, km/s; above 0.</summary>
    public double WidestKmPerS { get; init; } = 500.0;
}
