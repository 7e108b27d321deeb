using System;
using System.Collections.Generic;
using StarLines.LineLists;

namespace StarLines.Templates;

/// <summary>
/// Depths and widths of absorption lines from log gf and excitation energy: population by Saha and Boltzmann in one layer
/// of gas, saturation by Minnaert's interpolation. Good to a factor of two or so; the velocity fit scales each line itself.
/// </summary>
/// <remarks>
/// η ∝ g f λ (N_ion/N) exp(−χ/kT)/(U κ); depth 1/(1/η + 1/R_c) (Minnaert 1935, Zeitschrift für Astrophysik 10, 40).
/// Saha: N₊/N = 0.6665 (U₊/U) T^(5/2) 10^(−5040 I/T)/P_e with P_e in dyn/cm² (Gray 2005, The Observation and Analysis of
/// Stellar Photospheres, eq. 1.20). κ is the bound-free absorption of H⁻ up to 9000 K, ∝ P_e θ^(5/2) 10^(0.754 θ) (Gray, eq. 8.12),
/// and constant above, where neutral hydrogen takes over.
/// </remarks>
internal static class LineStrength
{
    /// <summary>Deepest a strong line gets in units of the continuum; common practice, no source.</summary>
    private const double LimitingDepth = 0.85;

    /// <summary>Depth of a line of which nothing is known.</summary>
    private const double UnknownDepth = 0.5;

    /// <summary>Temperature of the gas where lines form in units of the effective temperature: T at optical depth 0.2 in the grey atmosphere.</summary>
    private const double LayerTemperature = 0.90;

    /// <summary>
    /// Sets the strength: Fe I 6065.48 (log gf −1.53, 2.609 eV) has η = 4.5 in the Sun, a depth of 0.71; its solar equivalent
    /// width is 115 mÅ (Bedell et al. 2017, ApJ 839, 94).
    /// </summary>
    private const double SolarLogEta = 0.653;

    private const double SolarTemperature = 5772.0;

    /// <summary>Lines with depth and width for every line of a list that the options do not leave out.</summary>
    internal static List<TemplateLine> TemplateLines(LineList list, TemplateOptions options, out bool widthsKnown)
    {
        Guard.Between(options.TemperatureKelvin, 2500.0, 50_000.0, nameof(options.TemperatureKelvin), "K");
        Guard.Positive(options.IntrinsicFwhmKmPerS, nameof(options.IntrinsicFwhmKmPerS), "km/s");
        Guard.Positive(options.HydrogenFwhmAngstrom, nameof(options.HydrogenFwhmAngstrom), "Å");
        Guard.Between(options.MinimumDepth, 0.0, 1.0, nameof(options.MinimumDepth), "of the continuum");
        double reference = LogOpacity("Fe I", -1.53, 2.609, 6065.48, SolarTemperature) - SolarLogEta;
        var lines = new List<TemplateLine>(list.Lines.Count);
        widthsKnown = true;
        foreach (RestLine line in list.Lines)
        {
            double eta = Eta(line, options.TemperatureKelvin, reference);
            double depth = line.Depth > 0.0 ? line.Depth
                : double.IsNaN(eta) ? UnknownDepth
                : eta * LimitingDepth / (eta + LimitingDepth);
            if (line.Depth <= 0.0 || (double.IsNaN(line.Depth) && depth < options.MinimumDepth))
            {
                continue;
            }

            bool hydrogen = IsHydrogen(line);
            bool given = line.FwhmAngstrom > 0.0;
            widthsKnown &= given || hydrogen;
            lines.Add(new TemplateLine
            {
                Name = line.Name,
                WavelengthAngstrom = line.WavelengthAngstrom,
                Depth = depth,
                Shape = hydrogen && !given ? LineShape.Stark : LineShape.Gaussian,
                FwhmAngstrom = given ? line.FwhmAngstrom
                    : hydrogen ? options.HydrogenFwhmAngstrom
                    : line.WavelengthAngstrom * options.IntrinsicFwhmKmPerS / PhysicalConstants.SpeedOfLightKmPerS * Growth(eta),
            });
        }

        return lines;
    }

    /// <summary>Whether a line is one of hydrogen.</summary>
    internal static bool IsHydrogen(RestLine line) => line.Species is "H I" or "H";

    /// <summary>
    /// How much wider than its opacity profile a saturated line is: where Minnaert's depth halves,
    /// √(ln(2 + η/R_c)/ln 2).
    /// </summary>
    private static double Growth(double eta) =>
        double.IsNaN(eta) ? 1.0 : Math.Sqrt(Math.Log(2.0 + (eta / LimitingDepth)) / Math.Log(2.0));

    /// <summary>Line opacity at the centre over continuous opacity; NaN where the list does not say enough.</summary>
    private static double Eta(RestLine line, double temperatureKelvin, double reference)
    {
        if (IsHydrogen(line) || double.IsNaN(line.LogGf) || double.IsNaN(line.LowerEnergyEv))
        {
            return double.NaN;
        }

        return Math.Pow(10.0, LogOpacity(
            line.Species, line.LogGf, line.LowerEnergyEv, line.WavelengthAngstrom, temperatureKelvin) - reference);
    }

    private static double LogOpacity(
        string species, double logGf, double lowerEnergyEv, double wavelengthAngstrom, double effectiveTemperatureKelvin)
    {
        double t = LayerTemperature * effectiveTemperatureKelvin;
        double theta = 5040.0 / t;
        double log = logGf - (theta * lowerEnergyEv) + Math.Log10(wavelengthAngstrom) - LogContinuousOpacity(effectiveTemperatureKelvin);
        int space = species.IndexOf(' ', StringComparison.Ordinal);
        string symbol = space > 0 ? species[..space] : species;
        int charge = space > 0 ? Charge(species.AsSpan(space + 1)) : 0;
        if (charge < 0 || charge > 2 || !ElementTable.TryFind(symbol, out ElementTable.Element element))
        {
            return double.NaN;
        }

        return log + element.LogAbundance + Math.Log10(
            Fraction(element, charge, t, LogElectronPressure(effectiveTemperatureKelvin)) / ElementTable.PartitionFunction(element, charge, t));
    }

    private static int Charge(ReadOnlySpan<char> roman) => roman switch
    {
        "I" => 0,
        "II" => 1,
        "III" => 2,
        _ => -1,
    };

    /// <summary>The part of an element's atoms with a charge.</summary>
    private static double Fraction(in ElementTable.Element element, int charge, double t, double logElectronPressure)
    {
        Span<double> part = stackalloc double[4];
        part[0] = 1.0;
        double total = 1.0;
        for (int k = 0; k < 3; k++)
        {
            double energy = element.IonisationEv(k);
            double ratio = double.IsInfinity(energy) ? 0.0 : Math.Pow(
                10.0, Math.Log10(0.6665) + (2.5 * Math.Log10(t)) - (5040.0 * energy / t) - logElectronPressure)
                * ElementTable.PartitionFunction(element, k + 1, t) / ElementTable.PartitionFunction(element, k, t);
            part[k + 1] = part[k] * ratio;
            total += part[k + 1];
        }

        return part[charge] / total;
    }

    private static double LogContinuousOpacity(double effectiveTemperatureKelvin)
    {
        double capped = Math.Min(effectiveTemperatureKelvin, 9000.0);
        double theta = 5040.0 / (LayerTemperature * capped);
        return LogElectronPressure(capped) + (2.5 * Math.Log10(theta)) + (0.754 * theta);
    }

    /// <summary>
    /// log P_e in dyn/cm² where lines form in a main-sequence star: round values of published model atmospheres;
    /// common practice, no source.
    /// </summary>
    private static double LogElectronPressure(double effectiveTemperatureKelvin)
    {
        ReadOnlySpan<double> temperature = [3500.0, 5000.0, 5800.0, 7000.0, 8500.0, 10_000.0, 15_000.0, 20_000.0, 30_000.0, 50_000.0];
        ReadOnlySpan<double> pressure = [-0.8, 0.5, 1.1, 1.9, 2.6, 2.9, 3.2, 3.4, 3.7, 4.2];
        int k = 0;
        while (k < temperature.Length - 2 && temperature[k + 1] < effectiveTemperatureKelvin)
        {
            k++;
        }

        double f = (effectiveTemperatureKelvin - temperature[k]) / (temperature[k + 1] - temperature[k]);
        return pressure[k] + (f * (pressure[k + 1] - pressure[k]));
    }
}
