using Xunit;

namespace StarLines.Cli.Tests;

public sealed class NearestWordTests
{
    [Theory]
    [InlineData("mesure", "measure")]
    [InlineData("maesure", "measure")]
    [InlineData("inspekt", "inspect")]
    [InlineData("velo", "velocity")]
    [InlineData("VELOCITY", "velocity")]
    public void A_slip_of_the_finger_finds_its_word(string typed, string meant)
    {
        Assert.Equal(meant, NearestWord.Find(typed, ["inspect", "measure", "velocity", "plot"]));
    }

    [Fact]
    public void A_word_far_from_all_finds_none()
    {
        Assert.Null(NearestWord.Find("telescope", ["inspect", "measure", "velocity", "plot"]));
    }

    [Theory]
    [InlineData("", "", 0)]
    [InlineData("", "abc", 3)]
    [InlineData("ab", "ba", 1)]
    [InlineData("kitten", "sitting", 3)]
    public void Distance_counts_slips(string a, string b, int distance)
    {
        Assert.Equal(distance, NearestWord.Distance(a, b));
        Assert.Equal(distance, NearestWord.Distance(b, a));
    }
}
