using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Lines;
using StarLines.Velocities;
using StarLines.Velocities.Barycentre;

namespace StarLines.Analysis;

/// <summary>The main job on one spectrum: noise, continuum, velocities, lines, and the continuum again without the lines.</summary>
public static class SpectrumAnalysis
{
    // The lines are measured anew after each move of the level. A move of less than this part of its own uncertainty is
    // the last: the next one would be some ten times smaller.
    private const double Settled = 0.5;

    /// <summary>Measures a spectrum.</summary>
    /// <param name="spectrum">The spectrum as read.</param>
    /// <param name="options">What to measure, and how; keep it for all spectra of a night.</param>
    /// <returns>What was measured; a step that the data do not allow says so in its own result.</returns>
    /// <exception cref="ArgumentException">An option is out of range.</exception>
    public static AnalysisResult Analyse(Spectrum spectrum, AnalysisOptions options)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(options);
        Spectrum prepared = SpectrumPreparation.Prepare(spectrum, options.Exclude, options.FindOutliers, out bool noiseFromFlux);
        ContinuumFit continuum = ContinuumFitter.Fit(prepared, options.Continuum);
        var remarks = new List<Remark>();
        BarycentricResult? barycentre = Barycentre(prepared, remarks);
        bool needsVelocity = options.MeasureVelocities || (options.Lines is not null && options.LineVelocityKmPerS is null);
        IReadOnlyList<VelocityResult> velocities = needsVelocity ? Velocities(prepared, continuum, options, barycentre) : [];
        var result = new AnalysisResult
        {
            Spectrum = prepared,
            NoiseFromFlux = noiseFromFlux,
            Continuum = continuum,
            Velocities = options.MeasureVelocities ? velocities : [],
            Barycentre = barycentre,
            Remarks = remarks,
        };
        return options.Lines is null ? result : WithLines(result, options, velocities, remarks);
    }

    /// <summary>The reduction of a spectrum to the barycentre.</summary>
    /// <param name="spectrum">The spectrum; its metadata name target, site and time.</param>
    /// <param name="remarks">Receives what is missing.</param>
    /// <returns>The correction, or null where something is missing.</returns>
    public static BarycentricResult? Barycentre(Spectrum spectrum, ICollection<Remark> remarks)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(remarks);
        SpectrumMetadata metadata = spectrum.Metadata;
        if (metadata.RightAscensionDegrees is not double ra || metadata.DeclinationDegrees is not double dec
            || metadata.Site is not ObservingSite site || metadata.MidExposureUtc is not JulianDate time)
        {
            bool moved = spectrum.Scale.Frame is not (VelocityFrame.Topocentric or VelocityFrame.Unknown);
            remarks.Add(new Remark("no-barycentre", $"{Missing(metadata)}: {(moved ? "no BJD can be given" : "the velocity stays as the telescope saw it")}."));
            return null;
        }

        if (!BarycentricCorrection.Covers(time))
        {
            remarks.Add(new Remark("no-barycentre", "The time of the exposure is outside 1960 to 2059: the velocity stays as the telescope saw it."));
            return null;
        }

        return BarycentricCorrection.At(time, site, new StarAstrometry(ra, dec), target: metadata.Target);
    }

    private static string Missing(SpectrumMetadata metadata)
    {
        var missing = new List<string>();
        if (metadata.RightAscensionDegrees is null || metadata.DeclinationDegrees is null)
        {
            missing.Add("the coordinates of the target (give --ra and --dec)");
        }

        if (metadata.Site is null)
        {
            missing.Add("the site (give --site)");
        }

        if (metadata.MidExposureUtc is null)
        {
            missing.Add("the time (give --time)");
        }

        return $"Without {string.Join(", ", missing)}";
    }

    private static List<VelocityResult> Velocities(
        Spectrum spectrum, ContinuumFit continuum, AnalysisOptions options, BarycentricResult? barycentre)
    {
        var results = new List<VelocityResult>();
        if (options.StellarTemplates is StellarTemplates stellar && options.StellarTemplateNames.Count > 0)
        {
            results.AddRange(stellar.Measure(spectrum, continuum, options.StellarTemplateNames, options.Velocity));
        }

        if (options.Templates.Count > 0)
        {
            results.AddRange(VelocityMeasurer.MeasureAll(spectrum, continuum, options.Templates, options.Velocity));
        }

        if (barycentre is not null)
        {
            for (int k = 0; k < results.Count; k++)
            {
                results[k] = results[k].Reduced(barycentre);
            }
        }

        return results;
    }

    private static AnalysisResult WithLines(
        AnalysisResult result, AnalysisOptions options, IReadOnlyList<VelocityResult> velocities, List<Remark> remarks)
    {
        double velocity = options.LineVelocityKmPerS ?? BestVelocity(velocities);
        if (double.IsNaN(velocity))
        {
            velocity = 0.0;
            remarks.Add(new Remark(
                "velocity-assumed", "No velocity could be measured; the lines were looked for at 0 km/s: give --velocity."));
        }

        LineMeasureOptions measure = options.Measure with { VelocityKmPerS = velocity, NoiseFromFlux = result.NoiseFromFlux };
        ContinuumFit continuum = result.Continuum;
        LineMeasurementSet lines = LineMeasurer.Measure(result.Spectrum, continuum, options.Lines!, measure);
        for (int round = 0; round < options.ContinuumRounds; round++)
        {
            ContinuumFit refined = ContinuumFitter.Refine(result.Spectrum, continuum, lines.Model);
            double moved = Move(continuum, refined);
            continuum = refined;
            lines = LineMeasurer.Measure(result.Spectrum, continuum, options.Lines!, measure);
            if (moved < Settled)
            {
                break;
            }
        }

        return result with { Continuum = continuum, Lines = lines, LineVelocityKmPerS = velocity };
    }

    // The measured velocity with the smallest uncertainty.
    private static double BestVelocity(IReadOnlyList<VelocityResult> velocities)
    {
        double best = double.NaN;
        double least = double.PositiveInfinity;
        foreach (VelocityResult result in velocities)
        {
            if (result.ObservedKmPerS.HasValue && result.ObservedKmPerS.Uncertainty < least)
            {
                least = result.ObservedKmPerS.Uncertainty;
                best = result.ObservedKmPerS.Value;
            }
        }

        return best;
    }

    // The root mean square move in units of the uncertainty of the level.
    private static double Move(ContinuumFit before, ContinuumFit after)
    {
        double sum = 0.0;
        for (int i = 0; i < before.Count; i++)
        {
            double move = (after.Level[i] - before.Level[i]) / after.Sigma[i];
            sum += double.IsFinite(move) ? move * move : 0.0;
        }

        return Math.Sqrt(sum / before.Count);
    }
}
