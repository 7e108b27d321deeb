using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Continuum;
using StarLines.Noise;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// Measures radial velocities: correlation with a template over the whole range, then least squares of the template against
/// the pixels. The result stands in the frame of the spectrum until it is reduced.
/// </summary>
public static class VelocityMeasurer
{
    /// <summary>Fewest good pixels of a spectrum that can be measured.</summary>
    private const int FewestPixels = 16;

    /// <summary>Measures the velocity with one template.</summary>
    /// <param name="spectrum">The spectrum; where it has no uncertainties they are estimated from the flux itself.</param>
    /// <param name="continuum">Its continuum, pixel by pixel.</param>
    /// <param name="template">The template; keep it for the next spectrum.</param>
    /// <param name="options">Range and other choices.</param>
    /// <exception cref="ArgumentException">The lengths differ, or an option is out of range.</exception>
    public static VelocityResult Measure(
        Spectrum spectrum, ContinuumFit continuum, LineTemplate template, VelocityOptions? options = null) =>
        MeasureAll(spectrum, continuum, [template], options)[0];

    /// <summary>Measures the velocity with several templates; the spectrum is prepared once.</summary>
    /// <param name="spectrum">The spectrum; where it has no uncertainties they are estimated from the flux itself.</param>
    /// <param name="continuum">Its continuum, pixel by pixel.</param>
    /// <param name="templates">The templates; keep them for the next spectrum.</param>
    /// <param name="options">Range and other choices.</param>
    /// <returns>One result a template, in their order.</returns>
    /// <exception cref="ArgumentException">The lengths differ, or an option is out of range.</exception>
    public static VelocityResult[] MeasureAll(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<LineTemplate> templates, VelocityOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(templates);
        var families = new TemplateFamily[templates.Count];
        for (int k = 0; k < families.Length; k++)
        {
            families[k] = new TemplateFamily(templates[k]);
        }

        return MeasureFamilies(spectrum, continuum, families, options);
    }

    /// <summary>Measures the velocity with the best member of each of several families of templates.</summary>
    /// <param name="spectrum">The spectrum; where it has no uncertainties they are estimated from the flux itself.</param>
    /// <param name="continuum">Its continuum, pixel by pixel.</param>
    /// <param name="families">The families; keep them for the next spectrum.</param>
    /// <param name="options">Range and other choices.</param>
    /// <returns>One result a family, in their order.</returns>
    /// <exception cref="ArgumentException">The lengths differ, or an option is out of range.</exception>
    public static VelocityResult[] MeasureFamilies(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<TemplateFamily> families, VelocityOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(families);
        options ??= new VelocityOptions();
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        Guard.Between(options.SearchHalfRangeKmPerS, 10.0, 10_000.0, nameof(options.SearchHalfRangeKmPerS), "km/s");
        Guard.Between(options.FalseAlarmProbability, 1e-12, 0.5, nameof(options.FalseAlarmProbability), "");
        var results = new VelocityResult[families.Count];
        PreparedSpectrum? prepared = PreparedSpectrum.Of(spectrum, continuum, families, options);
        for (int k = 0; k < results.Length; k++)
        {
            results[k] = prepared is null
                ? Nothing(families[k].Name, VelocityStatus.Failed, new Remark(
                    "too-few-pixels", $"Fewer than {FewestPixels} pixels can be used: a velocity needs more."))
                : new VelocityRun(prepared, families[k], options).Result();
        }

        return results;
    }

    /// <summary>A result without a velocity.</summary>
    internal static VelocityResult Nothing(string template, VelocityStatus status, params ReadOnlySpan<Remark> warnings) =>
        new(new VelocityMeasurement { Template = template, Status = status, Warnings = warnings.ToArray() }, [], []);

    /// <summary>What all templates share: the spectrum in vacuum with weights, and its transform.</summary>
    internal sealed class PreparedSpectrum
    {
        private PreparedSpectrum(Spectrum spectrum, ResidualSpectrum residual, CorrelationSearch search, List<Remark> remarks)
        {
            Spectrum = spectrum;
            Residual = residual;
            Search = search;
            Remarks = remarks;
        }

        internal Spectrum Spectrum { get; }

        internal ResidualSpectrum Residual { get; }

        internal CorrelationSearch Search { get; }

        internal List<Remark> Remarks { get; }

        internal static PreparedSpectrum? Of(
            Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<TemplateFamily> families, VelocityOptions options)
        {
            if (spectrum.Count < FewestPixels)
            {
                return null;
            }

            var remarks = new List<Remark>();
            if (!spectrum.HasSigma)
            {
                spectrum = spectrum.WithSigma(NoiseEstimator.EstimatePerPixel(spectrum));
                remarks.Add(new Remark("noise-estimated", "The file has no uncertainties: they were estimated from the flux itself."));
            }

            if (spectrum.Scale.Medium == Medium.Unknown)
            {
                remarks.Add(new Remark("medium-assumed", string.Create(
                    CultureInfo.InvariantCulture,
                    $"The file does not say whether its wavelengths are in air or vacuum; {(options.AssumedMedium == Medium.Vacuum ? "vacuum" : "air")} was assumed: give --medium.")));
            }

            if (FrameRemark(spectrum.Scale.Frame) is Remark frame)
            {
                remarks.Add(frame);
            }

            var residual = new ResidualSpectrum(spectrum, continuum, options.AssumedMedium);
            if (residual.Used < FewestPixels)
            {
                return null;
            }

            CorrelationGrid? kept = families.Count > 0 ? families[0].Members[0].KeptGrid : null;
            CorrelationGrid grid = residual.GridFor(kept, options.SearchHalfRangeKmPerS);
            return new PreparedSpectrum(spectrum, residual, new CorrelationSearch(residual, grid), remarks);
        }

        private static Remark? FrameRemark(VelocityFrame frame) => frame switch
        {
            VelocityFrame.Unknown => new Remark(
                "frame-assumed", "The file does not say what its wavelengths were reduced to; topocentric was assumed: give --frame."),
            VelocityFrame.Heliocentric => new Remark(
                "heliocentric", "The wavelengths are reduced to the Sun, up to 15 m/s from the barycentre; the velocity is left so."),
            VelocityFrame.Rest => new Remark(
                "rest-frame", "The wavelengths are reduced to the rest frame of the star: the velocity is what remains."),
            _ => null,
        };
    }
}
