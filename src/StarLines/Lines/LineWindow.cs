namespace StarLines.Lines;

/// <summary>The pixels of a line's window and the local continuum, as a figure of the fit needs them.</summary>
/// <param name="FirstPixel">First pixel; −1 where the line has no window.</param>
/// <param name="LastPixel">Last pixel, included; −2 where the line has no window.</param>
/// <param name="LocalContinuum">The continuum that the fit found here, in units of the global continuum.</param>
public readonly record struct LineWindow(int FirstPixel, int LastPixel, double LocalContinuum)
{
    /// <summary>No window: the line is outside the spectrum.</summary>
    public static LineWindow None { get; } = new(-1, -2, 1.0);

    /// <summary>Number of pixels.</summary>
    public int PixelCount => LastPixel - FirstPixel + 1;
}
