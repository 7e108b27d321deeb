using System;
using StarLines.Velocities.Time;

namespace StarLines.Velocities.Barycentre;

/// <summary>Times, places and velocities of an observer at one instant; metres and m/s along the axes of the ICRS.</summary>
internal readonly struct ObserverState
{
    private const double SecondsPerDay = 86_400.0;
    private const double LightMetresPerSecond = 1e3 * PhysicalConstants.SpeedOfLightKmPerS;

    internal ObserverState(JulianDate utc, ObservingSite site, double ut1MinusUtcSeconds)
    {
        EarthMotion motion = EarthMotion.Instance;
        Tt = TimeScales.TtFromUtc(utc);
        EarthOrientation orientation = new(Tt, TimeScales.Ut1FromUtc(utc, ut1MinusUtcSeconds));
        Vector3 place = Geodesy.ToGeocentric(site);
        FromEarth = orientation.ToCelestial(place);
        VelocityFromEarth = orientation.VelocityOf(place);
        Zenith = orientation.ToCelestial(Geodesy.Up(site));

        Span<double> clock = stackalloc double[1];
        motion.Clock.Evaluate(Tt, clock);

        // TDB for TT moves the Earth by under 60 m; so the argument of the first look is good enough for its velocity.
        JulianDate tdbAtCentre = Tt.AddDays(clock[0] / SecondsPerDay);
        (Earth, EarthVelocity) = At(motion.Earth, tdbAtCentre);

        // A clock off the centre of the Earth: v·r/c² (Moyer 1981; under 2.2 µs).
        TdbMinusTtSeconds = clock[0] + (EarthVelocity.Dot(FromEarth) / (LightMetresPerSecond * LightMetresPerSecond));
        Tdb = Tt.AddDays(TdbMinusTtSeconds / SecondsPerDay);
        (Sun, SunVelocity) = At(motion.Sun, tdbAtCentre);
    }

    /// <summary>Terrestrial Time.</summary>
    internal JulianDate Tt { get; }

    /// <summary>Barycentric Dynamical Time.</summary>
    internal JulianDate Tdb { get; }

    /// <summary>TDB − TT at the observer, s.</summary>
    internal double TdbMinusTtSeconds { get; }

    /// <summary>The Earth's centre from the barycentre.</summary>
    internal Vector3 Earth { get; }

    /// <summary>Its velocity.</summary>
    internal Vector3 EarthVelocity { get; }

    /// <summary>The Sun's centre from the barycentre.</summary>
    internal Vector3 Sun { get; }

    /// <summary>Its velocity.</summary>
    internal Vector3 SunVelocity { get; }

    /// <summary>The observer from the Earth's centre.</summary>
    internal Vector3 FromEarth { get; }

    /// <summary>Its velocity.</summary>
    internal Vector3 VelocityFromEarth { get; }

    /// <summary>The unit vector to the zenith.</summary>
    internal Vector3 Zenith { get; }

    /// <summary>The observer from the barycentre.</summary>
    internal Vector3 Place => Earth + FromEarth;

    /// <summary>Its velocity.</summary>
    internal Vector3 Velocity => EarthVelocity + VelocityFromEarth;

    /// <summary>The observer from the Sun's centre.</summary>
    internal Vector3 FromSun => Place - Sun;

    private static (Vector3 Place, Vector3 Velocity) At(ChebyshevSeries series, JulianDate tdb)
    {
        Span<double> place = stackalloc double[3];
        Span<double> rate = stackalloc double[3];
        series.Evaluate(tdb, place, rate);
        return (new Vector3(place[0], place[1], place[2]), (1.0 / SecondsPerDay) * new Vector3(rate[0], rate[1], rate[2]));
    }
}
