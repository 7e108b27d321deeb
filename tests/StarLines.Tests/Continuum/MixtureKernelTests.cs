using System;
using System.Linq;
using StarLines.Continuum;
using Xunit;

namespace StarLines.Tests.Continuum;

public sealed class MixtureKernelTests
{
    [Theory]
    [InlineData(0)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    [InlineData(1003)]
    public void Four_pixels_at_a_time_agree_with_one_by_one(int pixels)
    {
        var random = new Random(pixels);
        double[] x = [.. Enumerable.Range(0, pixels).Select(i => 5000.0 + (i / 1003.0))];
        double[] flux = [.. x.Select(_ => 1.0 + (0.02 * Gaussian.Next(random)) - (random.Next(5) == 0 ? random.NextDouble() : 0.0))];
        double[] inverse = [.. x.Select(_ => random.Next(9) == 0 ? 0.0 : 50.0)];
        double[] level = [.. x.Select(_ => 1.0)];
        var frame = new KernelFrame(0.7, 0.05, 0.01, 0.06, 0.9, 5000.0, 1.0);
        SplineMoments fast = default, plain = default;
        MixtureCounts fastCounts = default, plainCounts = default;
        MixtureKernel.Add(x, flux, inverse, level, frame, ref fast, ref fastCounts);
        MixtureKernel.AddPlain(x, flux, inverse, level, frame, ref plain, ref plainCounts);
        for (int k = 0; k < 7; k++)
        {
            AssertClose(plain.W(k), fast.W(k));
        }

        for (int k = 0; k < 4; k++)
        {
            AssertClose(plain.Y(k), fast.Y(k));
        }

        AssertClose(plainCounts.Pixels, fastCounts.Pixels);
        AssertClose(plainCounts.Core, fastCounts.Core);
        AssertClose(plainCounts.Below, fastCounts.Below);
        AssertClose(plainCounts.Lost, fastCounts.Lost);
        AssertClose(plainCounts.Squares, fastCounts.Squares);
        AssertClose(plainCounts.Weight, fastCounts.Weight);
    }

    // The order of summation and the exponential differ: twelve digits are left of sixteen.
    private static void AssertClose(double expected, double actual) =>
        Assert.InRange(Math.Abs(actual - expected), 0.0, (1e-12 * Math.Abs(expected)) + 1e-300);
}
