using StarLines.Velocities.Barycentre;
using Xunit;

namespace StarLines.Tests.Velocities.Barycentre;

public class GeodesyTests
{
    [Theory]
    [InlineData(0.0, 0.0, 0.0)]
    [InlineData(90.0, 0.0, 100.0)]
    [InlineData(-90.0, 0.0, 2835.0)]
    [InlineData(-24.6272, -70.4042, 2635.0)]
    [InlineData(45.0, 179.9, 99_000.0)]
    [InlineData(0.001, -135.0, -500.0)]
    public void Geocentric_and_back_is_the_same_place(double latitude, double longitude, double height)
    {
        Vector3 place =
            Geodesy.ToGeocentric(new ObservingSite("", latitude, longitude, height));
        ObservingSite back = ObservingSite.FromGeocentric("", place.X, place.Y, place.Z);
        Assert.Equal(latitude, back.LatitudeDegrees, 1e-11);
        Assert.Equal(longitude, back.LongitudeDegrees, 1e-11);
        Assert.Equal(height, back.HeightMetres, 1e-6);
    }

    [Fact]
    public void Poles_and_equator_lie_at_the_radii_of_WGS_84()
    {
        // NGA.STND.0036: a = 6 378 137 m, b = 6 356 752.3142 m.
        Assert.Equal(6_356_752.3142, Geodesy.ToGeocentric(new ObservingSite("", 90.0, 0.0, 0.0)).Z, 1e-4);
        Assert.Equal(6_378_137.0, Geodesy.ToGeocentric(new ObservingSite("", 0.0, 90.0, 0.0)).Y, 1e-4);
    }
}
