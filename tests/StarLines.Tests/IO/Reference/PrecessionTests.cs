using StarLines.IO;
using Xunit;

namespace StarLines.Tests.IO.Reference;

/// <summary>Against ERFA 2.0.0 (the open form of the SOFA library): fk45z, and pmat76 for Julian equinoxes.</summary>
public sealed class PrecessionTests
{
    // Both sides evaluate the same published matrices; 1e-9 degrees is 4 microarcseconds.
    private const double Tolerance = 1e-9;

    [Theory]
    [InlineData(10.0, 20.0, 10.65897593194685, 20.273868614275735)]
    [InlineData(201.489, 14.0367, 202.10408918651933, 13.77822836989277)]
    [InlineData(349.5, -85.2, 350.6953052699607, -84.92564964528052)]
    public void Positions_of_B1950_become_those_of_J2000(double ra, double dec, double expectedRa, double expectedDec)
    {
        (double foundRa, double foundDec) = Precession.FromBesselianEquinox(ra, dec, 1950.0);
        Assert.Equal(expectedRa, foundRa, Tolerance);
        Assert.Equal(expectedDec, foundDec, Tolerance);
    }

    [Theory]
    [InlineData(1975.0, 10.0, 20.0, 10.329258118022478, 20.137010778927355)]
    [InlineData(1975.0, 201.489, -64.0367, 201.9152926833136, -64.16602919873257)]
    [InlineData(2015.5, 10.0, 20.0, 9.796013159466112, 19.91499062713449)]
    [InlineData(2015.5, 201.489, -64.0367, 201.22597469230968, -63.956332272212116)]
    public void Positions_of_a_Julian_equinox_become_those_of_J2000(double equinox, double ra, double dec, double expectedRa, double expectedDec)
    {
        (double foundRa, double foundDec) = Precession.FromJulianEquinox(ra, dec, equinox);
        Assert.Equal(expectedRa, foundRa, Tolerance);
        Assert.Equal(expectedDec, foundDec, Tolerance);
    }
}
