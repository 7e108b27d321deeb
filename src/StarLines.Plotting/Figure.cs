using System;
using System.IO;
using System.Text;
using SkiaSharp;
using StarLines.Plotting.Drawing;

namespace StarLines.Plotting;

/// <summary>
/// A figure ready to be drawn, in any size and either theme; made by <see cref="SpectrumFigure"/>, <see cref="NormalizedFigure"/>,
/// <see cref="LineFigure"/> and <see cref="CorrelationFigure"/>. The same figure with the same options gives the same bytes.
/// Immutable; several threads may draw it at once.
/// </summary>
public sealed class Figure
{
    /// <summary>Units of the figure an inch.</summary>
    private const float UnitsPerInch = 96f;

    /// <summary>Units of the figure a point.</summary>
    private const double UnitsPerPoint = 96.0 / 72.0;

    private const double SmallestHeightToWidth = 0.1;

    /// <summary>Compression of PNG: half the time of the usual level 6 for files 6 per cent larger.</summary>
    private const int PngLevel = 4;

    internal Figure(FigureContent content) => Content = content;

    internal FigureContent Content { get; }

    /// <summary>The heading.</summary>
    public string Title => Content.Title;

    /// <summary>Writes the figure in a format.</summary>
    /// <param name="stream">Receives the file; left open.</param>
    /// <param name="format">PNG or SVG.</param>
    /// <param name="options">How it is drawn.</param>
    /// <exception cref="ArgumentOutOfRangeException">An option is out of range.</exception>
    public void Save(Stream stream, FigureFormat format, FigureOptions? options = null)
    {
        if (format == FigureFormat.Svg)
        {
            ArgumentNullException.ThrowIfNull(stream);
            stream.Write(Encoding.UTF8.GetBytes(ToSvg(options)));
        }
        else
        {
            SavePng(stream, options);
        }
    }

    /// <summary>Writes the figure as PNG; the file tells its dots an inch.</summary>
    /// <param name="stream">Receives the file; left open.</param>
    /// <param name="options">How it is drawn.</param>
    /// <exception cref="ArgumentOutOfRangeException">An option is out of range.</exception>
    public void SavePng(Stream stream, FigureOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(stream);
        stream.Write(ToPng(options));
    }

    /// <summary>The figure as the bytes of a PNG file; the file tells its dots an inch.</summary>
    /// <param name="options">How it is drawn.</param>
    /// <exception cref="ArgumentOutOfRangeException">An option is out of range.</exception>
    public byte[] ToPng(FigureOptions? options = null)
    {
        options = (options ?? new FigureOptions()).Checked();
        int height = Height(options);
        using SKSurface surface = SKSurface.Create(new SKImageInfo(options.WidthPixels, height, SKColorType.Rgba8888, SKAlphaType.Opaque));
        surface.Canvas.Scale(options.DotsPerInch / UnitsPerInch);
        Paint(surface.Canvas, options, height);
        using SKPixmap pixels = surface.PeekPixels();
        using SKData data = pixels.Encode(new SKPngEncoderOptions(SKPngEncoderFilterFlags.Up, PngLevel))
            ?? throw new InvalidOperationException("The image could not be encoded.");
        return PngDensity.Insert(data.AsSpan(), options.DotsPerInch);
    }

    /// <summary>The figure as an SVG document.</summary>
    /// <param name="options">How it is drawn; the document has the printed size that pixels and dots an inch give.</param>
    /// <exception cref="ArgumentOutOfRangeException">An option is out of range.</exception>
    public string ToSvg(FigureOptions? options = null)
    {
        options = (options ?? new FigureOptions()).Checked();
        int height = Height(options);
        float unit = UnitsPerInch / options.DotsPerInch;
        using var stream = new MemoryStream();
        using (SKCanvas canvas = SKSvgCanvas.Create(new SKRect(0, 0, options.WidthPixels * unit, height * unit), stream))
        {
            Paint(canvas, options, height);
        }

        return SvgText.Finish(Encoding.UTF8.GetString(stream.GetBuffer(), 0, (int)stream.Length));
    }

    private int Height(FigureOptions options) =>
        options.HeightPixels
        ?? (int)Math.Clamp(Math.Round(options.WidthPixels * Math.Max(SmallestHeightToWidth, Content.HeightToWidth)), 150, 20_000);

    private void Paint(SKCanvas canvas, FigureOptions options, int heightPixels)
    {
        float unit = UnitsPerInch / options.DotsPerInch;
        var painter = new FigurePainter(
            canvas, Palette.Of(options.Theme), (float)(options.TextSizePoints * UnitsPerPoint), 1f / unit);
        painter.Paint(Content, options.Title ?? Content.Title, options.WidthPixels * unit, heightPixels * unit);
    }
}
