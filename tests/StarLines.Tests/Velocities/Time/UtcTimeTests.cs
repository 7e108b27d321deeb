using System;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Tests.Velocities.Time;

public class UtcTimeTests
{
    [Theory]
    [InlineData("2000-01-01T12:00:00", 2451544.5, 0.5)] // J2000.0 by definition
    [InlineData("2000-01-01 12:00", 2451544.5, 0.5)]
    [InlineData("1858-11-17T00:00:00.000Z", 2400000.5, 0.0)] // the zero of Modified Julian Dates
    [InlineData("1990-10-28T05:49:35.338", 2448192.5, 20975.338 / 86400)]
    [InlineData("2012-06-30T12:00:00", 2456108.5, 43200.0 / 86401)] // a day with a leap second
    [InlineData("2012-06-30T23:59:60.25", 2456108.5, 86400.25 / 86401)]
    [InlineData("2024-02-29T06:00:00.", 2460369.5, 0.25)]
    public void Times_become_Julian_Dates(string text, double day, double fraction)
    {
        JulianDate utc = UtcTime.Parse(text);
        Assert.Equal(day, utc.Day);
        Assert.Equal(fraction, utc.Fraction, 1e-15);
    }

    [Theory]
    [InlineData("")]
    [InlineData("yesterday")]
    [InlineData("2024-13-01T00:00:00")]
    [InlineData("2023-02-29T00:00:00")]
    [InlineData("2024-01-01T24:00:00")]
    [InlineData("2024-01-01T12:60:00")]
    [InlineData("2024-01-01T12:00:61")]
    [InlineData("2024-01-01T12:00:-1")]
    [InlineData("2024-01-01T12:00:1e1")]
    [InlineData("2024-01-01T12:00:00+02:00")]
    [InlineData("2024-01-01T12:00:00,5")]
    [InlineData("24-01-01T12:00:00")]
    [InlineData("2024-1-1T")]
    [InlineData("T12:00:00")]
    public void What_is_no_time_is_refused_with_the_cure(string text)
    {
        Assert.False(UtcTime.TryParse(text, out _, out string? problem));
        Assert.Contains("2024-05-01T21:30:00", problem, StringComparison.Ordinal);
        Assert.Throws<FormatException>(() => UtcTime.Parse(text));
    }

    [Fact]
    public void A_date_alone_is_refused_because_midnight_would_be_a_guess()
    {
        Assert.False(UtcTime.TryParse("2024-05-01", out _, out string? problem));
        Assert.Contains("no time of day", problem, StringComparison.Ordinal);
        Assert.True(UtcTime.TryParseDate("2024-05-01", out double midnight));
        Assert.Equal(2460431.5, midnight);
    }

    [Theory]
    [InlineData("2016-06-30T23:59:60")]
    [InlineData("2016-12-31T22:59:60")]
    public void A_leap_second_where_none_was_is_refused(string text)
    {
        Assert.False(UtcTime.TryParse(text, out _, out string? problem));
        Assert.Contains("leap second", problem, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("2016-12-31T23:59:60.500")]
    [InlineData("2016-12-31T23:59:59.999")]
    [InlineData("1998-12-31T23:59:60.999")]
    [InlineData("2024-05-01T00:00:00.000")]
    [InlineData("1969-07-20T20:17:40.001")]
    public void Printed_times_are_the_times_that_were_read(string text) =>
        Assert.Equal(text, UtcTime.ToIso(UtcTime.Parse(text)));

    [Fact]
    public void Rounding_carries_into_the_next_day_and_into_the_leap_second()
    {
        Assert.Equal("2024-01-01T00:00:00", UtcTime.ToIso(UtcTime.Parse("2023-12-31T23:59:59.7"), 0));
        Assert.Equal("2016-12-31T23:59:60", UtcTime.ToIso(UtcTime.Parse("2016-12-31T23:59:59.7"), 0));
        Assert.Equal("2017-01-01T00:00:00", UtcTime.ToIso(UtcTime.Parse("2016-12-31T23:59:60.7"), 0));
    }

    [Theory]
    [InlineData("2016-12-31T23:59:30", 60.0, "2017-01-01T00:00:29.000")]
    [InlineData("2016-12-31T23:50:00", 600.5, "2016-12-31T23:59:60.500")]
    [InlineData("2017-01-01T00:00:00", -1.0, "2016-12-31T23:59:60.000")]
    [InlineData("2024-05-01T23:00:00", 7200.0, "2024-05-02T01:00:00.000")]
    public void Half_an_exposure_is_added_across_leap_seconds(string start, double seconds, string middle) =>
        Assert.Equal(middle, UtcTime.ToIso(UtcTime.AddSeconds(UtcTime.Parse(start), seconds)));

    [Fact]
    public void Modified_Julian_Dates_keep_their_digits()
    {
        JulianDate utc = UtcTime.FromModified(59000.123456789);
        Assert.Equal(2459000.5, utc.Day);
        Assert.Equal(0.123456789, utc.Fraction, 1e-11);
    }
}
