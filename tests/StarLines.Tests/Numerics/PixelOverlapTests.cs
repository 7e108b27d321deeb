using System;
using System.Linq;
using StarLines.Numerics;
using Xunit;

namespace StarLines.Tests.Numerics;

public sealed class PixelOverlapTests
{
    [Fact]
    public void Dealing_out_keeps_the_sum_where_the_target_covers_the_source()
    {
        double[] source = Edges(101, 5000.0, 0.37);
        double[] target = [.. Enumerable.Range(0, 300).Select(static j => 4990.0 * Math.Exp(j * 5e-5))];
        double[] contents = [.. Enumerable.Range(0, 100).Select(static i => 1.0 + Math.Sin(i))];
        var dealt = new double[target.Length - 1];
        PixelOverlap.Deal(source, contents, target, dealt);
        Assert.Equal(contents.Sum(), dealt.Sum(), 1e-10);
    }

    [Fact]
    public void Two_pixels_into_one_give_the_mean_and_half_the_variance()
    {
        double[] source = Edges(5, 0.0, 1.0);
        double[] target = Edges(3, 0.0, 2.0);
        var flux = new double[2];
        var variance = new double[2];
        var coverage = new double[2];
        PixelOverlap.Rebin(source, [1.0, 3.0, 5.0, 9.0], [4.0, 4.0, 1.0, 3.0], [true, true, true, false], target, flux, variance, coverage);
        Assert.Equal([2.0, 5.0], flux);
        Assert.Equal([2.0, 1.0], variance);
        Assert.Equal([1.0, 0.5], coverage);
    }

    [Fact]
    public void The_scatter_of_rebinned_noise_is_the_variance_that_is_said()
    {
        var random = new Random(11);
        double[] source = Edges(4001, 0.0, 1.0);
        double[] target = Edges(1601, 0.0, 2.5);
        var noise = new double[4000];
        for (int i = 0; i < noise.Length; i++)
        {
            noise[i] = Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
        }

        var flux = new double[1600];
        var variance = new double[1600];
        PixelOverlap.Rebin(
            source, noise, Enumerable.Repeat(1.0, 4000).ToArray(), Enumerable.Repeat(true, 4000).ToArray(), target, flux, variance, new double[1600]);
        double measured = flux.Zip(variance, static (f, v) => f * f / v).Average();

        // χ² of 1600 values has a relative scatter of 3.5 %.
        Assert.InRange(measured, 0.88, 1.12);
    }

    private static double[] Edges(int count, double first, double step) =>
        [.. Enumerable.Range(0, count).Select(i => first + (i * step))];
}
