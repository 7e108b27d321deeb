namespace StarLines;

/// <summary>Constants used in more than one place; each with unit and source.</summary>
public static class PhysicalConstants
{
    /// <summary>Speed of light in vacuum, km/s (SI, exact).</summary>
    public const double SpeedOfLightKmPerS = 299_792.458;

    /// <summary>Planck constant, J s (SI 2019, exact).</summary>
    public const double PlanckJouleSeconds = 6.626_070_15e-34;

    /// <summary>Boltzmann constant, eV/K (SI 2019, exact ratio, rounded to double).</summary>
    public const double BoltzmannEvPerKelvin = 8.617_333_262_145_179e-5;

    /// <summary>Elementary charge, C, and so 1 eV in J (SI 2019, exact).</summary>
    public const double ElementaryChargeCoulomb = 1.602_176_634e-19;

    /// <summary>Astronomical unit, m (IAU 2012 resolution B2, exact).</summary>
    public const double AstronomicalUnitMetres = 149_597_870_700.0;

    /// <summary>FWHM of a Gaussian in units of its standard deviation, 2 √(2 ln 2).</summary>
    public const double FwhmPerSigma = 2.354_820_045_030_949_3;
}
