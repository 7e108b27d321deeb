using System;
using System.Collections.Generic;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>The line above the panels: the title on the left, the legend on the right.</summary>
internal sealed class Heading(SKCanvas canvas, Palette palette, float textSize)
{
    private const float SampleWidth = 18f;
    private const float SampleGap = 5f;
    private const float EntryGap = 14f;

    /// <summary>Draws the heading at the top of an area and tells its height.</summary>
    internal float Draw(string title, IReadOnlyList<LegendEntry> legend, SKRect area)
    {
        using SKFont large = FigureText.Font(1.1f * textSize);
        using SKFont small = FigureText.Font(0.9f * textSize);
        float legendWidth = LegendWidth(legend, small);
        string shown = Shorten(title, large, area.Width);
        bool sameLine = shown.Length == 0 || legendWidth == 0f
            || large.MeasureText(shown) + legendWidth + (2 * EntryGap) <= area.Width;
        float baseline = area.Top + (0.9f * large.Size);
        FigureText.Draw(canvas, shown, area.Left, baseline, SKTextAlign.Left, large, palette[Ink.Axis]);
        float step = 1.5f * textSize;
        float legendBaseline = sameLine ? baseline : baseline + step;
        DrawLegend(legend, small, Math.Max(area.Left, area.Right - legendWidth), legendBaseline);
        return (sameLine ? 0f : step) + (1.7f * textSize);
    }

    private static float LegendWidth(IReadOnlyList<LegendEntry> legend, SKFont font)
    {
        float width = 0f;
        foreach (LegendEntry entry in legend)
        {
            width += SampleWidth + SampleGap + font.MeasureText(entry.Name) + (width > 0f ? EntryGap : 0f);
        }

        return width;
    }

    private static string Shorten(string text, SKFont font, float width)
    {
        if (font.MeasureText(text) <= width)
        {
            return text;
        }

        int length = text.Length;
        while (length > 1 && font.MeasureText(text[..length] + "…") > width)
        {
            length--;
        }

        return text[..length] + "…";
    }

    private void DrawLegend(IReadOnlyList<LegendEntry> legend, SKFont font, float left, float baseline)
    {
        float middle = baseline - (0.36f * font.Size);
        foreach (LegendEntry entry in legend)
        {
            DrawSample(entry.Sample, left, middle);
            left += SampleWidth + SampleGap;
            FigureText.Draw(canvas, entry.Name, left, baseline, SKTextAlign.Left, font, palette[Ink.Axis]);
            left += font.MeasureText(entry.Name) + EntryGap;
        }
    }

    private void DrawSample(LegendSample sample, float left, float middle)
    {
        if (sample.Fill is { } ink)
        {
            using SKPaint fill = new() { Color = palette[ink].WithAlpha((byte)(ink == Ink.Shade ? 255 : 70)), IsAntialias = true };
            canvas.DrawRect(new SKRect(left, middle - 4, left + SampleWidth, middle + 4), fill);
        }

        if (sample.Line is { } pen)
        {
            using SKPaint paint = (pen with { Width = Math.Max(pen.Width, 1.2f) }).Paint(palette);
            canvas.DrawLine(left, middle, left + SampleWidth, middle, paint);
        }

        if (sample.Point)
        {
            using SKPaint bar = new Pen(Ink.Faded, 0.8f).Paint(palette);
            using SKPaint fill = new() { Color = palette[Ink.Data], IsAntialias = true };
            canvas.DrawLine(left + (0.5f * SampleWidth), middle - 5, left + (0.5f * SampleWidth), middle + 5, bar);
            canvas.DrawCircle(left + (0.5f * SampleWidth), middle, 2f, fill);
        }
    }
}
