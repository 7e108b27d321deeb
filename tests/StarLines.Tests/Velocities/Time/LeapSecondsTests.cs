using System;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Tests.Velocities.Time;

public class LeapSecondsTests
{
    // TAI − UTC by pyerfa 2.0.0.1, function dat; whole seconds also in IERS Bulletin C.
    [Theory]
    [InlineData("1960-03-01T00:00:00", 1.021242)]
    [InlineData("1961-07-31T00:00:00", 1.657394 + (30 * 0.001296))]
    [InlineData("1963-11-01T00:00:00", 2.6972788)]
    [InlineData("1965-09-01T12:00:00", 4.155058 + 0.000648)]
    [InlineData("1968-02-01T00:00:00", 6.185682)]
    [InlineData("1971-12-01T00:00:00", 9.81189)]
    [InlineData("1972-01-01T00:00:00", 10)]
    [InlineData("1972-06-30T23:59:60.9", 10)]
    [InlineData("1972-07-01T00:00:00", 11)]
    [InlineData("1979-12-31T12:00:00", 18)]
    [InlineData("1985-07-01T00:00:00", 23)]
    [InlineData("1990-01-01T00:00:00", 25)]
    [InlineData("1999-01-01T00:00:00", 32)]
    [InlineData("2005-12-31T23:59:60", 32)]
    [InlineData("2006-01-01T00:00:00", 33)]
    [InlineData("2015-07-01T00:00:00", 36)]
    [InlineData("2016-12-31T23:59:60.5", 36)]
    [InlineData("2017-01-01T00:00:00", 37)]
    [InlineData("2026-01-01T00:00:00", 37)]
    public void Offsets_are_those_published(string utc, double seconds) =>
        Assert.Equal(seconds, LeapSeconds.TaiMinusUtcSeconds(UtcTime.Parse(utc)), 1e-9);

    [Fact]
    public void Twenty_seven_days_have_a_leap_second()
    {
        int found = 0;
        for (double midnight = UtcTime.MidnightJd(1960, 1, 1); midnight < UtcTime.MidnightJd(2026, 1, 1); midnight += 1.0)
        {
            found += LeapSeconds.DayLengthSeconds(midnight) > 86_400.0 ? 1 : 0;
        }

        // IERS Bulletin C: 27 leap seconds from 1972 to 2016.
        Assert.Equal(27, found);
        Assert.Equal(86_401.0, LeapSeconds.DayLengthSeconds(UtcTime.MidnightJd(2016, 12, 31)));
    }

    [Fact]
    public void There_is_no_UTC_before_1960() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => LeapSeconds.TaiMinusUtcSeconds(UtcTime.Parse("1959-12-31T23:00:00")));

    [Fact]
    public void Constants_name_their_dates()
    {
        Assert.Equal(LeapSeconds.FirstJdUtc, UtcTime.MidnightJd(1960, 1, 1));
        Assert.Equal(LeapSeconds.AssumedFromJdUtc, UtcTime.MidnightJd(2028, 1, 1));
    }

    [Theory]
    [InlineData("2016-12-31T23:59:60.500")]
    [InlineData("2017-01-01T00:00:00.000")]
    [InlineData("2017-01-01T00:00:36.900")]
    [InlineData("2015-06-30T23:59:59.999")]
    [InlineData("1975-03-03T03:03:03.003")]
    public void Atomic_time_and_back_is_the_same_time(string text)
    {
        JulianDate utc = UtcTime.Parse(text);
        Assert.Equal(text, UtcTime.ToIso(TimeScales.UtcFromTai(TimeScales.TaiFromUtc(utc))));
    }
}
