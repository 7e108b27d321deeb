using System;

namespace StarLines.Numerics;

/// <summary>What a sampled correlation function says of its peak: place, height, width and the errors that follow from them.</summary>
internal static class CorrelationPeak
{
    /// <summary>The vertex of the parabola through a maximum and its two neighbours.</summary>
    /// <param name="c">Correlation at equal steps.</param>
    /// <param name="index">Index of the maximum; not the first or the last.</param>
    /// <returns>Place as a fractional index, height, and second derivative per step².</returns>
    internal static (double Index, double Height, double Curvature) Parabola(ReadOnlySpan<double> c, int index)
    {
        double curvature = c[index - 1] - (2.0 * c[index]) + c[index + 1];
        if (!(curvature < 0.0))
        {
            return (index, c[index], curvature);
        }

        double offset = 0.5 * (c[index - 1] - c[index + 1]) / curvature;
        return (index + offset, c[index] - (0.25 * (c[index - 1] - c[index + 1]) * offset), curvature);
    }

    /// <summary>
    /// Full width, in steps, where the peak falls to a level, by linear interpolation; NaN where it does not fall so far
    /// on both sides.
    /// </summary>
    /// <param name="c">Correlation at equal steps.</param>
    /// <param name="index">Index of the maximum.</param>
    /// <param name="level">The level, below the maximum.</param>
    internal static double WidthAt(ReadOnlySpan<double> c, int index, double level)
    {
        int right = index;
        while (right < c.Length && c[right] > level)
        {
            right++;
        }

        int left = index;
        while (left >= 0 && c[left] > level)
        {
            left--;
        }

        if (right >= c.Length || left < 0 || right == index)
        {
            return double.NaN;
        }

        double x1 = right - 1 + ((c[right - 1] - level) / (c[right - 1] - c[right]));
        double x0 = left + 1 - ((c[left + 1] - level) / (c[left + 1] - c[left]));
        return x1 - x0;
    }

    /// <summary>
    /// The standard deviation of the antisymmetric part of a correlation about its peak,
    /// σ_a² = (1/2N) Σ [c(δ + n) − c(δ − n)]², over the lags that lie inside on both sides, or round the circle.
    /// Source: Tonry and Davis (1979), AJ 84, 1511.
    /// </summary>
    /// <param name="c">Correlation at equal steps.</param>
    /// <param name="peak">Fractional index of the peak; values between samples by cubic interpolation.</param>
    /// <param name="periodic">Whether the last sample is followed by the first.</param>
    /// <returns>NaN where fewer than ten lags remain.</returns>
    internal static double AntisymmetricSigma(ReadOnlySpan<double> c, double peak, bool periodic)
    {
        int reach = periodic ? c.Length : (int)Math.Min(peak - 1.0, c.Length - 2.0 - peak) + 1;
        if (reach < 10)
        {
            return double.NaN;
        }

        double sum = 0.0;
        for (int n = 0; n < reach; n++)
        {
            double d = At(c, peak + n, periodic) - At(c, peak - n, periodic);
            sum += d * d;
        }

        return Math.Sqrt(sum / (2.0 * reach));
    }

    /// <summary>The ratio r = h/(√2 σ_a) of Tonry and Davis (1979).</summary>
    internal static double Ratio(double height, double antisymmetricSigma) => height / (Math.Sqrt(2.0) * antisymmetricSigma);

    /// <summary>The error (3/8) w/(1 + r) of the place, in the unit of w; Kurtz and Mink (1998), PASP 110, 934, after Tonry and Davis.</summary>
    internal static double TonryDavisError(double fwhm, double ratio) => 0.375 * fwhm / (1.0 + ratio);

    /// <summary>
    /// The maximum-likelihood error of the place, in steps: σ² = −[N (C″/C) C²/(1 − C²)]⁻¹. Source: Zucker (2003), MNRAS 342, 1291.
    /// </summary>
    /// <param name="count">Number N of pixels.</param>
    /// <param name="height">Height C of the peak, below 1.</param>
    /// <param name="curvature">Second derivative C″ per step², negative.</param>
    internal static double ZuckerError(int count, double height, double curvature)
    {
        double information = -count * curvature * height / (1.0 - (height * height));
        return information > 0.0 ? 1.0 / Math.Sqrt(information) : double.NaN;
    }

    /// <summary>The value at a fractional index by the cubic through the four samples around it.</summary>
    private static double At(ReadOnlySpan<double> c, double index, bool periodic)
    {
        double floor = Math.Floor(index);
        int i = (int)floor;
        double t = index - floor;
        if (t == 0.0)
        {
            return Sample(c, i, periodic);
        }

        double a = Sample(c, i - 1, periodic);
        double b = Sample(c, i, periodic);
        double d = Sample(c, i + 1, periodic);
        double e = Sample(c, i + 2, periodic);
        return (-t * (t - 1.0) * (t - 2.0) / 6.0 * a)
            + ((t + 1.0) * (t - 1.0) * (t - 2.0) / 2.0 * b)
            - ((t + 1.0) * t * (t - 2.0) / 2.0 * d)
            + ((t + 1.0) * t * (t - 1.0) / 6.0 * e);
    }

    private static double Sample(ReadOnlySpan<double> c, int index, bool periodic) =>
        periodic ? c[((index % c.Length) + c.Length) % c.Length] : c[Math.Clamp(index, 0, c.Length - 1)];
}
