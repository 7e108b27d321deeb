using System;
using System.Linq;
using StarLines.Continuum;
using Xunit;

namespace StarLines.Tests.Continuum;

public sealed class ContinuumFitterTests
{
    private const int Pixels = 4000;

    [Fact]
    public void The_level_of_a_crowded_spectrum_is_neither_high_nor_low()
    {
        // Asymmetric clipping would set this level high by several standard deviations of the mean.
        double worst = 0.0;
        double sum = 0.0;
        for (int seed = 0; seed < 20; seed++)
        {
            (Spectrum spectrum, double[] truth) = Make(seed, signalToNoise: 60, lines: 60, depth: 0.5);
            double bias = MeanRatio(ContinuumFitter.Fit(spectrum), truth) - 1.0;
            worst = Math.Max(worst, Math.Abs(bias));
            sum += bias;
        }

        Assert.InRange(sum / 20, -4e-4, 4e-4);
        Assert.True(worst < 2e-3);
    }

    [Fact]
    public void The_quoted_uncertainty_is_that_of_the_scatter()
    {
        double squares = 0.0;
        int count = 0;
        for (int seed = 100; seed < 140; seed++)
        {
            (Spectrum spectrum, double[] truth) = Make(seed, signalToNoise: 40, lines: 15, depth: 0.4);
            ContinuumFit fit = ContinuumFitter.Fit(spectrum);
            for (int i = 200; i < Pixels; i += 400)
            {
                double pull = (fit.Level[i] - truth[i]) / fit.Sigma[i];
                squares += pull * pull;
                count++;
            }
        }

        Assert.InRange(Math.Sqrt(squares / count), 0.75, 1.3);
    }

    [Fact]
    public void Emission_lines_do_not_lift_the_level()
    {
        (Spectrum spectrum, double[] truth) = Make(7, signalToNoise: 50, lines: 25, depth: -4.0);
        Assert.InRange(MeanRatio(ContinuumFitter.Fit(spectrum), truth), 0.998, 1.002);
    }

    [Fact]
    public void Broad_emission_between_two_stretches_of_continuum_is_not_taken_for_it()
    {
        var random = new Random(3);
        double[] flux = [.. Enumerable.Range(0, Pixels).Select(i =>
            1.0 + (4.0 * Math.Exp(-0.5 * Math.Pow((i - 2000) / 350.0, 2))) + (0.01 * Gaussian.Next(random)))];
        ContinuumFit fit = ContinuumFitter.Fit(
            new Spectrum(WavelengthScale.Linear(5000, 0.05, Pixels, Medium.Air), flux));
        Assert.InRange(fit.Level[2000], 0.8, 1.3);
        Assert.InRange(fit.Level[300], 0.98, 1.02);
    }

    [Fact]
    public void Broad_Balmer_wings_are_left_out()
    {
        var random = new Random(4);
        WavelengthScale scale = WavelengthScale.Linear(4600, 0.25, Pixels, Medium.Air);
        double[] flux = [.. Enumerable.Range(0, Pixels).Select(i =>
        {
            // Wings of the exponent 5/2 of linear Stark broadening.
            double x = Math.Abs(scale.WavelengthAngstrom(i) - 4861.3) / 12.0;
            return 1000.0 * (1.0 - (0.7 / (1.0 + Math.Pow(x, 2.5)))) * (1.0 + (0.01 * Gaussian.Next(random)));
        })];
        ContinuumFit fit = ContinuumFitter.Fit(new Spectrum(scale, flux));
        Assert.InRange(fit.Level[(int)scale.IndexOf(4861.3)] / 1000.0, 0.97, 1.03);
    }

    [Fact]
    public void Lines_that_are_divided_out_no_longer_matter()
    {
        var random = new Random(8);
        var model = new double[Pixels];
        var flux = new double[Pixels];
        for (int i = 0; i < Pixels; i++)
        {
            model[i] = 1.0 - (0.5 * Math.Exp(-0.5 * Math.Pow(((i % 40) - 20) / 8.0, 2)));
            flux[i] = 500.0 * (model[i] + (0.01 * Gaussian.Next(random)));
        }

        var spectrum = new Spectrum(WavelengthScale.Linear(5000, 0.05, Pixels, Medium.Air), flux);
        double[] truth = [.. Enumerable.Repeat(500.0, Pixels)];
        double blind = Math.Abs(MeanRatio(ContinuumFitter.Fit(spectrum), truth) - 1.0);
        double told = Math.Abs(MeanRatio(ContinuumFitter.Fit(spectrum, lineModel: model), truth) - 1.0);
        Assert.True(told < 1e-3 && told < blind);
    }

    [Fact]
    public void Scaling_the_flux_scales_the_level()
    {
        (Spectrum spectrum, _) = Make(9, signalToNoise: 80, lines: 20, depth: 0.5);
        double[] scaled = [.. spectrum.Flux.ToArray().Select(f => f * 1e-15)];
        double[] sigma = [.. spectrum.Sigma.ToArray().Select(s => s * 1e-15)];
        ContinuumFit one = ContinuumFitter.Fit(spectrum);
        ContinuumFit other = ContinuumFitter.Fit(new Spectrum(spectrum.Scale, scaled, sigma));
        for (int i = 0; i < Pixels; i += 100)
        {
            Assert.Equal(1.0, other.Level[i] / one.Level[i] * 1e15, 6);
        }
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(double.NaN)]
    [InlineData(-5.0)]
    public void A_spectrum_without_a_positive_level_has_no_continuum(double value)
    {
        var flux = new double[400];
        Array.Fill(flux, value);
        ContinuumFit fit = ContinuumFitter.Fit(
            new Spectrum(WavelengthScale.Linear(5000, 0.05, flux.Length, Medium.Air), flux));
        Assert.True(double.IsNaN(fit.Level[0]));
        Assert.False(fit.Trusted[0]);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(5)]
    [InlineData(40)]
    public void A_spectrum_of_few_pixels_does_not_fail(int pixels)
    {
        double[] flux = [.. Enumerable.Range(0, pixels).Select(i => 10.0 + (0.1 * (i % 3)))];
        double[] sigma = [.. Enumerable.Repeat(0.1, pixels)];
        ContinuumFit fit = ContinuumFitter.Fit(
            new Spectrum(WavelengthScale.Linear(5000, 0.05, pixels, Medium.Air), flux, sigma));
        Assert.Equal(pixels, fit.Count);
    }

    [Fact]
    public void A_stiffness_that_is_no_length_is_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => ContinuumFitter.Fit(
            Make(1, 50, 1, 0.1).Spectrum, new ContinuumOptions { StiffnessAngstrom = 0.0 }));

    private static double MeanRatio(ContinuumFit fit, double[] truth)
    {
        double sum = 0.0;
        for (int i = 0; i < truth.Length; i++)
        {
            sum += fit.Level[i] / truth[i];
        }

        return sum / truth.Length;
    }

    private static (Spectrum Spectrum, double[] Truth) Make(int seed, double signalToNoise, int lines, double depth)
    {
        var random = new Random(seed);
        var truth = new double[Pixels];
        var profile = new double[Pixels];
        Array.Fill(profile, 1.0);
        for (int line = 0; line < lines; line++)
        {
            double centre = random.NextDouble() * Pixels;
            double strength = depth * random.NextDouble();
            for (int i = Math.Max(0, (int)centre - 30); i < Math.Min(Pixels, (int)centre + 30); i++)
            {
                profile[i] *= 1.0 - (strength * Math.Exp(-0.5 * Math.Pow((i - centre) / 3.0, 2)));
            }
        }

        double slope = random.NextDouble() - 0.5;
        var flux = new double[Pixels];
        var sigma = new double[Pixels];
        for (int i = 0; i < Pixels; i++)
        {
            double x = (2.0 * i / Pixels) - 1.0;
            truth[i] = 1000.0 * (1.0 + (0.3 * slope * x) - (0.1 * x * x));
            sigma[i] = truth[i] / signalToNoise;
            flux[i] = (truth[i] * profile[i]) + (sigma[i] * Gaussian.Next(random));
        }

        return (new Spectrum(WavelengthScale.Linear(5000, 0.05, Pixels, Medium.Air), flux, sigma), truth);
    }
}
