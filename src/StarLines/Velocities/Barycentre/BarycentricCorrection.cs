using System;
using System.Collections.Generic;
using StarLines.Velocities.Time;

namespace StarLines.Velocities.Barycentre;

/// <summary>Reduces velocities and times of an observer on the Earth to the barycentre of the solar system.</summary>
/// <remarks>
/// <para>
/// 1 + z_B = γ(1 + β·ρ)/(1 − Φ/c²), β the observer's velocity over c, ρ the direction to the star, Φ/c² = GM_Sun/(r c²) + GM_Earth/(r c²).
/// Source: Wright and Eastman (2014), PASP 126, 838, eq. (28). Accuracy: 1 mm/s; without UT1 − UTC and polar motion 20 mm/s at worst.
/// </para>
/// <para>
/// BJD_TDB = JD_TDB + r·ρ_B/c. Source: Eastman, Siverd and Gaudi (2010), PASP 122, 935. Accuracy: 10 µs.
/// Earth and Sun: JPL DE405; Earth rotation: IAU 2006/2000A; site: WGS 84.
/// </para>
/// </remarks>
public static class BarycentricCorrection
{
    /// <summary>First Julian Date (UTC) that can be reduced, 1960-01-01.</summary>
    public const double FirstJdUtc = LeapSeconds.FirstJdUtc;

    /// <summary>Julian Date (UTC) up to which times can be reduced, 2060-01-01.</summary>
    public const double LastJdUtc = 2_473_459.5;

    private const double LightMetresPerSecond = 1e3 * PhysicalConstants.SpeedOfLightKmPerS;

    // Nominal values of IAU 2015 resolution B3, m³/s².
    private const double SunGm = 1.327_124_4e20;
    private const double EarthGm = 3.986_004e14;

    private const double ShapiroScale = 2.0 * SunGm / (LightMetresPerSecond * LightMetresPerSecond * LightMetresPerSecond);

    private const double Degrees = 180.0 / Math.PI;

    /// <summary>Whether a time lies in the years that can be reduced.</summary>
    /// <param name="utc">The time, Julian Date in UTC.</param>
    public static bool Covers(JulianDate utc) => utc.Value >= FirstJdUtc && utc.Value < LastJdUtc;

    /// <summary>The correction at one time.</summary>
    /// <param name="utc">Mid-exposure, Julian Date in UTC; from 1960 to 2059.</param>
    /// <param name="site">Where the telescope stands.</param>
    /// <param name="star">Where the star is and, where known, how it moves.</param>
    /// <param name="options">Settings, or null for the defaults.</param>
    /// <param name="target">The target's name, carried into the result.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time lies outside the years that can be reduced, or a value is out of range.</exception>
    public static BarycentricResult At(
        JulianDate utc, ObservingSite site, StarAstrometry star, BarycentricOptions? options = null, string target = "")
    {
        ArgumentNullException.ThrowIfNull(site);
        ArgumentNullException.ThrowIfNull(star);
        ArgumentNullException.ThrowIfNull(target);
        options ??= BarycentricOptions.Default;
        Guard.Between(options.Ut1MinusUtcSeconds, -2.0, 2.0, nameof(options.Ut1MinusUtcSeconds), "s");
        if (!Covers(utc))
        {
            throw new ArgumentOutOfRangeException(
                nameof(utc), $"JD {FormattableString.Invariant($"{utc.Value}")} (UTC) lies outside 1960 to 2059, the years of the Earth ephemeris.");
        }

        StarMotion motion = new(star);
        ObserverState observer = new(utc, site, options.Ut1MinusUtcSeconds);
        Vector3 direction = motion.FromObserver(observer.Tdb, observer.Place);
        double lightSeconds = observer.Place.Dot(motion.FromBarycentre(observer.Tdb)) / LightMetresPerSecond;
        double altitude = Degrees * Math.Asin(Math.Clamp(direction.Dot(observer.Zenith), -1.0, 1.0));
        return new BarycentricResult
        {
            Target = target,
            BarycentricJdTdb = observer.Tdb.AddDays((lightSeconds + ExtraDelay(observer, motion, direction, options)) / 86_400.0),
            JdUtc = utc,
            BarycentricRedshift = Redshift(observer, motion, direction, options),
            HeliocentricCorrectionKmPerS = (observer.Velocity - observer.SunVelocity).Dot(direction) / 1e3,
            LightTravelTimeSeconds = lightSeconds,
            AltitudeDegrees = altitude,
            Airmass = AirmassFormula.AtTrueAltitude(altitude),
            Warnings = Remarks(utc, observer, altitude),
        };
    }

    private static double Redshift(
        in ObserverState observer, in StarMotion star, Vector3 direction, BarycentricOptions options)
    {
        Vector3 beta = (1.0 / LightMetresPerSecond) * observer.Velocity;
        double along = beta.Dot(direction);
        double potential = ((SunGm / observer.FromSun.Length) + (EarthGm / observer.FromEarth.Length))
            / (LightMetresPerSecond * LightMetresPerSecond);

        // γ − 1 = (γ² β²)/(γ + 1), and the sum is arranged so that z keeps all its digits.
        double beta2 = beta.Dot(beta);
        double gamma = 1.0 / Math.Sqrt(1.0 - beta2);
        double gammaMinusOne = gamma * gamma * beta2 / (gamma + 1.0);
        double z = (gammaMinusOne + (gamma * along) + potential) / (1.0 - potential);
        if (options.RemovePerspective && star.HasParallax)
        {
            Vector3 own = star.Beta;
            double change = own.Dot(star.AtEpoch - direction) / (1.0 + own.Dot(direction));
            z += change + (z * change);
        }

        if (options.IncludeShapiro)
        {
            double change = ShapiroRate(observer, direction);
            z += change + (z * change);
        }

        return z;
    }

    private static double ExtraDelay(
        in ObserverState observer, in StarMotion star, Vector3 direction, BarycentricOptions options)
    {
        double delay = 0.0;
        if (options.IncludeWavefrontCurvature && star.HasParallax)
        {
            double along = observer.Place.Dot(direction);
            delay -= (observer.Place.Dot(observer.Place) - (along * along)) / (2.0 * star.DistanceMetres * LightMetresPerSecond);
        }

        return options.IncludeShapiro ? delay + ShapiroDelay(observer, direction) : delay;
    }

    // 2GM/c³ ln(1 + cos θ), θ between the star and the observer as seen from the Sun's centre; a constant is left out.
    private static double ShapiroDelay(in ObserverState observer, Vector3 direction) =>
        ShapiroScale * Math.Log(1.0 + (observer.FromSun.Dot(direction) / observer.FromSun.Length));

    private static double ShapiroRate(in ObserverState observer, Vector3 direction)
    {
        Vector3 place = observer.FromSun;
        Vector3 velocity = observer.Velocity - observer.SunVelocity;
        double distance = place.Length;
        double cosine = place.Dot(direction) / distance;
        double rate = (velocity.Dot(direction) - (cosine * place.Dot(velocity) / distance)) / distance;
        return ShapiroScale * rate / (1.0 + cosine);
    }

    private static List<Remark> Remarks(JulianDate utc, in ObserverState observer, double altitudeDegrees)
    {
        var remarks = new List<Remark>();
        if (altitudeDegrees < 0.0)
        {
            remarks.Add(new Remark("below-horizon", FormattableString.Invariant(
                $"The target stood {-altitudeDegrees:0} degrees below the horizon; check coordinates, site (east longitude is positive) and time (UTC).")));
        }

        double sunAltitude = -Degrees * Math.Asin(observer.FromSun.Unit().Dot(observer.Zenith));
        if (sunAltitude > 0.0)
        {
            remarks.Add(new Remark("sun-up", FormattableString.Invariant(
                $"The Sun stood {sunAltitude:0} degrees above the horizon; check that the time is UTC and the longitude positive east.")));
        }

        if (utc.Value >= LeapSeconds.AssumedFromJdUtc)
        {
            remarks.Add(new Remark(
                "leap-seconds-assumed", "No leap second is assumed after 2017; one announced since would move the time by 1 s."));
        }

        return remarks;
    }
}
