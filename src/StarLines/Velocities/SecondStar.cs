using System;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// A second star in the same light: a peak in the correlation that is left when the first star is taken away, confirmed by
/// both halves of the lines, then both stars fitted in turn with the other taken away.
/// </summary>
/// <remarks>Each fit takes the other star as known: where the lines of the two overlap the true errors are larger.</remarks>
internal sealed class SecondStar
{
    /// <summary>The second peak stands at least this far from the first, in widths of it: nearer the two cannot be told from one wide line.</summary>
    private const double LeastSeparation = 0.8;

    /// <summary>Least height in units of the first peak.</summary>
    private const double LeastHeight = 0.12;

    /// <summary>Least height in standard deviations of the rest of the correlation.</summary>
    private const double LeastSignificance = 7.0;

    /// <summary>Least depth of each half of the lines, in standard deviations of it.</summary>
    private const double LeastHalf = 4.0;

    /// <summary>Fewest windows of which halves mean something.</summary>
    private const int FewestWindows = 8;

    private const int Rounds = 3;

    private SecondStar(SearchPeak peak, VelocityFit first, VelocityFit second)
    {
        Peak = peak;
        FirstFit = first;
        SecondFit = second;
    }

    /// <summary>The second peak.</summary>
    internal SearchPeak Peak { get; }

    /// <summary>The first star, fitted without the second.</summary>
    internal VelocityFit FirstFit { get; }

    /// <summary>The second star, fitted without the first.</summary>
    internal VelocityFit SecondFit { get; }

    /// <summary>Looks for a second star; null where there is none that stands all tests.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="transform">The template.</param>
    /// <param name="c">The correlation.</param>
    /// <param name="peak">The first peak.</param>
    /// <param name="fit">The fit of the first star.</param>
    /// <param name="reach">How far a fit may move from its peak, in ln(1 + z).</param>
    internal static SecondStar? Find(
        ResidualSpectrum spectrum, TemplateTransform transform, double[] c, SearchPeak peak, VelocityFit fit, double reach)
    {
        if (double.IsNaN(peak.Width) || c.Length < 12.0 * peak.Width || fit.Joint.Used < FewestWindows)
        {
            return null;
        }

        double[] left = Subtract(transform, c, peak, fit.Broadening);
        if (Candidate(left, peak, spectrum.Used) is not SearchPeak second)
        {
            return null;
        }

        double start = second.Lag * transform.Grid.LogStep;
        ResidualSpectrum rest = spectrum.Without(fit);
        if (!BothHalves(rest, transform.Profile, start, fit.Broadening))
        {
            return null;
        }

        VelocityFit one = fit;
        VelocityFit two = VelocityFit.Run(rest, transform.Profile, start, reach, fit.Broadening, fitBroadening: false);
        for (int round = 0; round < Rounds && two.Converged && one.Converged; round++)
        {
            one = VelocityFit.Run(spectrum.Without(two), transform.Profile, fit.LogShift, reach, fit.Broadening, fitBroadening: false);
            two = VelocityFit.Run(spectrum.Without(one), transform.Profile, start, reach, fit.Broadening, fitBroadening: false);
        }

        return one.Converged && two.Converged && two.Joint.Used >= FewestWindows / 2 ? new SecondStar(second, one, two) : null;
    }

    /// <summary>The correlation without the first peak and the side lobes that belong to it.</summary>
    private static double[] Subtract(TemplateTransform transform, double[] c, SearchPeak peak, double broadening)
    {
        ReadOnlySpan<double> lobes = transform.Autocorrelation(broadening);
        var left = new double[c.Length];
        double centre = peak.Lag + (c.Length / 2);
        for (int k = 0; k < c.Length; k++)
        {
            double lag = Math.Abs(k - centre);
            int n = (int)lag;
            double f = lag - n;
            double lobe = n + 1 < lobes.Length ? (lobes[n] * (1.0 - f)) + (lobes[n + 1] * f) : 0.0;
            left[k] = c[k] - (peak.Height * lobe);
        }

        return left;
    }

    private static SearchPeak? Candidate(double[] left, SearchPeak peak, int pixels)
    {
        int best = -1;
        var sizes = new double[left.Length];
        int n = 0;
        for (int k = 1; k < left.Length - 1; k++)
        {
            if (Math.Abs(k - peak.Index) < LeastSeparation * peak.Width)
            {
                continue;
            }

            sizes[n++] = Math.Abs(left[k]);
            if (left[k] >= left[k - 1] && left[k] > left[k + 1] && (best < 0 || left[k] > left[best]))
            {
                best = k;
            }
        }

        if (best < 0 || left[best] < LeastHeight * peak.Height)
        {
            return null;
        }

        Array.Sort(sizes, 0, n);
        double scatter = Math.Max(1.4826 * sizes[n / 2], 1.0 / Math.Sqrt(pixels));
        double significance = left[best] / scatter;
        SearchPeak second = SearchPeak.At(left, best, pixels, significance);
        bool alike = second.Width > 0.5 * peak.Width && second.Width < 2.0 * peak.Width;
        return significance > LeastSignificance && alike ? second : null;
    }

    /// <summary>
    /// Whether the odd and the even windows, each alone, show the lines of the second star, judged by the scatter of the
    /// depths from window to window, which holds what the template leaves unexplained.
    /// </summary>
    private static bool BothHalves(ResidualSpectrum spectrum, TemplateProfile profile, double logShift, double broadening)
    {
        TemplateWindow[] windows = profile.Windows(spectrum.VacuumAngstrom, logShift, broadening);
        if (windows.Length < FewestWindows)
        {
            return false;
        }

        for (int half = 0; half < 2; half++)
        {
            if (HalfSignificance(spectrum, profile, windows, half, logShift, broadening) < LeastHalf)
            {
                return false;
            }
        }

        return true;
    }

    private static double HalfSignificance(
        ResidualSpectrum spectrum, TemplateProfile profile, TemplateWindow[] windows, int half, double logShift, double broadening)
    {
        double projections = 0.0;
        double squares = 0.0;
        double chi = 0.0;
        int count = 0;
        for (int g = half; g < windows.Length; g += 2)
        {
            (double projection, double square) = Project(spectrum, profile, windows[g], logShift, broadening);
            if (square > 0.0)
            {
                projections += projection;
                squares += square;
                chi += projection * projection / square;
                count++;
            }
        }

        if (count < 2 || squares <= 0.0)
        {
            return 0.0;
        }

        double depth = projections / squares;
        double excess = (chi - (depth * projections)) / (count - 1);
        return depth * Math.Sqrt(squares / Math.Max(excess, 1.0));
    }

    private static (double Projection, double Square) Project(
        ResidualSpectrum spectrum, TemplateProfile profile, TemplateWindow window, double logShift, double broadening)
    {
        int n = window.Length;
        var memory = new double[4 * n];
        Span<double> template = memory.AsSpan(0, n);
        profile.Evaluate(
            spectrum.VacuumAngstrom.Slice(window.Start, n),
            logShift,
            broadening,
            template,
            memory.AsSpan(n, n),
            memory.AsSpan(2 * n, n),
            memory.AsSpan(3 * n, n));
        double projection = 0.0;
        double square = 0.0;
        for (int i = 0; i < n; i++)
        {
            double weighted = spectrum.Weight[window.Start + i] * template[i];
            projection += weighted * spectrum.Absorption[window.Start + i];
            square += weighted * template[i];
        }

        return (projection, square);
    }
}
