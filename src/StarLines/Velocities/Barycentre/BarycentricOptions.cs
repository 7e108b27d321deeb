namespace StarLines.Velocities.Barycentre;

/// <summary>Settings of <see cref="BarycentricCorrection"/>.</summary>
public sealed record BarycentricOptions
{
    /// <summary>The defaults.</summary>
    public static BarycentricOptions Default { get; } = new();

    /// <summary>UT1 − UTC, seconds; left at 0 the velocity is off by at most 0.34 mm/s for each 0.01 s.</summary>
    public double Ut1MinusUtcSeconds { get; init; }

    /// <summary>
    /// Whether to take out also the change of the star's own radial velocity by its motion across the sky; it needs parallax, proper
    /// motion and radial velocity of the star. The result refers to the line of sight at the star's epoch.
    /// </summary>
    public bool RemovePerspective { get; init; }

    /// <summary>Whether to take out the Sun's Shapiro delay: in the velocity at most 0.03 m/s, in the time 0.07 ms.</summary>
    public bool IncludeShapiro { get; init; }

    /// <summary>Whether the time also allows for the curvature of the wave front of a star with a parallax (under 1 ms).</summary>
    public bool IncludeWavefrontCurvature { get; init; }
}
