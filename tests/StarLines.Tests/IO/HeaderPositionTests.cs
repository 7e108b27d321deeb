using System.Linq;
using StarLines.IO;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class HeaderPositionTests
{
    [Fact]
    public void Sexagesimal_right_ascensions_are_hours()
    {
        TestKeywords header = new TestKeywords().With("RA", "01:37:53.5").With("DEC", "-60:30:48.5").With("EQUINOX", "2000.0");
        (double ra, double dec) = HeaderPosition.Read(header, TestKeywords.Context())!.Value;
        Assert.Equal(15.0 * (1 + (37 / 60.0) + (53.5 / 3600)), ra, 1e-9);
        Assert.Equal(-(60 + (30 / 60.0) + (48.5 / 3600)), dec, 1e-9);
    }

    [Fact]
    public void The_position_of_the_object_wins_over_that_of_the_telescope()
    {
        TestKeywords header = new TestKeywords().With("RA", "71.40275").With("DEC", "-5.682888").With("PLUG_RA", "71.274207").With("PLUG_DEC", "-6.777797");
        Assert.Equal((71.274207, -6.777797), HeaderPosition.Read(header, TestKeywords.Context()));
    }

    [Fact]
    public void Radians_show_in_the_comment_and_are_reported()
    {
        // An invented pair: 1.5 rad is 5h 43m 46.5s, -0.5 rad is -28d 38m 52.4s.
        TestKeywords header = new TestKeywords()
            .With("RA", "1.5", "Mean RA  05 43 46.5").With("DEC", "-0.5", "Mean Dec -28 38 52.4").With("EQUINOX", "2000.0");
        ReadContext context = TestKeywords.Context();
        (double ra, double dec) = HeaderPosition.Read(header, context)!.Value;
        Assert.Equal(85.94375, ra, 1e-4);
        Assert.Equal(-28.64789, dec, 1e-4);
        Assert.Equal("position-doubtful", context.Remarks.Single().Word);
    }

    [Fact]
    public void A_position_that_its_comment_denies_is_not_used()
    {
        TestKeywords header = new TestKeywords().With("RA", "1.5", "Mean RA  09 43 46.5").With("DEC", "-0.5", "Mean Dec -28 38 52.4");
        ReadContext context = TestKeywords.Context();
        Assert.Null(HeaderPosition.Read(header, context));
        Assert.Equal("position-doubtful", context.Remarks.Single().Word);
    }

    [Fact]
    public void Equinox_1950_is_precessed_and_reported()
    {
        TestKeywords header = new TestKeywords().With("RA", "13:25:57.36").With("DEC", "14:02:12.12").With("EQUINOX", "B1950.0");
        ReadContext context = TestKeywords.Context();
        (double ra, double dec) = HeaderPosition.Read(header, context)!.Value;

        // fk45z of ERFA 2.0.0 for 201.489, +14.0367 degrees.
        Assert.Equal(202.10408918651933, ra, 1e-6);
        Assert.Equal(13.77822836989277, dec, 1e-6);
        Assert.Equal("position-precessed", context.Remarks.Single().Word);
    }

    [Fact]
    public void An_epoch_of_observation_is_no_equinox()
    {
        TestKeywords header = new TestKeywords().With("RA", "10.0").With("DEC", "20.0").With("EPOCH", "2017.99748");
        ReadContext context = TestKeywords.Context();
        Assert.Equal((10.0, 20.0), HeaderPosition.Read(header, context));
        Assert.Equal("equinox-assumed", context.Remarks.Single().Word);
    }
}
