namespace StarLines.Velocities;

/// <summary>How a velocity is searched and measured.</summary>
public sealed record VelocityOptions
{
    /// <summary>Velocities from minus to plus this are searched, km/s; 10 to 10 000.</summary>
    public double SearchHalfRangeKmPerS { get; init; } = 1000.0;

    /// <summary>Resolving power λ/FWHM of the instrument; NaN to take that of the spectrum's metadata.</summary>
    public double ResolvingPower { get; init; } = double.NaN;

    /// <summary>Probability that noise alone gives a peak taken for a star; above 0, below 1.</summary>
    public double FalseAlarmProbability { get; init; } = 1e-3;

    /// <summary>What wavelengths are taken for where neither spectrum nor template says.</summary>
    public Medium AssumedMedium { get; init; } = Medium.Air;

    /// <summary>Whether a second star is looked for.</summary>
    public bool SecondComponent { get; init; } = true;
}
