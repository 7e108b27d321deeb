using System;

namespace StarLines.Velocities;

/// <summary>The wavelengths of a spectrum in vacuum, in which shifts are multiplications.</summary>
internal static class VacuumAxis
{
    /// <summary>
    /// Refractivity is computed at every so many pixels and interpolated between: over 0.5 % of wavelength it bends
    /// by under 10⁻¹⁰, which is 0.03 m/s; no interval is longer.
    /// </summary>
    private const int Knots = 32;

    private const double LongestInterval = 0.005;

    /// <summary>Wavelengths in vacuum; the scale's own memory where it is in vacuum already.</summary>
    /// <param name="scale">The scale.</param>
    /// <param name="assumed">What it is taken for where its medium is unknown.</param>
    /// <param name="destination">Count values of memory to use where something must be converted.</param>
    internal static ReadOnlySpan<double> Of(WavelengthScale scale, Medium assumed, Span<double> destination)
    {
        ReadOnlySpan<double> air = scale.WavelengthsAngstrom;
        if ((scale.Medium == Medium.Unknown ? assumed : scale.Medium) != Medium.Air)
        {
            return air;
        }

        int n = air.Length;
        for (int start = 0; start < n;)
        {
            int end = Math.Min(start + Knots, n - 1);
            while (end > start + 1 && air[end] > air[start] * (1.0 + LongestInterval))
            {
                end = (start + end) / 2;
            }

            double first = AirVacuum.ToVacuumAngstrom(air[start]) / air[start];
            destination[start] = air[start] * first;
            if (end == start)
            {
                break;
            }

            double last = AirVacuum.ToVacuumAngstrom(air[end]) / air[end];
            double slope = (last - first) / (air[end] - air[start]);
            for (int i = start + 1; i <= end; i++)
            {
                destination[i] = air[i] * (first + (slope * (air[i] - air[start])));
            }

            start = end;
            if (end == n - 1)
            {
                break;
            }
        }

        return destination[..n];
    }
}
