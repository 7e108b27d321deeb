using System;
using StarLines.Numerics;

namespace StarLines.Profiles;

/// <summary>
/// φ = exp(−(λ − λ₀)²/(2σ²)), one width σ. The mean over a pixel from a to b is
/// σ √(π/2) [erf(u_b) − erf(u_a)]/(b − a) with u = (λ − λ₀)/(σ √2).
/// </summary>
internal sealed class GaussianProfile : ILineProfile
{
    /// <summary>√2.</summary>
    private const double Sqrt2 = 1.414_213_562_373_095_1;

    /// <summary>√(π/2).</summary>
    private const double SqrtHalfPi = 1.253_314_137_315_500_3;

    /// <summary>√(2π).</summary>
    private const double SqrtTwoPi = 2.506_628_274_631_000_5;

    /// <summary>Beyond 7 σ the profile is below 2.3e-11, less than any spectrum resolves.</summary>
    private const double ReachInSigma = 7.0;

    /// <inheritdoc/>
    public string Name => "gaussian";

    /// <inheritdoc/>
    public int WidthCount => 1;

    /// <inheritdoc/>
    public void Evaluate(
        PixelGrid pixels,
        double centre,
        ReadOnlySpan<double> widths,
        Span<double> value,
        Span<double> byCentre,
        Span<double> byWidths,
        Span<double> scratch)
    {
        if (pixels.Sampling == PixelSampling.Integrated)
        {
            EvaluateMean(pixels.Edges, centre, widths[0], value, byCentre, byWidths, scratch);
        }
        else
        {
            EvaluatePoint(pixels.Centres, centre, widths[0], value, byCentre, byWidths, scratch);
        }
    }

    /// <inheritdoc/>
    public void Begin(double fwhmAngstrom, Span<double> widths) => widths[0] = fwhmAngstrom / PhysicalConstants.FwhmPerSigma;

    /// <inheritdoc/>
    public double Fwhm(ReadOnlySpan<double> widths, Span<double> gradient)
    {
        gradient[0] = PhysicalConstants.FwhmPerSigma;
        return widths[0] * PhysicalConstants.FwhmPerSigma;
    }

    /// <inheritdoc/>
    public double Area(ReadOnlySpan<double> widths, Span<double> gradient)
    {
        gradient[0] = SqrtTwoPi;
        return widths[0] * SqrtTwoPi;
    }

    /// <inheritdoc/>
    public double Reach(ReadOnlySpan<double> widths) => ReachInSigma * widths[0];

    private static void EvaluateMean(
        ReadOnlySpan<double> edges,
        double centre,
        double sigma,
        Span<double> value,
        Span<double> byCentre,
        Span<double> bySigma,
        Span<double> scratch)
    {
        Span<double> u = scratch[..edges.Length];
        Span<double> erf = scratch.Slice(edges.Length, edges.Length);
        Span<double> gaussian = scratch.Slice(2 * edges.Length, edges.Length);
        double scale = 1.0 / (sigma * Sqrt2);
        for (int i = 0; i < u.Length; i++)
        {
            u[i] = (edges[i] - centre) * scale;
        }

        ErrorFunction.Evaluate(u, erf, gaussian);
        double perSigma = 1.0 / sigma;
        for (int i = 0; i < edges.Length - 1; i++)
        {
            double perPixel = 1.0 / (edges[i + 1] - edges[i]);
            double mean = sigma * SqrtHalfPi * (erf[i + 1] - erf[i]) * perPixel;
            value[i] = mean;
            byCentre[i] = (gaussian[i] - gaussian[i + 1]) * perPixel;
            bySigma[i] = (mean * perSigma) - (Sqrt2 * ((u[i + 1] * gaussian[i + 1]) - (u[i] * gaussian[i])) * perPixel);
        }
    }

    private static void EvaluatePoint(
        ReadOnlySpan<double> centres,
        double centre,
        double sigma,
        Span<double> value,
        Span<double> byCentre,
        Span<double> bySigma,
        Span<double> scratch)
    {
        int count = centres.Length;
        Span<double> u = scratch[..count];
        double scale = 1.0 / (sigma * Sqrt2);
        for (int i = 0; i < count; i++)
        {
            u[i] = (centres[i] - centre) * scale;
        }

        ErrorFunction.Evaluate(u, scratch.Slice(count, count), value);
        double factor = Sqrt2 / sigma;
        for (int i = 0; i < count; i++)
        {
            byCentre[i] = value[i] * u[i] * factor;
            bySigma[i] = byCentre[i] * u[i] * Sqrt2;
        }
    }
}
