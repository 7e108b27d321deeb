using System;
using System.Collections.Generic;
using StarLines.Tables;

namespace StarLines.Lines;

/// <summary>Turns measured lines into the table that the program writes.</summary>
public static class LineTable
{
    private const string Angstrom = "Angstrom";
    private const string Milliangstrom = "mAngstrom";

    /// <summary>The table of lines, one row a measurement; missing values are NaN or absent.</summary>
    /// <param name="rows">The rows; may be empty.</param>
    /// <param name="fluxUnit">Unit of the spectra's flux where all share one, else an empty string.</param>
    /// <param name="metadata">Metadata of the table; null for none.</param>
    public static Table ToTable(IReadOnlyList<LineRow> rows, string fluxUnit = "", TableMetadata? metadata = null)
    {
        ArgumentNullException.ThrowIfNull(rows);
        ArgumentNullException.ThrowIfNull(fluxUnit);
        var map = new TableMap<LineRow>();
        AddIdentity(map);
        AddCentre(map);
        AddWidths(map);
        AddProfile(map, fluxUnit.Length == 0 ? "" : $"{fluxUnit} {Angstrom}");
        AddQuality(map);
        return map.ToTable(rows, metadata, "lines");
    }

    private static void AddIdentity(TableMap<LineRow> map) => map
        .Text("file", r => r.File, "spectrum", "meta.id;meta.file")
        .Text("target", r => Known(r.Target), "target of the observation", "meta.id;src")
        .Text("line", r => r.Measurement.Line, "name of the line", "meta.id;em.line")
        .Text("species", r => Known(r.Measurement.Species), "atom or ion", "phys.atmol.element")
        .Double("rest_wavelength", r => r.Measurement.RestWavelengthAngstrom, Angstrom, "wavelength at rest, in the medium of the spectrum", "em.wl", decimals: 4)
        .Text("medium", r => MediumWord(r.Measurement.Medium), "air, vacuum, or unknown where the file does not say")
        .Text("status", r => LineWords.Of(r.Measurement.Status), "measured, limit, off-spectrum, masked or failed", "meta.code");

    private static void AddCentre(TableMap<LineRow> map) => map
        .Double("centre", r => r.Measurement.CentreAngstrom.Value, Angstrom, "centre of the fitted profile", "em.wl.central", decimals: 5)
        .Double("centre_err", r => r.Measurement.CentreAngstrom.Uncertainty, Angstrom, "its uncertainty, 1 sigma", "stat.error;em.wl.central", significantDigits: 3)
        .Double("velocity", r => r.Measurement.VelocityKmPerS.Value, "km/s", "velocity of the centre against rest, in the frame of the spectrum", "phys.veloc", decimals: 4)
        .Double("velocity_err", r => r.Measurement.VelocityKmPerS.Uncertainty, "km/s", "its uncertainty, 1 sigma", "stat.error;phys.veloc", significantDigits: 3);

    private static void AddWidths(TableMap<LineRow> map) => map
        .Double("ew", r => r.Measurement.EquivalentWidthMilliangstrom.Value, Milliangstrom, "equivalent width by the fit, absorption positive", "spect.line.eqWidth", decimals: 3)
        .Double("ew_err", r => r.Measurement.EquivalentWidthMilliangstrom.Uncertainty, Milliangstrom, "its uncertainty by noise and continuum, 1 sigma", "stat.error;spect.line.eqWidth", significantDigits: 3)
        .Double("ew_err_noise", r => r.Measurement.EquivalentWidthNoiseMilliangstrom, Milliangstrom, "part of the noise", "stat.error;spect.line.eqWidth", significantDigits: 3)
        .Double("ew_err_continuum", r => r.Measurement.EquivalentWidthContinuumMilliangstrom, Milliangstrom, "part of the placement of the continuum", "stat.error;spect.line.eqWidth", significantDigits: 3)
        .Double("ew_limit", r => r.Measurement.LimitMilliangstrom, Milliangstrom, "upper limit of the equivalent width, 3 sigma, at the width in fwhm", "stat.max;spect.line.eqWidth", significantDigits: 3)
        .Double("ew_direct", r => r.Measurement.DirectEquivalentWidthMilliangstrom.Value, Milliangstrom, "equivalent width by summation", "spect.line.eqWidth", decimals: 3)
        .Double("ew_direct_err", r => r.Measurement.DirectEquivalentWidthMilliangstrom.Uncertainty, Milliangstrom, "its uncertainty by noise and continuum, 1 sigma", "stat.error;spect.line.eqWidth", significantDigits: 3);

    private static void AddProfile(TableMap<LineRow> map, string fluxUnit) => map
        .Double("depth", r => r.Measurement.Depth.Value, "", "depth of the fitted profile in units of the continuum, emission negative", "spect.line.intensity", decimals: 5)
        .Double("depth_err", r => r.Measurement.Depth.Uncertainty, "", "its uncertainty, 1 sigma", "stat.error;spect.line.intensity", significantDigits: 3)
        .Double("fwhm", r => r.Measurement.FwhmAngstrom.Value, Angstrom, "full width at half maximum; of a limit, the width assumed", "spect.line.width", decimals: 5)
        .Double("fwhm_err", r => r.Measurement.FwhmAngstrom.Uncertainty, Angstrom, "its uncertainty, 1 sigma", "stat.error;spect.line.width", significantDigits: 3)
        .Double("flux", r => r.Measurement.Flux.Value, fluxUnit, "flux of the line, emission positive", "spect.line.strength", significantDigits: 6)
        .Double("flux_err", r => r.Measurement.Flux.Uncertainty, fluxUnit, "its uncertainty, 1 sigma", "stat.error;spect.line.strength", significantDigits: 3);

    private static void AddQuality(TableMap<LineRow> map) => map
        .Text("profile", r => Known(r.Measurement.Profile), "shape that was fitted", "meta.modelled")
        .Double("reduced_chi2", r => r.Measurement.ReducedChiSquare, "", "reduced chi-square of the fit", "stat.fit.chi2", decimals: 3)
        .Double("snr", r => r.Measurement.SignalToNoise, "", "signal-to-noise ratio a pixel of the continuum at the line", "stat.snr", decimals: 1)
        .Long("pixels", r => r.Measurement.Status == LineStatus.Measured ? r.Measurement.Pixels : null, "", "pixels used by the fit", "meta.number")
        .Long("blend", r => r.Measurement.Blend > 0 ? r.Measurement.Blend : null, "", "number shared by lines fitted together", "meta.id")
        .Text("warnings", r => LineWords.Of(r.Measurement.Warnings), "reservations, separated by semicolons", "meta.code.qual");

    private static string? Known(string text) => text.Length == 0 ? null : text;

    private static string MediumWord(Medium medium) => medium switch
    {
        Medium.Air => "air",
        Medium.Vacuum => "vacuum",
        _ => "unknown",
    };
}
