using System;

namespace StarLines.IO;

/// <summary>Mean positions of other equinoxes brought to J2000.0 (FK5, which is ICRS to 0.02 arcsec).</summary>
internal static class Precession
{
    private const double Degree = Math.PI / 180.0;
    private const double Arcsecond = Degree / 3600.0;

    /// <summary>Brings a position of a Julian equinox to J2000.0.</summary>
    /// <param name="raDegrees">Right ascension, degrees.</param>
    /// <param name="decDegrees">Declination, degrees.</param>
    /// <param name="equinox">Julian year.</param>
    /// <remarks>Angles ζ, z and θ from J2000.0: Lieske et al. (1977), A&amp;A 58, 1 (IAU 1976).</remarks>
    internal static (double RaDegrees, double DecDegrees) FromJulianEquinox(double raDegrees, double decDegrees, double equinox)
    {
        double t = (equinox - 2000.0) / 100.0;
        double zeta = (2306.2181 + ((0.30188 + (0.017998 * t)) * t)) * t * Arcsecond;
        double z = (2306.2181 + ((1.09468 + (0.018203 * t)) * t)) * t * Arcsecond;
        double theta = (2004.3109 + ((-0.42665 - (0.041833 * t)) * t)) * t * Arcsecond;
        return RotateBack(raDegrees, decDegrees, zeta, z, theta);
    }

    /// <summary>Brings a position of a Besselian equinox in FK4 to J2000.0 (FK5), for a star without proper motion in FK5.</summary>
    /// <param name="raDegrees">Right ascension, degrees.</param>
    /// <param name="decDegrees">Declination, degrees.</param>
    /// <param name="equinox">Besselian year, such as 1950.</param>
    /// <param name="epoch">Besselian year of the observation of the position.</param>
    /// <remarks>
    /// E-terms of aberration are removed and the position and its fictitious motion rotated by the matrix of
    /// Standish (1982), A&amp;A 115, 20, and Aoki et al. (1983), A&amp;A 128, 263, as in Seidelmann (ed., 1992),
    /// Explanatory Supplement, section 3.59. Equinoxes other than B1950 are first brought there by Newcomb's precession.
    /// </remarks>
    internal static (double RaDegrees, double DecDegrees) FromBesselianEquinox(
        double raDegrees, double decDegrees, double equinox, double epoch = 1950.0)
    {
        if (Math.Abs(equinox - 1950.0) > 1e-3)
        {
            (raDegrees, decDegrees) = NewcombToB1950(raDegrees, decDegrees, equinox);
        }

        Span<double> r0 = stackalloc double[3];
        ToVector(raDegrees, decDegrees, r0);
        const double PerCentury = 100.0 / Arcsecond;
        double w = (epoch - 1950.0) / PerCentury;
        Span<double> p = stackalloc double[3];
        double dot = 0.0;
        for (int i = 0; i < 3; i++)
        {
            p[i] = ETerms[i] + (w * ETermRates[i]);
            dot += r0[i] * p[i];
        }

        for (int i = 0; i < 3; i++)
        {
            p[i] = r0[i] - p[i] + (dot * r0[i]);
        }

        // Besselian to Julian epoch, in centuries after J2000.0.
        double julianDate = 2_415_020.313_52 + ((epoch - 1900.0) * 365.242_198_781);
        double centuries = ((julianDate - 2_451_545.0) / 365.25) / PerCentury;
        Span<double> position = stackalloc double[3];
        for (int i = 0; i < 3; i++)
        {
            for (int j = 0; j < 3; j++)
            {
                position[i] += (Rotation[(3 * i) + j] + (centuries * Motion[(3 * i) + j])) * p[j];
            }
        }

        return FromVector(position);
    }

    private static readonly double[] ETerms = [-1.62557e-6, -0.31919e-6, -0.13843e-6];

    private static readonly double[] ETermRates = [1.245e-3, -1.580e-3, -0.659e-3];

    private static readonly double[] Rotation =
    [
        0.9999256782, -0.0111820611, -0.0048579477,
        0.0111820610, 0.9999374784, -0.0000271765,
        0.0048579479, -0.0000271474, 0.9999881997,
    ];

    /// <summary>Motion in arcsec a century of the FK4 frame in FK5.</summary>
    private static readonly double[] Motion =
    [
        -0.000551, -0.238565, 0.435739,
        0.238514, -0.002667, -0.008541,
        -0.435623, 0.012254, 0.002117,
    ];

    /// <summary>Newcomb's precession in the form of Kinoshita (1975), SAO Special Report 364; tropical centuries.</summary>
    private static (double RaDegrees, double DecDegrees) NewcombToB1950(double raDegrees, double decDegrees, double equinox)
    {
        double start = (1950.0 - 1850.0) / 100.0;
        double t = (equinox - 1950.0) / 100.0;
        double w = 2303.5548 + ((1.39720 + (0.000060 * start)) * start);
        double zeta = (w + ((0.30242 - (0.000269 * start) + (0.017996 * t)) * t)) * t * Arcsecond;
        double z = (w + ((1.09478 + (0.000387 * start) + (0.018324 * t)) * t)) * t * Arcsecond;
        double theta = (2005.1125 + ((-0.85294 - (0.000365 * start)) * start)
            + ((-0.42647 - (0.000365 * start) - (0.041802 * t)) * t)) * t * Arcsecond;
        return RotateBack(raDegrees, decDegrees, zeta, z, theta);
    }

    /// <summary>The inverse of R_z(−z) R_y(θ) R_z(−ζ).</summary>
    private static (double RaDegrees, double DecDegrees) RotateBack(double raDegrees, double decDegrees, double zeta, double z, double theta)
    {
        double a = (raDegrees * Degree) - z;
        double d = decDegrees * Degree;
        double x = (Math.Cos(theta) * Math.Cos(d) * Math.Cos(a)) + (Math.Sin(theta) * Math.Sin(d));
        double y = Math.Cos(d) * Math.Sin(a);
        double up = (-Math.Sin(theta) * Math.Cos(d) * Math.Cos(a)) + (Math.Cos(theta) * Math.Sin(d));
        double ra = (Math.Atan2(y, x) - zeta) / Degree;
        return (ra - (360.0 * Math.Floor(ra / 360.0)), Math.Atan2(up, Math.Sqrt((x * x) + (y * y))) / Degree);
    }

    private static void ToVector(double raDegrees, double decDegrees, Span<double> vector)
    {
        (double sinDec, double cosDec) = Math.SinCos(decDegrees * Degree);
        (double sinRa, double cosRa) = Math.SinCos(raDegrees * Degree);
        vector[0] = cosDec * cosRa;
        vector[1] = cosDec * sinRa;
        vector[2] = sinDec;
    }

    private static (double RaDegrees, double DecDegrees) FromVector(ReadOnlySpan<double> vector)
    {
        double ra = Math.Atan2(vector[1], vector[0]) / Degree;
        double dec = Math.Atan2(vector[2], Math.Sqrt((vector[0] * vector[0]) + (vector[1] * vector[1]))) / Degree;
        return (ra < 0.0 ? ra + 360.0 : ra, dec);
    }
}
