using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>A straight line across the panel at one value, with, where its uncertainty can be seen, a band of ±1σ.</summary>
internal sealed class Rule(string name, bool vertical, double value, Pen pen, double sigma = 0) : PanelItem(name)
{
    internal bool Vertical { get; } = vertical;

    internal double Value { get; } = value;

    internal double Sigma { get; } = sigma;

    internal override LegendSample? Sample => new(pen);

    internal override void Draw(PanelCanvas panel)
    {
        SKRect frame = panel.Frame;
        if (Sigma > 0)
        {
            using SKPaint fill = new() { Color = panel.Palette[pen.Ink].WithAlpha(50), IsAntialias = true };
            panel.Canvas.DrawRect(
                Vertical
                    ? new SKRect(panel.X(Value - Sigma), frame.Top, panel.X(Value + Sigma), frame.Bottom)
                    : new SKRect(frame.Left, panel.Y(Value + Sigma), frame.Right, panel.Y(Value - Sigma)),
                fill);
        }

        using SKPaint paint = pen.Paint(panel.Palette);
        if (Vertical)
        {
            panel.Canvas.DrawLine(panel.X(Value), frame.Bottom, panel.X(Value), frame.Top, paint);
        }
        else
        {
            panel.Canvas.DrawLine(frame.Left, panel.Y(Value), frame.Right, panel.Y(Value), paint);
        }
    }
}
