using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;

namespace StarLines.Velocities;

/// <summary>
/// The hydrogen lines of a spectrum, as far as their wings reach: left out where metals are measured, since in a hot star
/// any metal line that falls on one of them outweighs all others.
/// </summary>
internal static class HydrogenMask
{
    private const double RingKmPerS = 100.0;
    private const int MostRings = 45;
    private const int LeastPixels = 2;

    // The wing ends where the upper part of a ring, which metal lines do not reach, is this near the continuum.
    private const double UpperFraction = 0.7;
    private const double EndDepth = 0.03;

    /// <summary>The ranges to leave out, in the spectrum's own medium and frame.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="hydrogen">Lines of hydrogen.</param>
    /// <param name="velocityKmPerS">Their velocity.</param>
    internal static List<WavelengthRange> Ranges(
        Spectrum spectrum, ContinuumFit continuum, LineList hydrogen, double velocityKmPerS)
    {
        var ranges = new List<WavelengthRange>();
        double factor = Doppler.Factor(velocityKmPerS);
        foreach (RestLine line in hydrogen.Lines)
        {
            double centre = LineWavelengths.Predict(line.WavelengthAngstrom, hydrogen.Medium, spectrum.Scale.Medium, factor);
            if (!spectrum.Scale.Range.Contains(centre))
            {
                continue;
            }

            double ring = centre * RingKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
            int blue = Rings(spectrum, continuum, centre, -ring);
            int red = Rings(spectrum, continuum, centre, ring);
            if (blue + red > 0)
            {
                ranges.Add(new WavelengthRange(centre - (blue * ring), centre + (red * ring)));
            }
        }

        return ranges;
    }

    private static int Rings(Spectrum spectrum, ContinuumFit continuum, double centre, double ring)
    {
        for (int k = 0; k < MostRings; k++)
        {
            double from = centre + (k * ring);
            double to = from + ring;
            if (!(Depth(spectrum, continuum, Math.Min(from, to), Math.Max(from, to)) > EndDepth))
            {
                return k;
            }
        }

        return MostRings;
    }

    // NaN, which ends the wing, where the ring holds no pixels.
    private static double Depth(Spectrum spectrum, ContinuumFit continuum, double from, double to)
    {
        WavelengthScale scale = spectrum.Scale;
        double middle = scale.IndexOf(0.5 * (from + to));
        int start = Math.Max(0, Math.Min(scale.FirstIndexAtOrAbove(from), (int)middle - 1));
        int end = Math.Min(scale.Count, Math.Max(scale.FirstIndexAtOrAbove(to), (int)middle + LeastPixels));
        var ratio = new double[Math.Max(0, end - start)];
        int count = 0;
        for (int i = start; i < end; i++)
        {
            if (spectrum.IsGood(i) && continuum.Level[i] > 0.0)
            {
                ratio[count++] = spectrum.Flux[i] / continuum.Level[i];
            }
        }

        return count < LeastPixels ? double.NaN : 1.0 - ContinuumData.Quantile(ratio.AsSpan(0, count), UpperFraction);
    }
}
