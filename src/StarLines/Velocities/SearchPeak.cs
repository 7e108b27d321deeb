using System;
using StarLines.Numerics;

namespace StarLines.Velocities;

/// <summary>The highest peak of a correlation function: place, height, width, errors, and how sure it is.</summary>
internal readonly record struct SearchPeak
{
    /// <summary>Lags within this many widths of the peak say nothing of the noise.</summary>
    private const double Excluded = 1.5;

    /// <summary>So many widths of lags away from the peak are needed to judge the noise from them.</summary>
    private const double EnoughWidths = 12.0;

    /// <summary>Index of the highest sample.</summary>
    internal int Index { get; private init; }

    /// <summary>Lag of the vertex, in steps.</summary>
    internal double Lag { get; private init; }

    /// <summary>Height of the vertex.</summary>
    internal double Height { get; private init; }

    /// <summary>Full width at half height, in steps; NaN where the range ends before.</summary>
    internal double Width { get; private init; }

    /// <summary>Error by Zucker (2003), in steps.</summary>
    internal double ZuckerError { get; private init; }

    /// <summary>The ratio of Tonry and Davis (1979).</summary>
    internal double Ratio { get; private init; }

    /// <summary>Error by Tonry and Davis, in steps.</summary>
    internal double TonryDavisError { get; private init; }

    /// <summary>Height in standard deviations of the noise.</summary>
    internal double Significance { get; private init; }

    /// <summary>Whether the peak lies at an end of the range.</summary>
    internal bool AtEnd { get; private init; }

    /// <summary>Finds the peak.</summary>
    /// <param name="c">Correlation, lag 0 in the middle.</param>
    /// <param name="pixels">Number of pixels that went into it.</param>
    internal static SearchPeak Find(ReadOnlySpan<double> c, int pixels)
    {
        int index = System.Numerics.Tensors.TensorPrimitives.IndexOfMax(c);
        int middle = c.Length / 2;
        if (index <= 0 || index >= c.Length - 1)
        {
            return new SearchPeak
            {
                Index = index,
                Lag = index - middle,
                Height = c[Math.Max(index, 0)],
                Width = double.NaN,
                ZuckerError = double.NaN,
                Ratio = double.NaN,
                TonryDavisError = double.NaN,
                Significance = Sureness(c, index, c[Math.Max(index, 0)], double.NaN, pixels),
                AtEnd = true,
            };
        }

        (double place, double height, double curvature) = CorrelationPeak.Parabola(c, index);
        double width = CorrelationPeak.WidthAt(c, index, 0.5 * height);
        double sigma = CorrelationPeak.AntisymmetricSigma(c, place, periodic: false);
        double ratio = CorrelationPeak.Ratio(height, sigma);
        return new SearchPeak
        {
            Index = index,
            Lag = place - middle,
            Height = height,
            Width = width,
            ZuckerError = CorrelationPeak.ZuckerError(pixels, height, curvature),
            Ratio = ratio,
            TonryDavisError = CorrelationPeak.TonryDavisError(width, ratio),
            Significance = Sureness(c, index, height, width, pixels),
        };
    }

    /// <summary>The peak of a second star, taken from the correlation without the first.</summary>
    /// <param name="c">Correlation without the first star, lag 0 in the middle.</param>
    /// <param name="index">Index of the maximum.</param>
    /// <param name="pixels">Number of pixels that went into it.</param>
    /// <param name="significance">Height in standard deviations.</param>
    internal static SearchPeak At(ReadOnlySpan<double> c, int index, int pixels, double significance)
    {
        (double place, double height, double curvature) = CorrelationPeak.Parabola(c, index);
        double width = CorrelationPeak.WidthAt(c, index, 0.5 * height);
        double ratio = CorrelationPeak.Ratio(height, CorrelationPeak.AntisymmetricSigma(c, place, periodic: false));
        return new SearchPeak
        {
            Index = index,
            Lag = place - (c.Length / 2),
            Height = height,
            Width = width,
            ZuckerError = CorrelationPeak.ZuckerError(pixels, height, curvature),
            Ratio = ratio,
            TonryDavisError = CorrelationPeak.TonryDavisError(width, ratio),
            Significance = significance,
        };
    }

    /// <summary>
    /// Height over noise: by the number of pixels, √(N/(1 − c²)), and where the range is long against the peak also by the
    /// scatter of the correlation away from it, which knows of correlated noise and of lines that do not belong.
    /// </summary>
    private static double Sureness(ReadOnlySpan<double> c, int index, double height, double width, int pixels)
    {
        double byPixels = height * Math.Sqrt(pixels / Math.Max(1.0 - (height * height), 1e-6));
        if (double.IsNaN(width))
        {
            return byPixels;
        }

        var away = new double[c.Length];
        int n = 0;
        int reach = (int)Math.Ceiling(Excluded * width);
        for (int k = 0; k < c.Length; k++)
        {
            if (Math.Abs(k - index) > reach)
            {
                away[n++] = Math.Abs(c[k]);
            }
        }

        if (n < EnoughWidths * width)
        {
            return byPixels;
        }

        Array.Sort(away, 0, n);
        double scatter = 1.4826 * away[n / 2];
        return scatter > 0.0 ? Math.Min(byPixels, height / scatter) : byPixels;
    }
}
