using System;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Where the items of a panel draw: a canvas, the panel's frame on it, and the way from data to it.</summary>
internal sealed class PanelCanvas(
    SKCanvas canvas, SKRect frame, DataRange x, DataRange y, Palette palette, float textSize, float deviceScale)
{
    private readonly double _xScale = frame.Width / x.Length;
    private readonly double _yScale = frame.Height / y.Length;

    internal SKCanvas Canvas { get; } = canvas;

    /// <summary>The frame of the data, in units of the figure.</summary>
    internal SKRect Frame { get; } = frame;

    internal DataRange XRange { get; } = x;

    internal DataRange YRange { get; } = y;

    internal Palette Palette { get; } = palette;

    internal float TextSize { get; } = textSize;

    /// <summary>Device pixels a unit of the figure.</summary>
    internal float DeviceScale { get; } = deviceScale;

    internal float X(double value) => (float)(Frame.Left + ((value - XRange.Minimum) * _xScale));

    /// <summary>The height of a value on the canvas, kept within a few frames of what is seen.</summary>
    internal float Y(double value) => (float)Math.Clamp(
        Frame.Bottom - ((value - YRange.Minimum) * _yScale), Frame.Top - (3 * Frame.Height), Frame.Bottom + (3 * Frame.Height));

    internal SKFont Font(float relativeSize = 1f) => FigureText.Font(TextSize * relativeSize);
}
