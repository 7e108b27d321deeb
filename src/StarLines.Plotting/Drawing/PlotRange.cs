using System;

namespace StarLines.Plotting.Drawing;

/// <summary>Chooses the range of a vertical axis so that single wild pixels do not squash the rest.</summary>
internal static class PlotRange
{
    /// <summary>Pixels in a row that must reach a value for it to count as real.</summary>
    private const int Support = 3;

    /// <summary>A value further out than the supported ones by up to this share of their range is still shown.</summary>
    private const double Stretch = 0.6;

    private const double TailQuantile = 0.004;

    /// <summary>The range of the flux that three pixels in a row support, by their lower or upper error where there is one.</summary>
    /// <param name="y">N values; those that are not finite are left out.</param>
    /// <param name="sigma">N standard deviations, or none.</param>
    /// <param name="used">N flags, or none where all are used.</param>
    internal static DataRange Robust(ReadOnlySpan<double> y, ReadOnlySpan<double> sigma, ReadOnlySpan<bool> used)
    {
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        double lowest = double.PositiveInfinity, highest = double.NegativeInfinity;
        var kept = new double[y.Length];
        int count = 0, run = 0;
        for (int i = 0; i < y.Length; i++)
        {
            if (!double.IsFinite(y[i]) || (used.Length != 0 && !used[i]))
            {
                run = 0;
                continue;
            }

            kept[count++] = y[i];
            lowest = Math.Min(lowest, y[i]);
            highest = Math.Max(highest, y[i]);
            if (++run >= Support)
            {
                (double least, double largest) = Supported(y, sigma, i);
                high = Math.Max(high, least);
                low = Math.Min(low, largest);
            }
        }

        if (count == 0)
        {
            return new DataRange(0.0, 1.0);
        }

        Array.Sort(kept, 0, count);
        int tail = (int)(TailQuantile * (count - 1));
        low = Math.Min(low, kept[tail]);
        high = Math.Max(high, kept[count - 1 - tail]);
        double reach = Stretch * (high - low);
        return new DataRange(lowest >= low - reach ? Math.Min(low, lowest) : low, highest <= high + reach ? Math.Max(high, highest) : high);
    }

    /// <summary>The largest value that all of the last pixels exceed and the smallest that none does, each less two standard deviations.</summary>
    private static (double Least, double Largest) Supported(ReadOnlySpan<double> y, ReadOnlySpan<double> sigma, int last)
    {
        double least = double.PositiveInfinity, largest = double.NegativeInfinity;
        for (int k = last - Support + 1; k <= last; k++)
        {
            double doubt = sigma.Length == 0 ? 0.0 : 2.0 * sigma[k];
            least = Math.Min(least, y[k] - doubt);
            largest = Math.Max(largest, y[k] + doubt);
        }

        return (least, largest);
    }

    /// <summary>The power of ten to take out of the numbers of an axis: 0 where they are easy to read as they are.</summary>
    internal static int Exponent(DataRange range)
    {
        double largest = Math.Max(Math.Abs(range.Minimum), Math.Abs(range.Maximum));
        if (largest is >= 1e-2 and < 1e5)
        {
            return 0;
        }

        return (int)Math.Floor(Math.Log10(largest));
    }
}
