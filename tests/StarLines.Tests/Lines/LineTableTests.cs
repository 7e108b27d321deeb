using System.Linq;
using StarLines.Lines;
using StarLines.Tables;
using Xunit;

namespace StarLines.Tests.Lines;

public sealed class LineTableTests
{
    [Fact]
    public void Table_has_the_columns_of_the_interface_in_its_order()
    {
        string[] promised =
        [
            "file", "target", "line", "species", "rest_wavelength", "medium", "status", "centre", "centre_err", "velocity",
            "velocity_err", "ew", "ew_err", "ew_err_noise", "ew_err_continuum", "ew_limit", "ew_direct", "ew_direct_err", "depth",
            "depth_err", "fwhm", "fwhm_err", "flux", "profile", "reduced_chi2", "snr", "pixels", "blend", "warnings",
        ];
        Table table = LineTable.ToTable([]);
        Assert.Equal(promised, table.Columns.Select(static c => c.Name).Where(static n => n != "flux_err"));
    }

    [Fact]
    public void Rows_carry_values_units_and_words()
    {
        var made = new SyntheticSpectrum(400, 200.0, 0, (5990.0, 0.5, 0.3), (6010.0, 0.5, 0.3));
        LineMeasurementSet set = made.Measure(new LineMeasureOptions { NoiseFromFlux = true });
        Table table = LineTable.ToTable([.. set.Lines.Select(static l => new LineRow("a.fits", "", l))], "adu");
        Assert.Equal("mAngstrom", table["ew"].Unit);
        Assert.Equal("adu Angstrom", table["flux"].Unit);
        Assert.Equal(["off-spectrum", "measured"], table["status"].Texts.ToArray());
        Assert.True(double.IsNaN(table["ew"].Doubles[0]));
        Assert.Equal(set.Lines[1].EquivalentWidthMilliangstrom.Value, table["ew"].Doubles[1]);
        Assert.Equal("noise-from-flux", table["warnings"].Texts[1]);
        Assert.Null(table["target"].Texts[0]);
    }

    [Fact]
    public void Warnings_are_joined_by_semicolons() =>
        Assert.Equal("edge;saturated", LineWords.Of(LineWarnings.Saturated | LineWarnings.Edge));
}
