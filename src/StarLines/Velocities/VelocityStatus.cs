namespace StarLines.Velocities;

/// <summary>How the measurement of a velocity ended.</summary>
public enum VelocityStatus
{
    /// <summary>Measured.</summary>
    Measured,

    /// <summary>Measured, but not reduced to the barycentre: coordinates, site or time are missing.</summary>
    Topocentric,

    /// <summary>No line of the template lies in the spectrum.</summary>
    OffSpectrum,

    /// <summary>The correlation has no significant peak.</summary>
    NoPeak,

    /// <summary>The measurement failed; the warnings say why.</summary>
    Failed,
}
