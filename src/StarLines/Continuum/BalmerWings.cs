using System;

namespace StarLines.Continuum;

/// <summary>Finds the Balmer lines that are broader than the continuum may bend, and leaves them out of the fit.</summary>
internal static class BalmerWings
{
    // Vacuum and air wavelengths of H-alpha to H-zeta, Å, to the Å that a window of tens of Å needs (NIST ASD).
    private static readonly double[] s_air = [6562.8, 4861.3, 4340.5, 4101.7, 3970.1, 3889.1];
    private static readonly double[] s_vacuum = [6564.6, 4862.7, 4341.7, 4102.9, 3971.2, 3890.2];

    private const double RingKmPerS = 250.0;
    private const int FirstRing = 2;
    private const int LeastPixels = 4;

    // Rings reach to 5500 km/s, but from H-epsilon on only half way to the next line.
    private const int MostRings = 22;
    private const int MostRingsCrowded = 11;
    private const int CrowdedFrom = 4;

    // A wing is broad when the ring from 500 to 750 km/s is this deep; metal lines do not reach its upper quantile.
    private const double BroadDepth = 0.04;

    // The wing ends where less than this is left.
    private const double EndDepth = 0.006;
    private const double UpperFraction = 0.7;

    /// <summary>Takes the weight off the pixels of broad Balmer lines.</summary>
    /// <param name="data">The pixels.</param>
    /// <param name="medium">Air or vacuum; unknown counts as air.</param>
    /// <param name="velocityKmPerS">Velocity of the star.</param>
    internal static void Exclude(ContinuumData data, Medium medium, double velocityKmPerS)
    {
        double[] rest = medium == Medium.Vacuum ? s_vacuum : s_air;
        for (int line = 0; line < rest.Length; line++)
        {
            double centre = rest[line] * (1.0 + (velocityKmPerS / PhysicalConstants.SpeedOfLightKmPerS));
            int rings = line < CrowdedFrom ? MostRings : MostRingsCrowded;
            double outer = centre * rings * RingKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
            if (centre - outer > data.X[0] && centre + outer < data.X[^1])
            {
                ExcludeLine(data, centre, rings);
            }
        }
    }

    private static void ExcludeLine(ContinuumData data, double centre, int rings)
    {
        // Both wings must be there: a band head or the slope of the response makes one side only.
        int blue = WingRings(data, centre, -1, rings);
        int red = WingRings(data, centre, 1, rings);
        if (blue == 0 || red == 0)
        {
            return;
        }

        double ring = centre * RingKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
        TakeWeightOff(data, centre - (blue * ring), centre + (red * ring));
    }

    private static int WingRings(ContinuumData data, double centre, int side, int rings)
    {
        double ring = centre * RingKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
        double near = Upper(data, centre + (side * (rings - 2) * ring), centre + (side * rings * ring));
        double far = Upper(data, centre - (side * (rings - 2) * ring), centre - (side * rings * ring));
        double previous = double.PositiveInfinity;
        for (int k = FirstRing; k < rings; k++)
        {
            // The level runs straight between the outermost rings on both sides.
            double along = (k + 0.5) / (rings - 1.0);
            double level = (0.5 * (near + far)) + (0.5 * along * (near - far));
            double depth = 1.0 - (Upper(data, centre + (side * k * ring), centre + (side * (k + 1) * ring)) / level);
            if (k == FirstRing && !(depth > BroadDepth))
            {
                return 0;
            }

            // Past the minimum of the depth the next line or the level itself takes over.
            if (depth < EndDepth || depth > previous * 1.15)
            {
                return k;
            }

            previous = Math.Min(previous, depth);
        }

        return rings;
    }

    private static double Upper(ContinuumData data, double from, double to)
    {
        int start = IndexOf(data, Math.Min(from, to));
        int end = IndexOf(data, Math.Max(from, to));
        return end - start < LeastPixels
            ? double.NaN
            : ContinuumData.Quantile(data.Flux.AsSpan(start, end - start).ToArray(), UpperFraction);
    }

    private static void TakeWeightOff(ContinuumData data, double from, double to)
    {
        int end = IndexOf(data, to);
        for (int i = IndexOf(data, from); i < end; i++)
        {
            data.InverseSigma[i] = 0.0;
        }
    }

    private static int IndexOf(ContinuumData data, double x)
    {
        int found = Array.BinarySearch(data.X, x);
        return found >= 0 ? found : ~found;
    }
}
