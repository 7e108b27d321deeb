using System;
using System.Linq;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests;

public sealed class SpectrumFigureTests
{
    [Fact]
    public void The_flux_is_drawn_as_it_is_and_masked_pixels_leave_a_gap()
    {
        Spectrum spectrum = Samples.Spectrum(change: static (flux, faults) =>
        {
            faults[500] = PixelFaults.Outlier;
            flux[600] = double.NaN;
        });
        Panel panel = OnlyPanel(SpectrumFigure.Create(spectrum));
        Trace flux = panel.Items.OfType<Trace>().Single(trace => trace.Name == "flux");
        Assert.Equal(spectrum.Flux.ToArray(), flux.Y);
        Assert.Equal(spectrum.Scale.WavelengthsAngstrom.ToArray(), flux.X);
        Assert.Equal([500, 600], Enumerable.Range(0, spectrum.Count).Where(i => !flux.IsShown(i)));
        Assert.Equal(2, panel.Items.OfType<MaskedRanges>().Single().Ranges.Count);
    }

    [Fact]
    public void Masked_pixels_are_shown_faded_but_missing_ones_are_not()
    {
        Spectrum spectrum = Samples.Spectrum(change: static (flux, faults) =>
        {
            faults[500] = PixelFaults.Flagged;
            flux[600] = double.NaN;
        });
        Trace faded = OnlyPanel(SpectrumFigure.Create(spectrum)).Items.OfType<Trace>().First(trace => trace.Pen.Ink == Ink.Faded);
        Assert.Equal([499, 500, 501], Enumerable.Range(0, spectrum.Count).Where(faded.IsShown));
    }

    [Fact]
    public void The_continuum_has_a_band_of_one_standard_deviation_and_is_dashed_where_uncertain()
    {
        Spectrum spectrum = Samples.Spectrum();
        Panel panel = OnlyPanel(SpectrumFigure.Create(spectrum, Samples.Continuum(spectrum.Count, 1.0, 100, 50)));
        Band band = panel.Items.OfType<Band>().Single();
        Assert.All(band.High.Zip(band.Low), pair => Assert.Equal(0.02, pair.First - pair.Second, 12));
        Trace uncertain = panel.Items.OfType<Trace>().Single(trace => trace.Name == "uncertain");
        Assert.Equal(Dash.Dashed, uncertain.Pen.Dash);
        Assert.True(uncertain.IsShown(120));
        Assert.False(uncertain.IsShown(400));
        Trace sure = panel.Items.OfType<Trace>().Single(trace => trace.Name == "continuum");
        Assert.False(sure.IsShown(120));
    }

    [Fact]
    public void The_axes_tell_units_medium_and_frame()
    {
        Spectrum spectrum = Samples.Spectrum(level: 2e-14, unit: "erg/cm2/s/A", medium: Medium.Vacuum, frame: VelocityFrame.Heliocentric);
        Panel panel = OnlyPanel(SpectrumFigure.Create(spectrum));
        Assert.Equal("Wavelength in vacuum, heliocentric (Å)", panel.XLabel);
        Assert.Equal("Flux (10⁻¹⁴ erg cm⁻² s⁻¹ Å⁻¹)", panel.YLabel);
        Assert.Equal(-14, panel.YExponent);
        Assert.Equal(new DataRange(5000, 5499.75), panel.X);
    }

    [Fact]
    public void The_heading_names_target_and_instrument() =>
        Assert.Equal("Lyra 2207 B  ·  Comb", SpectrumFigure.Create(Samples.Spectrum()).Title);

    [Fact]
    public void Strips_share_the_range_between_them()
    {
        var view = new SpectrumView { Range = new WavelengthRange(5100, 5300), Strips = 2 };
        Figure figure = SpectrumFigure.Create(Samples.Spectrum(), view: view);
        Assert.Equal(
            [new DataRange(5100, 5200), new DataRange(5200, 5300)],
            figure.Content.Cells.Select(cell => cell.Panels.Single().X));
        Assert.Equal(["", "Wavelength in air, barycentric (Å)"], figure.Content.Cells.Select(cell => cell.Panels[0].XLabel));
    }

    [Fact]
    public void A_range_without_pixels_is_refused_with_what_there_is()
    {
        var view = new SpectrumView { Range = new WavelengthRange(7000, 7100) };
        ArgumentException error = Assert.Throws<ArgumentException>(() => SpectrumFigure.Create(Samples.Spectrum(), view: view));
        Assert.Contains("5000.00:5499.75", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_continuum_of_another_length_is_refused() =>
        Assert.Throws<ArgumentException>(() => SpectrumFigure.Create(Samples.Spectrum(), Samples.Continuum(7)));

    internal static Panel OnlyPanel(Figure figure) => figure.Content.Cells.Single().Panels.Single();
}
