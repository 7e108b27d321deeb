using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>The turn from axes fixed to the Earth to those of the GCRS at one instant; polar motion is left out (under 1 mm/s).</summary>
/// <remarks>
/// IERS Conventions (2010), chapter 5: [GCRS] = Q(X, Y, s) R₃(−ERA) [Earth], with Q of eq. (5.6) and (5.10), the Earth rotation angle
/// of eq. (5.15); X, Y and s of IAU 2006/2000A.
/// </remarks>
internal readonly struct EarthOrientation
{
    // Rate of the Earth rotation angle, rad/s: 2π · 1.002 737 811 911 354 48 a UT1 day (IERS Conventions, eq. 5.15).
    private const double TurnsPerDay = 1.002_737_811_911_354_48;
    private const double RadPerSecond = 2.0 * Math.PI * TurnsPerDay / 86_400.0;
    private const double TurnsAtJ2000 = 0.779_057_273_264_0;

    private readonly double _x;
    private readonly double _y;
    private readonly double _sin;
    private readonly double _cos;

    internal EarthOrientation(JulianDate tt, JulianDate ut1)
    {
        Span<double> pole = stackalloc double[2];
        Span<double> locator = stackalloc double[1];
        EarthMotion.Instance.Pole.Evaluate(tt, pole);
        EarthMotion.Instance.Locator.Evaluate(tt, locator);
        _x = pole[0];
        _y = pole[1];
        double s = locator[0] - (_x * _y / 2.0);
        (_sin, _cos) = Math.SinCos(RotationAngle(ut1) - s);
    }

    /// <summary>The Earth rotation angle, rad.</summary>
    internal static double RotationAngle(JulianDate ut1)
    {
        // Whole turns are dropped from day and fraction apart, so that no digit is lost.
        double days = ut1.Day - 2_451_545.0;
        double turns = TurnsAtJ2000 + (days % 1.0) + ut1.Fraction + ((TurnsPerDay - 1.0) * (days + ut1.Fraction));
        return 2.0 * Math.PI * (turns - Math.Floor(turns));
    }

    /// <summary>A direction or place fixed to the Earth, along the axes of the GCRS.</summary>
    internal Vector3 ToCelestial(Vector3 earthFixed) => Tilt(Spin(earthFixed));

    /// <summary>The velocity, m/s, of a place fixed to the Earth, m, along the axes of the GCRS.</summary>
    internal Vector3 VelocityOf(Vector3 earthFixed)
    {
        Vector3 spun = Spin(earthFixed);
        return Tilt(new Vector3(-RadPerSecond * spun.Y, RadPerSecond * spun.X, 0.0));
    }

    private Vector3 Spin(Vector3 v) => new((_cos * v.X) - (_sin * v.Y), (_sin * v.X) + (_cos * v.Y), v.Z);

    // The matrix of eq. (5.10) without R₃(s), which Spin holds: a = 1/(1 + Z).
    private Vector3 Tilt(Vector3 v)
    {
        double z = Math.Sqrt(1.0 - (_x * _x) - (_y * _y));
        double a = 1.0 / (1.0 + z);
        return new Vector3(
            ((1.0 - (a * _x * _x)) * v.X) - (a * _x * _y * v.Y) + (_x * v.Z),
            (-a * _x * _y * v.X) + ((1.0 - (a * _y * _y)) * v.Y) + (_y * v.Z),
            (-_x * v.X) - (_y * v.Y) + (z * v.Z));
    }
}
