using System;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Velocities;

public class AirVacuumTests
{
    [Fact]
    public void The_inverse_is_exact_over_the_whole_range()
    {
        for (double vacuum = AirVacuum.MinimumAngstrom + 1.0; vacuum < 60_000.0; vacuum *= 1.0037)
        {
            Assert.Equal(vacuum, AirVacuum.ToVacuumAngstrom(AirVacuum.ToAirAngstrom(vacuum)), vacuum * 4e-16);
        }
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(3)]
    [InlineData(1000)]
    public void Spans_agree_with_single_values_and_may_alias(int count)
    {
        var wavelengths = new double[count];
        for (int i = 0; i < count; i++)
        {
            wavelengths[i] = 3000.0 + (7.1 * i);
        }

        double[] air = [.. wavelengths];
        AirVacuum.ToAir(air, air);
        double[] vacuum = [.. wavelengths];
        AirVacuum.ToVacuum(vacuum, vacuum);
        for (int i = 0; i < count; i++)
        {
            Assert.Equal(AirVacuum.ToAirAngstrom(wavelengths[i]), air[i]);
            Assert.Equal(AirVacuum.ToVacuumAngstrom(wavelengths[i]), vacuum[i]);
        }
    }

    [Fact]
    public void A_scale_keeps_its_frame_and_says_its_new_medium()
    {
        WavelengthScale air = WavelengthScale.Linear(4000.0, 1.0, 50, Medium.Air, VelocityFrame.Topocentric);
        WavelengthScale vacuum = AirVacuum.Convert(air, Medium.Vacuum);
        Assert.Equal(Medium.Vacuum, vacuum.Medium);
        Assert.Equal(VelocityFrame.Topocentric, vacuum.Frame);
        Assert.Equal(AirVacuum.ToVacuumAngstrom(4049.0), vacuum.WavelengthsAngstrom[49]);
        Assert.Same(air, AirVacuum.Convert(air, Medium.Air));
    }

    [Fact]
    public void A_scale_of_unknown_medium_is_refused()
    {
        WavelengthScale scale = WavelengthScale.Linear(4000.0, 1.0, 5, Medium.Unknown);
        Assert.Throws<ArgumentException>(() => AirVacuum.Convert(scale, Medium.Vacuum));
        Assert.Throws<ArgumentException>(() => AirVacuum.ConvertAngstrom(5000.0, Medium.Unknown, Medium.Air));
    }

    [Theory]
    [InlineData(1200.0)]
    [InlineData(-5.0)]
    [InlineData(double.NaN)]
    [InlineData(2e7)]
    public void Wavelengths_out_of_range_are_refused(double wavelengthAngstrom)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => AirVacuum.ToAirAngstrom(wavelengthAngstrom));
        Assert.Throws<ArgumentOutOfRangeException>(() => AirVacuum.ToVacuumAngstrom(wavelengthAngstrom));
        var one = new double[1];
        Assert.Throws<ArgumentOutOfRangeException>(() => AirVacuum.ToAir([wavelengthAngstrom], one));
    }
}
