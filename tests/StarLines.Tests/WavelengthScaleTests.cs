using System;
using Xunit;

namespace StarLines.Tests;

public sealed class WavelengthScaleTests
{
    [Fact]
    public void Index_and_wavelength_are_inverse_on_every_kind_of_scale()
    {
        WavelengthScale[] scales =
        [
            WavelengthScale.Linear(5000.0, 0.05, 1000, Medium.Air),
            WavelengthScale.LogLinear(5000.0, 1e-5, 1000, Medium.Vacuum),
            WavelengthScale.Tabulated([5000.0, 5000.3, 5001.1, 5001.2], Medium.Air),
        ];
        foreach (WavelengthScale scale in scales)
        {
            for (double index = -1.25; index < scale.Count + 1; index += 0.75)
            {
                Assert.Equal(index, scale.IndexOf(scale.WavelengthAngstrom(index)), 6);
            }
        }
    }

    [Fact]
    public void Edges_lie_between_the_centres_and_widths_add_up_to_the_range()
    {
        WavelengthScale scale = WavelengthScale.Tabulated([5000.0, 5000.3, 5001.1, 5001.2], Medium.Air);
        double sum = 0.0;
        for (int i = 0; i < scale.Count; i++)
        {
            Assert.InRange(scale.WavelengthsAngstrom[i], scale.EdgeAngstrom(i), scale.EdgeAngstrom(i + 1));
            sum += scale.PixelWidthAngstrom(i);
        }

        Assert.Equal(scale.EdgeAngstrom(4) - scale.EdgeAngstrom(0), sum, 9);
    }

    [Theory]
    [InlineData(5000.0, 5000.0)]
    [InlineData(5000.0, 4999.0)]
    [InlineData(5000.0, double.NaN)]
    [InlineData(-1.0, 5000.0)]
    [InlineData(5000.0, double.PositiveInfinity)]
    public void A_table_that_does_not_rise_is_refused(double first, double second) =>
        Assert.Throws<ArgumentException>(() => WavelengthScale.Tabulated([first, second], Medium.Air));

    [Fact]
    public void First_index_at_or_above_finds_the_pixel()
    {
        WavelengthScale scale = WavelengthScale.Linear(100.0, 1.0, 5, Medium.Air);
        Assert.Equal(0, scale.FirstIndexAtOrAbove(50.0));
        Assert.Equal(2, scale.FirstIndexAtOrAbove(102.0));
        Assert.Equal(3, scale.FirstIndexAtOrAbove(102.5));
        Assert.Equal(5, scale.FirstIndexAtOrAbove(105.0));
    }

    [Fact]
    public void A_scaled_and_a_sliced_scale_keep_their_kind()
    {
        WavelengthScale scale = WavelengthScale.LogLinear(4000.0, 2e-5, 500, Medium.Vacuum);
        WavelengthScale shifted = scale.Scaled(1.001, VelocityFrame.Barycentric);
        Assert.Equal(VelocityFrame.Barycentric, shifted.Frame);
        Assert.Equal(1.001 * scale.WavelengthAngstrom(17.5), shifted.WavelengthAngstrom(17.5), 9);
        Assert.Equal(scale.WavelengthAngstrom(23.25), scale.Slice(20, 100).WavelengthAngstrom(3.25), 9);
    }
}
