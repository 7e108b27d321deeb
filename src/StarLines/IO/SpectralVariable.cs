using System;
using StarLines.Velocities;

namespace StarLines.IO;

/// <summary>
/// A spectral coordinate of the FITS standard as a function of vacuum wavelength, with derivative and inverse, all in SI units.
/// Source: Greisen, Calabretta, Valdes &amp; Allen (2006), A&amp;A 446, 747, tables 1 to 3.
/// Air is standard air by Ciddor (1996), not equation (65) of that paper, which describes air at 0 °C.
/// </summary>
/// <param name="Type">FREQ, AFRQ, ENER, WAVN, VRAD, WAVE, VOPT, ZOPT, AWAV, VELO or BETA.</param>
/// <param name="RestMetres">Rest wavelength in vacuum, m; NaN where the type needs none.</param>
internal readonly record struct SpectralVariable(string Type, double RestMetres)
{
    private const double C = PhysicalConstants.SpeedOfLightKmPerS * 1000.0;
    private const double H = PhysicalConstants.PlanckJouleSeconds;

    /// <summary>Step of the derivative of the refractive index, relative to the wavelength: truncation and rounding both stay under 1e-12.</summary>
    private const double RelativeStep = 1e-4;

    /// <summary>The coordinate at a vacuum wavelength.</summary>
    internal double FromVacuum(double metres) => Type switch
    {
        "FREQ" => C / metres,
        "AFRQ" => 2.0 * Math.PI * C / metres,
        "ENER" => H * C / metres,
        "WAVN" => 1.0 / metres,
        "VRAD" => C * (1.0 - (RestMetres / metres)),
        "WAVE" => metres,
        "VOPT" => C * ((metres / RestMetres) - 1.0),
        "ZOPT" => (metres / RestMetres) - 1.0,
        "AWAV" => AirVacuum.ToAirAngstrom(metres * 1e10) * 1e-10,
        "VELO" => C * Beta(metres),
        "BETA" => Beta(metres),
        _ => double.NaN,
    };

    /// <summary>The vacuum wavelength of a coordinate, m.</summary>
    internal double ToVacuum(double value) => Type switch
    {
        "FREQ" => C / value,
        "AFRQ" => 2.0 * Math.PI * C / value,
        "ENER" => H * C / value,
        "WAVN" => 1.0 / value,
        "VRAD" => RestMetres / (1.0 - (value / C)),
        "WAVE" => value,
        "VOPT" => RestMetres * (1.0 + (value / C)),
        "ZOPT" => RestMetres * (1.0 + value),
        "AWAV" => AirVacuum.ToVacuumAngstrom(value * 1e10) * 1e-10,
        "VELO" => RestMetres * Math.Sqrt((1.0 + (value / C)) / (1.0 - (value / C))),
        "BETA" => RestMetres * Math.Sqrt((1.0 + value) / (1.0 - value)),
        _ => double.NaN,
    };

    /// <summary>Change of the coordinate a metre of vacuum wavelength.</summary>
    internal double Derivative(double metres) => Type switch
    {
        "FREQ" => -C / (metres * metres),
        "AFRQ" => -2.0 * Math.PI * C / (metres * metres),
        "ENER" => -H * C / (metres * metres),
        "WAVN" => -1.0 / (metres * metres),
        "VRAD" => C * RestMetres / (metres * metres),
        "WAVE" => 1.0,
        "VOPT" => C / RestMetres,
        "ZOPT" => 1.0 / RestMetres,
        "AWAV" => AirDerivative(metres),
        "VELO" => C * BetaDerivative(metres),
        "BETA" => BetaDerivative(metres),
        _ => double.NaN,
    };

    /// <summary>v/c of the relativistic Doppler formula, (λ² − λ₀²)/(λ² + λ₀²).</summary>
    private double Beta(double metres)
    {
        double q = metres / RestMetres;
        return ((q * q) - 1.0) / ((q * q) + 1.0);
    }

    private double BetaDerivative(double metres)
    {
        double q = metres / RestMetres;
        double sum = (q * q) + 1.0;
        return 4.0 * q / (sum * sum) / RestMetres;
    }

    /// <summary>d(λ/n)/dλ = (n − λ dn/dλ)/n².</summary>
    private static double AirDerivative(double metres)
    {
        double angstrom = metres * 1e10;
        double step = RelativeStep * angstrom;
        double slope = (AirVacuum.Refractivity(angstrom + step) - AirVacuum.Refractivity(angstrom - step)) / (2.0 * RelativeStep);
        double n = 1.0 + AirVacuum.Refractivity(angstrom);
        return (n - slope) / (n * n);
    }
}
