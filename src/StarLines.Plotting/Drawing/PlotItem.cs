using System.Collections.Generic;
using ScottPlot;

namespace StarLines.Plotting.Drawing;

/// <summary>Lets an item of a panel draw within a plot.</summary>
internal sealed class PlotItem(PanelItem item, DataRange x, DataRange y, Palette palette, float textSize, float deviceScale)
    : IPlottable
{
    /// <inheritdoc/>
    public bool IsVisible { get; set; } = true;

    /// <inheritdoc/>
    public IAxes Axes { get; set; } = new Axes();

    /// <inheritdoc/>
    public IEnumerable<LegendItem> LegendItems => [];

    /// <inheritdoc/>
    public AxisLimits GetAxisLimits() => new(x.Minimum, x.Maximum, y.Minimum, y.Maximum);

    /// <inheritdoc/>
    public void Render(RenderPack rp) =>
        item.Draw(new PanelCanvas(rp.Canvas, rp.DataRect.ToSKRect(), x, y, palette, textSize, deviceScale));
}
