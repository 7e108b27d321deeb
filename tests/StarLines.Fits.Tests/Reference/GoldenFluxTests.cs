using System;
using System.Collections.Generic;
using System.Globalization;
using Xunit;

namespace StarLines.Fits.Tests.Reference;

/// <summary>
/// Stored values of every storage form against tests/Data/golden/wcs (written by astropy 5.2.1 and NumPy, compared there with an independent
/// read by CFITSIO 4.2.0).
/// </summary>
public sealed class GoldenFluxTests
{
    public static TheoryData<string, int, string> Files()
    {
        TheoryData<string, int, string> files = [];
        foreach (Dictionary<string, string> row in GoldenTable.Read("wcs.csv"))
        {
            files.Add(row["file"], int.Parse(row["hdu"], CultureInfo.InvariantCulture), row["csv"]);
        }

        return files;
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void Flux_is_as_the_golden_table_says(string name, int number, string csv)
    {
        using FitsFile file = FitsFile.Open(GoldenTable.PathOf("fits", name));
        FitsHdu hdu = file.Hdus[number];
        double[] flux = hdu.Image?.ReadDoubles() ?? FluxColumn(hdu.Table!).ReadDoubles();
        List<Dictionary<string, string>> rows = GoldenTable.Read(csv.Split('/'));
        Assert.Equal(rows.Count, flux.Length);
        double tolerance = Tolerance(name);
        for (int i = 0; i < flux.Length; i++)
        {
            double expected = GoldenTable.Number(rows[i]["flux"]);
            bool same = expected.Equals(flux[i]) || Math.Abs(flux[i] - expected) <= tolerance * Math.Abs(expected);
            Assert.True(same, string.Create(CultureInfo.InvariantCulture, $"{name}, pixel {i + 1}: {flux[i]:R} against {expected:R}"));
        }
    }

    [Fact]
    public void Error_extension_is_as_the_golden_table_says()
    {
        using FitsFile file = FitsFile.Open(GoldenTable.PathOf("fits", "multi_hdu_sci_err_dq.fits"));
        double[] error = file.FindHdu("err")!.Image!.ReadDoubles();
        List<Dictionary<string, string>> rows = GoldenTable.Read("wcs", "multi_hdu_sci_err_dq.csv");
        for (int i = 0; i < error.Length; i++)
        {
            Assert.Equal(GoldenTable.Number(rows[i]["err"]), error[i]);
        }
    }

    /// <summary>Exact but for quantized tiles, where float32 arithmetic of two libraries differs, and the uint64 whose golden value was rounded twice (golden README).</summary>
    private static double Tolerance(string name) =>
        name.StartsWith("tile_rice1_float32", StringComparison.Ordinal) ? 1e-7 : name == "uint64_bzero.fits" ? 1e-12
        : name == "table_ascii.fits" ? 3e-16 : 0.0;

    private static FitsColumn FluxColumn(FitsTable table)
    {
        foreach (string name in (string[])["FLUX", "COUNTS", "FLUXES"])
        {
            if (table.FindColumn(name) is FitsColumn column)
            {
                return column;
            }
        }

        throw new InvalidOperationException("no flux column");
    }
}
