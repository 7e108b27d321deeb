using System.Linq;
using StarLines.IO;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class HeaderFrameTests
{
    [Theory]
    [InlineData("TOPOCENT", VelocityFrame.Topocentric)]
    [InlineData("BARYCENT", VelocityFrame.Barycentric)]
    [InlineData("HELIOCEN", VelocityFrame.Heliocentric)]
    [InlineData("SOURCE", VelocityFrame.Rest)]
    public void The_keyword_of_the_standard_tells_the_frame(string word, VelocityFrame expected) =>
        Assert.Equal(expected, Frame(new TestKeywords().With("SPECSYS", word), out _, out _));

    [Fact]
    public void A_merged_product_with_its_correction_in_the_header_is_barycentric()
    {
        TestKeywords header = new TestKeywords().With("CTYPE1", "Angstrom").With("ESO DRS BERV", "-7.505726");
        Assert.Equal(VelocityFrame.Barycentric, Frame(header, out double? applied, out _));
        Assert.Equal(-7.505726, applied);
    }

    [Fact]
    public void The_lamp_in_the_second_fibre_is_not_shifted()
    {
        TestKeywords header = new TestKeywords().With("CTYPE1", "Angstrom").With("ESO DRS BERV", "-7.5")
            .With("ESO DPR TYPE", "STAR,WAVE").With("ESO DRS CAL LOC FILE", "X_loco_B.fits");
        Assert.Equal(VelocityFrame.Topocentric, Frame(header, out double? applied, out _));
        Assert.Null(applied);
    }

    [Fact]
    public void An_amateur_correction_of_zero_means_none()
    {
        Assert.Equal(VelocityFrame.Topocentric, Frame(new TestKeywords().With("BSS_VHEL", "0"), out _, out _));
        Assert.Equal(VelocityFrame.Heliocentric, Frame(new TestKeywords().With("BSS_VHEL", "-12.5"), out double? applied, out _));
        Assert.Equal(-12.5, applied);
    }

    [Fact]
    public void A_velocity_whose_use_is_not_told_leaves_the_frame_open()
    {
        Assert.Equal(VelocityFrame.Unknown, Frame(new TestKeywords().With("VHELIO", "12.0"), out _, out ReadContext context));
        Assert.Equal("frame-unknown", context.Remarks.Single().Word);
    }

    [Fact]
    public void The_user_wins_and_is_told_so()
    {
        ReadContext context = TestKeywords.Context(new SpectrumReadOptions { Frame = VelocityFrame.Topocentric });
        Assert.Equal(VelocityFrame.Topocentric, HeaderFrame.Read(new TestKeywords().With("SPECSYS", "BARYCENT"), true, context, out _));
        Assert.Equal("frame-contradicts", context.Remarks.Single().Word);
    }

    private static VelocityFrame Frame(TestKeywords header, out double? applied, out ReadContext context)
    {
        context = TestKeywords.Context();
        return HeaderFrame.Read(header, true, context, out applied);
    }
}
