using System;
using System.Collections.Generic;
using System.Linq;
using ScottPlot;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Draws the content of a figure on a canvas.</summary>
internal sealed class FigurePainter(SKCanvas canvas, Palette palette, float textSize, float deviceScale)
{
    private const float Margin = 8f;
    private const float NumberGap = 3f;

    /// <summary>Room for half of the last number of a horizontal axis, text heights.</summary>
    private const float RightRoom = 1.3f;

    /// <summary>The share of an axis that its label may take; a longer one becomes smaller.</summary>
    private const float LabelShare = 0.97f;

    internal void Paint(FigureContent content, string title, float width, float height)
    {
        using (SKPaint ground = new() { Color = palette.Background })
        {
            canvas.DrawRect(new SKRect(0, 0, width, height), ground);
        }

        List<LegendEntry> legend = LegendEntry.Of(content.Cells.SelectMany(cell => cell.Panels).SelectMany(panel => panel.Items));
        var area = new SKRect(Margin, Margin, width - Margin - (RightRoom * textSize), height - (0.5f * Margin));
        if (title.Length != 0 || legend.Count != 0)
        {
            var heading = new Heading(canvas, palette, textSize);
            area.Top += heading.Draw(title, legend, area);
        }

        foreach (PlacedPanel placed in new PanelLayout(content, area, textSize).Place())
        {
            DrawPanel(placed);
        }
    }

    private void DrawPanel(PlacedPanel placed)
    {
        using var plot = new Plot();
        SKRect frame = placed.Frame;
        plot.RenderManager.ClearCanvasBeforeEachRender = false;
        plot.FigureBackground.Color = Colors.Transparent;
        plot.DataBackground.Color = Colors.Transparent;
        plot.HideGrid();
        plot.Axes.SetLimits(placed.Panel.X.Minimum, placed.Panel.X.Maximum, placed.YAxis.Minimum, placed.YAxis.Maximum);
        StyleAxis(plot.Axes.Bottom, placed.XTicks, placed.Panel.XLabel, frame.Width);
        StyleAxis(plot.Axes.Left, placed.YTicks, "", frame.Height);
        plot.Axes.Bottom.TickLabelStyle.OffsetY = NumberGap;
        plot.Axes.Left.TickLabelStyle.OffsetX = -NumberGap;
        plot.Axes.Left.TickLabelStyle.OffsetY = 0.1f * textSize;
        plot.Axes.FrameWidth(0.9f);
        plot.Axes.FrameColor(Color.FromSKColor(palette[Ink.Axis]));
        foreach (PanelItem item in placed.Panel.Items.Append(new FrameTicks(placed.XTicks.All, placed.YTicks.All)))
        {
            plot.PlottableList.Add(new PlotItem(item, placed, palette, textSize, deviceScale));
        }

        plot.Layout.Fixed(new PixelRect(frame.Left, frame.Right, frame.Bottom, frame.Top));
        plot.Render(canvas, new PixelRect(0, frame.Right + 4, frame.Bottom + (4 * textSize), 0));
        DrawYLabel(placed);
    }

    /// <summary>Draws the label of the vertical axis in line with those above and below.</summary>
    private void DrawYLabel(PlacedPanel placed)
    {
        using SKFont font = FigureText.Font(Fitting(placed.Panel.YLabel, placed.Frame.Height));
        FigureText.DrawUpwards(
            canvas, placed.Panel.YLabel, placed.YLabelX, placed.Frame.MidY, SKTextAlign.Center, font, palette[Ink.Axis]);
    }

    /// <summary>The size of text at which a label fits its axis.</summary>
    private float Fitting(string label, float length)
    {
        using SKFont font = FigureText.Font(textSize);
        return textSize * Math.Min(1f, LabelShare * length / Math.Max(1f, font.MeasureText(label)));
    }

    private void StyleAxis(IAxis axis, Ticks ticks, string label, float length)
    {
        Color colour = Color.FromSKColor(palette[Ink.Axis]);
        axis.TickGenerator = ticks;
        axis.MajorTickStyle.Length = 0;
        axis.MinorTickStyle.Length = 0;
        foreach (LabelStyle style in (LabelStyle[])[axis.TickLabelStyle, axis.Label])
        {
            style.FontName = FigureFonts.Key;
            style.FontSize = textSize;
            style.Bold = false;
            style.ForeColor = colour;
            style.SubpixelText = true;
        }

        axis.Label.FontSize = Fitting(label, length);
        axis.Label.Text = label;
        axis.Label.IsVisible = label.Length != 0;
    }
}
