using System;

namespace StarLines.Noise;

/// <summary>Finds cosmic-ray hits and dead pixels: single pixels sharper than any line the instrument can make.</summary>
public static class OutlierFinder
{
    // A line with a FWHM of 1.5 pixels or more leaves over 0.29 of its peak in a neighbour; a hit leaves less.
    private const double NeighbourFraction = 0.25;

    // One false alarm in some 10⁹ pixels of Gaussian noise.
    private const double Threshold = 6.0;

    /// <summary>Marks outliers.</summary>
    /// <param name="spectrum">The spectrum; N pixels.</param>
    /// <param name="sigma">N standard deviations of the flux.</param>
    /// <returns>N faults: <see cref="PixelFaults.Outlier"/> or none.</returns>
    /// <remarks>
    /// A pixel is an outlier when it stands more than 6 standard deviations off the straight line between its
    /// neighbours but one, and its nearest neighbours share less than a quarter of that excess.
    /// </remarks>
    public static PixelFaults[] Find(Spectrum spectrum, ReadOnlySpan<double> sigma)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        Guard.SameLength(sigma.Length, spectrum.Count, nameof(sigma));
        ReadOnlySpan<double> flux = spectrum.Flux;
        ReadOnlySpan<PixelFaults> faults = spectrum.Faults;
        var found = new PixelFaults[flux.Length];
        for (int i = 2; i < flux.Length - 2; i++)
        {
            double around = 0.5 * (flux[i - 2] + flux[i + 2]);
            double excess = flux[i] - around;
            if (Math.Abs(excess) > Threshold * sigma[i]
                && (faults[i - 2] | faults[i - 1] | faults[i] | faults[i + 1] | faults[i + 2]) == PixelFaults.None
                && IsSharp(flux, sigma, i, around, excess))
            {
                found[i] = PixelFaults.Outlier;
            }
        }

        return found;
    }

    private static bool IsSharp(ReadOnlySpan<double> flux, ReadOnlySpan<double> sigma, int i, double around, double excess)
    {
        double sign = Math.Sign(excess);
        double slope = 0.25 * (flux[i + 2] - flux[i - 2]);
        double left = sign * (flux[i - 1] - (around - slope));
        double right = sign * (flux[i + 1] - (around + slope));
        double size = Math.Abs(excess);
        double noise = 1.5 * (sigma[i - 1] + sigma[i + 1]) * 0.5;
        return Math.Max(left, right) < (NeighbourFraction * size) - noise
            && Math.Min(left, right) > (-NeighbourFraction * size);
    }
}
