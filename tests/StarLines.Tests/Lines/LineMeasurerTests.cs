using System;
using System.Linq;
using StarLines.Lines;
using StarLines.Profiles;
using Xunit;

namespace StarLines.Tests.Lines;

public sealed class LineMeasurerTests
{
    [Theory]
    [InlineData(0.4)]
    [InlineData(-3.0)]
    public void Noise_free_line_is_recovered_by_both_methods(double depth)
    {
        var made = new SyntheticSpectrum(400, 1000.0, 0, (6010.013, depth, 0.30));
        LineMeasurement line = Assert.Single(made.Measure().Lines);
        double truth = SyntheticSpectrum.EquivalentWidth(depth, 0.30);
        Assert.Equal(LineStatus.Measured, line.Status);
        Assert.Equal(LineWarnings.None, line.Warnings);
        Assert.Equal(6010.013, line.CentreAngstrom.Value, 1e-5);
        Assert.Equal(depth, line.Depth.Value, 1e-4);
        Assert.Equal(0.30, line.FwhmAngstrom.Value, 1e-4);
        Assert.Equal(truth, line.EquivalentWidthMilliangstrom.Value, 1e-3 * Math.Abs(truth));
        Assert.Equal(truth, line.DirectEquivalentWidthMilliangstrom.Value, 1e-3 * Math.Abs(truth));
        Assert.Equal(0.0, line.VelocityKmPerS.Value, 1e-3);
    }

    [Fact]
    public void Lines_that_touch_share_a_blend_and_are_parted()
    {
        var made = new SyntheticSpectrum(400, 1000.0, 0, (6010.0, 0.5, 0.30), (6010.4, 0.2, 0.25), (6015.0, 0.3, 0.30));
        LineMeasurementSet set = made.Measure();
        Assert.Equal([1, 1, 0], set.Lines.Select(static l => l.Blend));
        Assert.Equal([0.5, 0.2, 0.3], set.Lines.Select(static l => Math.Round(l.Depth.Value, 3)));
        Assert.True(set.Lines[0].Warnings.HasFlag(LineWarnings.Blended));
    }

    [Fact]
    public void Lines_nearer_than_their_widths_are_called_unresolved()
    {
        var made = new SyntheticSpectrum(400, 500.0, 0, (6010.0, 0.5, 0.30), (6010.2, 0.4, 0.30));
        Assert.All(made.Measure().Lines, static l => Assert.True(l.Warnings.HasFlag(LineWarnings.Unresolved)));
    }

    [Fact]
    public void Line_that_is_not_there_becomes_a_limit_of_three_standard_deviations()
    {
        var made = new SyntheticSpectrum(400, 100.0, 7);
        LineMeasurement line = Assert.Single(LineMeasurer.Measure(
            made.ToSpectrum(), made.Continuum(), SyntheticSpectrum.List([6010.0], 0.30), new()).Lines);
        Assert.Equal(LineStatus.Limit, line.Status);
        Assert.False(line.EquivalentWidthMilliangstrom.HasValue);
        Assert.Equal(0.30, line.FwhmAngstrom.Value, 1e-9);

        // A Gaussian of known shape: σ(W) = W/A σ(A) with σ(A)² = Δ ε²/(s √π); the pixel widens s by 1 %.
        double s = 0.30 / PhysicalConstants.FwhmPerSigma;
        double expected = 3.0 * 1000.0 * s * Math.Sqrt(2.0 * Math.PI) * 0.01 * Math.Sqrt(0.05 / (s * Math.Sqrt(Math.PI)));
        Assert.Equal(expected, line.LimitMilliangstrom, 0.02 * expected);
    }

    [Fact]
    public void Lines_outside_the_spectrum_or_on_masked_pixels_say_so()
    {
        var made = new SyntheticSpectrum(400, 100.0, 3, (5990.0, 0.5, 0.3), (6010.0, 0.5, 0.3), (6030.0, 0.5, 0.3));
        var faults = new PixelFaults[400];
        Array.Fill(faults, PixelFaults.Flagged, 190, 21);
        LineMeasurementSet set = made.Measure(faults: faults);
        Assert.Equal(
            [LineStatus.OffSpectrum, LineStatus.Masked, LineStatus.OffSpectrum], set.Lines.Select(static l => l.Status));
        Assert.All(set.Model.ToArray(), static v => Assert.Equal(1.0, v));
    }

    [Fact]
    public void Line_cut_by_the_end_of_the_spectrum_warns_of_it()
    {
        var made = new SyntheticSpectrum(400, 500.0, 0, (6000.1, 0.5, 0.3));
        LineMeasurement line = Assert.Single(made.Measure().Lines);
        Assert.True(line.Warnings.HasFlag(LineWarnings.Edge));
        Assert.Equal(0.5, line.Depth.Value, 1e-3);
    }

    [Fact]
    public void Masked_pixel_is_filled_by_the_model()
    {
        var made = new SyntheticSpectrum(400, 500.0, 0, (6010.0, 0.5, 0.3));
        made.Flux[201] = 1e6;
        var faults = new PixelFaults[400];
        faults[201] = PixelFaults.Outlier;
        LineMeasurement line = Assert.Single(made.Measure(faults: faults).Lines);
        Assert.True(line.Warnings.HasFlag(LineWarnings.MaskedPixels));
        double truth = SyntheticSpectrum.EquivalentWidth(0.5, 0.3);
        Assert.Equal(truth, line.DirectEquivalentWidthMilliangstrom.Value, 1e-3 * truth);
    }

    [Fact]
    public void Hit_that_nobody_flagged_does_not_count()
    {
        var made = new SyntheticSpectrum(400, 200.0, 5, (6010.0, 0.5, 0.3));
        made.Flux[203] += 30.0 * made.Sigma[203];
        LineMeasurement line = Assert.Single(made.Measure().Lines);
        Assert.True(line.Warnings.HasFlag(LineWarnings.MaskedPixels));
        double pull = (line.EquivalentWidthMilliangstrom.Value - SyntheticSpectrum.EquivalentWidth(0.5, 0.3))
            / line.EquivalentWidthMilliangstrom.Uncertainty;
        Assert.InRange(pull, -3.5, 3.5);
    }

    [Fact]
    public void Scaling_the_flux_leaves_equivalent_widths_alone()
    {
        var made = new SyntheticSpectrum(400, 100.0, 11, (6010.0, 0.5, 0.3));
        LineMeasurement plain = made.Measure().Lines[0];
        double[] flux = [.. made.Flux.Select(static v => v * 1e-17)];
        double[] sigma = [.. made.Sigma.Select(static v => v * 1e-17)];
        double[] level = Enumerable.Repeat(1e-14, 400).ToArray();
        var spectrum = new Spectrum(made.ToSpectrum().Scale, flux, sigma, fluxUnit: "erg/s/cm2/Angstrom");
        var continuum = new StarLines.Continuum.ContinuumFit(
            level, level.Select(static v => v * 1e-6).ToArray(), Enumerable.Repeat(true, 400).ToArray(), 100.0);
        LineMeasurement scaled = LineMeasurer.Measure(spectrum, continuum, SyntheticSpectrum.List([6010.0]), new()).Lines[0];
        Assert.Equal(plain.EquivalentWidthMilliangstrom.Value, scaled.EquivalentWidthMilliangstrom.Value, 1e-6);
        Assert.Equal(-scaled.EquivalentWidthMilliangstrom.Value * 1e-17, scaled.Flux.Value, 1e-20);
        Assert.False(plain.Flux.HasValue);
    }

    [Fact]
    public void Uncertain_continuum_adds_to_the_uncertainty()
    {
        var made = new SyntheticSpectrum(400, 100.0, 11, (6010.0, 0.5, 0.3));
        LineMeasurement exact = made.Measure().Lines[0];
        LineMeasurement uncertain = made.Measure(relativeSigma: 0.005).Lines[0];
        Assert.True(exact.EquivalentWidthContinuumMilliangstrom < 0.01);
        Assert.True(uncertain.EquivalentWidthContinuumMilliangstrom > 1.0);
        Assert.Equal(
            Math.Pow(uncertain.EquivalentWidthMilliangstrom.Uncertainty, 2),
            Math.Pow(uncertain.EquivalentWidthNoiseMilliangstrom, 2) + Math.Pow(uncertain.EquivalentWidthContinuumMilliangstrom, 2),
            1e-6);
    }

    [Fact]
    public void Model_divides_the_lines_out()
    {
        var made = new SyntheticSpectrum(400, 1000.0, 0, (6010.0, 0.5, 0.30), (6010.4, 0.2, 0.25));
        LineMeasurementSet set = made.Measure();
        for (int i = 0; i < 400; i++)
        {
            Assert.Equal(SyntheticSpectrum.ContinuumLevel, made.Flux[i] / set.Model[i], 0.01);
        }
    }

    [Fact]
    public void Profile_of_another_shape_is_called_a_poor_fit()
    {
        var made = new SyntheticSpectrum(400, 300.0, 9, (6010.0, 0.5, 0.30));
        LineMeasurement line = made.Measure(new LineMeasureOptions { Profile = ProfileShape.Lorentzian }).Lines[0];
        Assert.True(line.Warnings.HasFlag(LineWarnings.PoorFit));
    }

    [Fact]
    public void Spectrum_without_uncertainties_is_refused()
    {
        var made = new SyntheticSpectrum(400, 300.0, 9);
        var bare = new Spectrum(made.ToSpectrum().Scale, made.Flux);
        Assert.Throws<ArgumentException>(() => LineMeasurer.Measure(bare, made.Continuum(), SyntheticSpectrum.List([6010.0]), new()));
    }
}
