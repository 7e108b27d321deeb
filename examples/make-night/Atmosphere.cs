using System;
using System.Collections.Generic;
using StarLines.LineLists;

namespace StarLines.Examples.MakeNight;

/// <summary>
/// How strong a line is in a star: one layer in thermal equilibrium, abundances like those of the Sun.
/// Enough to make lines come and go with temperature as they do in the sky; not a model atmosphere.
/// </summary>
internal sealed class Atmosphere
{
    // Logarithmic solar abundances, H = 12, and ionization energies in eV: rounded textbook values.
    private static readonly Dictionary<string, (double Abundance, double FirstEv, double SecondEv, double WeightAmu)> Elements =
        new(StringComparer.Ordinal)
        {
            ["He"] = (10.93, 24.59, 54.42, 4),
            ["C"] = (8.43, 11.26, 24.38, 12),
            ["N"] = (7.83, 14.53, 29.60, 14),
            ["O"] = (8.69, 13.62, 35.12, 16),
            ["Na"] = (6.24, 5.14, 47.29, 23),
            ["Mg"] = (7.60, 7.65, 15.04, 24),
            ["Si"] = (7.51, 8.15, 16.35, 28),
            ["Ca"] = (6.34, 6.11, 11.87, 40),
            ["Sc"] = (3.15, 6.56, 12.80, 45),
            ["Ti"] = (4.95, 6.83, 13.58, 48),
            ["V"] = (3.93, 6.75, 14.62, 51),
            ["Cr"] = (5.64, 6.77, 16.49, 52),
            ["Mn"] = (5.43, 7.43, 15.64, 55),
            ["Fe"] = (7.50, 7.90, 16.19, 56),
            ["Ni"] = (6.22, 7.64, 18.17, 59),
            ["Ba"] = (2.18, 5.21, 10.00, 137),
        };

    /// <summary>Puts Fe I 6065.48 of a star like the Sun near 110 mÅ.</summary>
    private const double ColumnLog = -1.75;

    /// <summary>Turbulence, km/s.</summary>
    private const double TurbulenceKmPerS = 1.4;

    private readonly double _temperature;
    private readonly double _electronPressureLog;

    public Atmosphere(double temperatureKelvin, double surfaceGravityLog)
    {
        _temperature = temperatureKelvin;

        // Electron pressure of the layer where lines form, dyn/cm²: rises with temperature and gravity.
        _electronPressureLog = 1.2 + (11.0 * Math.Log10(temperatureKelvin / 5800.0)) + (0.4 * (surfaceGravityLog - 4.4));
    }

    /// <summary>Optical depth at the centre of a line before any broadening by the instrument.</summary>
    public double CentralOpticalDepth(RestLine line)
    {
        string[] parts = line.Species.Split(' ');
        if (parts.Length != 2 || !Elements.TryGetValue(parts[0], out var element) || !double.IsFinite(line.LogGf)
            || !double.IsFinite(line.LowerEnergyEv))
        {
            return 0.0;
        }

        double theta = 5040.0 / _temperature;
        double strength = element.Abundance + line.LogGf - (theta * line.LowerEnergyEv)
            + StageFractionLog(parts[1], element.FirstEv, element.SecondEv)
            + Math.Log10(line.WavelengthAngstrom / 5500.0)
            - ContinuousOpacityLog();
        return Math.Pow(10.0, strength + ColumnLog) / DopplerKmPerS(line.Species);
    }

    /// <summary>Doppler width of a species, km/s: √(2kT/m) and turbulence.</summary>
    public double DopplerKmPerS(string species)
    {
        double amu = Elements.TryGetValue(species.Split(' ')[0], out var element) ? element.WeightAmu : 1.0;

        // 2kT/m = 0.016629 km²/s² a kelvin over atomic weight.
        double thermalSquared = 0.016629 * _temperature / amu;
        return Math.Sqrt(thermalSquared + (TurbulenceKmPerS * TurbulenceKmPerS));
    }

    // The continuum above about 6000 K is set by H⁻, which grows with electron pressure and falls with temperature.
    private double ContinuousOpacityLog() =>
        _electronPressureLog - 1.2 + (0.754 * ((5040.0 / _temperature) - (5040.0 / 5800.0)));

    private double StageFractionLog(string stage, double firstEv, double secondEv)
    {
        double firstRatio = Math.Pow(10.0, SahaLog(firstEv));
        double secondRatio = Math.Pow(10.0, SahaLog(secondEv));
        double sum = 1.0 + firstRatio + (firstRatio * secondRatio);
        return stage switch
        {
            "I" => Math.Log10(1.0 / sum),
            "II" => Math.Log10(firstRatio / sum),
            _ => double.NegativeInfinity,
        };
    }

    // Saha: log (N₊ Pe / N) = −θ χ + 2.5 log T − 0.48 + log (2 U₊/U), with 2 U₊/U near 3 for most metals.
    private double SahaLog(double ionizationEv) =>
        (-5040.0 / _temperature * ionizationEv) + (2.5 * Math.Log10(_temperature)) - 0.48 + 0.5 - _electronPressureLog;
}
