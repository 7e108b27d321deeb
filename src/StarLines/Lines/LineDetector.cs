using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Numerics;
using StarLines.Velocities;

namespace StarLines.Lines;

/// <summary>Finds lines, in absorption and in emission, where there is no list.</summary>
public static class LineDetector
{
    /// <summary>Ratio of neighbouring widths that are tried.</summary>
    private const double WidthStep = 1.4142135623730951;

    /// <summary>Narrowest width that is tried, pixels.</summary>
    private const double NarrowestPixels = 1.5;

    /// <summary>Widest width that is tried, pixels: the cost grows with it.</summary>
    private const double WidestPixels = 300.0;

    /// <summary>Two lines nearer than this many full widths are one: the dip between two equal Gaussians vanishes at 2 σ.</summary>
    private const double SparrowLimitFwhm = 0.849;

    /// <summary>
    /// Finds the lines of a spectrum: the maxima, in position and width together, of the significance of a Gaussian filter
    /// matched to the noise.
    /// </summary>
    /// <param name="spectrum">The spectrum, with uncertainties.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="options">How.</param>
    /// <returns>
    /// Lines at rest in the spectrum's medium, named by their wavelength (<c>6562.8</c>), with depth and width as found.
    /// </returns>
    /// <exception cref="ArgumentException">The spectrum has no uncertainties, the continuum is of another length, or an option is out of range.</exception>
    public static LineList Detect(Spectrum spectrum, ContinuumFit continuum, LineDetectOptions options)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(options);
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        Guard.Positive(options.DetectionSignificance, nameof(options), "standard deviations");
        Guard.Positive(options.WidestKmPerS, nameof(options), "km/s");
        if (!spectrum.HasSigma)
        {
            throw new ArgumentException(
                "The spectrum has no uncertainties; estimate them from the flux before looking for lines.", nameof(spectrum));
        }

        using var pixels = new NormalizedPixels(spectrum, continuum);
        double[] widths = Widths(pixels, options);
        double[][] significance = new double[widths.Length][];
        for (int k = 0; k < widths.Length; k++)
        {
            significance[k] = Filter(pixels, widths[k]);
        }

        List<Found> found = Maxima(significance, widths, options.DetectionSignificance);
        return ToList(KeepSeparate(found), pixels, Doppler.Factor(options.VelocityKmPerS));
    }

    private static double[] Widths(NormalizedPixels pixels, LineDetectOptions options)
    {
        int middle = pixels.Count / 2;
        double perPixel = pixels.Spectrum.Scale.WavelengthsAngstrom[middle] / pixels.PixelWidth(middle);
        double resolvingPower = options.ResolvingPower ?? pixels.Spectrum.Metadata.ResolvingPower ?? double.PositiveInfinity;
        double narrowest = Math.Max(NarrowestPixels, perPixel / resolvingPower);
        double widest = Math.Min(perPixel * options.WidestKmPerS / PhysicalConstants.SpeedOfLightKmPerS, WidestPixels);
        var widths = new List<double>();
        for (double width = narrowest; width <= Math.Max(widest, narrowest * WidthStep * WidthStep); width *= WidthStep)
        {
            widths.Add(width);
        }

        return [.. widths];
    }

    /// <summary>Significance of a Gaussian of a given full width, in pixels, at every pixel; absorption positive.</summary>
    private static double[] Filter(NormalizedPixels pixels, double fwhmPixels)
    {
        double sigma = fwhmPixels / PhysicalConstants.FwhmPerSigma;
        int reach = Math.Min(pixels.Count - 1, (int)Math.Ceiling(MatchedFilter.ReachInSigma * sigma));
        var kernel = new double[(2 * reach) + 1];
        var squares = new double[kernel.Length];
        for (int k = -reach; k <= reach; k++)
        {
            kernel[k + reach] = Math.Exp(-0.5 * k * k / (sigma * sigma));
            squares[k + reach] = kernel[k + reach] * kernel[k + reach];
        }

        int count = pixels.Count;
        var weights = new double[count];
        var signals = new double[count];
        for (int i = 0; i < count; i++)
        {
            weights[i] = pixels.Weight[i] * pixels.Weight[i];
            signals[i] = weights[i] * (1.0 - pixels.Flux[i]);
        }

        var significance = new double[count];
        for (int i = 0; i < count; i++)
        {
            int first = Math.Max(0, i - reach);
            int length = Math.Min(count - 1, i + reach) - first + 1;
            int offset = first - (i - reach);
            var response = new FilterResponse(
                FixedLanes.Dot(signals.AsSpan(first, length), kernel.AsSpan(offset, length)),
                FixedLanes.Dot(weights.AsSpan(first, length), squares.AsSpan(offset, length)),
                FixedLanes.Dot(weights.AsSpan(first, length), kernel.AsSpan(offset, length)));
            double level = pixels.Continuum.Level[i];
            significance[i] = level > 0.0 ? response.Significance(pixels.Continuum.Sigma[i] / level) : 0.0;
        }

        return significance;
    }

    private static List<Found> Maxima(double[][] significance, double[] widths, double threshold)
    {
        var found = new List<Found>();
        for (int k = 0; k < widths.Length; k++)
        {
            double[] row = significance[k];
            for (int i = 0; i < row.Length; i++)
            {
                double size = Math.Abs(row[i]);
                if (size >= threshold && IsHighest(significance, k, i))
                {
                    found.Add(new Found(i + Offset(row, i), widths[k], row[i]));
                }
            }
        }

        return found;
    }

    /// <summary>Whether no neighbour in position or width is more significant with the same sign.</summary>
    private static bool IsHighest(double[][] significance, int width, int pixel)
    {
        double value = significance[width][pixel];
        double sign = Math.Sign(value);
        for (int k = Math.Max(0, width - 1); k <= Math.Min(significance.Length - 1, width + 1); k++)
        {
            for (int i = Math.Max(0, pixel - 1); i <= Math.Min(significance[k].Length - 1, pixel + 1); i++)
            {
                if ((k != width || i != pixel) && sign * significance[k][i] > sign * value)
                {
                    return false;
                }
            }
        }

        return true;
    }

    /// <summary>Where the parabola through three values has its summit, pixels from the middle one.</summary>
    private static double Offset(double[] row, int pixel)
    {
        if (pixel == 0 || pixel == row.Length - 1)
        {
            return 0.0;
        }

        double bend = row[pixel - 1] - (2.0 * row[pixel]) + row[pixel + 1];
        return bend == 0.0 ? 0.0 : Math.Clamp(0.5 * (row[pixel - 1] - row[pixel + 1]) / bend, -0.5, 0.5);
    }

    /// <summary>The strongest first; what lies too near to a stronger one is the same line.</summary>
    private static List<Found> KeepSeparate(List<Found> found)
    {
        found.Sort(static (a, b) => Math.Abs(b.Significance).CompareTo(Math.Abs(a.Significance)));
        var kept = new List<Found>();
        foreach (Found candidate in found)
        {
            bool separate = true;
            foreach (Found other in kept)
            {
                // A narrow core inside a broad line of the other sign is a line of its own.
                double width = other.Significance * candidate.Significance > 0.0
                    ? Math.Max(other.FwhmPixels, candidate.FwhmPixels)
                    : Math.Min(other.FwhmPixels, candidate.FwhmPixels);
                separate &= Math.Abs(other.Pixel - candidate.Pixel) >= SparrowLimitFwhm * width;
            }

            if (separate)
            {
                kept.Add(candidate);
            }
        }

        kept.Sort(static (a, b) => a.Pixel.CompareTo(b.Pixel));
        return kept;
    }

    private static LineList ToList(List<Found> found, NormalizedPixels pixels, double factor)
    {
        WavelengthScale scale = pixels.Spectrum.Scale;
        var rests = new double[found.Count];
        for (int i = 0; i < rests.Length; i++)
        {
            double observed = scale.WavelengthAngstrom(found[i].Pixel);
            rests[i] = LineWavelengths.Predict(observed, scale.Medium, scale.Medium, 1.0 / factor);
        }

        var lines = new RestLine[rests.Length];
        for (int i = 0; i < lines.Length; i++)
        {
            int pixel = Math.Clamp((int)Math.Round(found[i].Pixel), 0, pixels.Count - 1);
            lines[i] = new RestLine
            {
                Name = Name(rests, i),
                Species = "",
                WavelengthAngstrom = rests[i],
                FwhmAngstrom = found[i].FwhmPixels * pixels.PixelWidth(pixel) / factor,
                Source = "found in the spectrum",
            };
        }

        return new LineList("detected", scale.Medium, lines);
    }

    /// <summary>The wavelength with as many decimals as tell it from its neighbours, at least one.</summary>
    private static string Name(double[] rests, int index)
    {
        const int MostDecimals = 4;
        int decimals = 1;
        while (decimals < MostDecimals && (Same(rests, index, index - 1, decimals) || Same(rests, index, index + 1, decimals)))
        {
            decimals++;
        }

        return Text(rests[index], decimals);
    }

    private static bool Same(double[] rests, int index, int other, int decimals) =>
        other >= 0 && other < rests.Length && Text(rests[index], decimals) == Text(rests[other], decimals);

    private static string Text(double value, int decimals) =>
        value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private readonly record struct Found(double Pixel, double FwhmPixels, double Significance);
}
