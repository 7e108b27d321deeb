using System;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Continuum;

/// <summary>
/// The sums of one expectation step over the pixels of one knot interval and one block: weights by the probability of being
/// continuum, the moments of the weighted data, and what the noise model learns from.
/// </summary>
/// <remarks>Inputs are finite. A pixel with inverse sigma 0, or further than the reach from its level, adds nothing.</remarks>
internal static class MixtureKernel
{
    // Φ(r) ≈ 1/(1 + exp(−1.5976 r − 0.070566 r³)) to 1.4e-4: Page (1977), Applied Statistics 26, 75.
    internal const double StepLinear = 1.5976;
    internal const double StepCubic = 0.070566;

    private const double NormalPeak = 0.398942280401432677939946;

    /// <summary>Adds pixels four at a time.</summary>
    /// <param name="x">N wavelengths.</param>
    /// <param name="flux">N fluxes.</param>
    /// <param name="inverseSigma">N inverse standard deviations.</param>
    /// <param name="level">N levels.</param>
    /// <param name="frame">What is the same for all of them.</param>
    /// <param name="moments">Added to.</param>
    /// <param name="counts">Added to.</param>
    internal static void Add(
        ReadOnlySpan<double> x,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> inverseSigma,
        ReadOnlySpan<double> level,
        in KernelFrame frame,
        ref SplineMoments moments,
        ref MixtureCounts counts)
    {
        int lanes = Vector256<double>.Count;
        int whole = Vector256.IsHardwareAccelerated ? x.Length - (x.Length % lanes) : 0;
        if (whole > 0)
        {
            AddVectors(x[..whole], flux[..whole], inverseSigma[..whole], level[..whole], frame, ref moments, ref counts);
        }

        AddPlain(x[whole..], flux[whole..], inverseSigma[whole..], level[whole..], frame, ref moments, ref counts);
    }

    /// <summary>Adds pixels one by one.</summary>
    internal static void AddPlain(
        ReadOnlySpan<double> x,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> inverseSigma,
        ReadOnlySpan<double> level,
        in KernelFrame frame,
        ref SplineMoments moments,
        ref MixtureCounts counts)
    {
        for (int i = 0; i < x.Length; i++)
        {
            double w = inverseSigma[i];
            double ws = w * frame.InverseScale;
            double r = (flux[i] - level[i]) * ws;
            if (!(w > 0.0) || !(Math.Abs(r) < ContinuumMixture.Reach))
            {
                continue;
            }

            double core = frame.Core * NormalPeak * Math.Exp(-0.5 * r * r);
            double fall = Math.Exp(-r * (StepLinear + (StepCubic * r * r)));
            double upper = 1.0 / (1.0 + fall);
            double below = frame.Below * (1.0 - upper);
            double inverse = 1.0 / (core + below + (frame.Above * upper));
            double p = core * inverse;
            counts.Add(r, frame.Shift, p, below * inverse);
            moments.Add((x[i] - frame.Left) * frame.PerStep, p * ws * ws, flux[i] + (frame.Shift / ws));
        }
    }

    private static void AddVectors(
        ReadOnlySpan<double> x,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> inverseSigma,
        ReadOnlySpan<double> level,
        in KernelFrame frame,
        ref SplineMoments moments,
        ref MixtureCounts counts)
    {
        Vector256<double> one = Vector256.Create(1.0);
        Vector256<double> reach = Vector256.Create(ContinuumMixture.Reach);
        Vector256<double> m0 = default, m1 = default, m2 = default, m3 = default, m4 = default, m5 = default, m6 = default;
        Vector256<double> y0 = default, y1 = default, y2 = default, y3 = default;
        Vector256<double> pixels = default, cores = default, belows = default, lost = default, squares = default, weights = default;
        for (int i = 0; i < x.Length; i += Vector256<double>.Count)
        {
            Vector256<double> f = Load(flux, i);
            Vector256<double> ws = Load(inverseSigma, i) * frame.InverseScale;
            Vector256<double> r = (f - Load(level, i)) * ws;
            Vector256<double> good = Vector256.GreaterThan(ws, default) & Vector256.LessThan(Vector256.Abs(r), reach);
            r = Vector256.Min(Vector256.Max(r, -reach), reach);
            Vector256<double> r2 = r * r;
            Vector256<double> core = Vector256.Exp(-0.5 * r2) * (frame.Core * NormalPeak);
            Vector256<double> fall = Vector256.Exp(-r * (Vector256.Create(StepLinear) + (StepCubic * r2)));
            Vector256<double> upper = one / (one + fall);
            Vector256<double> below = (one - upper) * frame.Below;
            Vector256<double> inverse = one / (core + below + (upper * frame.Above));
            Vector256<double> p = core * inverse & good;
            Vector256<double> shifted = r + Vector256.Create(frame.Shift);
            Vector256<double> above = p & Vector256.GreaterThan(r, default);
            pixels += one & good;
            cores += p;
            belows += below * inverse & good;
            lost += p * (one - p) * shifted * shifted;
            squares += above * r2;
            weights += above;

            // Where ws is 0 the shift is divided by 1, and the weight of the datum is 0.
            Vector256<double> t = (Load(x, i) - Vector256.Create(frame.Left)) * frame.PerStep;
            Vector256<double> w = p * ws * ws;
            Vector256<double> v = w * (f + (Vector256.Create(frame.Shift) / Vector256.ConditionalSelect(good, ws, one)));
            Vector256<double> t2 = t * t;
            Vector256<double> t3 = t2 * t;
            Vector256<double> w3 = w * t3;
            m0 += w;
            m1 += w * t;
            m2 += w * t2;
            m3 += w3;
            m4 += w3 * t;
            m5 += w3 * t2;
            m6 += w3 * t3;
            y0 += v;
            y1 += v * t;
            y2 += v * t2;
            y3 += v * t3;
        }

        moments.W0 += Vector256.Sum(m0);
        moments.W1 += Vector256.Sum(m1);
        moments.W2 += Vector256.Sum(m2);
        moments.W3 += Vector256.Sum(m3);
        moments.W4 += Vector256.Sum(m4);
        moments.W5 += Vector256.Sum(m5);
        moments.W6 += Vector256.Sum(m6);
        moments.Y0 += Vector256.Sum(y0);
        moments.Y1 += Vector256.Sum(y1);
        moments.Y2 += Vector256.Sum(y2);
        moments.Y3 += Vector256.Sum(y3);
        counts.Pixels += Vector256.Sum(pixels);
        counts.Core += Vector256.Sum(cores);
        counts.Below += Vector256.Sum(belows);
        counts.Lost += Vector256.Sum(lost);
        counts.Squares += Vector256.Sum(squares);
        counts.Weight += Vector256.Sum(weights);
    }

    private static Vector256<double> Load(ReadOnlySpan<double> values, int index) =>
        Vector256.LoadUnsafe(ref MemoryMarshal.GetReference(values), (nuint)index);
}
