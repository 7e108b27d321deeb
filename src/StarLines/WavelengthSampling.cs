namespace StarLines;

/// <summary>How the pixels of a wavelength scale are spaced.</summary>
public enum WavelengthSampling
{
    /// <summary>Equal steps in wavelength.</summary>
    Linear,

    /// <summary>Equal steps in the logarithm of wavelength.</summary>
    LogLinear,

    /// <summary>Each pixel has its own wavelength.</summary>
    Tabulated,
}
