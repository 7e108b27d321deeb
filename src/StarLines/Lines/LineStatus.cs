namespace StarLines.Lines;

/// <summary>How the measurement of a line ended.</summary>
public enum LineStatus
{
    /// <summary>Measured.</summary>
    Measured,

    /// <summary>Not detected; an upper limit is given.</summary>
    Limit,

    /// <summary>Outside the spectrum.</summary>
    OffSpectrum,

    /// <summary>Its pixels are masked.</summary>
    Masked,

    /// <summary>The measurement failed; the warnings say why.</summary>
    Failed,
}
