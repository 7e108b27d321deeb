using System;
using System.Numerics.Tensors;

namespace StarLines.Continuum;

/// <summary>A first guess of the continuum, from high quantiles of a few wide blocks.</summary>
internal static class ContinuumStart
{
    private const int MostBlocks = 10;
    private const int LeastPixels = 30;

    // High enough to stand above crowded absorption, low enough to stand below a narrow emission line.
    private const double UpperFraction = 0.8;
    private const double MiddleFraction = 0.5;

    // Some instruments bend their spectra this much between two valleys; so does a broad emission line.
    private const double HumpHeight = 1.3;

    /// <summary>Sets the level of the data to a line through the upper quantiles of its blocks.</summary>
    /// <returns>Whether the level has a hump that may as well be broad emission.</returns>
    internal static bool SetUpperLevel(ContinuumData data)
    {
        (double[] x, double[] y) = BlockQuantiles(data, UpperFraction);
        RobustlySmooth(y);
        SetLevel(data, x, y);
        return HasHump(y);
    }

    /// <summary>Sets the level of the data to the line that hangs below all humps of its blocks.</summary>
    internal static void SetLowerLevel(ContinuumData data)
    {
        (double[] x, double[] y) = BlockQuantiles(data, MiddleFraction);
        int last = x.Length - 1;
        for (int from = 0; from < last;)
        {
            // The next corner of the lower convex hull is the one seen at the steepest fall.
            int to = from + 1;
            for (int b = from + 2; b <= last; b++)
            {
                if ((y[b] - y[from]) / (x[b] - x[from]) <= (y[to] - y[from]) / (x[to] - x[from]))
                {
                    to = b;
                }
            }

            for (int b = from + 1; b < to; b++)
            {
                y[b] = y[from] + ((x[b] - x[from]) / (x[to] - x[from]) * (y[to] - y[from]));
            }

            from = to;
        }

        SetLevel(data, x, y);
    }

    private static (double[] X, double[] Y) BlockQuantiles(ContinuumData data, double fraction)
    {
        int blocks = Math.Clamp(data.Count / LeastPixels, 1, MostBlocks);
        var x = new double[blocks];
        var y = new double[blocks];
        for (int b = 0; b < blocks; b++)
        {
            int start = (int)((long)data.Count * b / blocks);
            int end = (int)((long)data.Count * (b + 1) / blocks);
            x[b] = data.X[(start + end) / 2];
            double[] values = data.Flux.AsSpan(start, end - start).ToArray();
            y[b] = ContinuumData.Quantile(values, fraction);
        }

        return (x, y);
    }

    private static void SetLevel(ContinuumData data, double[] x, double[] y)
    {
        int blocks = x.Length;
        int j = 0;
        for (int i = 0; i < data.Count; i++)
        {
            while (j < blocks - 2 && data.X[i] > x[j + 1])
            {
                j++;
            }

            data.Level[i] = blocks == 1 ? y[0]
                : y[j] + ((Math.Clamp(data.X[i], x[0], x[^1]) - x[j]) / (x[j + 1] - x[j]) * (y[j + 1] - y[j]));
        }
    }

    private static bool HasHump(double[] y)
    {
        for (int b = 1; b < y.Length - 1; b++)
        {
            double left = TensorPrimitives.Min<double>(y.AsSpan(0, b));
            double right = TensorPrimitives.Min<double>(y.AsSpan(b + 1));
            if (y[b] > HumpHeight * Math.Max(left, right))
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>The scatter about the first guess in units of the quoted noise, at least 1.</summary>
    internal static double NoiseScale(ContinuumData data)
    {
        var deviations = new double[data.Count];
        for (int i = 0; i < deviations.Length; i++)
        {
            deviations[i] = Math.Abs(data.Flux[i] - data.Level[i]) * data.InverseSigma[i];
        }

        return Math.Max(1.0, 1.4826 * ContinuumData.Quantile(deviations, 0.5));
    }

    // A block under a broad line, or under broad emission, is replaced by the middle one of three.
    private static void RobustlySmooth(double[] y)
    {
        double[] copy = [.. y];
        for (int b = 1; b < y.Length - 1; b++)
        {
            double a = copy[b - 1];
            double c = copy[b + 1];
            y[b] = Math.Max(Math.Min(a, c), Math.Min(Math.Max(a, c), copy[b]));
        }
    }
}
