using System;
using System.Collections.Generic;
using System.Linq;
using Xunit;

namespace StarLines.Fits.Tests.Reference;

/// <summary>Damaged files of tests/Data/golden/hostile, and the outcomes that hostile.csv requires, as far as they concern storage.</summary>
public sealed class HostileTests
{
    /// <summary>Files whose storage is sound; what is wrong with them is the spectral axis or the values, which a FITS reader does not judge.</summary>
    private static readonly HashSet<string> SoundStorage =
    [
        "no_spectral_axis.fits", "spatial_axis_only.fits", "cdelt_zero.fits", "cunit_unknown.fits", "ctype_unknown_algorithm.fits",
        "velo_without_rest.fits", "wave_negative.fits", "freq_through_zero.fits", "flux_all_nan.fits", "flux_all_zero.fits", "flux_one_pixel.fits",
        "flux_zero_pixels.fits", "flux_huge_values.fits", "table_columns_unequal.fits", "wave_not_monotonic.fits", "wave_duplicate.fits",
        "wave_nan.fits", "wave_constant.fits", "tab_missing_table.fits", "tab_missing_column.fits", "gzip_bomb.fits.gz",
    ];

    public static TheoryData<string, string> Files()
    {
        TheoryData<string, string> files = [];
        foreach (Dictionary<string, string> row in GoldenTable.Read("hostile.csv"))
        {
            files.Add(row["file"], row["required_outcome"]);
        }

        return files;
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void Damaged_file_meets_its_required_outcome(string name, string outcome)
    {
        Reading reading = Reading.Of(GoldenTable.PathOf("hostile", name));
        if (SoundStorage.Contains(name))
        {
            Assert.Null(reading.Error);
            return;
        }

        switch (outcome)
        {
            case "error":
                Assert.NotNull(reading.Error);
                break;
            case "warn-readable":
                Assert.Null(reading.Error);
                Assert.NotEmpty(reading.Warnings);
                break;
            case "warn-or-error" or "error-or-partial" or "error-or-empty":
                Assert.True(reading.Error is not null || reading.Warnings.Count > 0, "read without a word");
                break;
            default:
                Assert.Equal("no-crash", outcome);
                break;
        }
    }

    [Theory]
    [InlineData("bitpix_bad.fits", 0, "BITPIX")]
    [InlineData("naxis1_string.fits", 0, "NAXIS1")]
    [InlineData("tform_bad_letter.fits", 1, "TFORM2")]
    [InlineData("no_end.fits", 0, "END")]
    [InlineData("heap_count_huge.fits", 1, "TFORM2")]
    [InlineData("value_garbage.fits", 0, "CRVAL1")]
    [InlineData("cdelt_nan.fits", 0, "CDELT1")]
    [InlineData("tile_ztile_zero.fits", 1, "ZTILE1")]
    public void Error_names_file_HDU_and_keyword(string name, int number, string keyword)
    {
        FitsFormatException error = Assert.IsType<FitsFormatException>(Reading.Of(GoldenTable.PathOf("hostile", name)).Error);
        Assert.Equal(number, error.HduNumber);
        Assert.Equal(keyword, error.Keyword);
        Assert.Contains(name, error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Lost_pixels_are_NaN_and_reported()
    {
        using FitsFile file = FitsFile.Open(GoldenTable.PathOf("hostile", "trunc_in_data.fits"));
        FitsImage image = file.Hdus[0].Image!;
        double[] pixels = image.ReadDoubles();
        Assert.Equal(200, image.StoredPixelCount);
        Assert.All(pixels[..200], pixel => Assert.True(double.IsFinite(pixel)));
        Assert.All(pixels[200..], pixel => Assert.True(double.IsNaN(pixel)));
        Assert.Contains(file.Warnings, warning => warning.Word == "truncated");
    }

    [Fact]
    public void Gzip_beyond_the_limit_is_refused_with_the_option_that_raises_it()
    {
        FitsOptions options = new() { MaximumDecompressedBytes = 1 << 20 };
        FitsFormatException error = Assert.Throws<FitsFormatException>(() => FitsFile.Open(GoldenTable.PathOf("hostile", "gzip_bomb.fits.gz"), options));
        Assert.Contains(nameof(FitsOptions.MaximumDecompressedBytes), error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Changed_data_are_reported_and_readable()
    {
        using FitsFile bad = FitsFile.Open(GoldenTable.PathOf("fits", "checksum_bad.fits"));
        using FitsFile good = FitsFile.Open(GoldenTable.PathOf("fits", "checksum_good.fits"));
        Assert.Contains(bad.Warnings, warning => warning.Word == "datasum");
        Assert.Equal(400, bad.Hdus[0].Image!.ReadDoubles().Length);
        Assert.Equal(new FitsChecksum(FitsChecksumStatus.Correct, FitsChecksumStatus.Correct), good.Hdus[0].VerifyChecksum());
    }

    [Fact]
    public void Sound_golden_files_have_no_warning()
    {
        string[] odd = ["checksum_bad.fits", "header_free_format.fits"];
        foreach (string name in GoldenTable.Read("wcs.csv").Select(row => row["file"]).Except(odd))
        {
            using FitsFile file = FitsFile.Open(GoldenTable.PathOf("fits", name));
            Assert.True(file.Warnings.Count == 0, $"{name}: {string.Join(" | ", file.Warnings)}");
        }
    }
}
