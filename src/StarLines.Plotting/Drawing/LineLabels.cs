using System;
using System.Collections.Generic;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// Names of lines in a band above the data: a tick where the line lies, a leader and the name, which reads upwards.
/// Where there are more lines than room the strongest are named and the others keep their tick.
/// </summary>
internal sealed class LineLabels : PanelItem
{
    /// <summary>Distance between the middles of neighbouring names, in text heights.</summary>
    private const float Spacing = 1.12f;

    /// <summary>How far a name may stand from its line, in text heights.</summary>
    private const float Farthest = 4.5f;

    private const float RelativeSize = 0.82f;
    private const float TickLength = 6f;
    private const float LeaderHeight = 9f;
    private const float Margin = 4f;

    internal LineLabels(IReadOnlyList<LineMark> marks)
        : base("")
    {
        LineMark[] sorted = [.. marks];
        Array.Sort(sorted, static (a, b) => a.WavelengthAngstrom.CompareTo(b.WavelengthAngstrom));
        Marks = sorted;
    }

    /// <summary>The lines in order of wavelength.</summary>
    internal IReadOnlyList<LineMark> Marks { get; }

    internal override bool UsesBand => true;

    internal override float BandHeight(DataRange x, SKRect frame, float textSize)
    {
        using SKFont font = FigureText.Font(textSize * RelativeSize);
        double[] places = Places(x, frame, font);
        float longest = 0f;
        for (int i = 0; i < places.Length; i++)
        {
            if (double.IsFinite(places[i]))
            {
                longest = Math.Max(longest, font.MeasureText(Marks[i].Label));
            }
        }

        return longest == 0f ? 0f : longest + TickLength + LeaderHeight + (2f * Margin) + FrameTicks.Major;
    }

    /// <summary>Where the middles of the names lie across the canvas; NaN for a line without.</summary>
    internal double[] Places(DataRange x, SKRect frame, SKFont font)
    {
        var wanted = new double[Marks.Count];
        var strengths = new double[Marks.Count];
        double scale = frame.Width / x.Length;
        for (int i = 0; i < wanted.Length; i++)
        {
            wanted[i] = frame.Left + ((Marks[i].WavelengthAngstrom - x.Minimum) * scale);
            strengths[i] = Marks[i].Strength;
        }

        double edge = 0.5 * Spacing * font.Size;
        return LabelPlacement.Place(
            wanted, strengths, Spacing * font.Size, frame.Left + edge, frame.Right - edge, Farthest * font.Size);
    }

    internal override void Draw(PanelCanvas panel)
    {
        using SKFont font = panel.Font(RelativeSize);
        double[] places = Places(panel.XRange, panel.Frame, font);
        float band = BandHeight(panel.XRange, panel.Frame, panel.TextSize);
        float tickBottom = panel.Frame.Top + Math.Max(band - Margin, TickLength + Margin);
        float tickTop = tickBottom - TickLength;
        using SKPaint absorption = new Pen(Ink.Axis, 0.8f).Paint(panel.Palette);
        using SKPaint emission = new Pen(Ink.Second, 1.1f).Paint(panel.Palette);
        for (int i = 0; i < places.Length; i++)
        {
            if (!panel.XRange.Contains(Marks[i].WavelengthAngstrom))
            {
                continue;
            }

            SKPaint paint = Marks[i].IsEmission ? emission : absorption;
            float x = panel.X(Marks[i].WavelengthAngstrom);
            panel.Canvas.DrawLine(x, tickBottom, x, tickTop, paint);
            if (double.IsFinite(places[i]))
            {
                var place = (float)places[i];
                panel.Canvas.DrawLine(x, tickTop, place, tickTop - LeaderHeight, paint);
                FigureText.DrawUpwards(
                    panel.Canvas, Marks[i].Label, place, tickTop - LeaderHeight - Margin, SKTextAlign.Left, font, paint.Color);
            }
        }
    }
}
