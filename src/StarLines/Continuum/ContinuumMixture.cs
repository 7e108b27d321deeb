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

    // A crowded spectrum keeps this much continuum, or the level would float above all data.
    private const double LeastCore = 0.08;
    private const double LargestShift = 0.6;
    private const double LeastDensity = 1e-5;

    // A block is told what the whole spectrum is like with the weight of this many pixels.
    private const double PriorPixels = 60.0;

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

    /// <summary>A mixture of its own with the same numbers.</summary>
    internal ContinuumMixture Copy() => (ContinuumMixture)MemberwiseClone();

    /// <summary>The probability that a residual belongs to a continuum pixel; 0 beyond the reach.</summary>
    internal double Probability(double r) =>
        Math.Abs(r) < Reach ? Core * NormalDensity(r) / Density(r) : 0.0;

    /// <summary>ln p(r), with the tails held constant beyond the reach.</summary>
    internal double LogDensity(double r) => Math.Log(Density(Math.Clamp(r, -Reach - 1.0, Reach + 1.0)));

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

    private static double NormalDensity(double r) => Math.Exp(-0.5 * r * r) / Math.Sqrt(2.0 * Math.PI);

    private double Density(double r)
    {
        double upper = 1.0 / (1.0 + Math.Exp(-r * (MixtureKernel.StepLinear + (MixtureKernel.StepCubic * r * r))));
        return (Core * NormalDensity(r)) + (Below * (1.0 - upper)) + (Above * upper);
    }
}
