namespace StarLines.Profiles;

/// <summary>What the flux of a pixel stands for.</summary>
public enum PixelSampling
{
    /// <summary>The mean over the width of the pixel, as a detector gives it.</summary>
    Integrated,

    /// <summary>The value at the centre of the pixel, as many computed spectra give it.</summary>
    Point,
}
