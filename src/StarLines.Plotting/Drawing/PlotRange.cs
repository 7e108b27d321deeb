using System;

namespace StarLines.Plotting.Drawing;

/// <summary>Chooses the range of a vertical axis so that single wild pixels and noisy ends do not squash the rest.</summary>
internal static class PlotRange
{
    /// <summary>Pixels in a row that must reach a value for it to count as real.</summary>
    private const int Support = 3;

    /// <summary>A value further out than the supported ones by up to this share of their range is still shown.</summary>
    private const double Stretch = 0.6;

    /// <summary>The share of pixels at each end that may lie outside.</summary>
    private const double TailQuantile = 0.004;

    /// <summary>
    /// The range that three good pixels in a row reach, less what their errors exceed the usual by, and that 99.2 per cent
    /// of the medians of three lie in; with the extremes, where they are not far outside.
    /// </summary>
    /// <param name="y">N values; those that are not finite are left out.</param>
    /// <param name="sigma">N standard deviations, or none.</param>
    /// <param name="used">N flags, or none where all are used.</param>
    internal static DataRange Robust(ReadOnlySpan<double> y, ReadOnlySpan<double> sigma, ReadOnlySpan<bool> used)
    {
        double[] values = Kept(y, used, y, out int count);
        if (count == 0)
        {
            return new DataRange(0.0, 1.0);
        }

        double[] errors = sigma.Length == 0 ? [] : Kept(y, used, sigma, out _);
        (double low, double high) = Tails(values, count);
        double usual = errors.Length == 0 ? 0.0 : Median(errors, count);
        double lowest = double.PositiveInfinity, highest = double.NegativeInfinity;
        for (int i = 0; i < count; i++)
        {
            double doubt = errors.Length == 0 ? 0.0 : 2.0 * Math.Max(0.0, errors[i] - usual);
            lowest = Math.Min(lowest, values[i] + doubt);
            highest = Math.Max(highest, values[i] - doubt);
            if (i >= Support - 1)
            {
                (double least, double largest) = Reached(values, i, doubt);
                high = Math.Max(high, least);
                low = Math.Min(low, largest);
            }
        }

        double reach = Stretch * (high - low);
        return new DataRange(
            lowest >= low - reach ? Math.Min(low, lowest) : low, highest <= high + reach ? Math.Max(high, highest) : high);
    }

    /// <summary>The power of ten to take out of the numbers of an axis: 0 where they are easy to read as they are.</summary>
    internal static int Exponent(DataRange range)
    {
        double largest = Math.Max(Math.Abs(range.Minimum), Math.Abs(range.Maximum));
        return largest is >= 1e-2 and < 1e5 ? 0 : (int)Math.Floor(Math.Log10(largest));
    }

    private static double[] Kept(ReadOnlySpan<double> y, ReadOnlySpan<bool> used, ReadOnlySpan<double> source, out int count)
    {
        var kept = new double[y.Length];
        count = 0;
        for (int i = 0; i < y.Length; i++)
        {
            if (double.IsFinite(y[i]) && (used.Length == 0 || used[i]))
            {
                kept[count++] = source[i];
            }
        }

        return kept;
    }

    /// <summary>The quantiles of the medians of three neighbours.</summary>
    private static (double Low, double High) Tails(double[] values, int count)
    {
        var medians = new double[count];
        for (int i = 0; i < count; i++)
        {
            double a = values[Math.Max(0, i - 1)], b = values[i], c = values[Math.Min(count - 1, i + 1)];
            medians[i] = Math.Max(Math.Min(a, b), Math.Min(Math.Max(a, b), c));
        }

        Array.Sort(medians);
        int tail = (int)(TailQuantile * (count - 1));
        return (medians[tail], medians[count - 1 - tail]);
    }

    private static double Median(double[] values, int count)
    {
        double[] sorted = values.AsSpan(0, count).ToArray();
        Array.Sort(sorted);
        return sorted[count / 2];
    }

    private static (double Least, double Largest) Reached(double[] values, int last, double doubt)
    {
        double least = double.PositiveInfinity, largest = double.NegativeInfinity;
        for (int k = last - Support + 1; k <= last; k++)
        {
            least = Math.Min(least, values[k] - doubt);
            largest = Math.Max(largest, values[k] + doubt);
        }

        return (least, largest);
    }
}
