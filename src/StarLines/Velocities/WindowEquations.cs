using System;

namespace StarLines.Velocities;

/// <summary>
/// The normal equations of one window: ln(1 + z) and broadening, which all windows share, and depth, level and tilt, which
/// are its own and are eliminated.
/// </summary>
internal static class WindowEquations
{
    /// <summary>Shared parameters: ln(1 + z), broadening.</summary>
    internal const int Shared = 2;

    private const int Own = 3;
    private const int All = Shared + Own;

    /// <summary>
    /// Linearizes r = a t − (level + tilt x)(1 − a t) at the present parameters, sums the normal equations with the Gaussian
    /// priors of the window's own parameters, eliminates these, and moves them to where the shared ones stay.
    /// </summary>
    /// <param name="absorption">1 − flux/continuum, N values.</param>
    /// <param name="weight">Inverse variances, N values.</param>
    /// <param name="template">Template t, N values.</param>
    /// <param name="byShift">∂t/∂ζ, N values.</param>
    /// <param name="byBroadening">∂t/∂(broadening), N values.</param>
    /// <param name="depthMean">Mean of the prior of the depth.</param>
    /// <param name="depthSigma">Standard deviation of it.</param>
    /// <param name="state">The window; receives information, step, χ² and pixels.</param>
    /// <param name="reduced">Receives the reduced matrix (00, 01, 11) and the right side (0, 1).</param>
    internal static void Solve(
        ReadOnlySpan<double> absorption,
        ReadOnlySpan<double> weight,
        ReadOnlySpan<double> template,
        ReadOnlySpan<double> byShift,
        ReadOnlySpan<double> byBroadening,
        double depthMean,
        double depthSigma,
        ref WindowState state,
        Span<double> reduced)
    {
        Span<double> matrix = stackalloc double[All * All];
        Span<double> right = stackalloc double[All];
        matrix.Clear();
        right.Clear();
        Sum(absorption, weight, template, byShift, byBroadening, ref state, matrix, right);
        AddPrior(matrix, right, 2, depthSigma, depthMean - state.Depth);
        AddPrior(matrix, right, 3, state.LevelSigma, -state.Level);
        AddPrior(matrix, right, 4, state.TiltSigma, -state.Tilt);
        state.PhotonInformation = matrix[0];
        Eliminate(matrix, right);
        reduced[0] = matrix[0];
        reduced[1] = matrix[1];
        reduced[2] = matrix[All + 1];
        reduced[3] = right[0];
        reduced[4] = right[1];
        state.Information = matrix[0];
        state.Step = matrix[0] > 0.0 ? right[0] / matrix[0] : 0.0;
        BackSubstitute(matrix, right, ref state);
    }

    private static void Sum(
        ReadOnlySpan<double> absorption,
        ReadOnlySpan<double> weight,
        ReadOnlySpan<double> template,
        ReadOnlySpan<double> byShift,
        ReadOnlySpan<double> byBroadening,
        ref WindowState state,
        Span<double> matrix,
        Span<double> right)
    {
        double a = state.Depth;
        double centre = 0.5 * (absorption.Length - 1);
        double scale = 1.0 / Math.Max(centre, 1.0);
        double vv = 0, vb = 0, va = 0, vc = 0, vs = 0, bb = 0, ba = 0, bc = 0, bs = 0, aa = 0, ac = 0, sa = 0, cc = 0, cs = 0, ss = 0;
        double rv = 0, rb = 0, ra = 0, rc = 0, rs = 0, chi = 0;
        int pixels = 0;
        for (int i = 0; i < absorption.Length; i++)
        {
            double w = weight[i];
            if (w <= 0.0)
            {
                continue;
            }

            double x = (i - centre) * scale;
            double t = template[i];
            double flux = 1.0 - (a * t);
            double shape = state.Level + (state.Tilt * x);
            double e = absorption[i] - (a * t) + (shape * flux);
            double stretch = 1.0 + shape;
            double jv = a * byShift[i] * stretch;
            double jb = a * byBroadening[i] * stretch;
            double ja = t * stretch;
            double jc = -flux;
            double js = -x * flux;
            double wv = w * jv;
            double wb = w * jb;
            double wa = w * ja;
            double wc = w * jc;
            double we = w * e;
            vv += wv * jv;
            vb += wv * jb;
            va += wv * ja;
            vc += wv * jc;
            vs += wv * js;
            bb += wb * jb;
            ba += wb * ja;
            bc += wb * jc;
            bs += wb * js;
            aa += wa * ja;
            ac += wa * jc;
            sa += wa * js;
            cc += wc * jc;
            cs += wc * js;
            ss += w * js * js;
            rv += we * jv;
            rb += we * jb;
            ra += we * ja;
            rc += we * jc;
            rs += we * js;
            chi += we * e;
            pixels++;
        }

        state.ChiSquare = chi;
        state.Pixels = pixels;
        ReadOnlySpan<double> upper = [vv, vb, va, vc, vs, bb, ba, bc, bs, aa, ac, sa, cc, cs, ss];
        int at = 0;
        for (int i = 0; i < All; i++)
        {
            for (int j = i; j < All; j++)
            {
                matrix[(i * All) + j] = upper[at];
                matrix[(j * All) + i] = upper[at];
                at++;
            }
        }

        right[0] = rv;
        right[1] = rb;
        right[2] = ra;
        right[3] = rc;
        right[4] = rs;
    }

    private static void AddPrior(Span<double> matrix, Span<double> right, int k, double sigma, double distance)
    {
        double precision = 1.0 / (sigma * sigma);
        matrix[(k * All) + k] += precision;
        right[k] += precision * distance;
    }

    /// <summary>Gaussian elimination of the own parameters, last first; the priors keep every pivot positive.</summary>
    private static void Eliminate(Span<double> matrix, Span<double> right)
    {
        for (int k = All - 1; k >= Shared; k--)
        {
            double pivot = 1.0 / matrix[(k * All) + k];
            for (int i = 0; i < k; i++)
            {
                double factor = matrix[(i * All) + k] * pivot;
                right[i] -= factor * right[k];
                for (int j = 0; j <= i; j++)
                {
                    matrix[(i * All) + j] -= factor * matrix[(j * All) + k];
                    matrix[(j * All) + i] = matrix[(i * All) + j];
                }
            }
        }
    }

    /// <summary>The own parameters at the present shared ones.</summary>
    private static void BackSubstitute(ReadOnlySpan<double> matrix, ReadOnlySpan<double> right, ref WindowState state)
    {
        Span<double> step = stackalloc double[All];
        step.Clear();
        for (int k = Shared; k < All; k++)
        {
            double value = right[k];
            for (int j = Shared; j < k; j++)
            {
                value -= matrix[(k * All) + j] * step[j];
            }

            step[k] = value / matrix[(k * All) + k];
        }

        state.Depth += step[2];
        state.Level += step[3];
        state.Tilt += step[4];
    }
}
