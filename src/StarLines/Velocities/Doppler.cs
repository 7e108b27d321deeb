using System;

namespace StarLines.Velocities;

/// <summary>
/// The relativistic Doppler formula for motion along the line of sight, receding positive:
/// 1 + z = λ_observed/λ_rest = √((1 + β)/(1 − β)), β = v/c. Factors multiply, velocities do not add:
/// apply a correction by multiplying factors.
/// </summary>
/// <remarks>Source: special relativity; the forms used keep full precision near z = 0.</remarks>
public static class Doppler
{
    // The largest double below 1: the formula ends at the speed of light itself.
    private const double MaximumBeta = 1.0 - 1.110_223_024_625_156_5e-16;

    /// <summary>The factor λ_observed/λ_rest of a velocity.</summary>
    /// <param name="velocityKmPerS">Velocity, km/s, receding positive; within ±c.</param>
    /// <returns>1 + z.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The velocity reaches the speed of light, or is not finite.</exception>
    public static double Factor(double velocityKmPerS)
    {
        double beta = Beta(velocityKmPerS);
        return Math.Sqrt((1.0 + beta) / (1.0 - beta));
    }

    /// <summary>The velocity of a factor λ_observed/λ_rest.</summary>
    /// <param name="factor">1 + z; above 0.</param>
    /// <returns>Velocity, km/s, receding positive.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The factor is not a finite number above 0.</exception>
    public static double VelocityKmPerS(double factor)
    {
        Guard.Positive(factor, nameof(factor), "");
        return VelocityOfRedshift(factor - 1.0);
    }

    /// <summary>The velocity of an observed wavelength against its wavelength at rest, both in the same medium.</summary>
    /// <param name="observedAngstrom">Observed wavelength, Å; above 0.</param>
    /// <param name="restAngstrom">Wavelength at rest, Å; above 0.</param>
    /// <returns>Velocity, km/s, receding positive.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A wavelength is not a finite number above 0.</exception>
    public static double VelocityKmPerS(double observedAngstrom, double restAngstrom)
    {
        Guard.Positive(observedAngstrom, nameof(observedAngstrom), "Å");
        Guard.Positive(restAngstrom, nameof(restAngstrom), "Å");
        return VelocityOfRedshift((observedAngstrom - restAngstrom) / restAngstrom);
    }

    /// <summary>The redshift z of a velocity.</summary>
    /// <param name="velocityKmPerS">Velocity, km/s, receding positive; within ±c.</param>
    /// <returns>z, precise to the last digits also where it is small.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The velocity reaches the speed of light, or is not finite.</exception>
    public static double Redshift(double velocityKmPerS)
    {
        double beta = Beta(velocityKmPerS);
        double factor = Math.Sqrt((1.0 + beta) / (1.0 - beta));

        // f − 1 = (f² − 1)/(f + 1), and f² − 1 = 2β/(1 − β): nothing cancels.
        return 2.0 * beta / (1.0 - beta) / (factor + 1.0);
    }

    /// <summary>The velocity of a redshift.</summary>
    /// <param name="redshift">z; above −1.</param>
    /// <returns>Velocity, km/s, receding positive.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The redshift is not a finite number above −1.</exception>
    public static double VelocityOfRedshiftKmPerS(double redshift)
    {
        Guard.Positive(1.0 + redshift, nameof(redshift), "+ 1");
        return VelocityOfRedshift(redshift);
    }

    // β = (f² − 1)/(f² + 1) with f = 1 + z, written in z.
    private static double VelocityOfRedshift(double z) =>
        PhysicalConstants.SpeedOfLightKmPerS * (z * (2.0 + z)) / (2.0 + (z * (2.0 + z)));

    private static double Beta(double velocityKmPerS)
    {
        double beta = velocityKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
        Guard.Between(beta, -MaximumBeta, MaximumBeta, nameof(velocityKmPerS), "c");
        return beta;
    }
}
