using System;

namespace StarLines.Profiles;

/// <summary>
/// A line shape φ(λ) of unit height at its centre, symmetric, with one or two widths. A line of depth A leaves the flux
/// 1 − A φ in units of the continuum.
/// </summary>
internal interface ILineProfile
{
    /// <summary>The word for the <c>profile</c> column.</summary>
    string Name { get; }

    /// <summary>Number of widths.</summary>
    int WidthCount { get; }

    /// <summary>Evaluates the profile and its derivatives on pixels.</summary>
    /// <param name="pixels">N pixels, Å.</param>
    /// <param name="centre">Centre of the line, Å, from the same reference as the pixels.</param>
    /// <param name="widths">The widths, Å; above 0.</param>
    /// <param name="value">Receives N values.</param>
    /// <param name="byCentre">Receives N derivatives by the centre, 1/Å.</param>
    /// <param name="byWidths">Receives N derivatives by each width in turn, 1/Å.</param>
    /// <param name="scratch">At least 3 (N + 1) values of scratch.</param>
    void Evaluate(
        PixelGrid pixels,
        double centre,
        ReadOnlySpan<double> widths,
        Span<double> value,
        Span<double> byCentre,
        Span<double> byWidths,
        Span<double> scratch);

    /// <summary>The widths of a line of a given full width at half maximum, to start a fit.</summary>
    /// <param name="fwhmAngstrom">Full width at half maximum, Å.</param>
    /// <param name="widths">Receives the widths, Å.</param>
    void Begin(double fwhmAngstrom, Span<double> widths);

    /// <summary>Full width at half maximum, Å, and its derivatives by the widths.</summary>
    double Fwhm(ReadOnlySpan<double> widths, Span<double> gradient);

    /// <summary>Integral over wavelength at unit depth, Å, and its derivatives by the widths.</summary>
    double Area(ReadOnlySpan<double> widths, Span<double> gradient);

    /// <summary>Distance from the centre beyond which the profile is taken as 0, Å; may be infinite.</summary>
    double Reach(ReadOnlySpan<double> widths);
}
