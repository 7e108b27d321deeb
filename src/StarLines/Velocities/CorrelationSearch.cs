using System;
using System.Buffers;
using StarLines.Numerics;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// The correlation of a spectrum with templates on one grid. At each shift the value is the weighted correlation coefficient,
/// c = Σ w r (t − t̄)/√(Σ w r² Σ w (t − t̄)²), so that N c² is, to first order, the drop of χ² that the template brings there.
/// </summary>
internal sealed class CorrelationSearch
{
    private readonly ResidualSpectrum _spectrum;
    private readonly double[] _re;
    private readonly double[] _im;
    private readonly double[] _weight;

    /// <summary>Transforms the spectrum.</summary>
    internal CorrelationSearch(ResidualSpectrum spectrum, CorrelationGrid grid)
    {
        _spectrum = spectrum;
        Grid = grid;
        RealFft fft = grid.Fft;
        _re = new double[fft.Bins];
        _im = new double[fft.Bins];
        _weight = new double[grid.Count];
        double[] signal = ArrayPool<double>.Shared.Rent(fft.Size);
        double[] work = ArrayPool<double>.Shared.Rent(2 * fft.Size);
        signal.AsSpan(grid.Count, fft.Size - grid.Count).Clear();
        spectrum.DealOnto(grid, signal.AsSpan(0, grid.Count), _weight);
        fft.Forward(signal.AsSpan(0, fft.Size), _re, _im, work);
        ArrayPool<double>.Shared.Return(signal);
        ArrayPool<double>.Shared.Return(work);
    }

    /// <summary>The grid.</summary>
    internal CorrelationGrid Grid { get; }

    /// <summary>Correlates with a template widened by a Gaussian.</summary>
    /// <param name="template">The template on the same grid.</param>
    /// <param name="broadening">Variance in velocity, (km/s)²; 0 for none.</param>
    /// <returns>2 MaximumLag + 1 correlation coefficients, the shift 0 in the middle; redshifts after it.</returns>
    internal double[] Correlate(TemplateTransform template, double broadening)
    {
        RealFft fft = Grid.Fft;
        int bins = fft.Bins;
        int lags = Grid.MaximumLag;
        double[] rented = ArrayPool<double>.Shared.Rent((2 * bins) + (3 * fft.Size));
        Span<double> re = rented.AsSpan(0, bins);
        Span<double> im = rented.AsSpan(bins, bins);
        Span<double> c = rented.AsSpan(2 * bins, fft.Size);
        double kept = Product(template, broadening, re, im);
        fft.Inverse(re, im, c, rented.AsSpan((2 * bins) + fft.Size, 2 * fft.Size));
        var result = new double[(2 * lags) + 1];

        // The sampled template starts MaximumLag pixels before the grid: shift n stands at place n − MaximumLag of the circle.
        for (int k = 0; k < result.Length; k++)
        {
            int place = k - (2 * lags);
            result[k] = c[place < 0 ? place + fft.Size : place];
        }

        ArrayPool<double>.Shared.Return(rented);
        Normalize(template, kept, result);
        return result;
    }

    /// <summary>
    /// The product of the transforms; the part of the template's squares that the widening leaves is returned.
    /// </summary>
    private double Product(TemplateTransform template, double broadening, Span<double> re, Span<double> im)
    {
        ReadOnlySpan<double> tr = template.Re;
        ReadOnlySpan<double> ti = template.Im;
        if (broadening <= 0.0)
        {
            for (int k = 0; k < re.Length; k++)
            {
                re[k] = (_re[k] * tr[k]) + (_im[k] * ti[k]);
                im[k] = (_im[k] * tr[k]) - (_re[k] * ti[k]);
            }

            return 1.0;
        }

        double sigma = Math.Sqrt(broadening) / (PhysicalConstants.SpeedOfLightKmPerS * Grid.LogStep);
        double exponent = 2.0 * Math.PI * sigma / Grid.Fft.Size;
        exponent *= -0.5 * exponent;
        double before = 0.0;
        double after = 0.0;
        for (int k = 0; k < re.Length; k++)
        {
            double factor = Math.Exp(exponent * k * k);
            re[k] = factor * ((_re[k] * tr[k]) + (_im[k] * ti[k]));
            im[k] = factor * ((_im[k] * tr[k]) - (_re[k] * ti[k]));
            double power = k == 0 ? 0.0 : (tr[k] * tr[k]) + (ti[k] * ti[k]);
            before += power;
            after += factor * factor * power;
        }

        return before > 0.0 ? after / before : 0.0;
    }

    /// <summary>
    /// Divides by √(Σ w r² Σ w (t − t̄)²). The second sum changes slowly with the shift: it is taken on blocks of pixels and
    /// interpolated between.
    /// </summary>
    private void Normalize(TemplateTransform template, double kept, Span<double> result)
    {
        int b = template.BlockLength;
        int blocks = (Grid.Count + b - 1) / b;
        double[] weights = ArrayPool<double>.Shared.Rent(blocks);
        weights.AsSpan(0, blocks).Clear();
        double total = 0.0;
        for (int m = 0; m < Grid.Count; m++)
        {
            weights[m / b] += _weight[m];
            total += _weight[m];
        }

        int steps = (result.Length / b) + 2;
        double[] norms = ArrayPool<double>.Shared.Rent(steps);
        for (int step = 0; step < steps; step++)
        {
            // At result[k] grid pixel m meets template sample m − k + 2 MaximumLag.
            int offset = ((2 * Grid.MaximumLag) - (step * b)) / b;
            double sum = 0.0;
            double squares = 0.0;
            int from = Math.Max(0, -offset);
            int to = Math.Min(blocks, template.Blocks - offset);
            for (int i = from; i < to; i++)
            {
                sum += weights[i] * template.BlockSums[i + offset];
                squares += weights[i] * template.BlockSquares[i + offset];
            }

            norms[step] = kept * Math.Max((squares / b) - (sum / b * (sum / b) / Math.Max(total, double.Epsilon)), 0.0);
        }

        for (int k = 0; k < result.Length; k++)
        {
            int step = k / b;
            double f = (double)(k - (step * b)) / b;
            double norm = (norms[step] * (1.0 - f)) + (norms[step + 1] * f);
            result[k] = norm > 0.0 && _spectrum.SquareSum > 0.0
                ? Math.Clamp(result[k] / Math.Sqrt(norm * _spectrum.SquareSum), -1.0, 1.0)
                : 0.0;
        }

        ArrayPool<double>.Shared.Return(weights);
        ArrayPool<double>.Shared.Return(norms);
    }
}
