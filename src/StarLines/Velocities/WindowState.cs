namespace StarLines.Velocities;

/// <summary>Why a window of the spectrum does not count in a velocity.</summary>
internal enum WindowFate
{
    /// <summary>It counts.</summary>
    Used,

    /// <summary>Too few of its pixels are good.</summary>
    Masked,

    /// <summary>The line is in emission, or filled by emission.</summary>
    Emission,

    /// <summary>Its velocity lies too far from that of the others.</summary>
    Outlier,
}

/// <summary>One window: its nuisance parameters, and what it says of the velocity.</summary>
internal struct WindowState
{
    /// <summary>Depth of the lines in units of the template's.</summary>
    internal double Depth;

    /// <summary>Correction of the continuum in the middle of the window, in units of it.</summary>
    internal double Level;

    /// <summary>Correction of the continuum from the middle to an end.</summary>
    internal double Tilt;

    /// <summary>Standard deviation of <see cref="Level"/> and <see cref="Tilt"/> before the fit.</summary>
    internal double LevelSigma;

    /// <summary>Standard deviation of <see cref="Tilt"/> before the fit.</summary>
    internal double TiltSigma;

    /// <summary>Inverse variance of ln(1 + z) by noise, the nuisance parameters allowed for.</summary>
    internal double Information;

    /// <summary>The step in ln(1 + z) that this window asks for.</summary>
    internal double Step;

    /// <summary>Inverse variance if nothing else were unknown: the photon limit.</summary>
    internal double PhotonInformation;

    /// <summary>Sum of squared residuals over their variances.</summary>
    internal double ChiSquare;

    /// <summary>Pixels with a weight.</summary>
    internal int Pixels;

    /// <summary>Factor on the variance where the residuals are larger than the noise.</summary>
    internal double Inflation;

    /// <summary>Whether it counts.</summary>
    internal WindowFate Fate;
}
