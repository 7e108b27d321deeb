using System;

namespace StarLines.Numerics;

/// <summary>The natural cubic spline through points (de Boor 1978, A Practical Guide to Splines, chapter IV).</summary>
internal static class CubicSpline
{
    /// <summary>The second derivatives at the knots, zero at both ends.</summary>
    /// <param name="x">N increasing knots.</param>
    /// <param name="y">N values; NaN spreads.</param>
    /// <param name="second">Receives N second derivatives; other memory.</param>
    internal static void SecondDerivatives(ReadOnlySpan<double> x, ReadOnlySpan<double> y, Span<double> second)
    {
        Guard.SameLength(y.Length, x.Length, nameof(y));
        Guard.SameLength(second.Length, x.Length, nameof(second));
        int n = x.Length;
        second.Clear();
        if (n < 3)
        {
            return;
        }

        var upper = new double[n];
        for (int i = 1; i < n - 1; i++)
        {
            double left = x[i] - x[i - 1];
            double right = x[i + 1] - x[i];
            double pivot = (2.0 * (left + right)) - (left * upper[i - 1]);
            double slope = ((y[i + 1] - y[i]) / right) - ((y[i] - y[i - 1]) / left);
            upper[i] = right / pivot;
            second[i] = ((6.0 * slope) - (left * second[i - 1])) / pivot;
        }

        for (int i = n - 3; i >= 1; i--)
        {
            second[i] -= upper[i] * second[i + 1];
        }
    }

    /// <summary>Value and first derivative inside one interval.</summary>
    /// <param name="x">Knots.</param>
    /// <param name="y">Values at the knots.</param>
    /// <param name="second">Second derivatives at the knots.</param>
    /// <param name="cell">Index of the knot at the left end of the interval.</param>
    /// <param name="at">Where.</param>
    internal static (double Value, double Slope) At(
        ReadOnlySpan<double> x, ReadOnlySpan<double> y, ReadOnlySpan<double> second, int cell, double at)
    {
        double h = x[cell + 1] - x[cell];
        double b = (at - x[cell]) / h;
        double a = 1.0 - b;
        double h2 = h * h / 6.0;
        double value = (a * y[cell]) + (b * y[cell + 1])
            + (h2 * ((((a * a * a) - a) * second[cell]) + (((b * b * b) - b) * second[cell + 1])));
        double slope = ((y[cell + 1] - y[cell]) / h)
            + (h / 6.0 * ((((3.0 * b * b) - 1.0) * second[cell + 1]) - (((3.0 * a * a) - 1.0) * second[cell])));
        return (value, slope);
    }
}
