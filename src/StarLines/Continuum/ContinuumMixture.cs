using System;

namespace StarLines.Continuum;

/// <summary>
/// How likely a pixel is continuum, by its residual r in units of its noise: the density of residuals is
/// p(r) = w φ(r) + ρ₋ Φ(−r) + ρ₊ Φ(r), a normal core and two one-sided tails of pixels that lines have pulled
/// down or up by any amount. ρ is the number of such pixels per unit of r next to the continuum.
/// </summary>
/// <remarks>
/// The derivative of ln p by the level is P (r + κ)/σ, with P = w φ/p the probability of being continuum and
/// κ = (ρ₋ − ρ₊)/w: the most likely level is a least-squares fit with weights P/σ² to the flux raised by κ σ. The shift
/// undoes the pull of the shallow absorption that no weight can tell from continuum.
/// </remarks>
internal sealed class ContinuumMixture
{
    /// <summary>Residuals beyond this are not continuum, and the tails are counted up to here.</summary>
    internal const double Reach = 5.0;

    private const int PerUnit = 32;
    private const double TableReach = 6.0;
    private const int TableLength = (int)(2 * TableReach * PerUnit) + 2;

    // A crowded spectrum keeps this much continuum, or the level would float above all data.
    private const double LeastCore = 0.08;
    private const double LargestShift = 0.6;
    private const double LeastDensity = 1e-5;

    // A block is told what the whole spectrum is like with the weight of this many pixels.
    private const double PriorPixels = 60.0;

    private static readonly double[] s_phi = MakePhi();
    private static readonly double[] s_upper = MakeUpper();

    /// <summary>A mixture to begin with: some absorption, little emission.</summary>
    internal ContinuumMixture()
    {
        Set(0.6, 0.06, 0.01);
    }

    /// <summary>Fraction of pixels in the core, among those within <see cref="Reach"/>.</summary>
    internal double Core { get; private set; }

    /// <summary>Density of absorbed pixels, per unit of r.</summary>
    internal double Below { get; private set; }

    /// <summary>Density of pixels in emission, per unit of r.</summary>
    internal double Above { get; private set; }

    /// <summary>κ = (ρ₋ − ρ₊)/w, in units of the noise.</summary>
    internal double Shift => Math.Clamp((Below - Above) / Core, -LargestShift, LargestShift);

    /// <summary>The probabilities that a residual belongs to a continuum pixel, and to an absorbed one.</summary>
    /// <param name="r">Residual in units of the noise, within ±<see cref="Reach"/>.</param>
    /// <param name="absorbed">Receives the probability of being absorbed.</param>
    internal double Probability(double r, out double absorbed)
    {
        double position = (r + TableReach) * PerUnit;
        int i = (int)position;
        double part = position - i;
        double phi = s_phi[i] + (part * (s_phi[i + 1] - s_phi[i]));
        double upper = s_upper[i] + (part * (s_upper[i + 1] - s_upper[i]));
        double core = Core * phi;
        double below = Below * (1.0 - upper);
        double inverse = 1.0 / (core + below + (Above * upper));
        absorbed = below * inverse;
        return core * inverse;
    }

    /// <summary>ln p(r), with the tails held constant beyond the table.</summary>
    internal double LogDensity(double r)
    {
        double position = Math.Clamp((r + TableReach) * PerUnit, 0.0, TableLength - 1);
        int i = (int)position;
        double upper = s_upper[i];
        return Math.Log((Core * s_phi[i]) + (Below * (1.0 - upper)) + (Above * upper));
    }

    /// <summary>Learns the three numbers from the sums of an expectation step.</summary>
    /// <param name="counts">The sums.</param>
    /// <param name="prior">The mixture of a wider region, counted as some pixels; null for none.</param>
    internal void Learn(in MixtureCounts counts, ContinuumMixture? prior)
    {
        double extra = prior is null ? 0.0 : PriorPixels;
        double pixels = counts.Pixels + extra;
        double core = counts.Core + (extra * (prior?.Core ?? 0.0));
        double below = counts.Below + (extra * (prior?.Below ?? 0.0) * Reach);
        if (pixels < 1.0)
        {
            return;
        }

        double above = Math.Max(0.0, pixels - core - below);
        Set(core / pixels, below / (pixels * Reach), above / (pixels * Reach));
    }

    private void Set(double core, double below, double above)
    {
        Core = Math.Max(core, LeastCore);
        Below = Math.Max(below, LeastDensity);
        Above = Math.Max(above, LeastDensity);
    }

    private static double[] MakePhi()
    {
        var table = new double[TableLength];
        for (int i = 0; i < TableLength; i++)
        {
            double r = (i / (double)PerUnit) - TableReach;
            table[i] = Math.Exp(-0.5 * r * r) / Math.Sqrt(2.0 * Math.PI);
        }

        return table;
    }

    private static double[] MakeUpper()
    {
        var table = new double[TableLength];
        for (int i = 0; i < TableLength; i++)
        {
            double r = (i / (double)PerUnit) - TableReach;
            table[i] = 0.5 * MathNet.Numerics.SpecialFunctions.Erfc(-r / Math.Sqrt(2.0));
        }

        return table;
    }
}
