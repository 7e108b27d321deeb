using System;
using System.Diagnostics;
using System.Numerics;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Numerics;

/// <summary>
/// A plan of the discrete Fourier transform of complex values in split arrays, for one size 2^a or 3 × 2^a.
/// Stockham's self-sorting algorithm by decimation in frequency, radix 4 with last passes of radix 2 or 3
/// (Van Loan 1992, Computational Frameworks for the Fast Fourier Transform, section 1.7). Immutable.
/// </summary>
internal sealed class ComplexFft
{
    private const double HalfSqrt3 = 0.866_025_403_784_438_6;

    private readonly Pass[] _passes;

    /// <summary>Makes a plan.</summary>
    /// <param name="size">Number of complex values: a power of two, or three times one.</param>
    internal ComplexFft(int size)
    {
        Debug.Assert(IsGood(size), "The size must be a power of two, or three times one.");
        Size = size;
        _passes = Plan(size);
    }

    /// <summary>Number of complex values.</summary>
    internal int Size { get; }

    /// <summary>The smallest size that has a plan and is not below a number.</summary>
    internal static int GoodSize(int minimum)
    {
        int power = (int)BitOperations.RoundUpToPowerOf2((uint)Math.Max(minimum, 1));
        int three = power / 4 * 3;
        return three >= minimum ? three : power;
    }

    /// <summary>Whether a size has a plan.</summary>
    internal static bool IsGood(int size) =>
        size > 0 && (BitOperations.IsPow2(size) || (size % 3 == 0 && BitOperations.IsPow2(size / 3)));

    /// <summary>
    /// Transforms in place: X_k = Σ x_j exp(−2πi jk/N). Swapping the two parts of the argument gives the inverse
    /// transform times N, its parts swapped. NaN spreads to every value.
    /// </summary>
    /// <param name="re">Real parts, <see cref="Size"/> values.</param>
    /// <param name="im">Imaginary parts, as many; other memory.</param>
    /// <param name="workRe">Scratch, as many; other memory.</param>
    /// <param name="workIm">Scratch, as many; other memory.</param>
    internal void Transform(Span<double> re, Span<double> im, Span<double> workRe, Span<double> workIm)
    {
        Guard.SameLength(re.Length, Size, nameof(re));
        Guard.SameLength(im.Length, Size, nameof(im));
        Guard.SameLength(workRe.Length, Size, nameof(workRe));
        Guard.SameLength(workIm.Length, Size, nameof(workIm));
        Span<double> xr = re;
        Span<double> xi = im;
        Span<double> yr = workRe;
        Span<double> yi = workIm;
        foreach (Pass pass in _passes)
        {
            Run(pass, xr, xi, yr, yi);
            Span<double> tr = xr;
            Span<double> ti = xi;
            xr = yr;
            xi = yi;
            yr = tr;
            yi = ti;
        }

        if ((_passes.Length & 1) != 0)
        {
            workRe.CopyTo(re);
            workIm.CopyTo(im);
        }
    }

    private static Pass[] Plan(int size)
    {
        var passes = new System.Collections.Generic.List<Pass>();
        int n = size;
        int stride = 1;
        while (n > 1)
        {
            int radix = n % 4 == 0 ? 4 : n % 2 == 0 ? 2 : 3;
            passes.Add(new Pass(radix, n, stride, Twiddles(radix, n)));
            n /= radix;
            stride *= radix;
        }

        return [.. passes];
    }

    /// <summary>For each p below n/radix the factors w^p, w^2p … of the outputs after the first, w = exp(−2πi/n).</summary>
    private static double[] Twiddles(int radix, int n)
    {
        int groups = n / radix;
        var factors = new double[2 * (radix - 1) * groups];
        int at = 0;
        for (int p = 0; p < groups; p++)
        {
            for (int k = 1; k < radix; k++)
            {
                (double sin, double cos) = Math.SinCos(-2.0 * Math.PI * ((long)k * p % n) / n);
                factors[at++] = cos;
                factors[at++] = sin;
            }
        }

        return factors;
    }

    private static void Run(
        in Pass pass, ReadOnlySpan<double> xr, ReadOnlySpan<double> xi, Span<double> yr, Span<double> yi)
    {
        switch (pass.Radix)
        {
            case 4 when pass.Stride >= Vector256<double>.Count:
                Radix4Wide(pass, xr, xi, yr, yi);
                break;
            case 4:
                Radix4(pass, xr, xi, yr, yi);
                break;
            case 2:
                Radix2(pass, xr, xi, yr, yi);
                break;
            default:
                Radix3(pass, xr, xi, yr, yi);
                break;
        }
    }

    private static void Radix4(
        in Pass pass, ReadOnlySpan<double> xr, ReadOnlySpan<double> xi, Span<double> yr, Span<double> yi)
    {
        int s = pass.Stride;
        int m = pass.Length / 4;
        ReadOnlySpan<double> tw = pass.Factors;
        for (int p = 0; p < m; p++)
        {
            ReadOnlySpan<double> w = tw.Slice(6 * p, 6);
            for (int q = 0; q < s; q++)
            {
                int a = q + (s * p);
                int b = a + (s * m);
                int c = b + (s * m);
                int d = c + (s * m);
                int o = q + (4 * s * p);
                (double acr, double aci) = (xr[a] + xr[c], xi[a] + xi[c]);
                (double bdr, double bdi) = (xr[b] + xr[d], xi[b] + xi[d]);
                (double amr, double ami) = (xr[a] - xr[c], xi[a] - xi[c]);
                (double bmr, double bmi) = (xr[b] - xr[d], xi[b] - xi[d]);
                yr[o] = acr + bdr;
                yi[o] = aci + bdi;
                (yr[o + s], yi[o + s]) = Multiply(amr + bmi, ami - bmr, w[0], w[1]);
                (yr[o + (2 * s)], yi[o + (2 * s)]) = Multiply(acr - bdr, aci - bdi, w[2], w[3]);
                (yr[o + (3 * s)], yi[o + (3 * s)]) = Multiply(amr - bmi, ami + bmr, w[4], w[5]);
            }
        }
    }

    /// <summary>The same pass on lanes of four, where the stride is a multiple of four.</summary>
    private static void Radix4Wide(
        in Pass pass, ReadOnlySpan<double> xrs, ReadOnlySpan<double> xis, Span<double> yrs, Span<double> yis)
    {
        nuint s = (nuint)pass.Stride;
        nuint m = (nuint)(pass.Length / 4);
        ref double xr = ref MemoryMarshal.GetReference(xrs);
        ref double xi = ref MemoryMarshal.GetReference(xis);
        ref double yr = ref MemoryMarshal.GetReference(yrs);
        ref double yi = ref MemoryMarshal.GetReference(yis);
        ReadOnlySpan<double> tw = pass.Factors;
        for (nuint p = 0; p < m; p++)
        {
            ReadOnlySpan<double> w = tw.Slice(6 * (int)p, 6);
            Vector256<double> w1r = Vector256.Create(w[0]);
            Vector256<double> w1i = Vector256.Create(w[1]);
            Vector256<double> w2r = Vector256.Create(w[2]);
            Vector256<double> w2i = Vector256.Create(w[3]);
            Vector256<double> w3r = Vector256.Create(w[4]);
            Vector256<double> w3i = Vector256.Create(w[5]);
            nuint a0 = s * p;
            nuint o0 = 4 * a0;
            for (nuint q = 0; q < s; q += 4)
            {
                nuint a = a0 + q;
                nuint o = o0 + q;
                Vector256<double> ar = Vector256.LoadUnsafe(ref xr, a);
                Vector256<double> ai = Vector256.LoadUnsafe(ref xi, a);
                Vector256<double> br = Vector256.LoadUnsafe(ref xr, a + (s * m));
                Vector256<double> bi = Vector256.LoadUnsafe(ref xi, a + (s * m));
                Vector256<double> cr = Vector256.LoadUnsafe(ref xr, a + (2 * s * m));
                Vector256<double> ci = Vector256.LoadUnsafe(ref xi, a + (2 * s * m));
                Vector256<double> dr = Vector256.LoadUnsafe(ref xr, a + (3 * s * m));
                Vector256<double> di = Vector256.LoadUnsafe(ref xi, a + (3 * s * m));
                Vector256<double> acr = ar + cr;
                Vector256<double> aci = ai + ci;
                Vector256<double> bdr = br + dr;
                Vector256<double> bdi = bi + di;
                Vector256<double> amr = ar - cr;
                Vector256<double> ami = ai - ci;
                Vector256<double> bmr = br - dr;
                Vector256<double> bmi = bi - di;
                (acr + bdr).StoreUnsafe(ref yr, o);
                (aci + bdi).StoreUnsafe(ref yi, o);
                Vector256<double> tr = amr + bmi;
                Vector256<double> ti = ami - bmr;
                ((tr * w1r) - (ti * w1i)).StoreUnsafe(ref yr, o + s);
                ((tr * w1i) + (ti * w1r)).StoreUnsafe(ref yi, o + s);
                tr = acr - bdr;
                ti = aci - bdi;
                ((tr * w2r) - (ti * w2i)).StoreUnsafe(ref yr, o + (2 * s));
                ((tr * w2i) + (ti * w2r)).StoreUnsafe(ref yi, o + (2 * s));
                tr = amr - bmi;
                ti = ami + bmr;
                ((tr * w3r) - (ti * w3i)).StoreUnsafe(ref yr, o + (3 * s));
                ((tr * w3i) + (ti * w3r)).StoreUnsafe(ref yi, o + (3 * s));
            }
        }
    }

    private static void Radix2(
        in Pass pass, ReadOnlySpan<double> xr, ReadOnlySpan<double> xi, Span<double> yr, Span<double> yi)
    {
        int s = pass.Stride;
        int m = pass.Length / 2;
        for (int p = 0; p < m; p++)
        {
            double wr = pass.Factors[2 * p];
            double wi = pass.Factors[(2 * p) + 1];
            for (int q = 0; q < s; q++)
            {
                int a = q + (s * p);
                int b = a + (s * m);
                int o = q + (2 * s * p);
                (double dr, double di) = (xr[a] - xr[b], xi[a] - xi[b]);
                yr[o] = xr[a] + xr[b];
                yi[o] = xi[a] + xi[b];
                (yr[o + s], yi[o + s]) = Multiply(dr, di, wr, wi);
            }
        }
    }

    private static void Radix3(
        in Pass pass, ReadOnlySpan<double> xr, ReadOnlySpan<double> xi, Span<double> yr, Span<double> yi)
    {
        // Three is always the last factor: length 3, so every twiddle factor is one.
        int s = pass.Stride;
        for (int q = 0; q < s; q++)
        {
            (double ar, double ai) = (xr[q], xi[q]);
            (double sr, double si) = (xr[q + s] + xr[q + (2 * s)], xi[q + s] + xi[q + (2 * s)]);
            double dr = HalfSqrt3 * (xr[q + s] - xr[q + (2 * s)]);
            double di = HalfSqrt3 * (xi[q + s] - xi[q + (2 * s)]);
            (double mr, double mi) = (ar - (0.5 * sr), ai - (0.5 * si));
            yr[q] = ar + sr;
            yi[q] = ai + si;
            yr[q + s] = mr + di;
            yi[q + s] = mi - dr;
            yr[q + (2 * s)] = mr - di;
            yi[q + (2 * s)] = mi + dr;
        }
    }

    private static (double Re, double Im) Multiply(double ar, double ai, double br, double bi) =>
        ((ar * br) - (ai * bi), (ar * bi) + (ai * br));

    /// <summary>One pass: its radix, the length of the transforms it splits, their stride, and its twiddle factors.</summary>
    private readonly record struct Pass(int Radix, int Length, int Stride, double[] Factors);
}
