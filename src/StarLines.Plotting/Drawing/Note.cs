using System;
using System.Collections.Generic;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>A corner of a panel.</summary>
internal enum Corner
{
    /// <summary>Upper left.</summary>
    TopLeft,

    /// <summary>Upper right.</summary>
    TopRight,

    /// <summary>Lower left.</summary>
    BottomLeft,

    /// <summary>Lower right.</summary>
    BottomRight,
}

/// <summary>Lines of text in a corner of a panel, on a ground that keeps them readable.</summary>
internal sealed class Note(Corner corner, IReadOnlyList<string> lines, float relativeSize = 0.9f, Ink ink = Ink.Axis) : PanelItem("")
{
    private const float Margin = 6f;
    private const float LineHeight = 1.3f;

    internal IReadOnlyList<string> Lines { get; } = lines;

    internal Corner Corner { get; } = corner;

    internal override bool UsesBand => true;

    internal override float BandHeight(DataRange x, SKRect frame, float textSize) =>
        Corner is Corner.TopLeft or Corner.TopRight ? (Lines.Count * LineHeight * relativeSize * textSize) + Margin : 0f;

    internal override void Draw(PanelCanvas panel)
    {
        using SKFont font = Fitting(panel);
        bool right = Corner is Corner.TopRight or Corner.BottomRight;
        bool bottom = Corner is Corner.BottomLeft or Corner.BottomRight;
        float step = LineHeight * font.Size;
        float widest = 0f;
        foreach (string line in Lines)
        {
            widest = Math.Max(widest, font.MeasureText(line));
        }

        float x = right ? panel.Frame.Right - Margin : panel.Frame.Left + Margin;
        float top = bottom ? panel.Frame.Bottom - Margin - (step * Lines.Count) : panel.Frame.Top + Margin;
        float left = right ? x - widest : x;
        using SKPaint ground = new() { Color = panel.Palette.Background.WithAlpha(215), IsAntialias = true };
        panel.Canvas.DrawRect(new SKRect(left - 2, top - 1, left + widest + 2, top + (step * Lines.Count)), ground);
        for (int i = 0; i < Lines.Count; i++)
        {
            FigureText.Draw(
                panel.Canvas, Lines[i], x, top + (step * i) + (0.95f * font.Size), right ? SKTextAlign.Right : SKTextAlign.Left, font, panel.Palette[ink]);
        }
    }

    /// <summary>The font, smaller where the widest line would not fit.</summary>
    private SKFont Fitting(PanelCanvas panel)
    {
        SKFont font = panel.Font(relativeSize);
        float room = panel.Frame.Width - (2 * Margin);
        foreach (string line in Lines)
        {
            float width = font.MeasureText(line);
            if (width > room)
            {
                font.Size *= room / width;
            }
        }

        return font;
    }
}
