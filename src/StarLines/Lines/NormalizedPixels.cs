using System;
using System.Buffers;
using System.Numerics.Tensors;
using StarLines.Continuum;

namespace StarLines.Lines;

/// <summary>A spectrum in units of its continuum, with weights, and the lines fitted so far. Rents its memory.</summary>
internal sealed class NormalizedPixels : IDisposable
{
    /// <summary>Steps of a table differing by more than this factor are the two sides of a gap.</summary>
    private const double GapFactor = 3.0;

    private readonly double[] _flux;
    private readonly double[] _weight;

    internal NormalizedPixels(Spectrum spectrum, ContinuumFit continuum)
    {
        Spectrum = spectrum;
        Continuum = continuum;
        Count = spectrum.Count;
        Model = new double[Count];
        Model.AsSpan().Fill(1.0);
        _flux = ArrayPool<double>.Shared.Rent(Count);
        _weight = ArrayPool<double>.Shared.Rent(Count);
        TensorPrimitives.Divide(spectrum.Flux, continuum.Level, _flux);
        TensorPrimitives.Divide(continuum.Level, spectrum.Sigma, _weight);
        ReadOnlySpan<PixelFaults> faults = spectrum.Faults;
        for (int i = 0; i < Count; i++)
        {
            // A continuum at or below zero gives no weight, and so does a pixel at fault.
            if (faults[i] != PixelFaults.None || !(_weight[i] > 0.0) || double.IsInfinity(_weight[i]))
            {
                _weight[i] = 0.0;
                _flux[i] = 1.0;
            }
        }
    }

    /// <summary>The spectrum.</summary>
    internal Spectrum Spectrum { get; }

    /// <summary>Its continuum.</summary>
    internal ContinuumFit Continuum { get; }

    /// <summary>Number of pixels.</summary>
    internal int Count { get; }

    /// <summary>Flux in units of the continuum; 1 where a pixel is not used.</summary>
    internal ReadOnlySpan<double> Flux => _flux.AsSpan(0, Count);

    /// <summary>Inverse standard deviations in units of the continuum; 0 where a pixel is not used.</summary>
    internal ReadOnlySpan<double> Weight => _weight.AsSpan(0, Count);

    /// <summary>1 less all lines fitted so far.</summary>
    internal double[] Model { get; }

    /// <summary>Drops a pixel that no line explains.</summary>
    internal void Drop(int index) => _weight[index] = 0.0;

    /// <summary>Whether a pixel is used.</summary>
    internal bool IsUsed(int index) => _weight[index] > 0.0;

    /// <summary>The pixel nearest to a wavelength, −1 where the wavelength lies outside the spectrum or in a gap.</summary>
    internal int NearestPixel(double wavelength)
    {
        WavelengthScale scale = Spectrum.Scale;
        if (!(wavelength >= scale.EdgeAngstrom(0) && wavelength <= scale.EdgeAngstrom(Count)))
        {
            return -1;
        }

        int index = Math.Clamp((int)Math.Round(scale.IndexOf(wavelength)), 0, Count - 1);
        double distance = Math.Abs(wavelength - scale.WavelengthsAngstrom[index]);
        return distance > 1.5 * PixelWidth(index) ? -1 : index;
    }

    /// <summary>The width of a pixel, Å; the smaller of its two steps, so that a gap does not count.</summary>
    internal double PixelWidth(int index)
    {
        ReadOnlySpan<double> wavelengths = Spectrum.Scale.WavelengthsAngstrom;
        double left = index > 0 ? wavelengths[index] - wavelengths[index - 1] : double.PositiveInfinity;
        double right = index < Count - 1 ? wavelengths[index + 1] - wavelengths[index] : double.PositiveInfinity;
        double least = Math.Min(left, right);
        return double.IsInfinity(least) ? 1.0 : least;
    }

    /// <summary>The pixels from one wavelength to another that belong together with a given pixel: clipped at the ends of the spectrum and at gaps.</summary>
    internal (int First, int Last) Window(int pixel, double from, double to)
    {
        WavelengthScale scale = Spectrum.Scale;
        int first = Math.Clamp((int)Math.Ceiling(scale.IndexOf(from)), 0, pixel);
        int last = Math.Clamp((int)Math.Floor(scale.IndexOf(to)), pixel, Count - 1);
        if (scale.Sampling != WavelengthSampling.Tabulated)
        {
            return (first, last);
        }

        ReadOnlySpan<double> wavelengths = scale.WavelengthsAngstrom;
        int left = pixel;
        while (left > first && wavelengths[left] - wavelengths[left - 1] <= GapFactor * PixelWidth(left))
        {
            left--;
        }

        int right = pixel;
        while (right < last && wavelengths[right + 1] - wavelengths[right] <= GapFactor * PixelWidth(right))
        {
            right++;
        }

        return (left, right);
    }

    /// <summary>Whether no gap lies between two pixels.</summary>
    internal bool AreConnected(int pixel, int other)
    {
        if (Spectrum.Scale.Sampling != WavelengthSampling.Tabulated)
        {
            return true;
        }

        // A little more than from centre to centre, so that rounding does not lose the last pixel.
        ReadOnlySpan<double> wavelengths = Spectrum.Scale.WavelengthsAngstrom;
        double margin = 0.25 * PixelWidth(other);
        double from = wavelengths[Math.Min(pixel, other)] - margin;
        double to = wavelengths[Math.Max(pixel, other)] + margin;
        (int first, int last) = Window(pixel, from, to);
        return other >= first && other <= last;
    }

    /// <summary>Centres and edges of a run of pixels, Å from a reference; the outer edges do not reach into gaps.</summary>
    internal void CopyPixels(int first, double reference, Span<double> centres, Span<double> edges)
    {
        WavelengthScale scale = Spectrum.Scale;
        ReadOnlySpan<double> wavelengths = scale.WavelengthsAngstrom.Slice(first, centres.Length);
        for (int i = 0; i < centres.Length; i++)
        {
            centres[i] = wavelengths[i] - reference;
        }

        // The edge of equal steps in ln λ is the geometric mean; it differs from the arithmetic one by (Δλ)²/(8λ).
        double bend = scale.Sampling == WavelengthSampling.LogLinear ? 0.125 : 0.0;
        for (int i = 1; i < centres.Length; i++)
        {
            double step = wavelengths[i] - wavelengths[i - 1];
            edges[i] = (0.5 * (centres[i] + centres[i - 1])) - (bend * step * step / wavelengths[i]);
        }

        double half = 0.5 * PixelWidth(first);
        edges[0] = centres[0] - (centres.Length > 1 ? edges[1] - centres[0] : half);
        edges[^1] = centres[^1] + (centres.Length > 1 ? centres[^1] - edges[^2] : half);
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        ArrayPool<double>.Shared.Return(_flux);
        ArrayPool<double>.Shared.Return(_weight);
    }
}
