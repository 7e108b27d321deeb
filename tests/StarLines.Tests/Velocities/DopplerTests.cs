using System;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Velocities;

public class DopplerTests
{
    [Fact]
    public void A_velocity_of_three_fifths_of_light_doubles_the_wavelength()
    {
        // √(1.6/0.4) = 2, special relativity in closed form.
        Assert.Equal(2.0, Doppler.Factor(0.6 * PhysicalConstants.SpeedOfLightKmPerS), 14);
        Assert.Equal(0.6 * PhysicalConstants.SpeedOfLightKmPerS, Doppler.VelocityKmPerS(2.0), 9);
        Assert.Equal(1.0, Doppler.Redshift(0.6 * PhysicalConstants.SpeedOfLightKmPerS), 14);
        Assert.Equal(-0.6 * PhysicalConstants.SpeedOfLightKmPerS, Doppler.VelocityKmPerS(2500.0, 5000.0), 9);
    }

    [Theory]
    [InlineData(-250_000.0)]
    [InlineData(-30.0)]
    [InlineData(-1e-9)]
    [InlineData(0.0)]
    [InlineData(1e-6)]
    [InlineData(17.3)]
    [InlineData(299_000.0)]
    public void Velocity_to_redshift_and_back_keeps_all_digits(double velocityKmPerS)
    {
        double back = Doppler.VelocityOfRedshiftKmPerS(Doppler.Redshift(velocityKmPerS));
        Assert.Equal(velocityKmPerS, back, Math.Abs(velocityKmPerS) * 1e-13);
    }

    [Fact]
    public void Factors_of_opposite_velocities_cancel()
    {
        Assert.Equal(1.0, Doppler.Factor(123.456) * Doppler.Factor(-123.456), 15);
    }

    [Theory]
    [InlineData(299_792.458)]
    [InlineData(-400_000.0)]
    [InlineData(double.NaN)]
    public void The_speed_of_light_is_out_of_range(double velocityKmPerS)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Doppler.Factor(velocityKmPerS));
        Assert.Throws<ArgumentOutOfRangeException>(() => Doppler.Redshift(velocityKmPerS));
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    public void A_factor_must_be_above_zero(double factor)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Doppler.VelocityKmPerS(factor));
        Assert.Throws<ArgumentOutOfRangeException>(() => Doppler.VelocityOfRedshiftKmPerS(factor - 1.0));
    }
}
