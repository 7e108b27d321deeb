using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>A star in uniform space motion; directions from the barycentre and from an observer.</summary>
/// <remarks>
/// Linear motion in space: ρ ∝ r₀ + t(μ + μ_r r₀) − ϖ r_observer, with μ_r = v_r ϖ and t counted from the epoch at the barycentre,
/// so that the light time across the observer's orbit belongs to t. Source: Wright and Eastman (2014), PASP 126, 838, section 3.
/// </remarks>
internal readonly struct StarMotion
{
    private const double RadPerMas = Math.PI / (180.0 * 3600.0e3);
    private const double DaysPerYear = 365.25;
    private const double SecondsPerDay = 86_400.0;
    private const double J2000 = 2_451_545.0;

    private readonly Vector3 _velocityRadPerYear;
    private readonly double _epochJd;
    private readonly double _parallaxRad;

    internal StarMotion(StarAstrometry star)
    {
        Guard.Finite(star.ProperMotionRightAscensionMasPerYear, nameof(star.ProperMotionRightAscensionMasPerYear), "mas/yr");
        Guard.Finite(star.ProperMotionDeclinationMasPerYear, nameof(star.ProperMotionDeclinationMasPerYear), "mas/yr");
        Guard.Between(star.ParallaxMas, 0.0, 1.0e4, nameof(star.ParallaxMas), "mas");
        Guard.Between(star.RadialVelocityKmPerS, -1.0e5, 1.0e5, nameof(star.RadialVelocityKmPerS), "km/s");
        Guard.Between(star.EpochJulianYear, 1800.0, 2200.0, nameof(star.EpochJulianYear), "yr");
        (double sinRa, double cosRa) = Math.SinCos(star.RightAscensionDegrees * (Math.PI / 180.0));
        (double sinDec, double cosDec) = Math.SinCos(star.DeclinationDegrees * (Math.PI / 180.0));
        AtEpoch = new Vector3(cosDec * cosRa, cosDec * sinRa, sinDec);
        Vector3 east = new(-sinRa, cosRa, 0.0);
        Vector3 north = new(-sinDec * cosRa, -sinDec * sinRa, cosDec);
        Vector3 across = ((RadPerMas * star.ProperMotionRightAscensionMasPerYear) * east)
            + ((RadPerMas * star.ProperMotionDeclinationMasPerYear) * north);
        _parallaxRad = RadPerMas * star.ParallaxMas;
        _epochJd = J2000 + ((star.EpochJulianYear - 2000.0) * DaysPerYear);
        double auPerYear = 1e3 * star.RadialVelocityKmPerS * DaysPerYear * SecondsPerDay / PhysicalConstants.AstronomicalUnitMetres;
        _velocityRadPerYear = across + ((auPerYear * _parallaxRad) * AtEpoch);
    }

    /// <summary>The unit vector towards the star at the epoch.</summary>
    internal Vector3 AtEpoch { get; }

    /// <summary>Whether the distance is known.</summary>
    internal bool HasParallax => _parallaxRad > 0.0;

    /// <summary>Distance, m; infinite without a parallax.</summary>
    internal double DistanceMetres => PhysicalConstants.AstronomicalUnitMetres / _parallaxRad;

    /// <summary>Velocity in space over c; only with a parallax.</summary>
    internal Vector3 Beta =>
        (DistanceMetres / (DaysPerYear * SecondsPerDay * 1e3 * PhysicalConstants.SpeedOfLightKmPerS)) * _velocityRadPerYear;

    /// <summary>The unit vector towards the star from the barycentre.</summary>
    internal Vector3 FromBarycentre(JulianDate tdb) => (AtEpoch + (Years(tdb, 0.0) * _velocityRadPerYear)).Unit();

    /// <summary>The unit vector towards the star from an observer.</summary>
    /// <param name="tdb">When the light arrives at the observer.</param>
    /// <param name="observerMetres">The observer's place from the barycentre, m.</param>
    internal Vector3 FromObserver(JulianDate tdb, Vector3 observerMetres)
    {
        double lightSeconds = observerMetres.Dot(AtEpoch) / (1e3 * PhysicalConstants.SpeedOfLightKmPerS);
        Vector3 parallax = (_parallaxRad / PhysicalConstants.AstronomicalUnitMetres) * observerMetres;
        return (AtEpoch + (Years(tdb, lightSeconds) * _velocityRadPerYear) - parallax).Unit();
    }

    private double Years(JulianDate tdb, double lightSeconds) =>
        ((tdb.Day - _epochJd) + tdb.Fraction + (lightSeconds / SecondsPerDay)) / DaysPerYear;
}
