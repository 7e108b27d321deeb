namespace StarLines.Templates;

/// <summary>The shape of a template line.</summary>
public enum LineShape
{
    /// <summary>A Gaussian: metal lines, instrument, turbulence.</summary>
    Gaussian,

    /// <summary>
    /// depth × (1 + u²)^(−5/4), whose wings fall as |Δλ|^(−5/2): a hydrogen line broadened by the linear Stark effect
    /// (Holtsmark 1919, Annalen der Physik 363, 577, far wing).
    /// </summary>
    Stark,
}
