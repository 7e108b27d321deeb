using ScottPlot;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Tick marks that point inwards on all four sides of the frame.</summary>
internal sealed class FrameTicks(Tick[] xTicks, Tick[] yTicks) : PanelItem("")
{
    /// <summary>Length of the marks that have a number, units of the figure.</summary>
    internal const float Major = 5.5f;

    private const float Minor = 3f;

    internal override bool UsesBand => true;

    internal override void Draw(PanelCanvas panel)
    {
        SKRect frame = panel.Frame;
        using SKPath path = new();
        foreach (Tick tick in xTicks)
        {
            float x = panel.X(tick.Position);
            float length = tick.IsMajor ? Major : Minor;
            AddLine(path, x, frame.Bottom, x, frame.Bottom - length);
            AddLine(path, x, frame.Top, x, frame.Top + length);
        }

        foreach (Tick tick in yTicks)
        {
            float y = panel.Y(tick.Position);
            float length = tick.IsMajor ? Major : Minor;
            AddLine(path, frame.Left, y, frame.Left + length, y);
            AddLine(path, frame.Right, y, frame.Right - length, y);
        }

        using SKPaint paint = new Pen(Ink.Axis, 0.8f).Paint(panel.Palette);
        panel.Canvas.DrawPath(path, paint);
    }

    private static void AddLine(SKPath path, float x0, float y0, float x1, float y1)
    {
        path.MoveTo(x0, y0);
        path.LineTo(x1, y1);
    }
}
