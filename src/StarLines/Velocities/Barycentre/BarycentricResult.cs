using System.Collections.Generic;

namespace StarLines.Velocities.Barycentre;

/// <summary>The reduction of one exposure to the barycentre of the solar system; the members are the columns of the table.</summary>
public sealed record BarycentricResult
{
    /// <summary>The target's name, or an empty string.</summary>
    public string Target { get; init; } = "";

    /// <summary>Barycentric Julian Date of mid-exposure, TDB.</summary>
    public required JulianDate BarycentricJdTdb { get; init; }

    /// <summary>Mid-exposure, Julian Date in UTC.</summary>
    public required JulianDate JdUtc { get; init; }

    /// <summary>z_B, so that (1 + z_true) = (1 + z_measured)(1 + z_B).</summary>
    public required double BarycentricRedshift { get; init; }

    /// <summary>c z_B, km/s.</summary>
    public double CorrectionKmPerS => PhysicalConstants.SpeedOfLightKmPerS * BarycentricRedshift;

    /// <summary>Velocity of the observer from the Sun along the line of sight, km/s, to be added to the measured velocity.</summary>
    public required double HeliocentricCorrectionKmPerS { get; init; }

    /// <summary>Light travel time from the observer to the plane of the barycentre, seconds; added to TDB it gives the barycentric date.</summary>
    public required double LightTravelTimeSeconds { get; init; }

    /// <summary>Height of the target over the horizon without refraction, degrees.</summary>
    public required double AltitudeDegrees { get; init; }

    /// <summary>Relative air mass; NaN below the horizon.</summary>
    public required double Airmass { get; init; }

    /// <summary>Reservations: <c>below-horizon</c>, <c>sun-up</c>, <c>leap-seconds-assumed</c>.</summary>
    public IReadOnlyList<Remark> Warnings { get; init; } = [];

    /// <summary>A velocity as the telescope saw it reduced to the barycentre, km/s.</summary>
    /// <param name="topocentricKmPerS">The measured velocity, km/s, by the relativistic Doppler formula.</param>
    public double ApplyKmPerS(double topocentricKmPerS) =>
        Doppler.VelocityOfRedshiftKmPerS(ApplyToRedshift(Doppler.Redshift(topocentricKmPerS)));

    /// <summary>A measured redshift reduced to the barycentre.</summary>
    /// <param name="redshift">The measured redshift.</param>
    public double ApplyToRedshift(double redshift) => redshift + BarycentricRedshift + (redshift * BarycentricRedshift);
}
