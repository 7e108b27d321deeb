using StarLines.IO;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class SexagesimalTests
{
    [Theory]
    [InlineData("12:34:56.7", 12.582416666666667, 3)]
    [InlineData("-00 30 00", -0.5, 3)]
    [InlineData(" 01:01:59.7", 1.0332500000000002, 3)]
    [InlineData("-71:22:13.3", -71.37036111111111, 3)]
    [InlineData("12h34m56.7s", 12.582416666666667, 3)]
    [InlineData("+41d16m09s", 41.269166666666667, 3)]
    [InlineData("24.473327", 24.473327, 1)]
    [InlineData("1.5e1", 15.0, 1)]
    public void Angles_are_read_as_they_are_written(string text, double expected, int parts)
    {
        Assert.True(Sexagesimal.TryParse(text, out double value, out int found, out _));
        Assert.Equal(expected, value, 1e-12);
        Assert.Equal(parts, found);
    }

    [Theory]
    [InlineData("")]
    [InlineData("north")]
    [InlineData("12:75:00")]
    [InlineData("1:2:3:4")]
    public void What_is_no_angle_is_refused(string text) =>
        Assert.False(Sexagesimal.TryParse(text, out _, out _, out _));

    [Theory]
    [InlineData("70:44:03 W", -70.734166666666667)]
    [InlineData("-29.2584", -29.2584)]
    [InlineData("N 48 30 00", 48.5)]
    [InlineData("12d30m00s", 12.5)]
    public void Compass_points_give_the_sign(string text, double expected)
    {
        Assert.True(Sexagesimal.TryParseGeographic(text, out double degrees));
        Assert.Equal(expected, degrees, 1e-12);
    }
}
