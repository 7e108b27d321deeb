using System;
using StarLines.Numerics;
using Xunit;

namespace StarLines.Tests.Numerics;

public sealed class FourierTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(6)]
    [InlineData(8)]
    [InlineData(12)]
    [InlineData(16)]
    [InlineData(24)]
    [InlineData(48)]
    [InlineData(64)]
    [InlineData(96)]
    [InlineData(128)]
    [InlineData(384)]
    [InlineData(512)]
    public void The_complex_transform_agrees_with_the_sum_that_defines_it(int n)
    {
        (double[] re, double[] im) = (Noise(n, 1), Noise(n, 2));
        (double[] wantedRe, double[] wantedIm) = Sum(re, im);
        new ComplexFft(n).Transform(re, im, new double[n], new double[n]);
        for (int k = 0; k < n; k++)
        {
            Assert.Equal(wantedRe[k], re[k], 1e-11);
            Assert.Equal(wantedIm[k], im[k], 1e-11);
        }
    }

    [Theory]
    [InlineData(2)]
    [InlineData(4)]
    [InlineData(6)]
    [InlineData(16)]
    [InlineData(48)]
    [InlineData(1024)]
    [InlineData(1536)]
    public void The_real_transform_agrees_with_the_complex_one_and_comes_back(int n)
    {
        double[] values = Noise(n, 3);
        (double[] re, double[] im) = (new double[(n / 2) + 1], new double[(n / 2) + 1]);
        var plan = new RealFft(n);
        plan.Forward(values, re, im, new double[2 * n]);
        (double[] wantedRe, double[] wantedIm) = Sum(values, new double[n]);
        for (int k = 0; k < re.Length; k++)
        {
            Assert.Equal(wantedRe[k], re[k], 1e-10);
            Assert.Equal(wantedIm[k], im[k], 1e-10);
        }

        var back = new double[n];
        plan.Inverse(re, im, back, new double[2 * n]);
        for (int j = 0; j < n; j++)
        {
            Assert.Equal(values[j], back[j], 1e-13);
        }
    }

    [Fact]
    public void A_good_size_is_the_smallest_that_has_a_plan()
    {
        for (int minimum = 1; minimum < 3000; minimum++)
        {
            int size = ComplexFft.GoodSize(minimum);
            Assert.True(ComplexFft.IsGood(size) && size >= minimum);
            for (int smaller = minimum; smaller < size; smaller++)
            {
                Assert.False(ComplexFft.IsGood(smaller));
            }
        }
    }

    private static double[] Noise(int n, int seed)
    {
        var random = new Random(seed);
        var values = new double[n];
        for (int i = 0; i < n; i++)
        {
            values[i] = (2.0 * random.NextDouble()) - 1.0;
        }

        return values;
    }

    private static (double[] Re, double[] Im) Sum(double[] re, double[] im)
    {
        int n = re.Length;
        (double[] sumRe, double[] sumIm) = (new double[n], new double[n]);
        for (int k = 0; k < n; k++)
        {
            for (int j = 0; j < n; j++)
            {
                (double sin, double cos) = Math.SinCos(-2.0 * Math.PI * ((long)j * k % n) / n);
                sumRe[k] += (re[j] * cos) - (im[j] * sin);
                sumIm[k] += (re[j] * sin) + (im[j] * cos);
            }
        }

        return (sumRe, sumIm);
    }
}
