using System;
using System.Collections.Generic;
using StarLines.Continuum;

namespace StarLines.Plotting.Tests;

/// <summary>Invented spectra and lines.</summary>
internal static class Samples
{
    internal const string Target = "Lyra 2207 B";

    internal static Spectrum Spectrum(
        int count = 2000,
        double level = 1.0,
        double snr = 80,
        string unit = "",
        Medium medium = Medium.Air,
        VelocityFrame frame = VelocityFrame.Barycentric,
        Action<double[], PixelFaults[]>? change = null)
    {
        var random = new Random(11);
        var scale = WavelengthScale.Linear(5000, 0.25, count, medium, frame);
        var flux = new double[count];
        var sigma = new double[count];
        for (int i = 0; i < count; i++)
        {
            sigma[i] = level / snr;
            double line = 0.5 * Math.Exp(-0.5 * Math.Pow((i % 100 - 50) / 4.0, 2));
            flux[i] = (level * (1 - line)) + (sigma[i] * Normal(random));
        }

        var faults = new PixelFaults[count];
        change?.Invoke(flux, faults);
        return new Spectrum(scale, flux, sigma, faults, unit, new SpectrumMetadata { Target = Target, Instrument = "Comb" });
    }

    internal static ContinuumFit Continuum(int count, double level = 1.0, int untrustedFrom = -1, int untrustedCount = 0)
    {
        var levels = new double[count];
        var sigma = new double[count];
        var trusted = new bool[count];
        for (int i = 0; i < count; i++)
        {
            levels[i] = level;
            sigma[i] = 0.01 * level;
            trusted[i] = i < untrustedFrom || i >= untrustedFrom + untrustedCount;
        }

        return new ContinuumFit(levels, sigma, trusted, 100);
    }

    internal static List<LineMark> Marks(int count, int seed, double from = 5000, double to = 5500)
    {
        var random = new Random(seed);
        var marks = new List<LineMark>();
        for (int i = 0; i < count; i++)
        {
            double wavelength = from + ((to - from) * random.NextDouble());
            marks.Add(new LineMark($"Xy I {wavelength:F2}", wavelength, random.NextDouble(), random.Next(4) == 0));
        }

        return marks;
    }

    internal static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
