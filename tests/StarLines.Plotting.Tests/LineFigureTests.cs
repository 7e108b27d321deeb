using System;
using System.Collections.Generic;
using System.Linq;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests;

public sealed class LineFigureTests
{
    [Fact]
    public void Residuals_are_in_standard_deviations()
    {
        var panel = new LinePanel("Xy I", [5000, 5000.1, 5000.2, 5000.3], [1.0, 0.8, 0.9, 1.1], [0.02, 0.02, 0.05, 0.02], [1.0, 0.84, 0.8, double.NaN]);
        Figure figure = LineFigure.Create([panel]);
        ErrorPoints residuals = figure.Content.Cells[0].Panels[1].Items.OfType<ErrorPoints>().Single();
        Assert.Equal(0.0, residuals.Y[0], 9);
        Assert.Equal(-2.0, residuals.Y[1], 9);
        Assert.Equal(2.0, residuals.Y[2], 9);
        Assert.True(double.IsNaN(residuals.Y[3]));
    }

    [Fact]
    public void A_panel_shows_data_model_continuum_and_notes()
    {
        LinePanel line = Invented("Xy I 5000.10");
        Panel panel = LineFigure.Create([line], "star", "Wavelength in air (Å)").Content.Cells[0].Panels[0];
        Assert.Equal(line.Flux.ToArray(), panel.Items.OfType<ErrorPoints>().Single().Y);
        Assert.Equal(line.Model.ToArray(), panel.Items.OfType<Trace>().Single(trace => trace.Name == "model").Y);
        Rule continuum = panel.Items.OfType<Rule>().Single(rule => rule.Name == "continuum");
        Assert.Equal((1.01, 0.004), (continuum.Value, continuum.Sigma));
        Assert.Equal(["Xy I 5000.10", "EW = 12.0 ± 1.0 mÅ"], panel.Items.OfType<Note>().Single().Lines);
        Assert.All(line.Flux.ToArray(), value => Assert.True(panel.Y.Contains(value)));
    }

    [Fact]
    public void Only_the_lowest_panels_of_a_grid_have_the_wavelength_label()
    {
        Figure figure = LineFigure.Create([.. Enumerable.Range(0, 5).Select(i => Invented($"line {i}"))], "star", "λ");
        Assert.Equal(3, figure.Content.Columns);
        Assert.Equal(["", "", "λ", "λ", "λ"], figure.Content.Cells.Select(cell => cell.Panels[^1].XLabel));
    }

    [Fact]
    public void Many_lines_fill_pages()
    {
        List<LinePanel> lines = [.. Enumerable.Range(0, 30).Select(i => Invented($"line {i}"))];
        IReadOnlyList<Figure> pages = LineFigure.Pages(lines, "star", panelsPerPage: 12);
        Assert.Equal([12, 12, 6], pages.Select(page => page.Content.Cells.Count));
        Assert.Equal("star  (2 of 3)", pages[1].Title);
        Assert.Empty(LineFigure.Pages([]));
    }

    [Fact]
    public void A_figure_of_no_lines_or_too_many_is_refused()
    {
        Assert.Throws<ArgumentException>(() => LineFigure.Create([]));
        Assert.Throws<ArgumentException>(() => LineFigure.Create([.. Enumerable.Repeat(Invented("x"), 61)]));
    }

    [Fact]
    public void Measured_lines_become_panels_of_their_windows()
    {
        Spectrum spectrum = Samples.Spectrum(change: static (_, faults) => faults[452] = PixelFaults.Outlier);
        LineMeasurementSet set = Measure(spectrum, out Continuum.ContinuumFit continuum);
        IReadOnlyList<LinePanel> panels = LinePanel.FromMeasurements(spectrum, continuum, set);
        Assert.Equal(set.Lines.Count(line => line.Status == LineStatus.Measured), panels.Count);
        LinePanel panel = panels.Single(p => p.Title == "Xy I 5112.50");
        LineWindow window = set.Windows[1];
        Assert.Equal(window.PixelCount - 1, panel.Used.ToArray().Count(used => used));
        Assert.True(panel.WavelengthsAngstrom.Length > window.PixelCount);
        int pixel = Array.IndexOf(panel.WavelengthsAngstrom.ToArray(), spectrum.Scale.WavelengthsAngstrom[450]);
        Assert.Equal(spectrum.Flux[450], panel.Flux[pixel], 12);
        Assert.Equal(set.Model[450] * window.LocalContinuum, panel.Model[pixel], 12);
        Assert.True(double.IsNaN(panel.Model[0]));
        Assert.StartsWith("EW = ", panel.Notes[0], StringComparison.Ordinal);
    }

    [Fact]
    public void The_strongest_lines_are_kept_in_the_order_of_the_list()
    {
        Spectrum spectrum = Samples.Spectrum(change: static (flux, _) =>
        {
            for (int i = 400; i < 500; i++)
            {
                flux[i] = 1 - (0.4 * (1 - flux[i]));
            }
        });
        LineMeasurementSet set = Measure(spectrum, out Continuum.ContinuumFit continuum);
        Assert.Equal(
            ["Xy I 5012.50", "Xy I 5212.50"],
            LinePanel.FromMeasurements(spectrum, continuum, set, strongest: 2).Select(panel => panel.Title));
    }

    private static LineMeasurementSet Measure(Spectrum spectrum, out Continuum.ContinuumFit continuum)
    {
        continuum = Samples.Continuum(spectrum.Count);
        RestLine[] lines = [.. ((double[])[5012.5, 5112.5, 5212.5]).Select(w => new RestLine
        {
            Name = FormattableString.Invariant($"Xy I {w:F2}"),
            Species = "Xy I",
            WavelengthAngstrom = w,
            FwhmAngstrom = 2.35,
        })];
        return LineMeasurer.Measure(spectrum, continuum, new LineList("invented", Medium.Air, lines), new LineMeasureOptions());
    }

    private static LinePanel Invented(string name)
    {
        double[] x = [.. Enumerable.Range(0, 21).Select(i => 5000 + (0.05 * i))];
        double[] model = [.. x.Select(w => 1.01 * (1 - (0.3 * Math.Exp(-Math.Pow((w - 5000.5) / 0.1, 2)))))];
        double[] flux = [.. model.Select((m, i) => m + (0.01 * (i % 3 - 1)))];
        return new LinePanel(name, x, flux, [.. Enumerable.Repeat(0.01, 21)], model)
        {
            CentreAngstrom = 5000.5,
            LocalContinuum = 1.01,
            ContinuumSigma = 0.004,
            Notes = ["EW = 12.0 ± 1.0 mÅ"],
        };
    }
}
