using StarLines.Velocities;

namespace StarLines.Lines;

/// <summary>Where lines stand, with the shift done in vacuum.</summary>
internal static class LineWavelengths
{
    /// <summary>The wavelength at which a line is expected, Å, in the medium of the spectrum.</summary>
    /// <param name="rest">Rest wavelength, Å.</param>
    /// <param name="restMedium">Its medium.</param>
    /// <param name="medium">Medium of the spectrum; unknown counts as that of the list.</param>
    /// <param name="factor">Doppler factor 1 + z.</param>
    internal static double Predict(double rest, Medium restMedium, Medium medium, double factor)
    {
        if (Effective(restMedium, medium) == Medium.Air || Effective(medium, restMedium) == Medium.Air)
        {
            double vacuum = AirVacuum.ConvertAngstrom(rest, Effective(restMedium, medium), Medium.Vacuum);
            return AirVacuum.ConvertAngstrom(vacuum * factor, Medium.Vacuum, Effective(medium, restMedium));
        }

        return rest * factor;
    }

    /// <summary>Velocity of a line, km/s, and that of one Å.</summary>
    internal static Measured Velocity(Measured centre, double rest, Medium restMedium, Medium medium)
    {
        double observedVacuum = ToVacuum(centre.Value, Effective(medium, restMedium));
        double restVacuum = ToVacuum(rest, Effective(restMedium, medium));
        double velocity = Doppler.VelocityKmPerS(observedVacuum, restVacuum);

        // dv/dλ = c/λ (1 − v²/c²), from λ/λ₀ = √((1 + β)/(1 − β)).
        double beta = velocity / PhysicalConstants.SpeedOfLightKmPerS;
        double slope = PhysicalConstants.SpeedOfLightKmPerS * (1.0 - (beta * beta)) / centre.Value;
        return new Measured(velocity, slope * centre.Uncertainty);
    }

    private static double ToVacuum(double wavelength, Medium medium) =>
        medium == Medium.Air ? AirVacuum.ConvertAngstrom(wavelength, Medium.Air, Medium.Vacuum) : wavelength;

    private static Medium Effective(Medium medium, Medium other) => medium == Medium.Unknown ? other : medium;
}
