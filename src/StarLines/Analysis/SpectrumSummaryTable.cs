using System.Collections.Generic;
using System.Linq;
using StarLines.Tables;
using StarLines.Velocities.Time;

namespace StarLines.Analysis;

/// <summary>The columns of the table of spectra.</summary>
public static class SpectrumSummaryTable
{
    /// <summary>Joins the members of a summary to columns; other tables may add to them.</summary>
    /// <returns>A new map.</returns>
    public static TableMap<SpectrumSummary> Map() => new TableMap<SpectrumSummary>()
        .Text("file", static s => s.Source, "Where the spectrum came from", "meta.id;meta.file")
        .Text("target", static s => s.Metadata.Target, "Name of the target", "meta.id;src")
        .Double("ra", static s => s.Metadata.RightAscensionDegrees ?? double.NaN, "deg", "Right ascension, ICRS", "pos.eq.ra", decimals: 6)
        .Double("dec", static s => s.Metadata.DeclinationDegrees ?? double.NaN, "deg", "Declination, ICRS", "pos.eq.dec", decimals: 6)
        .Text("site", static s => s.Metadata.Site?.Name, "The observatory", "meta.id;instr.obsty")
        .Double("site_latitude", static s => s.Metadata.Site?.LatitudeDegrees ?? double.NaN, "deg", "Geodetic latitude", "pos.earth.lat", decimals: 5)
        .Double("site_longitude", static s => s.Metadata.Site?.LongitudeDegrees ?? double.NaN, "deg", "Longitude, positive east", "pos.earth.lon", decimals: 5)
        .Double("site_height", static s => s.Metadata.Site?.HeightMetres ?? double.NaN, "m", "Height above the ellipsoid", "pos.earth.altitude", decimals: 1)
        .Text("mid_exposure", static s => s.Metadata.MidExposureUtc is { } utc ? UtcTime.ToIso(utc) : null, "Mid-exposure, UTC", "time.epoch")
        .Double("bjd_tdb", static s => s.Barycentre?.BarycentricJdTdb.Value ?? double.NaN, "d", "Barycentric Julian Date of mid-exposure, TDB", "time.epoch", decimals: 6)
        .Double("barycentric_correction", static s => s.Barycentre?.CorrectionKmPerS ?? double.NaN, "km/s", "Correction to the barycentre, c z_B", "spect.dopplerVeloc", decimals: 4)
        .Double("exposure", static s => s.Metadata.ExposureSeconds ?? double.NaN, "s", "Exposure time", "time.duration;obs.exposure", significantDigits: 8)
        .Long("pixels", static s => s.Pixels, "", "Number of pixels", "meta.number")
        .Long("good_pixels", static s => s.GoodPixels, "", "Number of pixels that may be used", "meta.number")
        .Double("wavelength_min", static s => s.Range.MinimumAngstrom, "Angstrom", "First pixel centre", "em.wl;stat.min", decimals: 3)
        .Double("wavelength_max", static s => s.Range.MaximumAngstrom, "Angstrom", "Last pixel centre", "em.wl;stat.max", decimals: 3)
        .Double("step", static s => s.StepAngstrom, "Angstrom", "Median step from pixel to pixel", "spect.binSize", significantDigits: 6)
        .Text("sampling", static s => Word(s.Sampling), "Spacing of the pixels: linear, log-linear or tabulated")
        .Text("medium", static s => Word(s.Medium), "Medium of the wavelengths: air, vacuum or unknown")
        .Text("frame", static s => Word(s.Frame), "Velocity frame of the wavelengths")
        .Double("resolving_power", static s => s.Metadata.ResolvingPower ?? double.NaN, "", "Resolving power of the instrument", "spect.resolution", significantDigits: 6)
        .Text("flux_unit", static s => s.FluxUnit, "Unit of the flux as the source writes it", "meta.unit")
        .Bool("has_error", static s => s.HasSigma, "Whether the source gives uncertainties", "meta.code")
        .Double("snr", static s => s.SignalToNoise, "", "Median signal-to-noise ratio a pixel by the uncertainties", "stat.snr", significantDigits: 4)
        .Double("snr_flux", static s => s.SignalToNoiseFromFlux, "", "Median signal-to-noise ratio a pixel by the scatter of the flux", "stat.snr", significantDigits: 4)
        .Text("warnings", static s => string.Join(';', s.Metadata.Remarks.Select(static r => r.Word).Distinct()), "Reservations, separated by semicolons", "meta.code.qual");

    /// <summary>Makes the table.</summary>
    /// <param name="summaries">One row each.</param>
    public static Table Create(IReadOnlyList<SpectrumSummary> summaries) => Map().ToTable(summaries, name: "spectra");

    /// <summary>The word of a medium in tables.</summary>
    /// <param name="medium">The medium.</param>
    public static string Word(Medium medium) => medium switch
    {
        Medium.Air => "air",
        Medium.Vacuum => "vacuum",
        _ => "unknown",
    };

    /// <summary>The word of a frame in tables.</summary>
    /// <param name="frame">The frame.</param>
    public static string Word(VelocityFrame frame) => frame switch
    {
        VelocityFrame.Topocentric => "topocentric",
        VelocityFrame.Geocentric => "geocentric",
        VelocityFrame.Heliocentric => "heliocentric",
        VelocityFrame.Barycentric => "barycentric",
        VelocityFrame.Rest => "rest",
        _ => "unknown",
    };

    /// <summary>The word of a sampling in tables.</summary>
    /// <param name="sampling">The sampling.</param>
    public static string Word(WavelengthSampling sampling) => sampling switch
    {
        WavelengthSampling.Linear => "linear",
        WavelengthSampling.LogLinear => "log-linear",
        _ => "tabulated",
    };
}
