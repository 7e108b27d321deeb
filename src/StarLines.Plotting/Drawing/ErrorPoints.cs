using System;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// Points with error bars; those that are not used are open circles. Where they lie too close to be told apart they may be
/// joined to a line instead.
/// </summary>
internal sealed class ErrorPoints(
    string name, double[] x, double[] y, double[] sigma, bool[] used, bool joined = false) : PanelItem(name)
{
    /// <summary>Points closer than this, units of the figure, are joined.</summary>
    private const float LeastPitch = 2f;

    /// <summary>An open circle smaller than this would look like a dot.</summary>
    private const float LeastRing = 1.4f;

    internal double[] X { get; } = x;

    internal double[] Y { get; } = y;

    /// <summary>One standard deviation a point, or none.</summary>
    internal double[] Sigma { get; } = sigma;

    /// <summary>Whether a point was used, or none where all were.</summary>
    internal bool[] Used { get; } = used;

    internal override LegendSample? Sample => new(Point: true);

    internal override void Draw(PanelCanvas panel)
    {
        int first = Math.Max(0, Trace.LowerBound(X, panel.XRange.Minimum) - 1);
        int end = Math.Min(X.Length, Trace.LowerBound(X, panel.XRange.Maximum) + 1);
        float pitch = (panel.X(X[Math.Max(first, end - 1)]) - panel.X(X[Math.Min(first, X.Length - 1)])) / Math.Max(1, end - first - 1);
        if (joined && pitch < LeastPitch)
        {
            DrawJoined(panel);
            return;
        }

        float radius = Math.Clamp(0.28f * pitch, 0.9f, 2.2f);
        using SKPaint bar = new Pen(Ink.Faded, 0.8f).Paint(panel.Palette);
        using SKPaint fill = new() { Color = panel.Palette[Ink.Data], IsAntialias = true };
        using SKPaint ring = new Pen(Ink.Faded, 0.8f).Paint(panel.Palette);
        ring.IsStroke = radius >= LeastRing;
        using SKPath bars = ErrorBars(panel, first, end);
        panel.Canvas.DrawPath(bars, bar);
        for (int i = first; i < end; i++)
        {
            if (double.IsFinite(Y[i]))
            {
                bool filled = Used.Length == 0 || Used[i];
                panel.Canvas.DrawCircle(panel.X(X[i]), panel.Y(Y[i]), radius, filled ? fill : ring);
            }
        }
    }

    private void DrawJoined(PanelCanvas panel)
    {
        if (Used.Length != 0)
        {
            bool[] unused = Array.ConvertAll(Used, static flag => !flag);
            new Trace("", X, Y, Pens.Masked, PixelSlice.WithNeighbours(unused, Used)).Draw(panel);
        }

        new Trace("", X, Y, Pens.Data with { Width = 0.95f }, Used).Draw(panel);
    }

    private SKPath ErrorBars(PanelCanvas panel, int first, int end)
    {
        SKPath path = new();
        for (int i = first; i < end && Sigma.Length != 0; i++)
        {
            if (double.IsFinite(Y[i]) && Sigma[i] > 0)
            {
                path.MoveTo(panel.X(X[i]), panel.Y(Y[i] - Sigma[i]));
                path.LineTo(panel.X(X[i]), panel.Y(Y[i] + Sigma[i]));
            }
        }

        return path;
    }
}
