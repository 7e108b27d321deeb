using System;
using System.Collections.Generic;
using System.Linq;
using SkiaSharp;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests;

public sealed class NormalizedFigureTests
{
    [Fact]
    public void The_flux_is_divided_by_the_continuum()
    {
        Spectrum spectrum = Samples.Spectrum(level: 40);
        Panel panel = SpectrumFigureTests.OnlyPanel(NormalizedFigure.Create(spectrum, Samples.Continuum(spectrum.Count, 40)));
        Trace trace = panel.Items.OfType<Trace>().Single(item => item.Name == "normalized flux");
        Assert.Equal(spectrum.Flux[77] / 40, trace.Y[77], 12);
        Assert.Equal("Normalized flux", panel.YLabel);
        Assert.True(panel.Y.Contains(1.0) && panel.Y.Contains(0.5));
    }

    [Fact]
    public void Lines_outside_the_range_are_not_marked()
    {
        Spectrum spectrum = Samples.Spectrum();
        var lines = new List<LineMark> { new("inside", 5100, 1), new("outside", 5400, 1) };
        var view = new SpectrumView { Range = new WavelengthRange(5050, 5200) };
        Panel panel = SpectrumFigureTests.OnlyPanel(
            NormalizedFigure.Create(spectrum, Samples.Continuum(spectrum.Count), lines, view));
        Assert.Equal(["inside"], panel.Items.OfType<LineLabels>().Single().Marks.Select(mark => mark.Label));
    }

    [Fact]
    public void Names_never_overlap_whatever_their_number()
    {
        Spectrum spectrum = Samples.Spectrum();
        foreach (int count in (int[])[1, 2, 10, 60, 300, 2000])
        {
            Figure figure = NormalizedFigure.Create(spectrum, Samples.Continuum(spectrum.Count), Samples.Marks(count, count));
            PlacedPanel placed = new PanelLayout(figure.Content, new SKRect(8, 30, 760, 430), 12).Place().Single();
            LineLabels labels = placed.Panel.Items.OfType<LineLabels>().Single();
            using SKFont font = FigureText.Font(12 * 0.82f);
            double[] shown = [.. labels.Places(placed.Panel.X, placed.Frame, font).Where(double.IsFinite)];
            Assert.NotEmpty(shown);
            Assert.All(shown.Zip(shown.Skip(1)), pair => Assert.True(pair.Second - pair.First >= font.Size));
            Assert.All(shown, place => Assert.InRange(place, placed.Frame.Left, placed.Frame.Right));
        }
    }

    [Fact]
    public void Names_stand_in_a_band_that_the_data_do_not_reach()
    {
        Assert.SkipWhen(FigureFonts.Status == FigureFontStatus.None, "There is no font, so names have no length.");
        Spectrum spectrum = Samples.Spectrum();
        Figure figure = NormalizedFigure.Create(spectrum, Samples.Continuum(spectrum.Count), Samples.Marks(30, 4));
        PlacedPanel placed = new PanelLayout(figure.Content, new SKRect(8, 30, 760, 430), 12).Place().Single();
        using SKFont font = FigureText.Font(12 * 0.82f);
        Assert.True(placed.Band > font.MeasureText("Xy I 5123.45"));
        double topOfData = placed.Frame.Bottom
            - ((placed.Panel.Y.Maximum - placed.YAxis.Minimum) / placed.YAxis.Length * placed.Frame.Height);
        Assert.Equal(placed.Frame.Top + placed.Band, topOfData, 2);
        Assert.All(placed.YTicks.All, tick => Assert.True(tick.Position <= placed.Panel.Y.Maximum));
    }

    [Fact]
    public void Measured_lines_become_marks_and_limits_do_not()
    {
        IReadOnlyList<LineMark> marks = LineMark.FromMeasurements(
        [
            Line("H-alpha", Lines.LineStatus.Measured, -900),
            Line("Fe I 6065.48", Lines.LineStatus.Measured, 80),
            Line("Fe I 6096.66", Lines.LineStatus.Limit, 2),
        ]);
        Assert.Equal(["Hα", "Fe I 6065.48"], marks.Select(mark => mark.Label));
        Assert.Equal([true, false], marks.Select(mark => mark.IsEmission));
        Assert.Equal([900.0, 80.0], marks.Select(mark => mark.Strength));
    }

    [Fact]
    public void A_mark_needs_a_name_and_a_place()
    {
        Assert.ThrowsAny<ArgumentException>(() => new LineMark(" ", 5000, 1));
        Assert.ThrowsAny<ArgumentException>(() => new LineMark("Hα", double.NaN, 1));
    }

    private static Lines.LineMeasurement Line(string name, Lines.LineStatus status, double width) => new()
    {
        Line = name,
        Species = name.Split(' ')[0],
        RestWavelengthAngstrom = 6000,
        Medium = Medium.Air,
        Status = status,
        CentreAngstrom = new Measured(6000, 0.01),
        EquivalentWidthMilliangstrom = new Measured(width, 1),
    };
}
