using System;
using System.IO;
using System.Text;
using Xunit;

namespace StarLines.Fits.Tests;

public sealed class FitsHeaderTests
{
    [Fact]
    public void Keywords_are_found_whatever_their_case()
    {
        using FitsFile file = Open("OBJECT  = 'Vega    '           / the star");
        Assert.True(file.Hdus[0].Header.TryGetCard("object", out FitsCard? card));
        Assert.Equal(("OBJECT", "Vega", "the star"), (card.Keyword, card.Text, card.Comment));
    }

    [Fact]
    public void Absent_and_blank_values_are_not_given()
    {
        using FitsFile file = Open("EXPTIME =                      / unknown");
        FitsHeader header = file.Hdus[0].Header;
        Assert.False(header.TryGetDouble("EXPTIME", out _));
        Assert.False(header.TryGetDouble("AIRMASS", out _));
        Assert.True(header.Contains("EXPTIME"));
    }

    [Theory]
    [InlineData("EXPTIME =                1.5D2", 150.0)]
    [InlineData("EXPTIME = 1.5e2", 150.0)]
    [InlineData("EXPTIME =150", 150.0)]
    [InlineData("EXPTIME = '150.0   '", 150.0)]
    [InlineData("EXPTIME = 150 seconds", 150.0)]
    [InlineData("exptime = +150.", 150.0)]
    public void Numbers_are_read_as_they_are_written_in_the_wild(string card, double expected)
    {
        using FitsFile file = Open(card);
        Assert.True(file.Hdus[0].Header.TryGetDouble("EXPTIME", out double value));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData("EXPTIME = 1.5e2", "card-syntax")]
    [InlineData("EXPTIME =150", "card-syntax")]
    [InlineData("EXPTIME = '150.0   '", "quoted-value")]
    [InlineData("EXPTIME = 150 seconds", "card-syntax")]
    [InlineData("exptime = 150.0", "lower-case-keyword")]
    [InlineData("EXPTIME = 150.0 / Å", "non-ascii")]
    public void Every_leniency_is_a_warning(string card, string word)
    {
        using FitsFile file = Open(card);
        Assert.True(file.Hdus[0].Header.TryGetDouble("EXPTIME", out _));
        Assert.Contains(file.Warnings, warning => warning.Word == word && warning.Keyword == "EXPTIME");
    }

    [Theory]
    [InlineData("EXPTIME = NaN")]
    [InlineData("EXPTIME = 1.2.3")]
    [InlineData("EXPTIME = 'long    '")]
    [InlineData("EXPTIME = T")]
    [InlineData("EXPTIME = 1E999")]
    public void What_is_no_number_is_an_error(string card)
    {
        using FitsFile file = Open(card);
        FitsFormatException error = Assert.Throws<FitsFormatException>(() => file.Hdus[0].Header.TryGetDouble("EXPTIME", out _));
        Assert.Equal(("EXPTIME", 0), (error.Keyword, error.HduNumber));
    }

    [Fact]
    public void Hierarch_keywords_are_found_with_and_without_the_word()
    {
        using FitsFile file = Open("HIERARCH ESO TEL  AIRM START = 1.25 / airmass");
        Assert.True(file.Hdus[0].Header.TryGetDouble("ESO TEL AIRM START", out double value));
        Assert.True(file.Hdus[0].Header.TryGetDouble("HIERARCH eso tel airm start", out double again));
        Assert.Equal((1.25, 1.25), (value, again));
    }

    [Fact]
    public void Comments_and_history_keep_their_order()
    {
        using FitsFile file = Open("HISTORY one", "COMMENT = not a value", "HISTORY two");
        FitsHeader header = file.Hdus[0].Header;
        Assert.Equal([" one", " two"], Array.ConvertAll([.. header.History], text => " " + text));
        Assert.Equal(["= not a value"], Array.ConvertAll([.. header.Comments], text => text.Trim()));
    }

    [Fact]
    public void An_extension_inherits_from_an_empty_primary_what_is_not_its_own()
    {
        string[] primary = ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0", "OBJECT  = 'Vega    '", "EXTNAME = 'TOP     '"];
        string[] extension = ["XTENSION= 'IMAGE   '", "BITPIX  =                    8", "NAXIS   =                    0", "PCOUNT  =                    0", "GCOUNT  =                    1", "INHERIT =                    T"];
        using FitsFile file = FitsFile.Open(new MemoryStream([.. Header(primary), .. Header(extension)]), "made");
        Assert.True(file.Hdus[1].Header.TryGetString("OBJECT", out string? name));
        Assert.Equal("Vega", name);
        Assert.Equal("", file.Hdus[1].Name);
    }

    [Fact]
    public void A_damaged_extension_leaves_the_others_readable()
    {
        byte[] sound = Sound();
        string[] damaged = ["XTENSION= 'BINTABLE'", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS1  =                    4", "NAXIS2  =                    1", "PCOUNT  =                    0", "GCOUNT  =                    1", "TFIELDS =                    1", "TFORM1  = '1Y      '"];
        using FitsFile file = FitsFile.Open(new MemoryStream([.. sound, .. Header(damaged), .. new byte[2880], .. sound.AsSpan(0, 0)]), "made");
        Assert.Equal(2, file.Hdus[0].Image!.ReadDoubles().Length);
        Assert.Equal(FitsHduKind.Damaged, file.Hdus[1].Kind);
        Assert.Equal("TFORM1", file.Hdus[1].Damage!.Keyword);
        Assert.Contains(file.Warnings, warning => warning.Word == "damaged");
    }

    [Fact]
    public void Bytes_after_the_last_HDU_are_left_out_with_a_warning()
    {
        using FitsFile file = FitsFile.Open(new MemoryStream([.. Sound(), .. "some words"u8]), "made");
        Assert.Single(file.Hdus);
        Assert.Contains(file.Warnings, warning => warning.Word == "trailing-bytes");
    }

    [Fact]
    public void A_stream_need_not_be_seekable()
    {
        using FitsFile file = FitsFile.Open(new System.IO.Compression.DeflateStream(Deflated(Sound()), System.IO.Compression.CompressionMode.Decompress), "-");
        Assert.Equal(2, file.Hdus[0].Image!.PixelCount);
    }

    [Fact]
    public void A_stream_beyond_the_limit_is_refused() =>
        Assert.Throws<FitsFormatException>(() => FitsFile.Open(new MemoryStream(Sound()), "-", new FitsOptions { MaximumStreamBytes = 3000 }));

    [Fact]
    public void A_missing_file_is_an_IO_error() =>
        Assert.Throws<FileNotFoundException>(() => FitsFile.Open(Path.Combine(Path.GetTempPath(), "no-such-file.fits")));

    [Fact]
    public void Data_cannot_be_read_after_the_file_is_disposed()
    {
        FitsFile file = FitsFile.Open(Reference.GoldenTable.PathOf("fits", "wave_log.fits"));
        FitsImage image = file.Hdus[0].Image!;
        file.Dispose();
        Assert.Throws<ObjectDisposedException>(() => image.ReadDoubles());
        Assert.True(file.Hdus[0].Header.TryGetDouble("CRVAL1", out _));
    }

    private static MemoryStream Deflated(byte[] bytes)
    {
        MemoryStream stream = new();
        using (System.IO.Compression.DeflateStream deflate = new(stream, System.IO.Compression.CompressionLevel.Fastest, leaveOpen: true))
        {
            deflate.Write(bytes);
        }

        stream.Position = 0;
        return stream;
    }

    private static byte[] Sound()
    {
        MemoryStream stream = new();
        new FitsWriter(stream).WriteImage(new double[] { 1.0, 2.0 }, [2]);
        return stream.ToArray();
    }

    private static FitsFile Open(params string[] cards) => FitsFile.Open(new MemoryStream(Header(
        ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0", .. cards])), "made");

    private static byte[] Header(string[] cards)
    {
        StringBuilder text = new();
        foreach (string card in cards)
        {
            text.Append(card.PadRight(80));
        }

        text.Append("END");
        return Encoding.Latin1.GetBytes(text.ToString().PadRight((text.Length + 2879) / 2880 * 2880));
    }
}
