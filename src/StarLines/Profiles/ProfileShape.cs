namespace StarLines.Profiles;

/// <summary>The shape of a spectral line.</summary>
public enum ProfileShape
{
    /// <summary>A Gaussian: thermal, turbulent and instrumental broadening.</summary>
    Gaussian,

    /// <summary>A Lorentzian: natural and pressure broadening.</summary>
    Lorentzian,
}
