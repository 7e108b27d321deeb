namespace StarLines.Continuum;

/// <summary>Settings of the continuum fit.</summary>
public sealed record ContinuumOptions
{
    /// <summary>The defaults.</summary>
    public static ContinuumOptions Default { get; } = new();

    /// <summary>
    /// The length over which the continuum may bend, Å: a wave of this length is followed to one half. Null lets the data choose.
    /// </summary>
    public double? StiffnessAngstrom { get; init; }

    /// <summary>
    /// Shortest stiffness the data may choose, Å; null for the larger of 1/30 of the range, 100 pixels and 6000 km/s.
    /// </summary>
    public double? ShortestStiffnessAngstrom { get; init; }

    /// <summary>Expected velocity of the star, km/s, by which broad Balmer lines are looked for.</summary>
    public double VelocityKmPerS { get; init; }

    /// <summary>Whether broad Balmer wings are looked for and left out.</summary>
    public bool ExcludeBroadBalmerWings { get; init; } = true;
}
