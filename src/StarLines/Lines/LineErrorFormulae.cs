using System;

namespace StarLines.Lines;

/// <summary>
/// Published error formulae of equivalent widths and Gaussian lines, for planning and for comparison; the measurement itself
/// takes its uncertainties from the covariance of the fit. Noise is white, one value a pixel, the continuum is 1.
/// </summary>
public static class LineErrorFormulae
{
    /// <summary>√π.</summary>
    private const double SqrtPi = 1.772_453_850_905_516;

    /// <summary>Coefficient of the 1988 formula.</summary>
    public const double Cayrel1988Coefficient = 1.6;

    /// <summary>Coefficient of the 2004 form, for a Gaussian fit with known continuum.</summary>
    public const double Cayrel2004Coefficient = 1.5;

    /// <summary>
    /// Uncertainty of the equivalent width of a weak line, mÅ: σ = k √(FWHM Δλ)/(S/N), the continuum known.
    /// </summary>
    /// <param name="fwhmAngstrom">Full width at half maximum, Å; above 0.</param>
    /// <param name="pixelAngstrom">Width of a pixel, Å; above 0.</param>
    /// <param name="signalToNoise">Signal-to-noise ratio a pixel of the continuum; above 0.</param>
    /// <param name="coefficient">k: <see cref="Cayrel1988Coefficient"/> or <see cref="Cayrel2004Coefficient"/>.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not above 0.</exception>
    /// <remarks>
    /// Source: Cayrel (1988), IAU Symposium 132, 345; Cayrel et al. (2004), A&amp;A 416, 1117. The Cramér–Rao value of k for a
    /// Gaussian of free depth, centre and width is √(3 √π/2.35482) = 1.502689.
    /// </remarks>
    public static double CayrelMilliangstrom(
        double fwhmAngstrom, double pixelAngstrom, double signalToNoise, double coefficient = Cayrel1988Coefficient)
    {
        Guard.Positive(fwhmAngstrom, nameof(fwhmAngstrom), "Å");
        Guard.Positive(pixelAngstrom, nameof(pixelAngstrom), "Å");
        Guard.Positive(signalToNoise, nameof(signalToNoise), "");
        return 1000.0 * coefficient * Math.Sqrt(fwhmAngstrom * pixelAngstrom) / signalToNoise;
    }

    /// <summary>
    /// Uncertainty of an equivalent width by summation, mÅ: σ = √(1 + F̄c/F̄) (Δλ − W)/(S/N).
    /// </summary>
    /// <param name="rangeAngstrom">Range of the summation Δλ, Å; above 0.</param>
    /// <param name="equivalentWidthMilliangstrom">W, mÅ; absorption positive.</param>
    /// <param name="fluxOverContinuum">Mean flux over mean continuum in the range; above 0.</param>
    /// <param name="signalToNoise">Signal-to-noise ratio of the continuum; above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of range.</exception>
    /// <remarks>Source: Vollmann and Eversberg (2006), Astronomische Nachrichten 327, 862, eq. (7).</remarks>
    public static double VollmannEversbergMilliangstrom(
        double rangeAngstrom, double equivalentWidthMilliangstrom, double fluxOverContinuum, double signalToNoise)
    {
        Guard.Positive(rangeAngstrom, nameof(rangeAngstrom), "Å");
        Guard.Finite(equivalentWidthMilliangstrom, nameof(equivalentWidthMilliangstrom), "mÅ");
        Guard.Positive(fluxOverContinuum, nameof(fluxOverContinuum), "");
        Guard.Positive(signalToNoise, nameof(signalToNoise), "");
        double range = (1000.0 * rangeAngstrom) - equivalentWidthMilliangstrom;
        return Math.Sqrt(1.0 + (1.0 / fluxOverContinuum)) * range / signalToNoise;
    }

    /// <summary>
    /// Cramér–Rao bounds of a Gaussian of depth A and standard deviation s in pixels Δ ≪ s, with noise ε a pixel and known
    /// continuum.
    /// </summary>
    /// <param name="depth">Depth A; not 0.</param>
    /// <param name="sigmaAngstrom">Standard deviation s of the profile, Å; above 0.</param>
    /// <param name="pixelAngstrom">Width Δ of a pixel, Å; above 0.</param>
    /// <param name="signalToNoise">1/ε; above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of range.</exception>
    /// <remarks>
    /// σ(x₀) = σ(s) = √(2/√π) √(s Δ) ε/A, σ(A) = √(3/(2√π)) √(Δ/s) ε, σ(W) = √(3√π) √(s Δ) ε. The scaling is that of Landman,
    /// Roussel-Dupré and Tanigawa (1982), ApJ 261, 732, and of Lenz and Ayres (1992), PASP 104, 1104.
    /// </remarks>
    public static GaussianBounds CramerRao(double depth, double sigmaAngstrom, double pixelAngstrom, double signalToNoise)
    {
        Guard.Positive(Math.Abs(depth), nameof(depth), "");
        Guard.Positive(sigmaAngstrom, nameof(sigmaAngstrom), "Å");
        Guard.Positive(pixelAngstrom, nameof(pixelAngstrom), "Å");
        Guard.Positive(signalToNoise, nameof(signalToNoise), "");
        double scale = Math.Sqrt(sigmaAngstrom * pixelAngstrom) / signalToNoise;
        double centre = Math.Sqrt(2.0 / SqrtPi) * scale / Math.Abs(depth);
        return new GaussianBounds(
            centre,
            PhysicalConstants.FwhmPerSigma * centre,
            Math.Sqrt(1.5 / SqrtPi) * Math.Sqrt(pixelAngstrom / sigmaAngstrom) / signalToNoise,
            1000.0 * Math.Sqrt(3.0 * SqrtPi) * scale);
    }
}
