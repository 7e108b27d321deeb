using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Text on the canvas.</summary>
internal static class FigureText
{
    internal static SKFont Font(float size) => new(FigureFonts.Typeface, size)
    {
        Edging = SKFontEdging.Antialias,
        Hinting = SKFontHinting.Normal,
        Subpixel = true,
    };

    /// <summary>Draws text whose baseline starts, has its middle or ends at a point.</summary>
    internal static void Draw(
        SKCanvas canvas, string text, float x, float y, SKTextAlign align, SKFont font, SKColor colour)
    {
        if (text.Length == 0)
        {
            return;
        }

        using var paint = new SKPaint { Color = colour, IsAntialias = true };
        canvas.DrawText(text, x, y, align, font, paint);
    }

    /// <summary>Draws text that reads upwards; its middle height lies at <paramref name="x"/>.</summary>
    internal static void DrawUpwards(
        SKCanvas canvas, string text, float x, float y, SKTextAlign align, SKFont font, SKColor colour)
    {
        canvas.Save();
        canvas.Translate(x, y);
        canvas.RotateDegrees(-90);
        Draw(canvas, text, 0, 0.36f * font.Size, align, font, colour);
        canvas.Restore();
    }
}
