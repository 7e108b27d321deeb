using System;
using System.Globalization;
using StarLines.Cli.Options;
using Xunit;

namespace StarLines.Cli.Tests.Options;

public sealed class ValuesTests
{
    [Fact]
    public void A_range_reads_a_decimal_point_under_a_decimal_comma()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("de-DE");
            Assert.Equal(new WavelengthRange(5889.95, 5895.92), Values.Range("5889.95:5895.92"));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("5890")]
    [InlineData("5890:")]
    [InlineData("5890:5880")]
    [InlineData("5890:5890")]
    [InlineData("5,889:5,890")]
    [InlineData("a:b")]
    [InlineData("1:2:3")]
    [InlineData("NaN:1")]
    public void A_bad_range_is_refused_with_a_word_on_how_to_write_it(string text)
    {
        Assert.NotEmpty(Assert.Throws<FormatException>(() => Values.Range(text)).Message);
    }

    // Sirius (ICRS, SIMBAD): 06 45 08.917 −16 42 58.02 = 101.28715, −16.71612.
    [Theory]
    [InlineData("101.28715")]
    [InlineData("06:45:08.917")]
    [InlineData("06 45 08.917")]
    [InlineData("6h45m8.917s")]
    public void A_right_ascension_is_degrees_or_sexagesimal_hours(string text)
    {
        Assert.Equal(101.28715, Values.RightAscensionDegrees(text), 5);
    }

    [Theory]
    [InlineData("-16.71612")]
    [InlineData("-16:42:58.02")]
    [InlineData("\u221216 42 58.02")]
    [InlineData("-16d42m58.02s")]
    public void A_declination_keeps_its_sign(string text)
    {
        Assert.Equal(-16.71612, Values.DeclinationDegrees(text), 5);
    }

    [Fact]
    public void A_declination_of_minus_zero_degrees_is_negative()
    {
        Assert.Equal(-0.5, Values.DeclinationDegrees("-00:30:00"), 10);
    }

    [Theory]
    [InlineData("361")]
    [InlineData("24:00:00")]
    [InlineData("12:60:00")]
    [InlineData("noon")]
    [InlineData("")]
    public void A_bad_right_ascension_is_refused(string text)
    {
        Assert.Throws<FormatException>(() => Values.RightAscensionDegrees(text));
    }

    [Theory]
    [InlineData("-91")]
    [InlineData("1,5")]
    public void A_bad_declination_is_refused(string text)
    {
        Assert.Throws<FormatException>(() => Values.DeclinationDegrees(text));
    }

    [Fact]
    public void A_mistyped_word_names_the_right_one()
    {
        FormatException problem = Assert.Throws<FormatException>(
            () => Values.Word("vacum", ("air", Medium.Air), ("vacuum", Medium.Vacuum)));
        Assert.Contains("'vacuum'", problem.Message, StringComparison.Ordinal);
    }
}
