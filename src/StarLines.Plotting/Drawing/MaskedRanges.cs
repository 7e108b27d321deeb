using System.Collections.Generic;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Ranges of pixels that are not used: wide ones as a shaded ground, narrow ones as marks along the lower axis.</summary>
internal sealed class MaskedRanges(string name, IReadOnlyList<DataRange> ranges) : PanelItem(name)
{
    private const float Wide = 3f;
    private const float MarkHeight = 5f;

    internal IReadOnlyList<DataRange> Ranges { get; } = ranges;

    internal override bool UsesBand => true;

    internal override LegendSample? Sample => new(Fill: Ink.Shade);

    /// <summary>Leaves out the items that have nothing to show, so that the legend does not name them.</summary>
    internal static List<PanelItem> OmitEmpty(List<PanelItem> items)
    {
        items.RemoveAll(static item => item is MaskedRanges { Ranges.Count: 0 });
        return items;
    }

    internal override void Draw(PanelCanvas panel)
    {
        using SKPaint shade = new() { Color = panel.Palette[Ink.Shade], IsAntialias = true };
        using SKPaint mark = new() { Color = panel.Palette[Ink.Faded], IsAntialias = true };
        foreach (DataRange range in Ranges)
        {
            if (range.Maximum < panel.XRange.Minimum || range.Minimum > panel.XRange.Maximum)
            {
                continue;
            }

            float left = panel.X(range.Minimum);
            float right = panel.X(range.Maximum);
            if (right - left >= Wide)
            {
                panel.Canvas.DrawRect(new SKRect(left, panel.Frame.Top, right, panel.Frame.Bottom), shade);
            }
            else
            {
                float middle = 0.5f * (left + right);
                panel.Canvas.DrawRect(
                    new SKRect(middle - 0.4f, panel.Frame.Bottom - MarkHeight, middle + 0.4f, panel.Frame.Bottom), mark);
            }
        }
    }
}
