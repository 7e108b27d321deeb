using System.Linq;
using StarLines.IO;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class HeaderTimeTests
{
    [Fact]
    public void Half_the_exposure_is_added_to_its_start()
    {
        TestKeywords header = new TestKeywords().With("DATE-OBS", "2012-10-04T06:29:16.153").With("EXPTIME", "900.0");
        Assert.Equal("2012-10-04T06:36:46.153", Middle(header, out string from, out _));
        Assert.Equal("DATE-OBS + half the exposure", from);
    }

    [Fact]
    public void Date_and_time_may_stand_apart()
    {
        TestKeywords header = new TestKeywords().With("DATE-OBS", "2017-12-31").With("UT-TIME", "23:57:16").With("UT-END", "00:07:17").With("EXPTIME", "600");
        Assert.Equal("2018-01-01T00:02:16.500", Middle(header, out _, out _));
    }

    [Fact]
    public void The_old_date_of_FITS_is_of_the_twentieth_century()
    {
        TestKeywords header = new TestKeywords().With("DATEOBS", "05/04/86").With("TIMEOBS", "21:01:03").With("EXPTIME", "120");
        Assert.Equal("1986-04-05T21:02:03.000", Middle(header, out _, out _));
    }

    [Fact]
    public void A_stated_middle_wins()
    {
        TestKeywords header = new TestKeywords().With("DATE-OBS", "2020-01-01T00:00:00").With("DATE-AVG", "2020-01-01T00:31:00").With("EXPTIME", "3600");
        Assert.Equal("2020-01-01T00:31:00.000", Middle(header, out string from, out _));
        Assert.Equal("DATE-AVG", from);
    }

    [Fact]
    public void A_comment_may_say_that_the_date_is_the_middle_and_that_another_is_local()
    {
        TestKeywords header = new TestKeywords()
            .With("DATE-OBS", "2015-10-08T19:45:00", "The observation median UTC")
            .With("DATE-BEG", "2015-10-09T03:40:47.0", "The observation start local time").With("EXPTIME", "600");
        Assert.Equal("2015-10-08T19:45:00.000", Middle(header, out _, out _));
    }

    [Fact]
    public void Without_an_exposure_time_the_start_is_used_and_reported()
    {
        TestKeywords header = new TestKeywords().With("MJD-OBS", "56204.25");
        Assert.Equal("2012-10-04T06:00:00.000", Middle(header, out _, out ReadContext context));
        Assert.Equal("time-is-start", context.Remarks.Single().Word);
    }

    [Fact]
    public void A_date_without_a_time_gives_none()
    {
        TestKeywords header = new TestKeywords().With("DATE-OBS", "1994-04-01").With("UT", "00:00:00").With("EXPTIME", "1");
        Assert.Equal("", Middle(header, out _, out ReadContext context));
        Assert.Equal("time-of-day-missing", context.Remarks.Single().Word);
    }

    [Fact]
    public void Atomic_time_is_brought_to_UTC()
    {
        // TAI - UTC was 37 s in 2020 (IERS Bulletin C).
        TestKeywords header = new TestKeywords().With("DATE-AVG", "2020-01-01T00:00:37").With("TIMESYS", "TAI");
        Assert.Equal("2020-01-01T00:00:00.000", Middle(header, out _, out _));
    }

    [Fact]
    public void Two_statements_that_disagree_are_reported()
    {
        TestKeywords header = new TestKeywords().With("DATE-OBS", "2020-01-01T00:00:00").With("MJD-OBS", "58850.3").With("EXPTIME", "10");
        Middle(header, out _, out ReadContext context);
        Assert.Equal("time-disagrees", context.Remarks.Single().Word);
    }

    private static string Middle(TestKeywords header, out string from, out ReadContext context)
    {
        context = TestKeywords.Context();
        JulianDate? mid = HeaderTime.MidExposure(header, HeaderTime.Exposure(header), out from, context);
        return mid is JulianDate date ? UtcTime.ToIso(date) : "";
    }
}
