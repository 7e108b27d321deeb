using System;

namespace StarLines.Velocities;

/// <summary>
/// Joins the velocities of windows: each has its variance by noise, and all share a scatter that the noise does not explain
/// (wavelengths at rest, blends, motions in the star), so that w = 1/(σ² + s²).
/// </summary>
internal static class WindowCombination
{
    /// <summary>A window further off than this many standard deviations is left out.</summary>
    private const double Cut = 4.5;

    /// <summary>Scatter is taken for real above this many standard deviations of χ².</summary>
    private const double Significance = 2.5;

    /// <summary>Median of χ² with one degree of freedom.</summary>
    private const double MedianChiSquare = 0.454_936;

    private const int Bisections = 40;

    /// <summary>
    /// Finds the scatter s², marks outliers, and gives the joint step and its variance. The scatter makes χ² equal to its
    /// degrees of freedom (Paule and Mandel 1982, Journal of Research NBS 87, 377), from a start by the median so that
    /// outliers do not raise it.
    /// </summary>
    /// <param name="windows">The windows with information, step and inflation; fates are set.</param>
    /// <param name="work">Scratch, as many values.</param>
    internal static Combination Join(Span<WindowState> windows, Span<double> work)
    {
        Readmit(windows);
        double centre = WeightedMedian(windows, work);
        double scatter = MedianScatter(windows, centre, work);
        int used = 0;
        foreach (ref WindowState window in windows)
        {
            if (window.Fate == WindowFate.Used)
            {
                double offset = window.Step - centre;
                if (offset * offset > Cut * Cut * (Variance(window) + scatter + centreVariance(windows, scatter)))
                {
                    window.Fate = WindowFate.Outlier;
                }
                else
                {
                    used++;
                }
            }
        }

        (double mean, double total, double chi) = Mean(windows, 0.0);
        scatter = chi > used - 1 + (Significance * Math.Sqrt(2.0 * Math.Max(used - 1, 1))) ? PauleMandel(windows, used) : 0.0;
        (mean, total, _) = Mean(windows, scatter);
        double variance = total > 0.0 ? 1.0 / total : double.NaN;
        if (scatter > 0.0)
        {
            // The scatter itself is known from few windows only: the variance of Student's distribution.
            variance *= used > 3 ? (used - 1.0) / (used - 3.0) : 3.0;
        }

        return new Combination(mean, variance, scatter, used);

        static double centreVariance(ReadOnlySpan<WindowState> windows, double scatter)
        {
            double total = Mean(windows, scatter).Total;
            return total > 0.0 ? 1.5 / total : 0.0;
        }
    }

    /// <summary>Variance of a window's step by noise.</summary>
    internal static double Variance(in WindowState window) => window.Inflation / window.Information;

    private static void Readmit(Span<WindowState> windows)
    {
        foreach (ref WindowState window in windows)
        {
            if (window.Fate == WindowFate.Outlier)
            {
                window.Fate = WindowFate.Used;
            }
        }
    }

    private static bool Counts(in WindowState window) => window.Fate == WindowFate.Used && window.Information > 0.0;

    /// <summary>The step that halves the information.</summary>
    private static double WeightedMedian(ReadOnlySpan<WindowState> windows, Span<double> work)
    {
        var weights = new double[windows.Length];
        int n = 0;
        double total = 0.0;
        foreach (ref readonly WindowState window in windows)
        {
            if (Counts(window))
            {
                // Standard deviations, not variances, as weights: one sharp line shall not decide alone.
                work[n] = window.Step;
                weights[n] = 1.0 / Math.Sqrt(Variance(window));
                total += weights[n++];
            }
        }

        work[..n].Sort(weights.AsSpan(0, n));
        double sum = 0.0;
        for (int k = 0; k < n; k++)
        {
            sum += weights[k];
            if (sum >= 0.5 * total)
            {
                return work[k];
            }
        }

        return 0.0;
    }

    /// <summary>The s² at which half of the windows lie within the median of their χ².</summary>
    private static double MedianScatter(ReadOnlySpan<WindowState> windows, double centre, Span<double> work)
    {
        if (MedianChi(windows, centre, 0.0, work) <= MedianChiSquare)
        {
            return 0.0;
        }

        double high = 0.0;
        foreach (ref readonly WindowState window in windows)
        {
            if (Counts(window))
            {
                double offset = window.Step - centre;
                high = Math.Max(high, offset * offset / MedianChiSquare);
            }
        }

        double low = 0.0;
        for (int k = 0; k < Bisections; k++)
        {
            double middle = 0.5 * (low + high);
            if (MedianChi(windows, centre, middle, work) > MedianChiSquare)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }

            if (high - low < 0.02 * high)
            {
                break;
            }
        }

        return high;
    }

    private static double MedianChi(ReadOnlySpan<WindowState> windows, double centre, double scatter, Span<double> work)
    {
        int n = 0;
        foreach (ref readonly WindowState window in windows)
        {
            if (Counts(window))
            {
                double offset = window.Step - centre;
                work[n++] = offset * offset / (Variance(window) + scatter);
            }
        }

        if (n == 0)
        {
            return 0.0;
        }

        work[..n].Sort();
        return (n & 1) == 1 ? work[n / 2] : 0.5 * (work[(n / 2) - 1] + work[n / 2]);
    }

    private static double PauleMandel(ReadOnlySpan<WindowState> windows, int used)
    {
        double low = 0.0;
        double high = 1e-16;
        while (Mean(windows, high).Chi > used - 1 && high < 1.0)
        {
            high *= 4.0;
        }

        for (int k = 0; k < Bisections && high - low > 1e-3 * high; k++)
        {
            double middle = 0.5 * (low + high);
            if (Mean(windows, middle).Chi > used - 1)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return high;
    }

    private static (double Mean, double Total, double Chi) Mean(ReadOnlySpan<WindowState> windows, double scatter)
    {
        double total = 0.0;
        double sum = 0.0;
        double squares = 0.0;
        foreach (ref readonly WindowState window in windows)
        {
            if (Counts(window))
            {
                double weight = 1.0 / (Variance(window) + scatter);
                total += weight;
                sum += weight * window.Step;
                squares += weight * window.Step * window.Step;
            }
        }

        double mean = total > 0.0 ? sum / total : 0.0;
        return (mean, total, squares - (mean * sum));
    }
}

/// <summary>The joint step in ln(1 + z), its variance, the scatter s² of the windows and the number of them used.</summary>
internal readonly record struct Combination(double Step, double Variance, double Scatter, int Used);
