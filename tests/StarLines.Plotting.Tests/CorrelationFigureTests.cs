using System;
using System.Linq;
using StarLines.Plotting.Drawing;
using StarLines.Templates;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Plotting.Tests;

public sealed class CorrelationFigureTests
{
    [Fact]
    public void A_row_shows_the_whole_range_and_the_peak()
    {
        CorrelationCurve curve = Curve(-42.5, 0.12);
        Figure figure = CorrelationFigure.Create([curve], "star");
        Panel whole = figure.Content.Cells[0].Panels.Single();
        Panel peak = figure.Content.Cells[1].Panels.Single();
        Assert.Equal(new DataRange(-500, 500), whole.X);
        Assert.Equal(-42.5, 0.5 * (peak.X.Minimum + peak.X.Maximum), 9);
        Assert.Equal(curve.Correlation.ToArray(), whole.Items.OfType<Trace>().Single().Y);
        Assert.Equal(["metal"], whole.Items.OfType<Note>().Single().Lines);
        Rule rule = peak.Items.OfType<Rule>().Single(item => item.Vertical);
        Assert.Equal((-42.5, 0.12), (rule.Value, rule.Sigma));
        Assert.Equal("peak −42.50 ± 0.12 km s⁻¹", peak.Items.OfType<Note>().Single().Lines[0]);
    }

    [Fact]
    public void Without_a_peak_it_says_so()
    {
        var curve = new CorrelationCurve("balmer", [-1, 0, 1], [0.01, 0.02, 0.0]);
        Figure figure = CorrelationFigure.Create([curve]);
        Assert.Equal("no peak", figure.Content.Cells[1].Panels[0].Items.OfType<Note>().Single().Lines[0]);
        Assert.NotEmpty(figure.ToPng());
    }

    [Fact]
    public void A_peak_near_the_end_keeps_the_surroundings_within_the_range()
    {
        Panel peak = CorrelationFigure.Create([Curve(490, 1)]).Content.Cells[1].Panels[0];
        Assert.True(peak.X.Maximum <= 500 && peak.X.Contains(490));
    }

    [Fact]
    public void A_measured_velocity_becomes_a_curve_with_its_peak()
    {
        Spectrum spectrum = Samples.Spectrum();
        TemplateLine[] lines = [.. Enumerable.Range(0, 20).Select(i => new TemplateLine
        {
            Name = $"Xy I {i}",
            WavelengthAngstrom = 5012.5 + (25 * i),
            Depth = 0.5,
            FwhmAngstrom = 2.35,
        })];
        LineTemplate template = LineTemplate.FromLines("comb", Medium.Air, lines, widthsKnown: true);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, Samples.Continuum(spectrum.Count), template);
        Figure figure = CorrelationFigure.FromResults(spectrum, [result])!;
        Panel peak = figure.Content.Cells[1].Panels[0];
        Assert.Equal("Velocity, barycentric (km s⁻¹)", peak.XLabel);
        Assert.Equal(result.PeakKmPerS.Value, peak.Items.OfType<Rule>().First(rule => rule.Vertical).Value);
        Assert.Equal(result.Correlation.ToArray(), figure.Content.Cells[0].Panels[0].Items.OfType<Trace>().Single().Y);
        Assert.Equal("Lyra 2207 B  ·  Comb", figure.Title);
        Assert.Null(CorrelationFigure.FromResults(spectrum, []));
    }

    [Fact]
    public void Curves_that_do_not_fit_are_refused()
    {
        Assert.Throws<ArgumentException>(() => new CorrelationCurve("x", [1], [1]));
        Assert.Throws<ArgumentException>(() => new CorrelationCurve("x", [1, 2], [1]));
        Assert.Throws<ArgumentException>(() => CorrelationFigure.Create([]));
    }

    private static CorrelationCurve Curve(double velocity, double error)
    {
        double[] x = [.. Enumerable.Range(0, 1001).Select(i => -500.0 + i)];
        double[] y = [.. x.Select(v => 0.6 * Math.Exp(-Math.Pow((v - velocity) / 12, 2)))];
        return new CorrelationCurve("metal", x, y) { PeakKmPerS = new Measured(velocity, error), PeakFwhmKmPerS = 20 };
    }
}
