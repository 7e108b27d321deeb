using System.Globalization;
using System.Linq;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests.Drawing;

public sealed class TicksTests
{
    [Theory]
    [InlineData(0.9, 1.0)]
    [InlineData(1.1, 2.0)]
    [InlineData(2.1, 5.0)]
    [InlineData(5.1, 10.0)]
    [InlineData(0.0011, 0.002)]
    [InlineData(300.0, 500.0)]
    public void Steps_are_one_two_or_five_times_a_power_of_ten(double least, double step) =>
        Assert.Equal(step, Ticks.NiceStep(least).Step, 12);

    [Fact]
    public void Numbers_have_no_thousands_separators_in_any_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Assert.Equal(["4000", "6000", "8000", "10000"], Labels(new Ticks(new DataRange(3500, 10500), 2000, 4)));
            Assert.Equal(["0.98", "1.00", "1.02"], Labels(new Ticks(new DataRange(0.97, 1.03), 0.02, 4)));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Negative_numbers_have_a_true_minus_and_zero_has_none() =>
        Assert.Equal(["−0.5", "0.0", "0.5"], Labels(new Ticks(new DataRange(-0.6, 0.6), 0.5, 5)));

    [Fact]
    public void A_power_of_ten_is_taken_out_of_the_numbers() =>
        Assert.Equal(["1.0", "1.5", "2.0"], Labels(new Ticks(new DataRange(0.9e-15, 2.1e-15), 0.5e-15, 5, exponent: -15)));

    [Fact]
    public void Ticks_stay_within_the_range()
    {
        var ticks = new Ticks(new DataRange(4321.5, 6789.1), 500, 5);
        Assert.All(ticks.All, tick => Assert.InRange(tick.Position, 4321.5, 6789.1));
        Assert.Equal(5, ticks.All.Count(tick => tick.IsMajor));
        Assert.Equal(100, ticks.All[1].Position - ticks.All[0].Position, 6);
    }

    [Fact]
    public void Numbers_of_a_horizontal_axis_have_room_between_them()
    {
        using SkiaSharp.SKFont font = FigureText.Font(12);
        foreach (double width in (double[])[0.3, 1, 7, 20, 55, 300, 4000])
        {
            var range = new DataRange(6562.1, 6562.1 + width);
            Ticks ticks = Ticks.Across(range, 160, 12, labelled: true);
            ScottPlot.Tick[] majors = [.. ticks.All.Where(tick => tick.IsMajor)];
            for (int i = 1; i < majors.Length; i++)
            {
                double distance = (majors[i].Position - majors[i - 1].Position) * 160 / width;
                Assert.True(distance > font.MeasureText(majors[i].Label), $"the numbers of a range of {width} touch");
            }
        }
    }

    private static string[] Labels(Ticks ticks) => [.. ticks.All.Where(tick => tick.IsMajor).Select(tick => tick.Label)];
}
