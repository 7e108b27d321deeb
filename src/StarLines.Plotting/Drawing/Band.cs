using System;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>The area between two traces, such as one standard deviation to both sides.</summary>
internal sealed class Band(string name, double[] x, double[] low, double[] high, Ink ink, byte opacity = 70) : PanelItem(name)
{
    internal double[] X { get; } = x;

    internal double[] Low { get; } = low;

    internal double[] High { get; } = high;

    internal override LegendSample? Sample => new(Fill: ink);

    internal override void Draw(PanelCanvas panel)
    {
        int first = Math.Max(0, Trace.LowerBound(X, panel.XRange.Minimum) - 1);
        int end = Math.Min(X.Length, Trace.LowerBound(X, panel.XRange.Maximum) + 1);
        using SKPaint paint = new() { Color = panel.Palette[ink].WithAlpha(opacity), IsAntialias = true };
        while (first < end)
        {
            int stop = first;
            while (stop < end && double.IsFinite(Low[stop]) && double.IsFinite(High[stop]))
            {
                stop++;
            }

            DrawRun(panel, first, stop, paint);
            first = stop + 1;
        }
    }

    private void DrawRun(PanelCanvas panel, int first, int stop, SKPaint paint)
    {
        if (stop - first < 2)
        {
            return;
        }

        using SKPath path = new();
        path.MoveTo(panel.X(X[first]), panel.Y(High[first]));
        AddSide(path, panel, High, first, stop - 1, 1);
        AddSide(path, panel, Low, stop - 1, first, -1);
        path.Close();
        panel.Canvas.DrawPath(path, paint);
    }

    /// <summary>One side of the band, a point at least every other device pixel.</summary>
    private void AddSide(SKPath path, PanelCanvas panel, double[] side, int from, int to, int step)
    {
        float least = 0.5f / panel.DeviceScale;
        float previous = float.NaN;
        for (int i = from; i != to + step; i += step)
        {
            float x = panel.X(X[i]);
            if (i == from || i == to || MathF.Abs(x - previous) >= least)
            {
                path.LineTo(x, panel.Y(side[i]));
                previous = x;
            }
        }
    }
}
