using System;
using System.Linq;
using StarLines.Velocities;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Tests.Velocities.Barycentre;

public class BarycentricCorrectionTests
{
    private static readonly ObservingSite Site = new("Hill", -30.0, -70.5, 2500.0);
    private static readonly StarAstrometry Star = new(200.0, -40.0);

    [Fact]
    public void The_correction_is_applied_by_multiplying_factors()
    {
        BarycentricResult result = BarycentricCorrection.At(UtcTime.Parse("2021-04-05T04:00:00"), Site, Star);
        double expected = Doppler.VelocityKmPerS(Doppler.Factor(-321.0) * (1.0 + result.BarycentricRedshift));
        Assert.Equal(expected, result.ApplyKmPerS(-321.0), 1e-9);
        Assert.Equal(result.BarycentricRedshift * 299_792.458, result.CorrectionKmPerS, 1e-12);
    }

    [Fact]
    public void The_rate_of_the_light_time_is_the_velocity()
    {
        // BJD − JD grows by v·ρ/c a second: two independent outputs must agree.
        JulianDate middle = UtcTime.Parse("2021-04-05T04:00:00");
        const double Half = 300.0;
        double before = BarycentricCorrection.At(UtcTime.AddSeconds(middle, -Half), Site, Star).LightTravelTimeSeconds;
        double after = BarycentricCorrection.At(UtcTime.AddSeconds(middle, Half), Site, Star).LightTravelTimeSeconds;
        double fromTimes = 299_792.458 * (after - before) / (2.0 * Half);

        // γ and the potentials in z_B amount to 7 to 8 m/s in c z_B.
        double constant = BarycentricCorrection.At(middle, Site, Star).CorrectionKmPerS - fromTimes;
        Assert.InRange(constant, 0.002, 0.010);
    }

    [Theory]
    [InlineData("1959-12-31T23:59:59")]
    [InlineData("2060-01-01T00:00:00")]
    [InlineData("1890-01-01T00:00:00")]
    public void Times_outside_the_ephemeris_are_refused(string utc)
    {
        Exception error = Assert.Throws<ArgumentOutOfRangeException>(() => BarycentricCorrection.At(UtcTime.Parse(utc), Site, Star));
        Assert.Contains("1960 to 2059", error.Message, StringComparison.Ordinal);
        Assert.False(BarycentricCorrection.Covers(UtcTime.Parse(utc)));
    }

    [Theory]
    [InlineData("1960-01-01T00:00:00")]
    [InlineData("2059-12-31T23:59:59")]
    public void The_first_and_the_last_second_are_covered(string utc)
    {
        BarycentricResult result = BarycentricCorrection.At(UtcTime.Parse(utc), Site, Star);
        Assert.InRange(result.CorrectionKmPerS, -31.0, 31.0);
        Assert.InRange(result.LightTravelTimeSeconds, -520.0, 520.0);
    }

    [Fact]
    public void Every_year_has_the_speed_of_the_Earth_along_the_ecliptic()
    {
        // Towards the vernal point the velocity swings by 29.3 to 30.8 km/s within a year, at every year of the data.
        StarAstrometry vernal = new(0.0, 0.0);
        for (int year = 1960; year < 2060; year++)
        {
            double largest = Enumerable.Range(0, 73).Max(n => Math.Abs(BarycentricCorrection.At(
                new JulianDate(UtcTime.MidnightJd(year, 1, 1) + (5 * n), 0.0), Site, vernal).CorrectionKmPerS));
            Assert.InRange(largest, 29.2, 30.9);
        }
    }

    [Fact]
    public void A_target_under_the_horizon_and_a_risen_Sun_are_said()
    {
        // Local noon at longitude −70.5° is near 16:42 UTC.
        BarycentricResult noon = BarycentricCorrection.At(UtcTime.Parse("2021-01-05T16:42:00"), Site, Star);
        Assert.Contains(noon.Warnings, w => w.Word == "sun-up");

        BarycentricResult north = BarycentricCorrection.At(UtcTime.Parse("2021-01-05T04:42:00"), Site, new StarAstrometry(0.0, 80.0));
        Assert.Contains(north.Warnings, w => w.Word == "below-horizon");
        Assert.True(double.IsNaN(north.Airmass));
        Assert.DoesNotContain(north.Warnings, w => w.Word == "sun-up");
    }

    [Fact]
    public void Leap_seconds_of_the_future_are_said_to_be_assumed() => Assert.Contains(
        BarycentricCorrection.At(UtcTime.Parse("2035-01-01T05:00:00"), Site, Star).Warnings, w => w.Word == "leap-seconds-assumed");

    [Fact]
    public void A_target_at_the_zenith_has_one_air_mass()
    {
        // Kasten and Young (1989): 1.000 at the zenith, 5.6 at 10°, 38 at the horizon seen refracted, near 31.7 in true altitude 0 (Young 1994).
        Assert.Equal(1.0, AirmassFormula.AtTrueAltitude(90.0), 1e-3);
        Assert.Equal(2.0, AirmassFormula.AtTrueAltitude(30.0), 1e-2);
        Assert.Equal(31.7, AirmassFormula.AtTrueAltitude(0.0), 0.1);
    }

    [Theory]
    [InlineData(double.NaN, 0.0)]
    [InlineData(0.0, 90.1)]
    [InlineData(1000.0, 0.0)]
    public void Coordinates_out_of_range_are_refused(double ra, double dec) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new StarAstrometry(ra, dec));

    [Fact]
    public void A_parallax_that_is_negative_is_refused() => Assert.Throws<ArgumentOutOfRangeException>(
        () => BarycentricCorrection.At(UtcTime.Parse("2021-04-05T04:00:00"), Site, Star with { ParallaxMas = -1.0 }));
}
