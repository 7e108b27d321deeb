using System;
using StarLines.TestSupport;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Velocities.Reference;

/// <summary>
/// Against tests/Data/golden/airvac.csv: 1011 wavelengths from 2000 to 25 000 Å by published formulae
/// (Ciddor 1996; Edlén 1953 and 1966; Birch and Downs 1994; Greisen et al. 2006), evaluated in NumPy.
/// </summary>
public class AirVacuumReferenceTests
{
    private static readonly GoldenTable Table = new(ReferenceData.DataFile("golden", "airvac.csv"));

    [Fact]
    public void Ciddors_formula_and_its_inverse_agree_to_the_last_digits()
    {
        Assert.Equal(1011, Table.Count);
        for (int row = 0; row < Table.Count; row++)
        {
            double wavelength = Table.Number(row, "wavelength");

            // Both sides evaluate the same expression in double precision; only the order of operations may differ.
            Assert.Equal(Table.Number(row, "n_minus_1_ciddor1996"), AirVacuum.Refractivity(wavelength), 1e-18);
            Assert.Equal(Table.Number(row, "vac2air_ciddor1996"), AirVacuum.ToAirAngstrom(wavelength), wavelength * 3e-16);
            Assert.Equal(Table.Number(row, "air2vac_ciddor1996"), AirVacuum.ToVacuumAngstrom(wavelength), wavelength * 3e-16);
        }
    }

    [Fact]
    public void Air_is_standard_air_and_not_the_cold_air_of_the_FITS_formula()
    {
        // The other formulae for 15 °C lie within 100 m/s everywhere; the one for 0 °C is 3.9 to 4.7 km/s away.
        for (int row = 0; row < Table.Count; row++)
        {
            double air = AirVacuum.ToAirAngstrom(Table.Number(row, "wavelength"));
            double others = 299_792.458 * Math.Abs((Table.Number(row, "vac2air_birchdowns1994") / air) - 1.0);
            double cold = 299_792.458 * Math.Abs((Table.Number(row, "vac2air_greisen2006") / air) - 1.0);
            Assert.True(others < 0.1, $"row {row}: {others} km/s from Birch and Downs");
            Assert.InRange(cold, 3.8, 4.8);
        }
    }

    [Fact]
    public void The_wavenumber_is_the_one_in_vacuum()
    {
        // With the wavenumber in air the wavelength at 2000 Å would differ by over 10 m/s (3e-8); we agree to 3e-16 above.
        double s = 1e4 / 1999.3526230448367;
        double wrong = 1e-8 * ((5792105 / (238.0185 - (s * s))) + (167917 / (57.362 - (s * s))));
        Assert.True(Math.Abs(wrong - AirVacuum.Refractivity(2000.0)) > 3e-8);
    }
}
