using System;

namespace StarLines.Velocities;

/// <summary>
/// Wavelengths in standard air and in vacuum: λ_air = λ_vac/n, standard air being dry, 15 °C, 101 325 Pa, 450 ppm CO₂.
/// </summary>
/// <remarks>
/// 10⁸(n − 1) = 5 792 105/(238.0185 − s²) + 167 917/(57.362 − s²), s = 10⁴/λ_vac in µm⁻¹: s belongs to the
/// wavelength in vacuum; the one in air, put there by mistake, is wrong by up to 15 m/s at 2000 Å.
/// Source: Ciddor (1996), Applied Optics 35, 1566, eq. (1), checked there from 3000 to 16 900 Å and used beyond for want of better.
/// The formula of the FITS spectral paper for air wavelengths (Greisen et al. 2006, eq. 65) belongs to 0 °C, 4 to 5 km/s away from
/// what spectrographs call air, and is not used.
/// The air stands at the telescope; a spectrum shifted by 30 km/s before it is converted is wrong by less than 1 m/s.
/// </remarks>
public static class AirVacuum
{
    /// <summary>Shortest wavelength that can be converted, Å: air is opaque below (common practice, no source).</summary>
    public const double MinimumAngstrom = 1850.0;

    /// <summary>Longest wavelength that can be converted, Å: 1 mm, where n − 1 has long been constant.</summary>
    public const double MaximumAngstrom = 1.0e7;

    // Below 1 part in 10¹⁶ after four steps: each step gains the factor λ dn/dλ, under 10⁻⁴.
    private const int InverseSteps = 5;

    /// <summary>The refractivity n − 1 of standard air.</summary>
    /// <param name="vacuumAngstrom">Wavelength in vacuum, Å.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is out of range.</exception>
    public static double Refractivity(double vacuumAngstrom)
    {
        Check(vacuumAngstrom, nameof(vacuumAngstrom));
        return RefractivityAt(vacuumAngstrom);
    }

    /// <summary>The wavelength in standard air of a wavelength in vacuum, Å.</summary>
    /// <param name="vacuumAngstrom">Wavelength in vacuum, Å.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is out of range.</exception>
    public static double ToAirAngstrom(double vacuumAngstrom)
    {
        Check(vacuumAngstrom, nameof(vacuumAngstrom));
        return vacuumAngstrom / (1.0 + RefractivityAt(vacuumAngstrom));
    }

    /// <summary>The wavelength in vacuum of a wavelength in standard air, Å: the exact inverse, by iteration.</summary>
    /// <param name="airAngstrom">Wavelength in air, Å.</param>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is out of range.</exception>
    public static double ToVacuumAngstrom(double airAngstrom)
    {
        Check(airAngstrom, nameof(airAngstrom));
        return Invert(airAngstrom);
    }

    /// <summary>Converts wavelengths in vacuum to wavelengths in standard air.</summary>
    /// <param name="vacuumAngstrom">Wavelengths in vacuum, Å; N values.</param>
    /// <param name="airAngstrom">Receives the wavelengths in air, Å; N values; may be the same memory.</param>
    /// <exception cref="ArgumentException">The lengths differ, or a wavelength is out of range.</exception>
    public static void ToAir(ReadOnlySpan<double> vacuumAngstrom, Span<double> airAngstrom)
    {
        Guard.SameLength(airAngstrom.Length, vacuumAngstrom.Length, nameof(airAngstrom));
        CheckAll(vacuumAngstrom, nameof(vacuumAngstrom));
        for (int i = 0; i < vacuumAngstrom.Length; i++)
        {
            airAngstrom[i] = vacuumAngstrom[i] / (1.0 + RefractivityAt(vacuumAngstrom[i]));
        }
    }

    /// <summary>Converts wavelengths in standard air to wavelengths in vacuum.</summary>
    /// <param name="airAngstrom">Wavelengths in air, Å; N values.</param>
    /// <param name="vacuumAngstrom">Receives the wavelengths in vacuum, Å; N values; may be the same memory.</param>
    /// <exception cref="ArgumentException">The lengths differ, or a wavelength is out of range.</exception>
    public static void ToVacuum(ReadOnlySpan<double> airAngstrom, Span<double> vacuumAngstrom)
    {
        Guard.SameLength(vacuumAngstrom.Length, airAngstrom.Length, nameof(vacuumAngstrom));
        CheckAll(airAngstrom, nameof(airAngstrom));
        for (int i = 0; i < airAngstrom.Length; i++)
        {
            vacuumAngstrom[i] = Invert(airAngstrom[i]);
        }
    }

    /// <summary>One wavelength from one medium to another.</summary>
    /// <param name="wavelengthAngstrom">Wavelength, Å, in medium <paramref name="from"/>.</param>
    /// <param name="from">Air or vacuum.</param>
    /// <param name="to">Air or vacuum.</param>
    /// <returns>The wavelength in medium <paramref name="to"/>, Å.</returns>
    /// <exception cref="ArgumentException">A medium is unknown, or the wavelength is out of range.</exception>
    public static double ConvertAngstrom(double wavelengthAngstrom, Medium from, Medium to)
    {
        CheckKnown(from, nameof(from));
        CheckKnown(to, nameof(to));
        return from == to ? wavelengthAngstrom
            : to == Medium.Air ? ToAirAngstrom(wavelengthAngstrom)
            : ToVacuumAngstrom(wavelengthAngstrom);
    }

    /// <summary>A scale converted to another medium; the pixels stay where they are.</summary>
    /// <param name="scale">The scale; its medium must be known.</param>
    /// <param name="to">Air or vacuum.</param>
    /// <returns>The same scale where its medium is the one asked for, else a tabulated one.</returns>
    /// <exception cref="ArgumentException">A medium is unknown, or a wavelength is out of range.</exception>
    public static WavelengthScale Convert(WavelengthScale scale, Medium to)
    {
        ArgumentNullException.ThrowIfNull(scale);
        CheckKnown(scale.Medium, nameof(scale));
        CheckKnown(to, nameof(to));
        if (scale.Medium == to)
        {
            return scale;
        }

        var converted = new double[scale.Count];
        if (to == Medium.Air)
        {
            ToAir(scale.WavelengthsAngstrom, converted);
        }
        else
        {
            ToVacuum(scale.WavelengthsAngstrom, converted);
        }

        return WavelengthScale.FromOwned(converted, to, scale.Frame);
    }

    private static double RefractivityAt(double vacuumAngstrom)
    {
        double s = 1.0e4 / vacuumAngstrom;
        double s2 = s * s;
        return 1.0e-8 * ((5_792_105.0 / (238.0185 - s2)) + (167_917.0 / (57.362 - s2)));
    }

    // λ_vac = λ_air n(λ_vac), solved by fixed-point iteration.
    private static double Invert(double airAngstrom)
    {
        double vacuum = airAngstrom;
        for (int step = 0; step < InverseSteps; step++)
        {
            vacuum = airAngstrom * (1.0 + RefractivityAt(vacuum));
        }

        return vacuum;
    }

    private static void Check(double wavelengthAngstrom, string parameter) =>
        Guard.Between(wavelengthAngstrom, MinimumAngstrom, MaximumAngstrom, parameter, "Å");

    private static void CheckAll(ReadOnlySpan<double> wavelengthsAngstrom, string parameter)
    {
        foreach (double wavelength in wavelengthsAngstrom)
        {
            Check(wavelength, parameter);
        }
    }

    private static void CheckKnown(Medium medium, string parameter)
    {
        if (medium == Medium.Unknown)
        {
            throw new ArgumentException("The medium is unknown; state air or vacuum.", parameter);
        }
    }
}
