using System.Collections.Generic;
using System.Linq;
using StarLines.Tables;
using StarLines.Velocities.Barycentre;

namespace StarLines.Cli.Output;

/// <summary>The columns of <c>starlines barycentre</c>.</summary>
internal static class BarycentreTable
{
    private static readonly TableMap<BarycentricResult> Map = new TableMap<BarycentricResult>()
        .Text("target", static r => r.Target, "Name of the target", "meta.id;src")
        .Double("bjd_tdb", static r => r.BarycentricJdTdb.Value, "d", "Barycentric Julian Date of mid-exposure, TDB", "time.epoch", decimals: 10)
        .Double("jd_utc", static r => r.JdUtc.Value, "d", "Julian Date of mid-exposure, UTC", "time.epoch", decimals: 10)
        .Double(
            "z_barycentre",
            static r => r.BarycentricRedshift,
            "",
            "Correction z_B: 1 + z_true = (1 + z_measured)(1 + z_B)",
            significantDigits: 12)
        .Double("barycentric_correction", static r => r.CorrectionKmPerS, "km/s", "Correction to the barycentre, c z_B", "spect.dopplerVeloc", decimals: 6)
        .Double("heliocentric_correction", static r => r.HeliocentricCorrectionKmPerS, "km/s", "Correction to the Sun's centre, classical", "spect.dopplerVeloc", decimals: 6)
        .Double("light_travel_time", static r => r.LightTravelTimeSeconds, "s", "Light travel time to the barycentre", "time.interval", decimals: 6)
        .Double("altitude", static r => r.AltitudeDegrees, "deg", "Altitude of the star without refraction", "pos.az.alt", decimals: 3)
        .Double("airmass", static r => r.Airmass, "", "Relative air mass", "obs.airMass", decimals: 3)
        .Text("warnings", static r => string.Join(';', r.Warnings.Select(static w => w.Word)), "Reservations, separated by semicolons", "meta.code.qual");

    /// <summary>Makes the table.</summary>
    public static Table Create(IReadOnlyList<BarycentricResult> results) => Map.ToTable(results, name: "barycentre");
}
