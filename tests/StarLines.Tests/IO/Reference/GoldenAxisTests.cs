using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using StarLines.IO;
using StarLines.TestSupport;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.IO.Reference;

/// <summary>
/// Wavelengths and fluxes of the golden FITS files (tests/Data/golden/README.md, section 3): vacuum wavelengths by the formulae of
/// Greisen et al. (2006), A&amp;A 446, 747, checked there against WCSLIB; fluxes checked against CFITSIO.
/// </summary>
public sealed class GoldenAxisTests
{
    /// <summary>Rounding of a few double operations; the golden values agree with WCSLIB to 1.2e-13.</summary>
    private const double Tolerance = 1e-12;

    /// <summary>Files whose axis is sampled in another variable than its own type, or by a grism, in air: the golden table used the air formula
    /// of WCSLIB (IAU 1953) inside the algorithm, we use Ciddor (1996). They differ by 3 m/s, which changes over the axis by far less.</summary>
    private const double AirAlgorithmTolerance = 2e-10;

    public static TheoryData<string, string> Files()
    {
        var data = new TheoryData<string, string>();
        foreach (Dictionary<string, string> row in GoldenCsv.Rows("wcs.csv"))
        {
            if (!row["csv"].EndsWith("_alt.csv", StringComparison.Ordinal))
            {
                data.Add(row["file"], row["csv"]);
            }
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void Wavelengths_and_flux_are_those_of_the_golden_table(string file, string csv)
    {
        List<Dictionary<string, string>> rows = GoldenCsv.Rows(csv.Split('/'));
        IReadOnlyList<Spectrum> spectra = SpectrumReader.Read(ReferenceData.DataFile("golden", "fits", file));
        Assert.Equal(rows.Count, spectra.Sum(spectrum => spectrum.Count));

        double tolerance = file is "awav_f2a.fits" or "awav_gra.fits" or "wave_gra.fits" ? AirAlgorithmTolerance : Tolerance;
        int row = 0;
        foreach (Spectrum spectrum in spectra)
        {
            bool reversed = GoldenCsv.Number(rows[row]["wave_vac"]) > GoldenCsv.Number(rows[row + spectrum.Count - 1]["wave_vac"]);
            for (int i = 0; i < spectrum.Count; i++)
            {
                int at = reversed ? spectrum.Count - 1 - i : i;
                Compare(rows[row + at], spectrum, i, tolerance);
            }

            row += spectrum.Count;
        }
    }

    [Fact]
    public void An_alternate_axis_gives_its_own_wavelengths()
    {
        using Fits.FitsFile file = Fits.FitsFile.Open(ReferenceData.DataFile("golden", "fits", "alternate_wcs.fits"));
        var context = new ReadContext("alternate", "0", SpectrumReadOptions.Default);
        var header = new FitsKeywords(file.Hdus[0].Header);
        AxisSolution axis = AxisInterpreter.Interpret(header, AxisDescription.Read(header, 1, 400, "A", context), context)!;
        WavelengthScale scale = axis.ToScale(axis.Medium, VelocityFrame.Unknown);
        List<Dictionary<string, string>> rows = GoldenCsv.Rows("wcs", "alternate_wcs_alt.csv");
        for (int i = 0; i < rows.Count; i++)
        {
            Close(GoldenCsv.Number(rows[i]["wave_vac"]) * 1e10, scale.WavelengthsAngstrom[i], Tolerance, i);
        }
    }

    private static void Compare(Dictionary<string, string> row, Spectrum spectrum, int i, double tolerance)
    {
        double wavelength = spectrum.Scale.WavelengthsAngstrom[i];
        if (spectrum.Scale.Medium == Medium.Air && row.ContainsKey("native") && IsStatedAir(spectrum))
        {
            Close(GoldenCsv.Number(row["wave_vac_ciddor"]) * 1e10, AirVacuum.ToVacuumAngstrom(wavelength), tolerance, i);
        }
        else
        {
            Close(GoldenCsv.Number(row["wave_vac"]) * 1e10, wavelength, tolerance, i);
        }

        double flux = GoldenCsv.Number(row["flux"]);
        if (double.IsFinite(flux))
        {
            // Fluxes are stored values times a scale; quantized tiles are quoted as what CFITSIO decodes to float32 (1e-7).
            Assert.True(Math.Abs(flux - spectrum.Flux[i]) <= 1e-7 * Math.Abs(flux), $"flux {spectrum.Flux[i]} at {i}, not {flux}");
        }
        else
        {
            Assert.Equal(PixelFaults.Missing, spectrum.Faults[i] & PixelFaults.Missing);
        }

        if (row.TryGetValue("err", out string? cell) && double.IsFinite(GoldenCsv.Number(cell)))
        {
            double error = GoldenCsv.Number(cell);
            Assert.True(Math.Abs(error - spectrum.Sigma[i]) <= 1e-7 * error, $"error {spectrum.Sigma[i]} at {i}, not {error}");
        }
    }

    private static bool IsStatedAir(Spectrum spectrum) =>
        !spectrum.Metadata.Remarks.Any(remark => remark.Word == "medium-assumed");

    private static void Close(double expected, double found, double tolerance, int index) => Assert.True(
        Math.Abs(found - expected) <= tolerance * expected,
        string.Create(CultureInfo.InvariantCulture, $"{found:R} Å at index {index}, not {expected:R} Å: relative {Math.Abs((found / expected) - 1.0):E2}"));
}
