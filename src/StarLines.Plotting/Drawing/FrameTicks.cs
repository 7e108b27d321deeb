using ScottPlot;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Tick marks that point inwards on all four sides of the frame.</summary>
internal sealed class FrameTicks(Tick[] xTicks, Tick[] yTicks) : PanelItem("")
{
    private const float Major = 5.5f;
    private const float Minor = 3f;

    internal override void Draw(PanelCanvas panel)
    {
        SKRect frame = panel.Frame;
        using SKPaint paint = new Pen(Ink.Axis, 0.8f).Paint(panel.Palette);
        foreach (Tick tick in xTicks)
        {
            float x = panel.X(tick.Position);
            float length = tick.IsMajor ? Major : Minor;
            panel.Canvas.DrawLine(x, frame.Bottom, x, frame.Bottom - length, paint);
            panel.Canvas.DrawLine(x, frame.Top, x, frame.Top + length, paint);
        }

        foreach (Tick tick in yTicks)
        {
            float y = panel.Y(tick.Position);
            float length = tick.IsMajor ? Major : Minor;
            panel.Canvas.DrawLine(frame.Left, y, frame.Left + length, y, paint);
            panel.Canvas.DrawLine(frame.Right, y, frame.Right - length, y, paint);
        }
    }
}
