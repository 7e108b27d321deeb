using System;
using System.Globalization;
using System.IO;
using System.Linq;
using StarLines.Noise;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.Noise;

public sealed class NoiseEstimatorTests
{
    [Fact]
    public void Noise_of_the_worked_example_comes_out_to_its_digits()
    {
        // Worked with NumPy from Stoehr et al. (2008), ASP Conf. Ser. 394, 505; values as printed in the reference tables.
        double[] flux = [.. File.ReadLines(ReferenceData.DataFile("golden", "snr_example.csv"))
            .Skip(2).Select(l => double.Parse(l.Split(',')[0], CultureInfo.InvariantCulture))];
        double noise = NoiseEstimator.Estimate(flux);
        Assert.Equal(10.202144243, noise, 8);
        double[] sorted = [.. flux.Order()];
        double median = 0.5 * (sorted[(sorted.Length / 2) - 1] + sorted[sorted.Length / 2]);
        Assert.Equal(98.005192111, median / noise, 8);
    }

    [Fact]
    public void Noise_follows_the_sensitivity_along_a_spectrum()
    {
        var random = new Random(5);
        var flux = new double[6000];
        for (int i = 0; i < flux.Length; i++)
        {
            flux[i] = 100.0 + (Gaussian.Next(random) * (i < 3000 ? 1.0 : 4.0));
        }

        double[] sigma = NoiseEstimator.EstimatePerPixel(
            new Spectrum(WavelengthScale.Linear(5000, 0.1, flux.Length, Medium.Air), flux));
        Assert.InRange(sigma[1000], 0.85, 1.15);
        Assert.InRange(sigma[5000], 3.4, 4.6);
    }

    [Fact]
    public void Runs_of_zeros_are_gaps_and_single_zeros_are_not()
    {
        double[] flux = [0, 0, 0, 0, 0, 0, 0, 0, 5, 0, 6, 0, 0, 7, 0, 0, 0, 0, 0, 0, 0, 0, 0];
        PixelFaults[] found = GapFinder.Find(flux);
        Assert.Equal(
            [0, 1, 2, 3, 4, 5, 6, 7, 14, 15, 16, 17, 18, 19, 20, 21, 22],
            Enumerable.Range(0, flux.Length).Where(i => found[i] != PixelFaults.None));
    }

    [Fact]
    public void Hits_of_one_pixel_are_found_and_narrow_lines_are_left()
    {
        var random = new Random(11);
        var flux = new double[4000];
        for (int i = 0; i < flux.Length; i++)
        {
            // A Gaussian emission line of FWHM 2 pixels every 100 pixels, at any place within the pixel.
            double x = ((i + 50) % 100) - 50 + (0.01 * (i / 100));
            flux[i] = 100.0 + (80.0 * Math.Exp(-0.5 * x * x / (0.85 * 0.85))) + Gaussian.Next(random);
        }

        int[] hits = [120, 777, 1530, 2222, 3333];
        foreach (int hit in hits)
        {
            flux[hit] += 40.0;
        }

        var sigma = new double[flux.Length];
        Array.Fill(sigma, 1.0);
        var spectrum = new Spectrum(WavelengthScale.Linear(5000, 0.1, flux.Length, Medium.Air), flux, sigma);
        PixelFaults[] found = OutlierFinder.Find(spectrum, sigma);
        Assert.Equal(hits, Enumerable.Range(0, found.Length).Where(i => found[i] != PixelFaults.None));
    }
}
