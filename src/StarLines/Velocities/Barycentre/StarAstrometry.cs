using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>Where a star is and how it moves, ICRS.</summary>
public sealed record StarAstrometry
{
    /// <summary>Makes a star at a place; its motion is set by the other members.</summary>
    /// <param name="rightAscensionDegrees">Right ascension, ICRS, degrees, 0 to 360 (−360 to 720 is taken too).</param>
    /// <param name="declinationDegrees">Declination, ICRS, degrees, −90 to 90.</param>
    /// <exception cref="ArgumentOutOfRangeException">A coordinate is out of range.</exception>
    public StarAstrometry(double rightAscensionDegrees, double declinationDegrees)
    {
        Guard.Between(rightAscensionDegrees, -360.0, 720.0, nameof(rightAscensionDegrees), "degrees");
        Guard.Between(declinationDegrees, -90.0, 90.0, nameof(declinationDegrees), "degrees");
        RightAscensionDegrees = rightAscensionDegrees;
        DeclinationDegrees = declinationDegrees;
    }

    /// <summary>Right ascension at <see cref="EpochJulianYear"/>, degrees.</summary>
    public double RightAscensionDegrees { get; }

    /// <summary>Declination at <see cref="EpochJulianYear"/>, degrees.</summary>
    public double DeclinationDegrees { get; }

    /// <summary>Proper motion in right ascension, times cos δ, mas/yr.</summary>
    public double ProperMotionRightAscensionMasPerYear { get; init; }

    /// <summary>Proper motion in declination, mas/yr.</summary>
    public double ProperMotionDeclinationMasPerYear { get; init; }

    /// <summary>Parallax, mas; 0 where unknown.</summary>
    public double ParallaxMas { get; init; }

    /// <summary>Systemic radial velocity, km/s, receding positive; it matters only with a parallax.</summary>
    public double RadialVelocityKmPerS { get; init; }

    /// <summary>Epoch of place and motion, Julian year TDB.</summary>
    public double EpochJulianYear { get; init; } = 2000.0;
}
