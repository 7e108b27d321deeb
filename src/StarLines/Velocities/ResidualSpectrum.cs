using System;
using System.Buffers;
using StarLines.Continuum;
using StarLines.Numerics;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// A spectrum as velocities are measured on it: wavelengths in vacuum, the absorption 1 − flux/continuum and its inverse variance,
/// 0 where a pixel is not used. Made once for all templates.
/// </summary>
internal sealed class ResidualSpectrum
{
    /// <summary>No pixel weighs more than this many times the median: a σ far too small is a fault of the file.</summary>
    private const double MaximumWeight = 50.0;

    /// <summary>This part of the pixels at each end fades to nothing in the correlation.</summary>
    private const double Taper = 0.02;

    /// <summary>Weights in the correlation are even over so many pixels.</summary>
    private const int EvenedPixels = 128;

    private readonly double[] _vacuum;

    /// <summary>Prepares a spectrum.</summary>
    internal ResidualSpectrum(Spectrum spectrum, ContinuumFit continuum, Medium assumed)
    {
        int n = spectrum.Count;
        Assumed = assumed;
        var converted = new double[n];
        ReadOnlySpan<double> vacuum = VacuumAxis.Of(spectrum.Scale, assumed, converted);
        _vacuum = converted;
        if (!vacuum.Overlaps(converted))
        {
            vacuum.CopyTo(converted);
        }

        Absorption = new double[n];
        Weight = new double[n];
        ContinuumSigma = new double[n];
        StiffnessAngstrom = continuum.StiffnessAngstrom;
        Fill(spectrum, continuum);
        CapWeights();
    }

    private ResidualSpectrum(ResidualSpectrum other, double[] absorption)
    {
        _vacuum = other._vacuum;
        Assumed = other.Assumed;
        Absorption = absorption;
        Weight = other.Weight;
        ContinuumSigma = other.ContinuumSigma;
        StiffnessAngstrom = other.StiffnessAngstrom;
        Used = other.Used;
    }

    /// <summary>What wavelengths of unknown medium were taken for.</summary>
    internal Medium Assumed { get; }

    /// <summary>Number of pixels.</summary>
    internal int Count => _vacuum.Length;

    /// <summary>Wavelengths in vacuum, Å.</summary>
    internal ReadOnlySpan<double> VacuumAngstrom => _vacuum;

    /// <summary>1 − flux/continuum.</summary>
    internal double[] Absorption { get; }

    /// <summary>Inverse variance of the absorption.</summary>
    internal double[] Weight { get; }

    /// <summary>Standard deviation of the continuum in units of itself.</summary>
    internal double[] ContinuumSigma { get; }

    /// <summary>The length over which the continuum may bend, Å.</summary>
    internal double StiffnessAngstrom { get; }

    /// <summary>Number of pixels with a weight.</summary>
    internal int Used { get; private set; }

    /// <summary>Weighted sum of the squared absorption about its mean, as it goes into the correlation.</summary>
    internal double SquareSum { get; private set; }

    /// <summary>Median width of a pixel, km/s.</summary>
    internal double PixelKmPerS
    {
        get
        {
            int middle = Count / 2;
            return Count < 2 ? double.NaN
                : PhysicalConstants.SpeedOfLightKmPerS * Math.Log(_vacuum[Math.Max(middle, 1)] / _vacuum[Math.Max(middle, 1) - 1]);
        }
    }

    /// <summary>The spectrum with a fitted star taken away.</summary>
    internal ResidualSpectrum Without(VelocityFit fit)
    {
        var absorption = new double[Count];
        fit.AddModel(_vacuum, absorption);
        System.Numerics.Tensors.TensorPrimitives.Subtract(Absorption, absorption, absorption);
        return new ResidualSpectrum(this, absorption);
    }

    /// <summary>The grid for this spectrum.</summary>
    internal CorrelationGrid GridFor(CorrelationGrid? kept, double halfRangeKmPerS)
    {
        double finest = double.PositiveInfinity;
        for (int i = 1; i < _vacuum.Length; i++)
        {
            finest = Math.Min(finest, (_vacuum[i] - _vacuum[i - 1]) / _vacuum[i]);
        }

        // A table with a few crowded pixels shall not set the step of all.
        double mean = Math.Log(_vacuum[^1] / _vacuum[0]) / (_vacuum.Length - 1);
        finest = Math.Max(finest, 0.25 * mean);
        return CorrelationGrid.For(
            kept, Edge(0), Edge(Count), finest, Math.Log(Doppler.Factor(halfRangeKmPerS)));
    }

    /// <summary>Deals weight × (absorption − mean) and weight out to a grid, faded at the ends.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="signal">Receives the weighted absorption; the grid's number of pixels.</param>
    /// <param name="weight">Receives the weights; as many.</param>
    internal void DealOnto(CorrelationGrid grid, Span<double> signal, Span<double> weight)
    {
        int n = Count;
        double[] rented = ArrayPool<double>.Shared.Rent((3 * n) + 1);
        Span<double> edges = rented.AsSpan(0, n + 1);
        Span<double> faded = rented.AsSpan(n + 1, n);
        Span<double> contents = rented.AsSpan((2 * n) + 1, n);
        for (int i = 0; i <= n; i++)
        {
            edges[i] = Edge(i);
        }

        Fade(faded);
        double sum = 0.0;
        double total = 0.0;
        for (int i = 0; i < n; i++)
        {
            sum += faded[i] * Absorption[i];
            total += faded[i];
        }

        double mean = total > 0.0 ? sum / total : 0.0;
        double squares = 0.0;
        for (int i = 0; i < n; i++)
        {
            double centred = Absorption[i] - mean;
            contents[i] = faded[i] * centred;
            squares += contents[i] * centred;
        }

        SquareSum = squares;
        PixelOverlap.Deal(edges, contents, grid.EdgesAngstrom, signal);
        PixelOverlap.Deal(edges, faded, grid.EdgesAngstrom, weight);
        ArrayPool<double>.Shared.Return(rented);
    }

    /// <summary>
    /// Weights for the correlation: those of the pixels, evened out over blocks, for the weights of photon noise rise in the
    /// lines themselves; faded at the ends.
    /// </summary>
    private void Fade(Span<double> faded)
    {
        for (int start = 0; start < faded.Length; start += EvenedPixels)
        {
            int end = Math.Min(start + EvenedPixels, faded.Length);
            double variance = 0.0;
            int good = 0;
            for (int i = start; i < end; i++)
            {
                if (Weight[i] > 0.0)
                {
                    variance += 1.0 / Weight[i];
                    good++;
                }
            }

            double even = good > 0 ? good / variance : 0.0;
            for (int i = start; i < end; i++)
            {
                faded[i] = Weight[i] > 0.0 ? even : 0.0;
            }
        }

        int width = (int)(Taper * faded.Length);
        for (int i = 0; i < width; i++)
        {
            double factor = 0.5 * (1.0 - Math.Cos(Math.PI * (i + 0.5) / width));
            faded[i] *= factor;
            faded[^(i + 1)] *= factor;
        }
    }

    private double Edge(int i) =>
        i == 0 ? _vacuum[0] - (0.5 * (_vacuum[1] - _vacuum[0]))
        : i == _vacuum.Length ? _vacuum[^1] + (0.5 * (_vacuum[^1] - _vacuum[^2]))
        : 0.5 * (_vacuum[i - 1] + _vacuum[i]);

    private void Fill(Spectrum spectrum, ContinuumFit continuum)
    {
        ReadOnlySpan<double> flux = spectrum.Flux;
        ReadOnlySpan<double> sigma = spectrum.Sigma;
        ReadOnlySpan<double> level = continuum.Level;
        for (int i = 0; i < flux.Length; i++)
        {
            if (spectrum.IsGood(i) && level[i] > 0.0)
            {
                double relative = sigma[i] / level[i];
                Absorption[i] = 1.0 - (flux[i] / level[i]);
                Weight[i] = 1.0 / (relative * relative);
                ContinuumSigma[i] = continuum.Sigma[i] / level[i];
                Used++;
            }
        }
    }

    /// <summary>Caps the weights at a multiple of the median of a regular sample of them.</summary>
    private void CapWeights()
    {
        const int SampleSize = 512;
        int stride = Math.Max(1, Count / SampleSize);
        var sample = new double[(Count + stride - 1) / stride];
        int taken = 0;
        for (int i = 0; i < Count; i += stride)
        {
            if (Weight[i] > 0.0)
            {
                sample[taken++] = Weight[i];
            }
        }

        if (taken == 0)
        {
            return;
        }

        Array.Sort(sample, 0, taken);
        double cap = MaximumWeight * sample[taken / 2];
        for (int i = 0; i < Weight.Length; i++)
        {
            Weight[i] = Math.Min(Weight[i], cap);
        }
    }
}
