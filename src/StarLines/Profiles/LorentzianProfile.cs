using System;

namespace StarLines.Profiles;

/// <summary>
/// φ = γ²/((λ − λ₀)² + γ²), one width γ, the half width at half maximum. The mean over a pixel from a to b is
/// γ [atan(v_b) − atan(v_a)]/(b − a) with v = (λ − λ₀)/γ.
/// </summary>
internal sealed class LorentzianProfile : ILineProfile
{
    /// <inheritdoc/>
    public string Name => "lorentzian";

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
            EvaluateMean(pixels.Edges, centre, widths[0], value, byCentre, byWidths);
        }
        else
        {
            EvaluatePoint(pixels.Centres, centre, widths[0], value, byCentre, byWidths);
        }
    }

    /// <inheritdoc/>
    public void Begin(double fwhmAngstrom, Span<double> widths) => widths[0] = 0.5 * fwhmAngstrom;

    /// <inheritdoc/>
    public double Fwhm(ReadOnlySpan<double> widths, Span<double> gradient)
    {
        gradient[0] = 2.0;
        return 2.0 * widths[0];
    }

    /// <inheritdoc/>
    public double Area(ReadOnlySpan<double> widths, Span<double> gradient)
    {
        gradient[0] = Math.PI;
        return Math.PI * widths[0];
    }

    /// <inheritdoc/>
    public double Reach(ReadOnlySpan<double> widths) => double.PositiveInfinity;

    private static void EvaluateMean(
        ReadOnlySpan<double> edges,
        double centre,
        double gamma,
        Span<double> value,
        Span<double> byCentre,
        Span<double> byGamma)
    {
        double perGamma = 1.0 / gamma;
        double v = (edges[0] - centre) * perGamma;
        double angle = Math.Atan(v);
        double height = 1.0 / (1.0 + (v * v));
        for (int i = 0; i < edges.Length - 1; i++)
        {
            double nextV = (edges[i + 1] - centre) * perGamma;
            double nextAngle = Math.Atan(nextV);
            double nextHeight = 1.0 / (1.0 + (nextV * nextV));
            double perPixel = 1.0 / (edges[i + 1] - edges[i]);
            value[i] = gamma * (nextAngle - angle) * perPixel;
            byCentre[i] = (height - nextHeight) * perPixel;
            byGamma[i] = (value[i] * perGamma) - (((nextV * nextHeight) - (v * height)) * perPixel);
            v = nextV;
            angle = nextAngle;
            height = nextHeight;
        }
    }

    private static void EvaluatePoint(
        ReadOnlySpan<double> centres,
        double centre,
        double gamma,
        Span<double> value,
        Span<double> byCentre,
        Span<double> byGamma)
    {
        double perGamma = 1.0 / gamma;
        for (int i = 0; i < centres.Length; i++)
        {
            double v = (centres[i] - centre) * perGamma;
            double height = 1.0 / (1.0 + (v * v));
            value[i] = height;
            byCentre[i] = 2.0 * v * height * height * perGamma;
            byGamma[i] = byCentre[i] * v;
        }
    }
}
