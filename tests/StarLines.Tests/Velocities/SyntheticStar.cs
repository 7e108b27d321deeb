using System;
using System.Collections.Generic;
using System.Linq;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Velocities;

namespace StarLines.Tests.Velocities;

/// <summary>Spectra with lines of known velocity and Gaussian noise.</summary>
internal static class SyntheticStar
{
    public const double FirstAngstrom = 5000.0;

    /// <summary>A list of lines over 5000 to 5300 Å with depths and widths.</summary>
    public static LineList List(int lines, int seed, double fwhmAngstrom = 0.25)
    {
        var random = new Random(seed);
        return new LineList("synthetic", Medium.Vacuum, [.. Enumerable.Range(0, lines).Select(j => new RestLine
        {
            Name = $"L{j}",
            Species = "Fe I",
            WavelengthAngstrom = FirstAngstrom + 8.0 + (284.0 * (j + random.NextDouble()) / lines),
            Depth = 0.15 + (0.6 * random.NextDouble()),
            FwhmAngstrom = fwhmAngstrom,
        })]);
    }

    /// <summary>A spectrum of 6000 pixels of 0.05 Å, normalized, of one or more stars.</summary>
    public static Spectrum Spectrum(
        LineList list,
        double signalToNoise,
        int seed,
        IReadOnlyList<(double VelocityKmPerS, double Light, double ExtraSigmaKmPerS)> stars,
        Medium medium = Medium.Vacuum)
    {
        var random = new Random(seed);
        WavelengthScale scale = WavelengthScale.Linear(FirstAngstrom, 0.05, 6000, Medium.Vacuum, VelocityFrame.Topocentric);
        var flux = new double[scale.Count];
        for (int i = 0; i < flux.Length; i++)
        {
            flux[i] = 1.0 + (Gauss(random) / signalToNoise);
        }

        foreach ((double velocity, double light, double extra) in stars)
        {
            foreach (RestLine line in list.Lines)
            {
                AddLine(line, scale.WavelengthsAngstrom, velocity, light, extra, flux);
            }
        }

        if (medium == Medium.Air)
        {
            scale = AirVacuum.Convert(scale, Medium.Air);
        }

        return new Spectrum(scale, flux, Enumerable.Repeat(1.0 / signalToNoise, flux.Length).ToArray());
    }

    /// <summary>The true continuum, 1.</summary>
    public static ContinuumFit Continuum(Spectrum spectrum) => new(
        Enumerable.Repeat(1.0, spectrum.Count).ToArray(), new double[spectrum.Count], Enumerable.Repeat(true, spectrum.Count).ToArray(), 300.0);

    public static double Gauss(Random random) =>
        Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());

    private static void AddLine(
        RestLine line, ReadOnlySpan<double> wavelengths, double velocity, double light, double extra, double[] flux)
    {
        double centre = line.WavelengthAngstrom * Doppler.Factor(velocity);
        double own = line.FwhmAngstrom / PhysicalConstants.FwhmPerSigma;
        double sigma = Math.Sqrt((own * own) + Math.Pow(extra * centre / PhysicalConstants.SpeedOfLightKmPerS, 2.0));
        for (int i = 0; i < flux.Length; i++)
        {
            double u = (wavelengths[i] - centre) / sigma;
            if (Math.Abs(u) < 9.0)
            {
                flux[i] -= light * line.Depth * own / sigma * Math.Exp(-0.5 * u * u);
            }
        }
    }
}
