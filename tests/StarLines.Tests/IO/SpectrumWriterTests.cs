using System;
using System.IO;
using System.Linq;
using StarLines.Continuum;
using StarLines.Fits;
using StarLines.IO;
using StarLines.Tables;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class SpectrumWriterTests
{
    [Theory]
    [InlineData(SpectrumFormat.FitsTable, "spectrum.fits")]
    [InlineData(SpectrumFormat.FitsImage, "spectrum.fits")]
    [InlineData(SpectrumFormat.Ecsv, "spectrum.ecsv")]
    [InlineData(SpectrumFormat.VoTable, "spectrum.vot")]
    [InlineData(SpectrumFormat.Json, "spectrum.json")]
    [InlineData(SpectrumFormat.Parquet, "spectrum.parquet")]
    public void What_is_written_reads_the_same(SpectrumFormat format, string name)
    {
        Spectrum spectrum = Make(WavelengthScale.Linear(5000.0, 0.1, 50, Medium.Air, VelocityFrame.Barycentric));
        Spectrum read = RoundTrip(spectrum, format, name);
        Compare(spectrum, read, exact: format != SpectrumFormat.FitsImage);
        Assert.Equal(Medium.Air, read.Scale.Medium);
        Assert.Equal(VelocityFrame.Barycentric, read.Scale.Frame);
        SpectrumMetadata metadata = read.Metadata;
        Assert.Equal("Star of the test", metadata.Target);
        Assert.Equal(123.456, metadata.RightAscensionDegrees);
        Assert.Equal(-12.5, metadata.DeclinationDegrees);
        Assert.Equal(45.25, metadata.Site!.LatitudeDegrees);
        Assert.Equal(1234.0, metadata.Site.HeightMetres);
        Assert.Equal(600.0, metadata.ExposureSeconds);
        Assert.Equal(48000.0, metadata.ResolvingPower);
        Assert.Equal(-3.25, metadata.AppliedCorrectionKmPerS);
        Assert.Equal("2024-05-01T21:30:00.125000", UtcTime.ToIso(metadata.MidExposureUtc!.Value, 6));
    }

    [Fact]
    public void Comma_separated_values_keep_all_digits()
    {
        Spectrum spectrum = Make(WavelengthScale.Tabulated([5000.1, 5000.3, 5000.70000000001], Medium.Vacuum));
        Compare(spectrum, RoundTrip(spectrum, SpectrumFormat.Csv, "spectrum.csv"), exact: true);
    }

    [Theory]
    [InlineData(Medium.Vacuum)]
    [InlineData(Medium.Unknown)]
    public void A_logarithmic_image_keeps_its_steps(Medium medium)
    {
        Spectrum spectrum = Make(WavelengthScale.LogLinear(4000.0, 1e-4, 500, medium));
        Spectrum read = RoundTrip(spectrum, SpectrumFormat.FitsImage, "spectrum.fits");
        Assert.Equal(WavelengthSampling.LogLinear, read.Scale.Sampling);
        Assert.Equal(medium == Medium.Unknown, read.Metadata.Remarks.Any(remark => remark.Word == "medium-assumed"));
        Compare(spectrum, read, exact: false);
    }

    [Fact]
    public void A_table_of_wavelengths_is_no_image()
    {
        Spectrum spectrum = Make(WavelengthScale.Tabulated([5000.1, 5000.3, 5000.7], Medium.Vacuum));
        Assert.Throws<ArgumentException>(() => SpectrumWriter.Write(spectrum, new MemoryStream(), SpectrumFormat.FitsImage));
    }

    [Fact]
    public void A_normalized_spectrum_has_the_promised_columns()
    {
        Spectrum spectrum = Make(WavelengthScale.Linear(5000.0, 0.1, 3, Medium.Air));
        var continuum = new ContinuumFit([20.0, 20.0, -1.0], [0.1, 0.1, 0.1], [true, true, false], 10.0);
        using var stream = new MemoryStream();
        SpectrumWriter.WriteNormalized(spectrum, continuum, stream);
        stream.Position = 0;
        using FitsFile file = FitsFile.Open(stream, "normalized");
        Table table = FitsTableMapping.Read(file.Hdus[1]);
        Assert.Equal(
            ["wavelength", "flux", "uncertainty", "continuum", "continuum_uncertainty", "normalized_flux", "normalized_uncertainty", "mask"],
            table.Columns.Select(column => column.Name));
        Assert.Equal(spectrum.Flux[0] / 20.0, table["normalized_flux"].Doubles[0]);
        Assert.True(double.IsNaN(table["normalized_flux"].Doubles[2]));
        Assert.Equal("erg/s/cm2/Angstrom", table["continuum"].Unit);
    }

    [Fact]
    public void Several_spectra_stand_in_one_file()
    {
        Spectrum blue = Make(WavelengthScale.Linear(4000.0, 0.1, 20, Medium.Air));
        Spectrum red = Make(WavelengthScale.Linear(6000.0, 0.1, 30, Medium.Air));
        using var stream = new MemoryStream();
        SpectrumWriter.WriteFits([blue, red], stream);
        Assert.Equal([20, 30], SpectrumReader.Read(new MemoryStream(stream.ToArray()), "two.fits").Select(spectrum => spectrum.Count));
        Assert.Equal(30, SpectrumReader.Read(new MemoryStream(stream.ToArray()), "two.fits#2").Single().Count);
    }

    [Fact]
    public void Tables_of_all_types_go_through_FITS_and_back()
    {
        var metadata = new TableMetadata { { "program", "a test" }, { "rows", 2L }, { "good", true }, { "value", 1.5 } };
        var table = new Table(
            [
                new TableColumn("x", (ReadOnlySpan<double>)[1.0 / 3.0, double.NaN]) { Unit = "km/s", Description = "a number", Ucd = "spect.dopplerVeloc" },
                new TableColumn("n", (ReadOnlySpan<long?>)[1L << 40, null]),
                new TableColumn("name", (ReadOnlySpan<string?>)["Fe I", null]),
                new TableColumn("flag", (ReadOnlySpan<bool?>)[true, null]),
            ],
            metadata,
            "LINES");
        using var stream = new MemoryStream();
        FitsTableMapping.Write(table, stream, ["made by a test"]);
        stream.Position = 0;
        using FitsFile file = FitsFile.Open(stream, "lines");
        Table read = FitsTableMapping.Read(file.Hdus[1]);
        Assert.Equal("LINES", read.Name);
        Assert.Equal(1.0 / 3.0, read["x"].Doubles[0]);
        Assert.True(read["x"].IsMissing(1));
        Assert.Equal(("km/s", "a number", "spect.dopplerVeloc"), (read["x"].Unit, read["x"].Description, read["x"].Ucd));
        Assert.Equal([1L << 40, null], read["n"].Longs.ToArray());
        Assert.Equal(["Fe I", null], read["name"].Texts.ToArray());
        Assert.Equal([true, null], read["flag"].Bools.ToArray());
        Assert.Equal("a test", read.Metadata.TextOf("program"));
        Assert.Equal(1.5, read.Metadata["VALUE"].ToReal());
        Assert.Contains("made by a test", file.Hdus[1].Header.History);
    }

    private static Spectrum RoundTrip(Spectrum spectrum, SpectrumFormat format, string name)
    {
        using var stream = new MemoryStream();
        SpectrumWriter.Write(spectrum, stream, format, ["written by a test"]);
        return SpectrumReader.Read(new MemoryStream(stream.ToArray()), name).Single();
    }

    private static void Compare(Spectrum spectrum, Spectrum read, bool exact)
    {
        Assert.Equal(spectrum.Count, read.Count);
        for (int i = 0; i < spectrum.Count; i++)
        {
            // An axis is computed again from its keywords; a table is stored.
            double tolerance = exact ? 0.0 : 1e-14 * spectrum.Count * spectrum.Scale.WavelengthsAngstrom[i];
            Assert.Equal(spectrum.Scale.WavelengthsAngstrom[i], read.Scale.WavelengthsAngstrom[i], tolerance);
        }

        Assert.Equal(spectrum.Flux.ToArray(), read.Flux.ToArray());
        Assert.Equal(spectrum.Sigma.ToArray(), read.Sigma.ToArray());
        Assert.Equal(spectrum.FluxUnit, read.FluxUnit.Length == 0 ? spectrum.FluxUnit : read.FluxUnit);
        for (int i = 0; i < spectrum.Count; i++)
        {
            Assert.Equal(spectrum.IsGood(i), read.IsGood(i));
            Assert.Equal(spectrum.Faults[i] & PixelFaults.Missing, read.Faults[i] & PixelFaults.Missing);
        }
    }

    private static Spectrum Make(WavelengthScale scale)
    {
        double[] flux = [.. Enumerable.Range(0, scale.Count).Select(i => i == 1 ? double.NaN : 10.0 + (1.0 / (i + 3.0)))];
        double[] sigma = [.. Enumerable.Range(0, scale.Count).Select(i => 0.1 + (0.01 / (i + 7.0)))];
        var faults = new PixelFaults[scale.Count];
        faults[2] = PixelFaults.Flagged;
        return new Spectrum(scale, flux, sigma, faults, "erg/s/cm2/Angstrom", new SpectrumMetadata
        {
            Target = "Star of the test",
            RightAscensionDegrees = 123.456,
            DeclinationDegrees = -12.5,
            Site = new ObservingSite("Invented Hill", 45.25, -10.5, 1234.0),
            MidExposureUtc = UtcTime.Parse("2024-05-01T21:30:00.125"),
            ExposureSeconds = 600.0,
            ResolvingPower = 48000.0,
            AppliedCorrectionKmPerS = -3.25,
        });
    }
}
