using System;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests.Drawing;

public sealed class PlotRangeTests
{
    [Fact]
    public void Cosmic_hits_do_not_squash_the_plot()
    {
        double[] flux = Noise(5000, 0.01);
        foreach (int hit in (int[])[40, 700, 701, 2500, 4444])
        {
            flux[hit] = 80;
        }

        flux[3000] = -50;
        DataRange range = PlotRange.Robust(flux, [], []);
        Assert.InRange(range.Maximum, 1.0, 1.1);
        Assert.InRange(range.Minimum, 0.9, 1.0);
    }

    [Fact]
    public void A_narrow_emission_line_is_shown_to_its_top()
    {
        double[] flux = Noise(5000, 0.01);
        for (int i = 2490; i <= 2510; i++)
        {
            flux[i] += 9 * Math.Exp(-4 * Math.Log(2) * Math.Pow((i - 2500) / 3.0, 2));
        }

        Assert.True(PlotRange.Robust(flux, [], []).Maximum >= flux[2500]);
    }

    [Fact]
    public void A_noisy_end_does_not_squash_the_plot()
    {
        double[] flux = Noise(5000, 0.01);
        var sigma = new double[flux.Length];
        var random = new Random(5);
        for (int i = 0; i < flux.Length; i++)
        {
            sigma[i] = i < 60 ? 20 : 0.01;
            flux[i] += i < 60 ? 20 * Samples.Normal(random) : 0;
        }

        DataRange range = PlotRange.Robust(flux, sigma, []);
        Assert.InRange(range.Maximum, 1.0, 12.0);
        Assert.InRange(range.Minimum, -10.0, 1.0);
    }

    [Fact]
    public void Noise_alone_is_shown_whole()
    {
        double[] flux = Noise(3000, 1.0);
        DataRange range = PlotRange.Robust(flux, [], []).Padded(0.05, 0.05);
        int outside = Array.FindAll(flux, value => !range.Contains(value)).Length;
        Assert.InRange(outside, 0, 3);
    }

    [Fact]
    public void Masked_pixels_do_not_count()
    {
        double[] flux = Noise(100, 0.01);
        var used = new bool[flux.Length];
        Array.Fill(used, true);
        for (int i = 30; i < 60; i++)
        {
            flux[i] = 1000;
            used[i] = false;
        }

        Assert.True(PlotRange.Robust(flux, [], used).Maximum < 1.1);
    }

    [Fact]
    public void Without_pixels_there_is_still_a_range() =>
        Assert.Equal(new DataRange(0, 1), PlotRange.Robust([double.NaN], [], []));

    [Fact]
    public void A_constant_gets_a_range_around_it()
    {
        DataRange range = PlotRange.Robust([5, 5, 5, 5], [], []);
        Assert.True(range.Minimum < 5 && range.Maximum > 5);
    }

    [Theory]
    [InlineData(1.0, 0)]
    [InlineData(43000.0, 0)]
    [InlineData(2.3e-15, -15)]
    [InlineData(5.1e6, 6)]
    public void Long_numbers_get_a_power_of_ten(double maximum, int exponent) =>
        Assert.Equal(exponent, PlotRange.Exponent(new DataRange(0, maximum)));

    private static double[] Noise(int count, double sigma)
    {
        var random = new Random(3);
        var values = new double[count];
        for (int i = 0; i < count; i++)
        {
            values[i] = 1 + (sigma * Samples.Normal(random));
        }

        return values;
    }
}
