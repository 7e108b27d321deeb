using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using StarLines.Numerics;
using StarLines.TestSupport;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Velocities.Reference;

/// <summary>
/// Worked numbers of published error formulae, computed with NumPy and SciPy: golden tables <c>statistics.csv</c> and
/// <c>ccf_example.csv</c>, made by <c>statistics_examples.py</c>.
/// </summary>
public sealed class CorrelationErrorTests
{
    private const int Count = 1024;

    /// <summary>Both sides use double precision and the same formulae.</summary>
    private const double Tolerance = 1e-9;

    private static readonly Dictionary<string, double> Golden = File
        .ReadLines(ReferenceData.DataFile("golden", "statistics.csv")).Skip(2).Select(static line => line.Split(','))
        .ToDictionary(static f => f[0], static f => double.Parse(f[1], CultureInfo.InvariantCulture));

    [Fact]
    public void The_correlation_of_the_example_agrees_at_all_lags()
    {
        (double[] c, double[] wanted) = Correlate();
        for (int k = 0; k < Count; k++)
        {
            Assert.Equal(wanted[k], c[k], 1e-12);
        }
    }

    [Fact]
    public void The_parabola_gives_place_height_and_curvature()
    {
        (double index, double height, double curvature) = CorrelationPeak.Parabola(Correlate().Correlation, Peak());
        Assert.Equal(Golden["ccf.peak_lag_parabola"], index - 511.0, Tolerance);
        Assert.Equal(Golden["ccf.peak_height_parabola"], height, Tolerance);
        Assert.Equal(Golden["ccf.second_derivative"], curvature, Tolerance);
    }

    [Fact]
    public void The_error_of_Zucker_is_that_of_the_example()
    {
        (_, double height, double curvature) = CorrelationPeak.Parabola(Correlate().Correlation, Peak());
        Assert.Equal(Golden["zucker2003.sigma_pixel"], CorrelationPeak.ZuckerError(Count, height, curvature), Tolerance);
    }

    [Fact]
    public void The_r_of_Tonry_and_Davis_is_that_of_the_example()
    {
        double[] c = Correlate().Correlation;
        int peak = Peak();
        (_, double height, _) = CorrelationPeak.Parabola(c, peak);
        double sigma = CorrelationPeak.AntisymmetricSigma(c, peak, periodic: true);
        double width = CorrelationPeak.WidthAt(c, peak, 0.5 * height);
        double r = CorrelationPeak.Ratio(height, sigma);
        Assert.Equal(Golden["td79.sigma_a_integer_peak"], sigma, Tolerance);
        Assert.Equal(Golden["td79.r_integer_peak"], r, 1e-7);
        Assert.Equal(Golden["td79.ccf_fwhm"], width, Tolerance);
        Assert.Equal(Golden["td79.sigma_v_3_8_w_over_1_plus_r"], 2.0 * CorrelationPeak.TonryDavisError(width, r), Tolerance);
    }

    [Fact]
    public void The_r_about_the_fractional_peak_agrees_within_the_cubic_interpolation()
    {
        double[] c = Correlate().Correlation;
        (double index, double height, _) = CorrelationPeak.Parabola(c, Peak());
        double r = CorrelationPeak.Ratio(height, CorrelationPeak.AntisymmetricSigma(c, index, periodic: true));

        // The table shifts by the Fourier transform; a cubic smooths the noise of the pixels a little.
        Assert.Equal(Golden["td79.r_fractional_peak"], r, 0.01 * Golden["td79.r_fractional_peak"]);
    }

    [Theory]
    [InlineData(0.0, "bouchy2001.dv_gradient_sigmaD0")]
    [InlineData(5.0, "bouchy2001.dv_gradient_sigmaD5")]
    public void The_photon_limit_by_differences_is_that_of_the_example(double detectorNoise, string key)
    {
        (double[] wavelengths, double[] electrons, _) = Photons();
        double[] variance = [.. electrons.Select(a => a + (detectorNoise * detectorNoise))];
        Assert.Equal(Golden[key], 1000.0 * PhotonLimit.KmPerS(wavelengths, electrons, variance), 1e-8);
    }

    [Theory]
    [InlineData(0.0, "bouchy2001.dv_analytic_sigmaD0")]
    [InlineData(5.0, "bouchy2001.dv_analytic_sigmaD5")]
    public void The_photon_limit_by_derivatives_is_that_of_the_example(double detectorNoise, string key)
    {
        (double[] wavelengths, double[] electrons, double[] slope) = Photons();
        double[] variance = [.. electrons.Select(a => a + (detectorNoise * detectorNoise))];
        double limit = PhysicalConstants.SpeedOfLightKmPerS / Math.Sqrt(PhotonLimit.Information(wavelengths, slope, variance));
        Assert.Equal(Golden[key], 1000.0 * limit, 1e-8);
    }

    [Fact]
    public void The_quality_factor_is_that_of_the_example()
    {
        (double[] wavelengths, double[] electrons, _) = Photons();
        Assert.Equal(Golden["bouchy2001.Q_gradient_sigmaD0"], PhotonLimit.Quality(wavelengths, electrons), 1e-5);
    }

    private static int Peak()
    {
        double[] c = Correlate().Correlation;
        return Array.IndexOf(c, c.Max());
    }

    /// <summary>The circular correlation in the order of the table, lags −511 to 512, and the table's.</summary>
    private static (double[] Correlation, double[] Wanted) Correlate()
    {
        double[][] rows = [.. File.ReadLines(ReferenceData.DataFile("golden", "ccf_example.csv")).Skip(2).Select(static line =>
            line.Split(',').Select(static f => double.Parse(f, CultureInfo.InvariantCulture)).ToArray())];
        var plan = new RealFft(Count);
        (double[] sr, double[] si, double ss) = Transform(plan, [.. rows.Select(static r => r[1])]);
        (double[] tr, double[] ti, double ts) = Transform(plan, [.. rows.Select(static r => r[2])]);
        for (int k = 0; k < plan.Bins; k++)
        {
            (sr[k], si[k]) = ((sr[k] * tr[k]) + (si[k] * ti[k]), (si[k] * tr[k]) - (sr[k] * ti[k]));
        }

        var c = new double[Count];
        plan.Inverse(sr, si, c, new double[2 * Count]);
        double[] ordered = [.. rows.Select(r => c[((int)r[3] + Count) % Count] / Math.Sqrt(ss * ts))];
        return (ordered, [.. rows.Select(static r => r[4])]);
    }

    private static (double[] Re, double[] Im, double Squares) Transform(RealFft plan, double[] values)
    {
        double mean = values.Average();
        double[] centred = [.. values.Select(v => v - mean)];
        (double[] re, double[] im) = (new double[plan.Bins], new double[plan.Bins]);
        plan.Forward(centred, re, im, new double[2 * plan.Size]);
        return (re, im, centred.Sum(static v => v * v));
    }

    /// <summary>The spectrum of section 4 of the table's description: four lines, counts and their derivatives.</summary>
    private static (double[] Wavelengths, double[] Electrons, double[] Slope) Photons()
    {
        (double C, double D, double W)[] lines = [(5503.0, 0.6, 0.05), (5507.5, 0.3, 0.04), (5510.0, 0.8, 0.06), (5516.2, 0.5, 0.08)];
        double[] x = [.. Enumerable.Range(0, 2001).Select(static i => 5500.0 + (0.01 * i))];
        double Profile((double C, double D, double W) line, double at) => line.D * Math.Exp(-0.5 * Math.Pow((at - line.C) / line.W, 2.0));
        double[] electrons = [.. x.Select(at => 1e4 * (1.0 - lines.Sum(line => Profile(line, at))))];
        double[] slope = [.. x.Select(at => 1e4 * lines.Sum(line => Profile(line, at) * (at - line.C) / (line.W * line.W)))];
        return (x, electrons, slope);
    }
}
