using System;
using System.Collections.Generic;
using StarLines.Noise;

namespace StarLines.Analysis;

/// <summary>Makes a spectrum ready to be measured.</summary>
public static class SpectrumPreparation
{
    /// <summary>Excludes ranges, marks gaps, estimates the noise where the file has none, and marks outliers.</summary>
    /// <param name="spectrum">The spectrum as read.</param>
    /// <param name="exclude">Ranges to leave out, in the spectrum's own medium and frame.</param>
    /// <param name="findOutliers">Whether cosmic-ray hits and dead pixels are looked for.</param>
    /// <param name="noiseFromFlux">Receives whether the noise was taken from the flux.</param>
    public static Spectrum Prepare(
        Spectrum spectrum, IReadOnlyList<WavelengthRange> exclude, bool findOutliers, out bool noiseFromFlux)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(exclude);
        noiseFromFlux = !spectrum.HasSigma;
        Spectrum prepared = spectrum.Excluding(exclude).WithFaultsAdded(GapFinder.Find(spectrum.Flux));
        if (noiseFromFlux)
        {
            prepared = prepared.WithSigma(NoiseEstimator.EstimatePerPixel(prepared));
        }

        return findOutliers ? prepared.WithFaultsAdded(OutlierFinder.Find(prepared, prepared.Sigma)) : prepared;
    }
}
