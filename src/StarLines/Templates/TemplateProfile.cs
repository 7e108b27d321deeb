using System;

namespace StarLines.Templates;

/// <summary>The absorption of a template, 1 − flux/continuum, at any wavelength, with its derivatives.</summary>
internal abstract class TemplateProfile
{
    /// <summary>Shortest wavelength at rest in vacuum with absorption, Å.</summary>
    internal abstract double MinimumAngstrom { get; }

    /// <summary>Longest wavelength at rest in vacuum with absorption, Å.</summary>
    internal abstract double MaximumAngstrom { get; }

    /// <summary>Whether the profile can be broadened; a spectrum as template cannot.</summary>
    internal abstract bool CanBroaden { get; }

    /// <summary>Absorption and its derivatives at observed wavelengths.</summary>
    /// <param name="vacuumAngstrom">N observed wavelengths in vacuum, Å, increasing.</param>
    /// <param name="logShift">ζ = ln(1 + z).</param>
    /// <param name="broadening">Variance of a Gaussian in velocity that widens every line at constant equivalent width, (km/s)².</param>
    /// <param name="absorption">Receives N values.</param>
    /// <param name="byShift">Receives N derivatives by ζ.</param>
    /// <param name="byBroadening">Receives N derivatives by the broadening, 1/(km/s)².</param>
    /// <param name="work">Scratch, N values.</param>
    internal abstract void Evaluate(
        ReadOnlySpan<double> vacuumAngstrom,
        double logShift,
        double broadening,
        Span<double> absorption,
        Span<double> byShift,
        Span<double> byBroadening,
        Span<double> work);

    /// <summary>Cuts a spectrum into the runs of pixels in which the template says something, each measured on its own.</summary>
    /// <param name="vacuumAngstrom">Observed wavelengths in vacuum, Å, increasing.</param>
    /// <param name="logShift">ζ = ln(1 + z), as well as it is known.</param>
    /// <param name="broadening">As in <see cref="Evaluate"/>, (km/s)².</param>
    internal abstract TemplateWindow[] Windows(ReadOnlySpan<double> vacuumAngstrom, double logShift, double broadening);

    /// <summary>Variance of the noise of the template itself at an observed wavelength; 0 for computed lines.</summary>
    internal virtual void AddVariance(ReadOnlySpan<double> vacuumAngstrom, double logShift, Span<double> variance)
    {
    }
}
