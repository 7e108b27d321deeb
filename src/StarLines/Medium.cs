namespace StarLines;

/// <summary>What the wavelengths of a scale or a list were reduced to.</summary>
public enum Medium
{
    /// <summary>The source does not say.</summary>
    Unknown,

    /// <summary>Standard air: dry, 15 °C, 101 325 Pa, 450 ppm CO₂ (Ciddor 1996).</summary>
    Air,

    /// <summary>Vacuum.</summary>
    Vacuum,
}
