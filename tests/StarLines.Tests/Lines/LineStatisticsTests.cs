using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Linq;
using System.Reflection;
using StarLines.Lines;
using Xunit;

namespace StarLines.Tests.Lines;

/// <summary>Noise draws scatter as the quoted uncertainties say.</summary>
public sealed class LineStatisticsTests
{
    [Fact]
    public void Pulls_of_isolated_lines_are_standard_normal_and_reach_the_cramer_rao_bound()
    {
        var pulls = new List<double>[4] { [], [], [], [] };
        var overBound = new List<double>();
        for (int seed = 1; seed <= 60; seed++)
        {
            double signalToNoise = new[] { 20.0, 50.0, 100.0, 300.0 }[seed % 4];
            var random = new Random(1000 + seed);
            var truth = Enumerable.Range(0, 12)
                .Select(i => (6004.0 + (5.0 * i) + random.NextDouble(), 0.25 + (0.6 * random.NextDouble()), 0.25 + (0.2 * random.NextDouble())))
                .ToArray();
            var made = new SyntheticSpectrum(1400, signalToNoise, seed, truth);
            LineMeasurementSet set = made.Measure();
            for (int i = 0; i < truth.Length; i++)
            {
                LineMeasurement line = set.Lines[i];
                (double centre, double depth, double fwhm) = truth[i];
                double width = SyntheticSpectrum.EquivalentWidth(depth, fwhm);
                pulls[0].Add(Pull(line.CentreAngstrom, centre));
                pulls[1].Add(Pull(line.EquivalentWidthMilliangstrom, width));
                pulls[2].Add(Pull(line.FwhmAngstrom, fwhm));
                pulls[3].Add(Pull(line.Depth, depth));
                double bound = LineErrorFormulae.CramerRao(depth, fwhm / PhysicalConstants.FwhmPerSigma, SyntheticSpectrum.Step, signalToNoise)
                    .EquivalentWidthMilliangstrom;
                overBound.Add((line.EquivalentWidthMilliangstrom.Value - width) / bound);
            }
        }

        // 720 lines: the mean is known to 0.037, the standard deviation to 0.026; three of these are allowed.
        foreach (List<double> list in pulls)
        {
            Assert.InRange(list.Average(), -0.11, 0.11);
            Assert.InRange(Deviation(list), 0.9, 1.1);
        }

        Assert.InRange(Deviation(overBound), 0.9, 1.08);
    }

    [Fact]
    public void Noise_alone_passes_as_a_line_as_seldom_as_the_threshold_says()
    {
        int measured = 0;
        const int Spectra = 60;
        const int Windows = 30;
        for (int seed = 1; seed <= Spectra; seed++)
        {
            var made = new SyntheticSpectrum(1400, 50.0, seed);
            LineMeasurementSet set = LineMeasurer.Measure(
                made.ToSpectrum(),
                made.Continuum(),
                SyntheticSpectrum.List(Enumerable.Range(0, Windows).Select(static i => 6003.0 + (2.1 * i)), 0.3),
                new());
            measured += set.Lines.Count(static l => l.Status == LineStatus.Measured);
        }

        // 3 σ on both sides is 0.27 % of 1800 windows, 4.9; the search beside the prediction adds about as little again.
        Assert.InRange(measured, 0, 16);
    }

    [Fact]
    public void Fits_allocate_nothing()
    {
        DebuggableAttribute? debugging = typeof(LineMeasurer).Assembly.GetCustomAttribute<DebuggableAttribute>();
        Assert.SkipWhen(debugging is { IsJITOptimizerDisabled: true }, "Vector code allocates in a Debug build; this runs in Release.");
        var made = new SyntheticSpectrum(400, 100.0, 11, (6010.0, 0.5, 0.3));
        using var pixels = new NormalizedPixels(made.ToSpectrum(), made.Continuum());
        var fitter = new BlendFitter(pixels, new LineMeasureOptions(), new StarLines.Profiles.GaussianProfile());
        LineTask[] tasks = [Start()];

        // The first fits make room and load code.
        for (int i = 0; i < 5; i++)
        {
            fitter.Fit(tasks, [0], 180, 220);
        }

        long before = GC.GetAllocatedBytesForCurrentThread();
        fitter.Fit(tasks, [0], 180, 220);
        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
        Assert.Equal(LineStatus.Measured, tasks[0].Status);
    }

    private static LineTask Start() => new(SyntheticSpectrum.List([6010.0]).Lines[0], 6010.0)
    {
        Pixel = 200,
        PixelWidth = SyntheticSpectrum.Step,
        ExpectedFwhm = 0.25,
        Fwhm = 0.25,
        LeastFwhm = 0.025,
        Depth = 0.4,
        Significance = 40.0,
        Fitted = true,
    };

    private static double Pull(Measured measured, double truth) => (measured.Value - truth) / measured.Uncertainty;

    private static double Deviation(List<double> values)
    {
        double mean = values.Average();
        return Math.Sqrt(values.Sum(v => (v - mean) * (v - mean)) / (values.Count - 1));
    }
}
