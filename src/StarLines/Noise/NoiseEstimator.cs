using System;
using StarLines.Numerics;

namespace StarLines.Noise;

/// <summary>The noise of a spectrum, taken from its own flux.</summary>
public static class NoiseEstimator
{
    // Stoehr et al. (2008): 1.482602 / √6, from the median absolute deviation of 2 f(i) − f(i−2) − f(i+2).
    private const double StoehrFactor = 1.482602 / 2.449489742783178;

    // A block of this many pixels fixes its noise to about 5 per cent and still follows the sensitivity of a detector.
    private const int BlockPixels = 600;

    // Fewer differences than this make a median worthless.
    private const int MinimumDifferences = 8;

    /// <summary>The noise of a run of pixels, as one number.</summary>
    /// <param name="flux">N values; finite.</param>
    /// <param name="faults">N faults of the pixels, or none; a difference that touches a bad pixel is left out.</param>
    /// <returns>One standard deviation in the flux unit; NaN where fewer than 8 differences are left.</returns>
    /// <remarks>
    /// noise = 1.482602/√6 · median |2 f(i) − f(i−2) − f(i+2)|. Holds for noise that is uncorrelated beyond one pixel.
    /// Source: Stoehr et al. (2008), ASP Conf. Ser. 394, 505.
    /// </remarks>
    public static double Estimate(ReadOnlySpan<double> flux, ReadOnlySpan<PixelFaults> faults = default)
    {
        var differences = new double[Math.Max(0, flux.Length - 4)];
        int count = 0;
        for (int i = 2; i < flux.Length - 2; i++)
        {
            if (faults.IsEmpty || (faults[i - 2] | faults[i] | faults[i + 2]) == PixelFaults.None)
            {
                differences[count++] = Math.Abs((2.0 * flux[i]) - flux[i - 2] - flux[i + 2]);
            }
        }

        return count < MinimumDifferences ? double.NaN : StoehrFactor * Median(differences.AsSpan(0, count));
    }

    /// <summary>The noise pixel by pixel: the estimate of blocks of 600 pixels, joined by straight lines.</summary>
    /// <param name="spectrum">The spectrum; N pixels.</param>
    /// <returns>N standard deviations in the flux unit; all NaN where no block has enough good pixels.</returns>
    public static double[] EstimatePerPixel(Spectrum spectrum)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        int count = spectrum.Count;
        int blocks = Math.Max(1, (int)Math.Round(count / (double)BlockPixels));
        var noise = new double[blocks];
        double whole = double.NaN;
        for (int b = 0; b < blocks; b++)
        {
            int start = (int)((long)count * b / blocks);
            int end = (int)((long)count * (b + 1) / blocks);
            double block = Estimate(spectrum.Flux[start..end], spectrum.Faults[start..end]);
            if (!(block > 0.0) && double.IsNaN(whole))
            {
                whole = Estimate(spectrum.Flux, spectrum.Faults);
            }

            noise[b] = block > 0.0 ? block : whole;
        }

        return Interpolated(noise, count);
    }

    private static double[] Interpolated(double[] noise, int count)
    {
        var sigma = new double[count];
        double perPixel = noise.Length / (double)count;
        for (int i = 0; i < count; i++)
        {
            double x = Math.Clamp(((i + 0.5) * perPixel) - 0.5, 0.0, noise.Length - 1.0);
            int b = Math.Min((int)x, Math.Max(0, noise.Length - 2));
            double next = noise[Math.Min(b + 1, noise.Length - 1)];
            sigma[i] = noise[b] + ((x - b) * (next - noise[b]));
        }

        return sigma;
    }

    private static double Median(Span<double> values)
    {
        int middle = values.Length / 2;
        double upper = Selection.Smallest(values, middle);
        if (values.Length % 2 == 1)
        {
            return upper;
        }

        // What selection leaves below the middle holds the value just before it.
        return 0.5 * (upper + System.Numerics.Tensors.TensorPrimitives.Max<double>(values[..middle]));
    }
}
