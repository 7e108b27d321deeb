using System;
using System.Diagnostics;

namespace StarLines.Numerics;

/// <summary>
/// A plan of the discrete Fourier transform of real values, for one even size: a complex transform of half the size
/// on the even and odd values, then untangled. Immutable.
/// </summary>
internal sealed class RealFft
{
    private readonly ComplexFft _half;
    private readonly double[] _cos;
    private readonly double[] _sin;

    /// <summary>Makes a plan.</summary>
    /// <param name="size">Number of real values: twice a power of two, or twice three times one.</param>
    internal RealFft(int size)
    {
        Debug.Assert(size >= 2 && size % 2 == 0, "The size must be even.");
        Size = size;
        _half = new ComplexFft(size / 2);
        int m = size / 2;
        _cos = new double[m + 1];
        _sin = new double[m + 1];
        for (int k = 0; k <= m; k++)
        {
            (_sin[k], _cos[k]) = Math.SinCos(Math.PI * k / m);
        }
    }

    /// <summary>Number of real values.</summary>
    internal int Size { get; }

    /// <summary>Number of complex values of the transform, Size/2 + 1.</summary>
    internal int Bins => (Size / 2) + 1;

    /// <summary>The smallest size that has a plan and is not below a number.</summary>
    internal static int GoodSize(int minimum) => 2 * ComplexFft.GoodSize((Math.Max(minimum, 2) + 1) / 2);

    /// <summary>X_k = Σ x_j exp(−2πi jk/N) for k from 0 to N/2. NaN spreads to every value.</summary>
    /// <param name="values"><see cref="Size"/> real values.</param>
    /// <param name="re">Receives the real parts, <see cref="Bins"/> values; other memory.</param>
    /// <param name="im">Receives the imaginary parts, as many.</param>
    /// <param name="work">Scratch, 2 × <see cref="Size"/> values; other memory.</param>
    internal void Forward(ReadOnlySpan<double> values, Span<double> re, Span<double> im, Span<double> work)
    {
        Guard.SameLength(values.Length, Size, nameof(values));
        int m = Size / 2;
        Span<double> zr = work[..m];
        Span<double> zi = work.Slice(m, m);
        for (int j = 0; j < m; j++)
        {
            zr[j] = values[2 * j];
            zi[j] = values[(2 * j) + 1];
        }

        _half.Transform(zr, zi, work.Slice(2 * m, m), work.Slice(3 * m, m));
        re[0] = zr[0] + zi[0];
        im[0] = 0.0;
        re[m] = zr[0] - zi[0];
        im[m] = 0.0;

        // X_k = E_k + exp(−πik/m) O_k with E and O the transforms of the even and the odd values.
        for (int k = 1; k < m; k++)
        {
            double er = 0.5 * (zr[k] + zr[m - k]);
            double ei = 0.5 * (zi[k] - zi[m - k]);
            double or = 0.5 * (zi[k] + zi[m - k]);
            double oi = 0.5 * (zr[m - k] - zr[k]);
            re[k] = er + ((_cos[k] * or) + (_sin[k] * oi));
            im[k] = ei + ((_cos[k] * oi) - (_sin[k] * or));
        }
    }

    /// <summary>x_j = (1/N) Σ X_k exp(+2πi jk/N), of the half of the transform that real values need.</summary>
    /// <param name="re">Real parts, <see cref="Bins"/> values.</param>
    /// <param name="im">Imaginary parts, as many.</param>
    /// <param name="values">Receives <see cref="Size"/> real values; other memory.</param>
    /// <param name="work">Scratch, 2 × <see cref="Size"/> values; other memory.</param>
    internal void Inverse(ReadOnlySpan<double> re, ReadOnlySpan<double> im, Span<double> values, Span<double> work)
    {
        Guard.SameLength(values.Length, Size, nameof(values));
        int m = Size / 2;
        Span<double> zr = work[..m];
        Span<double> zi = work.Slice(m, m);
        double scale = 1.0 / Size;

        // Z_k = E_k + i O_k, where 2 E_k = X_k + X*_(m−k) and 2 O_k = (X_k − X*_(m−k)) exp(+πik/m).
        for (int k = 0; k < m; k++)
        {
            double er = re[k] + re[m - k];
            double ei = im[k] - im[m - k];
            double dr = re[k] - re[m - k];
            double di = im[k] + im[m - k];
            double or = (dr * _cos[k]) - (di * _sin[k]);
            double oi = (dr * _sin[k]) + (di * _cos[k]);
            zr[k] = scale * (er - oi);
            zi[k] = scale * (ei + or);
        }

        // The parts swapped: the inverse transform by the forward one.
        _half.Transform(zi, zr, work.Slice(2 * m, m), work.Slice(3 * m, m));
        for (int j = 0; j < m; j++)
        {
            values[2 * j] = zr[j];
            values[(2 * j) + 1] = zi[j];
        }
    }
}
