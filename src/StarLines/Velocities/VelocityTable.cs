using System;
using System.Collections.Generic;
using StarLines.Tables;

namespace StarLines.Velocities;

/// <summary>The table of velocities: one row a spectrum, template and star.</summary>
public static class VelocityTable
{
    /// <summary>Rows as a table with the columns of the interface.</summary>
    /// <param name="rows">The rows, in the order of the table.</param>
    /// <param name="metadata">Metadata of the table, or null for none.</param>
    public static Table ToTable(IReadOnlyList<VelocityRow> rows, TableMetadata? metadata = null)
    {
        ArgumentNullException.ThrowIfNull(rows);
        return Map().ToTable(rows, metadata);
    }

    /// <summary>The rows of a result: its own, and one for a second star.</summary>
    /// <param name="file">The spectrum as the user names it.</param>
    /// <param name="target">The target, or an empty string.</param>
    /// <param name="result">The result.</param>
    public static IReadOnlyList<VelocityRow> RowsOf(string file, string target, VelocityResult result)
    {
        ArgumentNullException.ThrowIfNull(result);
        var rows = new List<VelocityRow>();
        for (VelocityResult? star = result; star is not null; star = star.Second)
        {
            rows.Add(new VelocityRow(file, target, star.Measurement));
        }

        return rows;
    }

    /// <summary>The word of a status in the table.</summary>
    /// <param name="status">The status.</param>
    public static string Word(VelocityStatus status) => status switch
    {
        VelocityStatus.Measured => "measured",
        VelocityStatus.Topocentric => "topocentric",
        VelocityStatus.OffSpectrum => "off-spectrum",
        VelocityStatus.NoPeak => "no-peak",
        _ => "failed",
    };

    private static TableMap<VelocityRow> Map() => new TableMap<VelocityRow>()
        .Text("file", static r => r.File, "Spectrum")
        .Text("target", static r => r.Target, "Target")
        .Text("template", static r => r.Measurement.Template, "Template")
        .Double("bjd_tdb", static r => r.Measurement.BarycentricJdTdb?.Value ?? double.NaN, "d", "Barycentric Julian Date (TDB) of mid-exposure", "time.epoch", decimals: 10)
        .Double("rv", static r => r.Measurement.VelocityKmPerS.Value, "km/s", "Barycentric radial velocity", "spect.dopplerVeloc", decimals: 5)
        .Double("rv_err", static r => Uncertainty(r.Measurement), "km/s", "Uncertainty of the velocity: noise, continuum and scatter of the lines", "stat.error;spect.dopplerVeloc", decimals: 5)
        .Double("rv_topocentric", static r => r.Measurement.TopocentricKmPerS, "km/s", "Radial velocity as the telescope saw it", decimals: 5)
        .Double("barycentric_correction", static r => r.Measurement.BarycentricCorrectionKmPerS, "km/s", "c z_B, so that (1 + z) = (1 + z_measured)(1 + z_B)", decimals: 5)
        .Double("ccf_height", static r => r.Measurement.PeakHeight, "", "Height of the correlation peak", significantDigits: 5)
        .Double("ccf_fwhm", static r => r.Measurement.PeakFwhmKmPerS, "km/s", "Full width at half maximum of the correlation peak", significantDigits: 5)
        .Double("r_value", static r => r.Measurement.RValue, "", "Ratio r of Tonry and Davis (1979)", significantDigits: 5)
        .Double("vsini", static r => r.Measurement.ProjectedRotationKmPerS.Value, "km/s", "Projected rotational velocity", "phys.veloc.rotat", significantDigits: 4)
        .Double("photon_limit", static r => r.Measurement.PhotonLimitKmPerS, "km/s", "Photon limit of the uncertainty (Bouchy et al. 2001)", significantDigits: 4)
        .Long("pixels", static r => r.Measurement.Pixels, "", "Pixels used")
        .Long("components", static r => r.Measurement.Components, "", "Stars seen in the correlation")
        .Long("component", static r => r.Measurement.Component, "", "Which of them")
        .Text("status", static r => Word(r.Measurement.Status), "How the measurement ended")
        .Text("warnings", static r => Words(r.Measurement), "Reservations");

    /// <summary>The uncertainty, also of a velocity that could not be reduced.</summary>
    private static double Uncertainty(VelocityMeasurement measurement) =>
        measurement.VelocityKmPerS.HasValue ? measurement.VelocityKmPerS.Uncertainty : measurement.TopocentricUncertaintyKmPerS;

    private static string Words(VelocityMeasurement measurement)
    {
        var words = new List<string>(measurement.Warnings.Count);
        foreach (Remark remark in measurement.Warnings)
        {
            if (!words.Contains(remark.Word))
            {
                words.Add(remark.Word);
            }
        }

        return string.Join(';', words);
    }
}
