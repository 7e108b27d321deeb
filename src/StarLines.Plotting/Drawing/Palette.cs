using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>What a mark stands for; the palette gives it its colour.</summary>
internal enum Ink
{
    /// <summary>Axes, ticks and text.</summary>
    Axis,

    /// <summary>Measured pixels.</summary>
    Data,

    /// <summary>Measured pixels that are not used, and error bars.</summary>
    Faded,

    /// <summary>The continuum.</summary>
    Continuum,

    /// <summary>A fitted model.</summary>
    Model,

    /// <summary>The second of two kinds: emission, a second component.</summary>
    Second,

    /// <summary>Reference lines.</summary>
    Guide,

    /// <summary>The ground of a masked range.</summary>
    Shade,
}

/// <summary>
/// The colours of a theme. The hues are blue, vermilion and bluish green, which the common kinds of colour blindness keep
/// apart (Okabe and Ito 2008, Color Universal Design); their lightness differs too, so that they survive a grey print.
/// </summary>
internal sealed class Palette
{
    private readonly SKColor[] _inks;

    private Palette(SKColor background, params SKColor[] inks)
    {
        Background = background;
        _inks = inks;
    }

    internal static Palette Light { get; } = new(
        new SKColor(0xFF, 0xFF, 0xFF),
        new SKColor(0x16, 0x1B, 0x22),
        new SKColor(0x1F, 0x27, 0x33),
        new SKColor(0x9D, 0xA6, 0xB0),
        new SKColor(0xD5, 0x5E, 0x00),
        new SKColor(0x00, 0x72, 0xB2),
        new SKColor(0x00, 0x7D, 0x5C),
        new SKColor(0x8A, 0x93, 0x9E),
        new SKColor(0xE6, 0xE9, 0xED));

    internal static Palette Dark { get; } = new(
        new SKColor(0x11, 0x15, 0x1C),
        new SKColor(0xE3, 0xE8, 0xEE),
        new SKColor(0xD3, 0xDA, 0xE3),
        new SKColor(0x6B, 0x76, 0x84),
        new SKColor(0xFF, 0x9B, 0x42),
        new SKColor(0x5C, 0xBB, 0xF2),
        new SKColor(0x2C, 0xB5, 0x88),
        new SKColor(0x79, 0x85, 0x93),
        new SKColor(0x23, 0x2B, 0x36));

    internal SKColor Background { get; }

    internal SKColor this[Ink ink] => _inks[(int)ink];

    internal static Palette Of(FigureTheme theme) => theme == FigureTheme.Dark ? Dark : Light;
}
