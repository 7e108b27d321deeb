using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>How a line is dashed.</summary>
internal enum Dash
{
    /// <summary>Unbroken.</summary>
    Solid,

    /// <summary>Long strokes.</summary>
    Dashed,

    /// <summary>Short strokes.</summary>
    Dotted,
}

/// <summary>How a line is drawn; the width is in units of the figure, 1/96 inch.</summary>
internal readonly record struct Pen(Ink Ink, float Width, Dash Dash = Dash.Solid)
{
    internal SKPaint Paint(Palette palette)
    {
        var paint = new SKPaint
        {
            Color = palette[Ink],
            StrokeWidth = Width,
            IsStroke = true,
            IsAntialias = true,
            StrokeJoin = Width < 1f ? SKStrokeJoin.Bevel : SKStrokeJoin.Round,
        };
        if (Dash != Dash.Solid)
        {
            float[] intervals = Dash == Dash.Dashed ? [5f, 3.5f] : [1.2f, 2.4f];
            paint.PathEffect = SKPathEffect.CreateDash(intervals, 0);
        }

        return paint;
    }
}
