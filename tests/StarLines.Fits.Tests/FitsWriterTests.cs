using System;
using System.ComponentModel;
using System.Diagnostics;
using System.IO;
using Xunit;

namespace StarLines.Fits.Tests;

public sealed class FitsWriterTests
{
    private static readonly double[] Waves = [5000.0, 5000.5, double.NaN, 5001.5];

    [Fact]
    public void Images_of_every_type_are_read_back()
    {
        double[] reals = [1.5, -2.25e-30, double.NaN, double.PositiveInfinity, 3e38, 0.0];
        long[] integers = [0, 1, 255, 17, 3, 4];
        MemoryStream stream = new();
        FitsWriter writer = new(stream);
        writer.WriteImage(reals, [6], -64);
        writer.WriteImage(reals, [3, 2], -32, name: "SINGLE");
        foreach (int bitPix in (int[])[8, 16, 32, 64])
        {
            writer.WriteImage(integers, [6], bitPix);
        }

        using FitsFile file = Reopen(stream);
        Assert.Equal(reals, file.Hdus[0].Image!.ReadDoubles());
        Assert.Equal([3L, 2L], file.FindHdu("single")!.Image!.Axes);
        Assert.Equal(Array.ConvertAll(reals, value => (double)(float)value), file.Hdus[1].Image!.ReadDoubles());
        for (int i = 2; i < 6; i++)
        {
            Assert.Equal(integers, file.Hdus[i].Image!.ReadIntegers());
        }
    }

    [Fact]
    public void Tables_of_every_type_are_read_back()
    {
        using FitsFile file = Reopen(WriteSample());
        FitsTable table = file.FindHdu("LINES")!.Table!;
        Assert.Equal(4, table.RowCount);
        FitsColumn wave = table.FindColumn("wave")!;
        Assert.Equal(("Angstrom", "em.wl", "spec:Data.SpectralAxis.Value"), (wave.Unit, wave.Ucd, wave.Utype));
        Assert.Equal(Waves, wave.ReadDoubles());
        Assert.Equal([3.0, 4.0], table.FindColumn("VECTOR")!.ReadDoubles(1));
        Assert.Equal([1L, long.MinValue, -3L, 40000L], table.FindColumn("COUNT")!.ReadIntegers());
        Assert.True(double.IsNaN(table.FindColumn("COUNT")!.ReadDoubles()[1]));
        Assert.Equal([true, false, null, true], table.FindColumn("USED")!.ReadLogicals());
        Assert.Equal(["Fe I", "", "Angstrom", "e'"], table.FindColumn("SPECIES")!.ReadStrings());
    }

    [Fact]
    public void Header_values_are_read_back()
    {
        using FitsFile file = Reopen(WriteSample());
        FitsHeader header = file.Hdus[0].Header;
        Assert.True(header.TryGetDouble("CRVAL1", out double number));
        Assert.Equal(1.0 / 3.0, number);
        Assert.True(header.TryGetString("OBJECT", out string? text));
        Assert.Equal("O'Neil's star", text);
        Assert.True(header.TryGetString("PATHLIST", out text));
        Assert.Equal(LongText, text);
        Assert.True(header.TryGetDouble("STAR LINES CONTINUUM STIFFNESS", out number));
        Assert.Equal(2.5, number);
        Assert.Equal(2, header.History.Count);
    }

    [Fact]
    public void Checksums_are_right()
    {
        using FitsFile file = Reopen(WriteSample());
        Assert.All(file.Hdus, hdu => Assert.Equal(new FitsChecksum(FitsChecksumStatus.Correct, FitsChecksumStatus.Correct), hdu.VerifyChecksum()));
        Assert.Empty(file.Warnings);
    }

    /// <summary>fitsverify is the verifier of the FITS support office, built on CFITSIO.</summary>
    [Fact]
    public void Written_files_pass_fitsverify_without_error_or_warning()
    {
        string path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName() + ".fits");
        try
        {
            File.WriteAllBytes(path, WriteSample().ToArray());
            string report = RunFitsVerify(path);
            Assert.StartsWith("verification OK", report, StringComparison.Ordinal);
        }
        finally
        {
            File.Delete(path);
        }
    }

    [Theory]
    [InlineData("NAXIS1")]
    [InlineData("TFORM12")]
    [InlineData("CHECKSUM")]
    [InlineData("A=B")]
    public void Keywords_of_the_structure_are_refused(string keyword) =>
        Assert.Throws<ArgumentException>(() => new FitsHeaderBuilder().Add(keyword, 1L));

    [Fact]
    public void Header_numbers_must_be_finite() =>
        Assert.Throws<ArgumentException>(() => new FitsHeaderBuilder().Add("CRVAL1", double.NaN));

    [Fact]
    public void Pixels_that_do_not_fit_their_type_are_refused() =>
        Assert.Throws<ArgumentException>(() => new FitsWriter(new MemoryStream()).WriteImage([70000L], [1], 16));

    [Fact]
    public void Columns_of_different_length_are_refused() =>
        Assert.Throws<ArgumentException>(() => new FitsWriter(new MemoryStream()).WriteTable(
            [FitsColumnData.OfDoubles("A", [1.0]), FitsColumnData.OfDoubles("B", [1.0, 2.0])]));

    [Fact]
    public void Random_long_strings_are_read_back()
    {
        Random random = new(20);
        for (int i = 0; i < 300; i++)
        {
            string text = RandomText(random, random.Next(200));
            MemoryStream stream = new();
            new FitsWriter(stream).WriteEmptyPrimary(new FitsHeaderBuilder().Add("TEXT", text, "a comment").Add("AFTER", 1L));
            using FitsFile file = Reopen(stream);
            Assert.True(file.Hdus[0].Header.TryGetString("TEXT", out string? read));
            Assert.Equal(text.TrimEnd(' '), read);
            Assert.True(file.Hdus[0].Header.TryGetInteger("AFTER", out _));
        }
    }

    private const string LongText = "night-1/star.fits; night-1/star-2.fits; it's a 'quoted' list & more; night-2/another-star.fits; night-2/the-last-star-of-the-night.fits";

    private static string RandomText(Random random, int length)
    {
        char[] letters = new char[length];
        for (int i = 0; i < length; i++)
        {
            letters[i] = random.Next(4) == 0 ? '\'' : (char)random.Next('A', 'Z');
        }

        return new string(letters);
    }

    private static MemoryStream WriteSample()
    {
        FitsHeaderBuilder header = new FitsHeaderBuilder()
            .Add("CTYPE1", "WAVE", "vacuum wavelength").Add("CRVAL1", 1.0 / 3.0, "first pixel").Add("CRPIX1", 1.0).Add("CDELT1", 1e-9)
            .Add("OBJECT", "O'Neil's star").Add("EXPTIME", 1200L, "[s] exposure").Add("NORMAL", true)
            .Add("PATHLIST", LongText, "inputs").Add("STAR LINES CONTINUUM STIFFNESS", 2.5, "chosen")
            .AddHistory("Continuum fitted by likelihood, with a stiffness that was chosen from the data, and written here in a line that needs two cards.")
            .AddComment("A comment with an accent: Ångström.");
        MemoryStream stream = new();
        FitsWriter writer = new(stream);
        writer.WriteImage(new double[] { 1.0, double.NaN, 3.0 }, [3], -32, header);
        FitsColumnData[] columns =
        [
            FitsColumnData.OfDoubles("WAVE", Waves).With(unit: "Angstrom", ucd: "em.wl", utype: "spec:Data.SpectralAxis.Value", description: "wavelength in vacuum"),
            FitsColumnData.OfSingles("VECTOR", [1, 2, 3, 4, 5, 6, 7, float.NaN], 2),
            FitsColumnData.OfIntegers("COUNT", [1, long.MinValue, -3, 40000]),
            FitsColumnData.OfIntegers("FLAG", [1, 2, 3, 4]),
            FitsColumnData.OfLogicals("USED", [true, false, null, true]),
            FitsColumnData.OfStrings("SPECIES", ["Fe I", "", "Ångström", "é'"]),
        ];
        writer.WriteTable(columns, new FitsHeaderBuilder().Add("CREATOR", "StarLines"), "LINES");
        writer.WriteTable([FitsColumnData.OfDoubles("EMPTY", [])]);
        return stream;
    }

    private static FitsFile Reopen(MemoryStream stream) => FitsFile.Open(new MemoryStream(stream.ToArray()), "written");

    private static string RunFitsVerify(string path)
    {
        try
        {
            using Process process = Process.Start(new ProcessStartInfo("fitsverify", ["-q", path]) { RedirectStandardOutput = true })!;
            string report = process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return report;
        }
        catch (Win32Exception)
        {
            Assert.Skip("fitsverify is not installed.");
            throw;
        }
    }
}
