using System;

namespace StarLines.Velocities;

/// <summary>The least uncertainty of a velocity that the photons of a spectrum allow.</summary>
/// <remarks>
/// W_i = λ_i² (dA/dλ)_i²/σ_i², δV = c/√ΣW, Q = √ΣW/√ΣA for σ² = A.
/// Source: Bouchy, Pepe and Queloz (2001), A&amp;A 374, 733, after Connes (1985), Ap&amp;SS 110, 211.
/// </remarks>
public static class PhotonLimit
{
    /// <summary>The photon limit of a spectrum from its own slopes, by central differences (one-sided at the ends).</summary>
    /// <param name="wavelengthsAngstrom">N wavelengths, Å, increasing.</param>
    /// <param name="flux">N fluxes, of a noise-free spectrum or one of high signal to noise: noise adds slopes of its own.</param>
    /// <param name="variance">N variances of the flux; pixels without a positive one are left out.</param>
    /// <returns>One standard deviation of the velocity, km/s; infinite where there is no slope.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static double KmPerS(ReadOnlySpan<double> wavelengthsAngstrom, ReadOnlySpan<double> flux, ReadOnlySpan<double> variance)
    {
        Guard.SameLength(flux.Length, wavelengthsAngstrom.Length, nameof(flux));
        Guard.SameLength(variance.Length, wavelengthsAngstrom.Length, nameof(variance));
        var slope = new double[flux.Length];
        Slopes(wavelengthsAngstrom, flux, slope);
        return PhysicalConstants.SpeedOfLightKmPerS / Math.Sqrt(Information(wavelengthsAngstrom, slope, variance));
    }

    /// <summary>The quality factor Q of a spectrum counted in photo-electrons: δV = c/(Q √N_e).</summary>
    /// <param name="wavelengthsAngstrom">N wavelengths, Å, increasing.</param>
    /// <param name="electrons">N counts.</param>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static double Quality(ReadOnlySpan<double> wavelengthsAngstrom, ReadOnlySpan<double> electrons)
    {
        double total = 0.0;
        foreach (double count in electrons)
        {
            total += count;
        }

        return PhysicalConstants.SpeedOfLightKmPerS / (KmPerS(wavelengthsAngstrom, electrons, electrons) * Math.Sqrt(total));
    }

    /// <summary>Σ λ² (dA/dλ)²/σ² over the pixels with a positive variance.</summary>
    internal static double Information(ReadOnlySpan<double> wavelengths, ReadOnlySpan<double> slope, ReadOnlySpan<double> variance)
    {
        double sum = 0.0;
        for (int i = 0; i < wavelengths.Length; i++)
        {
            if (variance[i] > 0.0)
            {
                double d = wavelengths[i] * slope[i];
                sum += d * d / variance[i];
            }
        }

        return sum;
    }

    /// <summary>Derivatives of second order at unequal steps; one-sided at the ends.</summary>
    private static void Slopes(ReadOnlySpan<double> x, ReadOnlySpan<double> y, Span<double> slope)
    {
        int n = x.Length;
        if (n < 2)
        {
            slope.Clear();
            return;
        }

        slope[0] = (y[1] - y[0]) / (x[1] - x[0]);
        slope[n - 1] = (y[n - 1] - y[n - 2]) / (x[n - 1] - x[n - 2]);
        for (int i = 1; i < n - 1; i++)
        {
            double left = x[i] - x[i - 1];
            double right = x[i + 1] - x[i];
            slope[i] = ((left * left * (y[i + 1] - y[i])) + (right * right * (y[i] - y[i - 1]))) / (left * right * (left + right));
        }
    }
}
