using System;
using System.Buffers.Binary;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using System.Xml.Linq;
using SkiaSharp;
using Xunit;

namespace StarLines.Plotting.Tests;

public sealed class FigureTests
{
    private static readonly FigureOptions Small = new() { WidthPixels = 640, HeightPixels = 360, DotsPerInch = 96 };

    [Fact]
    public void The_same_data_give_the_same_bytes()
    {
        foreach ((Figure first, Figure second) in Everything().Zip(Everything()))
        {
            Assert.Equal(first.ToPng(Small), second.ToPng(Small));
            Assert.Equal(first.ToSvg(Small), second.ToSvg(Small));
        }
    }

    [Fact]
    public void Threads_at_once_give_the_same_bytes()
    {
        List<Figure> figures = Everything();
        List<byte[]> expected = [.. figures.Select(figure => figure.ToPng(Small))];
        var drawn = new byte[24][];
        Parallel.For(0, drawn.Length, i => drawn[i] = figures[i % figures.Count].ToPng(Small));
        for (int i = 0; i < drawn.Length; i++)
        {
            Assert.Equal(expected[i % figures.Count], drawn[i]);
        }
    }

    [Fact]
    public void The_culture_does_not_matter()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        string expected = SpectrumFigure.Create(Samples.Spectrum()).ToSvg(Small);
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Assert.Equal(expected, SpectrumFigure.Create(Samples.Spectrum()).ToSvg(Small));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void A_png_has_the_pixels_and_tells_the_density_asked_for()
    {
        byte[] png = SpectrumFigure.Create(Samples.Spectrum()).ToPng(new FigureOptions { WidthPixels = 700, HeightPixels = 500, DotsPerInch = 300 });
        using SKBitmap bitmap = SKBitmap.Decode(png);
        Assert.Equal((700, 500), (bitmap.Width, bitmap.Height));
        Assert.Equal("pHYs"u8.ToArray(), png[37..41]);
        Assert.Equal(11811u, BinaryPrimitives.ReadUInt32BigEndian(png.AsSpan(41)));
    }

    [Fact]
    public void An_svg_is_xml_of_the_printed_size_with_its_labels_as_text()
    {
        var options = new FigureOptions { WidthPixels = 1600, HeightPixels = 800, DotsPerInch = 200 };
        var svg = XDocument.Parse(SpectrumFigure.Create(Samples.Spectrum()).ToSvg(options));
        Assert.Equal(("768", "384"), (svg.Root!.Attribute("width")!.Value, svg.Root.Attribute("height")!.Value));
        Assert.SkipWhen(FigureFonts.Status == FigureFontStatus.None, "There is no font, so there is no text.");
        List<string> texts = [.. svg.Descendants().Where(e => e.Name.LocalName == "text").Select(e => e.Value.Trim())];
        Assert.Contains("Wavelength in air, barycentric (Å)", texts);
        Assert.Contains("Flux (arbitrary unit)", texts);
        Assert.Contains("5100", texts);
        Assert.Contains(texts, text => text.StartsWith(Samples.Target, StringComparison.Ordinal));
    }

    [Fact]
    public void Without_a_height_more_panels_make_a_higher_figure()
    {
        Spectrum spectrum = Samples.Spectrum();
        using SKBitmap one = SKBitmap.Decode(SpectrumFigure.Create(spectrum).ToPng());
        using SKBitmap four = SKBitmap.Decode(SpectrumFigure.Create(spectrum, view: new SpectrumView { Strips = 4 }).ToPng());
        Assert.Equal((1600, 900), (one.Width, one.Height));
        Assert.True(four.Height > 1.5 * one.Height);
    }

    [Fact]
    public void The_dark_theme_has_a_dark_ground()
    {
        using SKBitmap light = SKBitmap.Decode(SpectrumFigure.Create(Samples.Spectrum()).ToPng(Small));
        using SKBitmap dark = SKBitmap.Decode(SpectrumFigure.Create(Samples.Spectrum()).ToPng(Small with { Theme = FigureTheme.Dark }));
        Assert.Equal(SKColors.White, light.GetPixel(1, 1));
        Assert.True(dark.GetPixel(1, 1).Red < 40);
    }

    [Fact]
    public void No_spike_is_lost_among_300000_pixels()
    {
        const int count = 300_000;
        const int spike = 123_456;
        var flux = new double[count];
        Array.Fill(flux, 1.0);
        flux[spike] = 1.3;
        flux[spike + 40_000] = 0.7;
        var spectrum = new Spectrum(WavelengthScale.Linear(4000, 0.01, count, Medium.Air), flux);
        byte[] with = SpectrumFigure.Create(spectrum).ToPng(Small);
        flux[spike] = 1.0;
        byte[] without = SpectrumFigure.Create(new Spectrum(spectrum.Scale, flux)).ToPng(Small);
        Assert.NotEqual(with, without);
        using SKBitmap bitmap = SKBitmap.Decode(with);
        Assert.Contains(Enumerable.Range(0, bitmap.Width), x => IsInkColumn(bitmap, x, 40, 100) && x is > 250 and < 350);
    }

    [Fact]
    public void A_heading_can_be_given_or_left_out()
    {
        Assert.SkipWhen(FigureFonts.Status == FigureFontStatus.None, "There is no font, so there is no text.");
        Figure figure = SpectrumFigure.Create(Samples.Spectrum());
        Assert.Contains("Another star", figure.ToSvg(Small with { Title = "Another star" }), StringComparison.Ordinal);
        Assert.DoesNotContain(Samples.Target, figure.ToSvg(Small with { Title = "" }), StringComparison.Ordinal);
    }

    [Fact]
    public void Options_out_of_range_are_refused()
    {
        Figure figure = SpectrumFigure.Create(Samples.Spectrum());
        Assert.Throws<ArgumentOutOfRangeException>(() => figure.ToPng(new FigureOptions { WidthPixels = 10 }));
        Assert.Throws<ArgumentOutOfRangeException>(() => figure.ToPng(new FigureOptions { HeightPixels = 50_000 }));
        Assert.Throws<ArgumentOutOfRangeException>(() => figure.ToSvg(new FigureOptions { DotsPerInch = 1 }));
        Assert.Throws<ArgumentOutOfRangeException>(() => figure.ToSvg(new FigureOptions { TextSizePoints = double.NaN }));
    }

    [Fact]
    public void The_extension_chooses_the_format()
    {
        Assert.Equal(FigureFormat.Png, FigureFormats.FromPath("a/b.PNG"));
        Assert.Equal(FigureFormat.Svg, FigureFormats.FromPath("b.svg"));
        ArgumentException error = Assert.Throws<ArgumentException>(() => FigureFormats.FromPath("b.pdf"));
        Assert.Contains(".png or .svg", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Saving_writes_the_format_asked_for()
    {
        Figure figure = SpectrumFigure.Create(Samples.Spectrum());
        using var png = new MemoryStream();
        using var svg = new MemoryStream();
        figure.Save(png, FigureFormat.Png, Small);
        figure.Save(svg, FigureFormat.Svg, Small);
        Assert.Equal(figure.ToPng(Small), png.ToArray());
        Assert.Equal(figure.ToSvg(Small), System.Text.Encoding.UTF8.GetString(svg.ToArray()));
    }

    [Fact]
    public void The_embedded_font_comes_with_its_licence()
    {
        Assert.SkipUnless(FigureFonts.Status == FigureFontStatus.Embedded, "The build had no npm, so no font is embedded.");
        Assert.Equal("DejaVu Sans", FigureFonts.Family);
        Assert.Contains("Bitstream", FigureFonts.LicenceNotice, StringComparison.Ordinal);
        Assert.Null(FigureFonts.Problem);
    }

    private static bool IsInkColumn(SKBitmap bitmap, int x, int top, int bottom) =>
        Enumerable.Range(top, bottom - top).Count(y => bitmap.GetPixel(x, y).Red < 140) > 0.8 * (bottom - top);

    private static List<Figure> Everything()
    {
        Spectrum spectrum = Samples.Spectrum(change: static (_, faults) => faults.AsSpan(700, 60).Fill(PixelFaults.Flagged));
        Continuum.ContinuumFit continuum = Samples.Continuum(spectrum.Count, 1.0, 300, 80);
        double[] x = [5000, 5000.1, 5000.2, 5000.3];
        return
        [
            SpectrumFigure.Create(spectrum, continuum),
            NormalizedFigure.Create(spectrum, continuum, Samples.Marks(50, 1)),
            LineFigure.Create([new LinePanel("Xy I", x, [1, 0.8, 0.82, 1], [0.1, 0.1, 0.1, 0.1], [1, 0.81, 0.81, 1])]),
            CorrelationFigure.Create([new CorrelationCurve("metal", x, [0, 0.5, 0.4, 0]) { PeakKmPerS = new Measured(5000.12, 0.01) }]),
        ];
    }
}
