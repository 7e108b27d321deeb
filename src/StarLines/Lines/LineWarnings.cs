using System;

namespace StarLines.Lines;

/// <summary>Reservations about a measured line; each is one word in the <c>warnings</c> column.</summary>
[Flags]
public enum LineWarnings
{
    /// <summary>None.</summary>
    None = 0,

    /// <summary><c>edge</c>: part of the window lies outside the spectrum; width and equivalent width may be low.</summary>
    Edge = 1,

    /// <summary><c>masked-pixels</c>: some pixels of the window are masked; direct summation is filled by the model.</summary>
    MaskedPixels = 2,

    /// <summary><c>blended</c>: fitted together with neighbours.</summary>
    Blended = 4,

    /// <summary><c>poor-fit</c>: the profile does not describe the data: the reduced χ² is too high, or the residuals ask for wings or shoulders.</summary>
    PoorFit = 8,

    /// <summary><c>continuum</c>: the continuum is not to be trusted here.</summary>
    Continuum = 16,

    /// <summary><c>shifted</c>: the centre lies far from where the velocity puts it; perhaps another line.</summary>
    Shifted = 32,

    /// <summary><c>undersampled</c>: the line is narrower than two pixels.</summary>
    Undersampled = 64,

    /// <summary><c>saturated</c>: the core reaches zero flux.</summary>
    Saturated = 128,

    /// <summary><c>methods-disagree</c>: fit and summation differ by more than three standard deviations.</summary>
    MethodsDisagree = 256,

    /// <summary><c>at-bound</c>: a parameter of the fit ended at its bound.</summary>
    AtBound = 512,

    /// <summary><c>noise-from-flux</c>: the spectrum has no uncertainties; they were estimated from the flux.</summary>
    NoiseFromFlux = 1024,

    /// <summary><c>medium-assumed</c>: the file does not say whether its wavelengths are in air or vacuum.</summary>
    MediumAssumed = 2048,

    /// <summary><c>no-convergence</c>: the fit stopped before it settled.</summary>
    NoConvergence = 4096,

    /// <summary>
    /// <c>unresolved</c>: a line fitted together with this one lies nearer than 0.85 full widths, where two equal Gaussians
    /// no longer show two minima; only the sum of both is well determined.
    /// </summary>
    Unresolved = 8192,

    /// <summary>
    /// <c>degenerate</c>: the fitted profile is far deeper than anything the data show, because neighbours of opposite sign
    /// cancel it; the line has no numbers. Take one of the lines out of the list.
    /// </summary>
    Degenerate = 16384,
}
