using System;
using System.Collections.Generic;
using System.Diagnostics;

namespace StarLines;

/// <summary>
/// A one-dimensional spectrum: wavelengths, flux, where known its uncertainty, and for each pixel whether it may be used.
/// All stored numbers are finite; what is not is flagged. Immutable.
/// </summary>
public sealed class Spectrum
{
    private readonly double[] _flux;
    private readonly double[] _sigma;
    private readonly PixelFaults[] _faults;

    /// <summary>Makes a spectrum; the arrays are copied.</summary>
    /// <param name="scale">Wavelengths of the N pixels.</param>
    /// <param name="flux">N values in <paramref name="fluxUnit"/>; values that are not finite become <see cref="PixelFaults.Missing"/>.</param>
    /// <param name="sigma">N standard deviations of the flux, or none; values that are not finite and positive become <see cref="PixelFaults.NoSigma"/>.</param>
    /// <param name="faults">N faults, or none.</param>
    /// <param name="fluxUnit">Unit of the flux, or an empty string where it is arbitrary.</param>
    /// <param name="metadata">What else is known.</param>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public Spectrum(
        WavelengthScale scale,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> sigma = default,
        ReadOnlySpan<PixelFaults> faults = default,
        string fluxUnit = "",
        SpectrumMetadata? metadata = null)
        : this(scale, flux.ToArray(), sigma.ToArray(), faults.ToArray(), fluxUnit, metadata, takeOwnership: true)
    {
    }

    /// <summary>Makes a spectrum of arrays that the caller just allocated and gives up; they may be changed here.</summary>
    internal Spectrum(
        WavelengthScale scale,
        double[] flux,
        double[] sigma,
        PixelFaults[] faults,
        string fluxUnit,
        SpectrumMetadata? metadata,
        bool takeOwnership)
    {
        ArgumentNullException.ThrowIfNull(scale);
        ArgumentNullException.ThrowIfNull(fluxUnit);
        Debug.Assert(takeOwnership, "Only arrays just allocated may be handed over.");
        Guard.SameLength(flux.Length, scale.Count, nameof(flux));
        if (sigma.Length != 0)
        {
            Guard.SameLength(sigma.Length, scale.Count, nameof(sigma));
        }

        if (faults.Length != 0)
        {
            Guard.SameLength(faults.Length, scale.Count, nameof(faults));
        }

        Scale = scale;
        _flux = flux;
        _sigma = sigma;
        _faults = faults.Length == 0 ? new PixelFaults[flux.Length] : faults;
        FluxUnit = fluxUnit;
        Metadata = metadata ?? SpectrumMetadata.Empty;
        FlagWhatIsNotFinite();
    }

    private Spectrum(
        WavelengthScale scale, double[] flux, double[] sigma, PixelFaults[] faults, string fluxUnit, SpectrumMetadata metadata)
    {
        Scale = scale;
        _flux = flux;
        _sigma = sigma;
        _faults = faults;
        FluxUnit = fluxUnit;
        Metadata = metadata;
    }

    /// <summary>Wavelengths.</summary>
    public WavelengthScale Scale { get; }

    /// <summary>Number of pixels.</summary>
    public int Count => _flux.Length;

    /// <summary>Flux in <see cref="FluxUnit"/>; <see cref="Count"/> finite values.</summary>
    public ReadOnlySpan<double> Flux => _flux;

    /// <summary>Standard deviation of the flux, in <see cref="FluxUnit"/>; <see cref="Count"/> values (0 where flagged <see cref="PixelFaults.NoSigma"/>), or none.</summary>
    public ReadOnlySpan<double> Sigma => _sigma;

    /// <summary>Whether the source gave uncertainties.</summary>
    public bool HasSigma => _sigma.Length != 0;

    /// <summary>Faults of the pixels; <see cref="Count"/> values, <see cref="PixelFaults.None"/> for a good pixel.</summary>
    public ReadOnlySpan<PixelFaults> Faults => _faults;

    /// <summary>Unit of the flux as the source writes it, or an empty string.</summary>
    public string FluxUnit { get; }

    /// <summary>What else is known.</summary>
    public SpectrumMetadata Metadata { get; }

    /// <summary>Whether a pixel may be used.</summary>
    /// <param name="index">0 to Count − 1.</param>
    public bool IsGood(int index) => _faults[index] == PixelFaults.None;

    /// <summary>The same pixels on another scale of the same length.</summary>
    /// <param name="scale">The new scale.</param>
    public Spectrum WithScale(WavelengthScale scale)
    {
        ArgumentNullException.ThrowIfNull(scale);
        Guard.SameLength(scale.Count, Count, nameof(scale));
        return new Spectrum(scale, _flux, _sigma, _faults, FluxUnit, Metadata);
    }

    /// <summary>The same pixels with other metadata.</summary>
    /// <param name="metadata">The new metadata.</param>
    public Spectrum WithMetadata(SpectrumMetadata metadata)
    {
        ArgumentNullException.ThrowIfNull(metadata);
        return new Spectrum(Scale, _flux, _sigma, _faults, FluxUnit, metadata);
    }

    /// <summary>The same pixels with uncertainties.</summary>
    /// <param name="sigma">Count standard deviations, in the flux unit.</param>
    public Spectrum WithSigma(ReadOnlySpan<double> sigma) =>
        new(Scale, _flux.AsSpan().ToArray(), sigma.ToArray(), _faults.AsSpan().ToArray(), FluxUnit, Metadata, takeOwnership: true);

    /// <summary>The same pixels with more faults.</summary>
    /// <param name="faults">Count faults, joined to those already set.</param>
    public Spectrum WithFaultsAdded(ReadOnlySpan<PixelFaults> faults)
    {
        Guard.SameLength(faults.Length, Count, nameof(faults));
        PixelFaults[] joined = _faults.AsSpan().ToArray();
        for (int i = 0; i < joined.Length; i++)
        {
            joined[i] |= faults[i];
        }

        return new Spectrum(Scale, _flux, _sigma, joined, FluxUnit, Metadata);
    }

    /// <summary>The same pixels with those in some ranges flagged <see cref="PixelFaults.Excluded"/>.</summary>
    /// <param name="ranges">Ranges in the spectrum's own medium and frame.</param>
    public Spectrum Excluding(IReadOnlyList<WavelengthRange> ranges)
    {
        ArgumentNullException.ThrowIfNull(ranges);
        if (ranges.Count == 0)
        {
            return this;
        }

        var added = new PixelFaults[Count];
        foreach (WavelengthRange range in ranges)
        {
            int end = Scale.FirstIndexAtOrAbove(Math.BitIncrement(range.MaximumAngstrom));
            for (int i = Scale.FirstIndexAtOrAbove(range.MinimumAngstrom); i < end; i++)
            {
                added[i] = PixelFaults.Excluded;
            }
        }

        return WithFaultsAdded(added);
    }

    /// <summary>A run of pixels.</summary>
    /// <param name="start">First index.</param>
    /// <param name="count">Number of pixels; at least 1.</param>
    public Spectrum Slice(int start, int count) => new(
        Scale.Slice(start, count),
        _flux.AsSpan(start, count).ToArray(),
        HasSigma ? _sigma.AsSpan(start, count).ToArray() : [],
        _faults.AsSpan(start, count).ToArray(),
        FluxUnit,
        Metadata);

    private void FlagWhatIsNotFinite()
    {
        for (int i = 0; i < _flux.Length; i++)
        {
            if (!double.IsFinite(_flux[i]))
            {
                _flux[i] = 0.0;
                _faults[i] |= PixelFaults.Missing;
            }
        }

        for (int i = 0; i < _sigma.Length; i++)
        {
            if (!(_sigma[i] > 0.0) || !double.IsFinite(_sigma[i]))
            {
                _sigma[i] = 0.0;
                _faults[i] |= PixelFaults.NoSigma;
            }
        }
    }
}
