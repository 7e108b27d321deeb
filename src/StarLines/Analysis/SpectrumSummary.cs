using System;
using System.Collections.Generic;
using StarLines.Noise;
using StarLines.Velocities.Barycentre;

namespace StarLines.Analysis;

/// <summary>What a spectrum is and how far it can be trusted, at a glance; the members are the columns of the table of spectra.</summary>
public sealed record SpectrumSummary
{
    /// <summary>Where the spectrum came from.</summary>
    public required string Source { get; init; }

    /// <summary>What its header says.</summary>
    public required SpectrumMetadata Metadata { get; init; }

    /// <summary>Number of pixels.</summary>
    public required int Pixels { get; init; }

    /// <summary>Number of pixels that may be used.</summary>
    public required int GoodPixels { get; init; }

    /// <summary>First and last pixel centre.</summary>
    public required WavelengthRange Range { get; init; }

    /// <summary>How the wavelengths are spaced.</summary>
    public required WavelengthSampling Sampling { get; init; }

    /// <summary>Median step from pixel to pixel, Å; NaN for one pixel.</summary>
    public required double StepAngstrom { get; init; }

    /// <summary>Air or vacuum.</summary>
    public required Medium Medium { get; init; }

    /// <summary>The velocity frame.</summary>
    public required VelocityFrame Frame { get; init; }

    /// <summary>Unit of the flux, or an empty string.</summary>
    public required string FluxUnit { get; init; }

    /// <summary>Whether the source gives uncertainties.</summary>
    public required bool HasSigma { get; init; }

    /// <summary>Median signal-to-noise ratio a pixel, by the source's uncertainties.</summary>
    public required double SignalToNoise { get; init; }

    /// <summary>Median signal-to-noise ratio a pixel, by the scatter of the flux itself; far from <see cref="SignalToNoise"/>, distrust the uncertainties.</summary>
    public required double SignalToNoiseFromFlux { get; init; }

    /// <summary>The barycentric correction at mid-exposure, or null where coordinates, site or time are missing.</summary>
    public BarycentricResult? Barycentre { get; init; }

    /// <summary>Summarizes a spectrum.</summary>
    /// <param name="spectrum">The spectrum.</param>
    public static SpectrumSummary Of(Spectrum spectrum)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        double[] noise = NoiseEstimator.EstimatePerPixel(spectrum);
        return new SpectrumSummary
        {
            Source = spectrum.Metadata.Source,
            Metadata = spectrum.Metadata,
            Pixels = spectrum.Count,
            GoodPixels = CountGood(spectrum),
            Range = spectrum.Scale.Range,
            Sampling = spectrum.Scale.Sampling,
            StepAngstrom = MedianStep(spectrum.Scale),
            Medium = spectrum.Scale.Medium,
            Frame = spectrum.Scale.Frame,
            FluxUnit = spectrum.FluxUnit,
            HasSigma = spectrum.HasSigma,
            SignalToNoise = spectrum.HasSigma ? MedianRatio(spectrum, spectrum.Sigma) : double.NaN,
            SignalToNoiseFromFlux = MedianRatio(spectrum, noise),
            Barycentre = Correction(spectrum.Metadata),
        };
    }

    private static BarycentricResult? Correction(SpectrumMetadata metadata)
    {
        bool isKnown = metadata is
        {
            RightAscensionDegrees: not null, DeclinationDegrees: not null, Site: not null, MidExposureUtc: not null,
        };
        return isKnown && BarycentricCorrection.Covers(metadata.MidExposureUtc!.Value)
            ? BarycentricCorrection.At(
                metadata.MidExposureUtc.Value,
                metadata.Site!,
                new StarAstrometry(metadata.RightAscensionDegrees!.Value, metadata.DeclinationDegrees!.Value),
                target: metadata.Target)
            : null;
    }

    private static int CountGood(Spectrum spectrum)
    {
        int good = 0;
        for (int i = 0; i < spectrum.Count; i++)
        {
            good += spectrum.IsGood(i) ? 1 : 0;
        }

        return good;
    }

    private static double MedianStep(WavelengthScale scale)
    {
        var steps = new List<double>(scale.Count);
        ReadOnlySpan<double> wavelengths = scale.WavelengthsAngstrom;
        for (int i = 1; i < wavelengths.Length; i++)
        {
            steps.Add(wavelengths[i] - wavelengths[i - 1]);
        }

        return Median(steps);
    }

    private static double MedianRatio(Spectrum spectrum, ReadOnlySpan<double> noise)
    {
        var ratios = new List<double>(spectrum.Count);
        for (int i = 0; i < spectrum.Count; i++)
        {
            if (spectrum.IsGood(i) && noise[i] > 0.0)
            {
                ratios.Add(spectrum.Flux[i] / noise[i]);
            }
        }

        return Median(ratios);
    }

    private static double Median(List<double> values)
    {
        values.Sort();
        return values.Count == 0 ? double.NaN : values[values.Count / 2];
    }
}
