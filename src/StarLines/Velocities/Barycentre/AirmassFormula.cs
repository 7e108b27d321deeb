using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>Relative air mass.</summary>
internal static class AirmassFormula
{
    /// <summary>Air mass at a height over the horizon without refraction; NaN below the horizon.</summary>
    /// <param name="altitudeDegrees">True altitude, degrees.</param>
    /// <remarks>Young (1994), Applied Optics 33, 1108, eq. (5): a fit good to 0.004 at the horizon.</remarks>
    internal static double AtTrueAltitude(double altitudeDegrees)
    {
        if (!(altitudeDegrees >= 0.0))
        {
            return double.NaN;
        }

        double c = Math.Sin(altitudeDegrees * (Math.PI / 180.0));
        double numerator = (((1.002432 * c) + 0.148386) * c) + 0.0096467;
        double denominator = ((((c + 0.149864) * c) + 0.0102963) * c) + 0.000303978;
        return numerator / denominator;
    }
}
