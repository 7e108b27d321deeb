using System.Collections.Generic;
using ScottPlot;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Lets an item of a panel draw within a plot.</summary>
internal sealed class PlotItem(PanelItem item, PlacedPanel placed, Palette palette, float textSize, float deviceScale)
    : IPlottable
{
    /// <inheritdoc/>
    public bool IsVisible { get; set; } = true;

    /// <inheritdoc/>
    public IAxes Axes { get; set; } = new Axes();

    /// <inheritdoc/>
    public IEnumerable<LegendItem> LegendItems => [];

    /// <inheritdoc/>
    public AxisLimits GetAxisLimits() => new(
        placed.Panel.X.Minimum, placed.Panel.X.Maximum, placed.YAxis.Minimum, placed.YAxis.Maximum);

    /// <inheritdoc/>
    public void Render(RenderPack rp)
    {
        SKRect frame = rp.DataRect.ToSKRect();
        rp.Canvas.Save();
        if (!item.UsesBand && placed.Band > 0f)
        {
            rp.Canvas.ClipRect(new SKRect(frame.Left, frame.Top + placed.Band, frame.Right, frame.Bottom));
        }

        item.Draw(new PanelCanvas(rp.Canvas, frame, placed.Panel.X, placed.YAxis, palette, textSize, deviceScale));
        rp.Canvas.Restore();
    }
}
