using System;
using MathNet.Numerics;
using StarLines.Numerics;
using Xunit;

namespace StarLines.Tests.Numerics;

public sealed class ErrorFunctionTests
{
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(4001)]
    public void Error_function_agrees_with_the_reference_library(int count)
    {
        var argument = new double[count];
        for (int i = 0; i < count; i++)
        {
            argument[i] = -8.0 + (16.0 * i / Math.Max(1, count - 1));
        }

        var erf = new double[count];
        var gaussian = new double[count];
        ErrorFunction.Evaluate(argument, erf, gaussian);
        for (int i = 0; i < count; i++)
        {
            // The reference library states 1e-15; both errors add.
            Assert.Equal(SpecialFunctions.Erf(argument[i]), erf[i], 2e-15);
            Assert.Equal(Math.Exp(-argument[i] * argument[i]), gaussian[i], 1e-14);
        }
    }

    [Fact]
    public void Error_function_is_odd_and_passes_on_nan()
    {
        double[] erf = new double[3];
        double[] gaussian = new double[3];
        ErrorFunction.Evaluate([-0.3, 0.3, double.NaN], erf, gaussian);
        Assert.Equal(-erf[0], erf[1]);
        Assert.True(double.IsNaN(erf[2]));
        Assert.True(double.IsNaN(gaussian[2]));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(1000)]
    public void Sum_in_lanes_agrees_with_the_plain_loop(int count)
    {
        var random = new Random(count);
        var a = new double[count];
        var b = new double[count];
        double plain = 0.0;
        for (int i = 0; i < count; i++)
        {
            a[i] = random.NextDouble();
            b[i] = random.NextDouble();
            plain += a[i] * b[i];
        }

        Assert.Equal(plain, FixedLanes.Dot(a, b), 1e-12 * (1.0 + plain));
    }
}
