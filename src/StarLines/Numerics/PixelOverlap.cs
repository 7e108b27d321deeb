using System;
using System.Diagnostics;

namespace StarLines.Numerics;

/// <summary>Rebins pixels onto other pixels by the overlap of their intervals, so that sums are conserved.</summary>
internal static class PixelOverlap
{
    /// <summary>
    /// Deals the contents of each source pixel out to the target pixels in proportion to the overlap. What lies outside the
    /// target is dropped. The sum over the target equals the sum over the source where the source lies inside.
    /// NaN spreads to the target pixels that it touches.
    /// </summary>
    /// <param name="sourceEdges">N + 1 increasing edges.</param>
    /// <param name="contents">N amounts, such as flux × pixel width, or weights.</param>
    /// <param name="targetEdges">M + 1 increasing edges in the same unit.</param>
    /// <param name="destination">Receives M amounts; other memory.</param>
    internal static void Deal(
        ReadOnlySpan<double> sourceEdges,
        ReadOnlySpan<double> contents,
        ReadOnlySpan<double> targetEdges,
        Span<double> destination)
    {
        Guard.SameLength(contents.Length + 1, sourceEdges.Length, nameof(contents));
        Guard.SameLength(destination.Length + 1, targetEdges.Length, nameof(destination));
        destination.Clear();
        int j = 0;
        for (int i = 0; i < contents.Length; i++)
        {
            double left = sourceEdges[i];
            double right = sourceEdges[i + 1];
            double density = contents[i] / (right - left);
            while (j < destination.Length && targetEdges[j + 1] <= left)
            {
                j++;
            }

            for (int k = j; k < destination.Length && targetEdges[k] < right; k++)
            {
                double overlap = Math.Min(right, targetEdges[k + 1]) - Math.Max(left, targetEdges[k]);
                destination[k] += Math.Max(overlap, 0.0) * density;
            }
        }
    }

    /// <summary>
    /// Rebins a flux density and its variance: F_j = Σ o_ij F_i / Σ o_ij and V_j = Σ o_ij² V_i / (Σ o_ij)², where o_ij is the
    /// overlap of source pixel i with target pixel j. Neighbouring target pixels that share a source pixel have correlated
    /// noise, which the variance of one pixel cannot say.
    /// </summary>
    /// <param name="sourceEdges">N + 1 increasing edges.</param>
    /// <param name="flux">N flux densities; finite.</param>
    /// <param name="variance">N variances, or none.</param>
    /// <param name="use">N flags: whether the pixel counts; one that does not leaves its share of the target uncovered.</param>
    /// <param name="targetEdges">M + 1 increasing edges in the same unit.</param>
    /// <param name="rebinned">Receives M flux densities, 0 where nothing covers the pixel; other memory.</param>
    /// <param name="rebinnedVariance">Receives M variances, or none.</param>
    /// <param name="coverage">Receives M covered fractions of the target pixels, 0 to 1.</param>
    internal static void Rebin(
        ReadOnlySpan<double> sourceEdges,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> variance,
        ReadOnlySpan<bool> use,
        ReadOnlySpan<double> targetEdges,
        Span<double> rebinned,
        Span<double> rebinnedVariance,
        Span<double> coverage)
    {
        Guard.SameLength(flux.Length + 1, sourceEdges.Length, nameof(flux));
        Guard.SameLength(use.Length, flux.Length, nameof(use));
        Guard.SameLength(rebinned.Length + 1, targetEdges.Length, nameof(rebinned));
        Guard.SameLength(coverage.Length, rebinned.Length, nameof(coverage));
        Debug.Assert(variance.IsEmpty == rebinnedVariance.IsEmpty, "Variances come in and go out together.");
        int first = 0;
        for (int j = 0; j < rebinned.Length; j++)
        {
            double left = targetEdges[j];
            double right = targetEdges[j + 1];
            while (first < flux.Length && sourceEdges[first + 1] <= left)
            {
                first++;
            }

            double sum = 0.0;
            double sumVariance = 0.0;
            double covered = 0.0;
            for (int i = first; i < flux.Length && sourceEdges[i] < right; i++)
            {
                double overlap = use[i] ? Math.Min(right, sourceEdges[i + 1]) - Math.Max(left, sourceEdges[i]) : 0.0;
                covered += overlap;
                sum += overlap * flux[i];
                sumVariance += variance.IsEmpty ? 0.0 : overlap * overlap * variance[i];
            }

            coverage[j] = Math.Min(covered / (right - left), 1.0);
            rebinned[j] = covered > 0.0 ? sum / covered : 0.0;
            if (!rebinnedVariance.IsEmpty)
            {
                rebinnedVariance[j] = covered > 0.0 ? sumVariance / (covered * covered) : 0.0;
            }
        }
    }
}
