using System;
using System.Collections.Generic;
using System.Linq;
using StarLines.LineLists;
using StarLines.Templates;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Velocities;

public sealed class VelocityMeasurerTests
{
    private static readonly LineList List = SyntheticStar.List(40, seed: 5);
    private static readonly LineTemplate Template = LineTemplate.FromLineList(List);

    [Fact]
    public void Errors_over_quoted_uncertainties_scatter_by_one_and_reach_the_photon_limit()
    {
        var pulls = new List<double>();
        var ratios = new List<double>();
        for (int k = 0; k < 120; k++)
        {
            double velocity = -300.0 + (5.0 * k);
            Spectrum spectrum = SyntheticStar.Spectrum(List, 20.0 + k, seed: 100 + k, [(velocity, 1.0, 0.0)]);
            VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), Template);
            Assert.Equal(VelocityStatus.Topocentric, result.Measurement.Status);
            pulls.Add((result.ObservedKmPerS.Value - velocity) / result.ObservedKmPerS.Uncertainty);
            ratios.Add(result.ObservedKmPerS.Uncertainty / result.Measurement.PhotonLimitKmPerS);
        }

        // The standard deviation of 120 draws has a scatter of 6.5 %, their mean one of 0.09.
        Assert.InRange(Math.Sqrt(pulls.Average(static p => p * p)), 0.8, 1.2);
        Assert.InRange(pulls.Average(), -0.3, 0.3);
        Assert.InRange(ratios.Average(), 1.0, 1.1);
    }

    [Theory]
    [InlineData(-950.0)]
    [InlineData(0.0)]
    [InlineData(999.0)]
    public void The_doppler_shift_is_relativistic_over_the_whole_range(double velocityKmPerS)
    {
        Spectrum spectrum = SyntheticStar.Spectrum(List, 1e4, seed: 1, [(velocityKmPerS, 1.0, 0.0)]);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), Template);
        Assert.Equal(velocityKmPerS, result.ObservedKmPerS.Value, 6.0 * result.ObservedKmPerS.Uncertainty);
        Assert.Equal(velocityKmPerS, result.PeakKmPerS.Value, 0.3);
    }

    [Fact]
    public void A_spectrum_in_air_gives_the_velocity_of_the_same_spectrum_in_vacuum()
    {
        Spectrum vacuum = SyntheticStar.Spectrum(List, 100.0, seed: 2, [(150.0, 1.0, 0.0)]);
        Spectrum air = SyntheticStar.Spectrum(List, 100.0, seed: 2, [(150.0, 1.0, 0.0)], Medium.Air);
        double a = VelocityMeasurer.Measure(vacuum, SyntheticStar.Continuum(vacuum), Template).ObservedKmPerS.Value;
        double b = VelocityMeasurer.Measure(air, SyntheticStar.Continuum(air), Template).ObservedKmPerS.Value;
        Assert.Equal(a, b, 1e-4);
    }

    [Fact]
    public void Noise_alone_gives_no_peak()
    {
        int found = 0;
        for (int k = 0; k < 100; k++)
        {
            Spectrum spectrum = SyntheticStar.Spectrum(List, 50.0, seed: 900 + k, []);
            VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), Template);
            found += result.Measurement.Status == VelocityStatus.NoPeak ? 0 : 1;
        }

        // One in a thousand by the default probability.
        Assert.InRange(found, 0, 1);
    }

    [Fact]
    public void A_template_outside_the_spectrum_is_off_spectrum()
    {
        var far = new LineList("far", Medium.Vacuum, [new RestLine { Name = "X", Species = "Fe I", WavelengthAngstrom = 8000.0, Depth = 0.5, FwhmAngstrom = 0.3 }]);
        Spectrum spectrum = SyntheticStar.Spectrum(List, 50.0, seed: 3, [(0.0, 1.0, 0.0)]);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), LineTemplate.FromLineList(far));
        Assert.Equal(VelocityStatus.OffSpectrum, result.Measurement.Status);
        Assert.False(result.ObservedKmPerS.HasValue);
    }

    [Fact]
    public void Lines_that_do_not_belong_are_left_out()
    {
        RestLine[] lines = [.. List.Lines.Select(static (line, j) => j % 8 == 3 ? line with { WavelengthAngstrom = line.WavelengthAngstrom + 0.06 } : line)];
        LineTemplate wrong = LineTemplate.FromLineList(new LineList("wrong", Medium.Vacuum, lines));
        Spectrum spectrum = SyntheticStar.Spectrum(List, 150.0, seed: 4, [(42.0, 1.0, 0.0)]);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), wrong);
        Assert.InRange(result.LinesLeftOut, 3, 8);
        Assert.Equal(42.0, result.ObservedKmPerS.Value, 4.0 * result.ObservedKmPerS.Uncertainty);
    }

    [Fact]
    public void Wavelengths_at_rest_with_errors_of_their_own_are_in_the_uncertainty()
    {
        var pulls = new List<double>();
        for (int k = 0; k < 40; k++)
        {
            var random = new Random(k);
            RestLine[] lines = [.. List.Lines.Select(line => line with { WavelengthAngstrom = line.WavelengthAngstrom * (1.0 + (0.5 * SyntheticStar.Gauss(random) / PhysicalConstants.SpeedOfLightKmPerS)) })];
            Spectrum spectrum = SyntheticStar.Spectrum(List, 200.0, seed: 50 + k, [(10.0, 1.0, 0.0)]);
            VelocityResult result = VelocityMeasurer.Measure(
                spectrum, SyntheticStar.Continuum(spectrum), LineTemplate.FromLineList(new LineList("off", Medium.Vacuum, lines)));
            pulls.Add((result.ObservedKmPerS.Value - 10.0) / result.ObservedKmPerS.Uncertainty);
        }

        // 0.5 km/s over √40 lines is 79 m/s, several times the noise; 40 draws know their scatter to 11 %.
        Assert.InRange(Math.Sqrt(pulls.Average(static p => p * p)), 0.7, 1.35);
    }

    [Fact]
    public void A_second_spectrum_of_the_star_as_template_gives_the_difference()
    {
        Spectrum first = SyntheticStar.Spectrum(List, 300.0, seed: 21, [(12.0, 1.0, 0.0)]);
        Spectrum second = SyntheticStar.Spectrum(List, 300.0, seed: 22, [(12.75, 1.0, 0.0)]);
        LineTemplate template = LineTemplate.FromSpectrum(first, SyntheticStar.Continuum(first), 12.0, "first");
        VelocityResult result = VelocityMeasurer.Measure(second, SyntheticStar.Continuum(second), template);
        Assert.Equal(12.75, result.ObservedKmPerS.Value, 4.0 * result.ObservedKmPerS.Uncertainty);
        Assert.InRange(result.ObservedKmPerS.Uncertainty, 1.0 * result.Measurement.PhotonLimitKmPerS, 0.03);
    }

    [Fact]
    public void A_rotating_star_gives_its_rotation()
    {
        // Variance 0.225 of the squared v sin i for ε = 0.6, here in a Gaussian.
        Spectrum spectrum = SyntheticStar.Spectrum(List, 200.0, seed: 6, [(-20.0, 1.0, 30.0 * Math.Sqrt(0.225))]);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), Template);
        Assert.Equal(30.0, result.Measurement.ProjectedRotationKmPerS.Value, 1.5);
        Assert.Equal(-20.0, result.ObservedKmPerS.Value, 4.0 * result.ObservedKmPerS.Uncertainty);
    }

    [Theory]
    [InlineData(60.0, 0.4)]
    [InlineData(-45.0, 0.3)]
    [InlineData(300.0, 0.25)]
    public void A_second_star_gets_a_velocity_of_its_own(double velocityKmPerS, double light)
    {
        Spectrum spectrum = SyntheticStar.Spectrum(List, 100.0, seed: 7, [(5.0, 1.0 - light, 0.0), (velocityKmPerS, light, 0.0)]);
        VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), Template);
        Assert.Equal(2, result.Measurement.Components);
        Assert.NotNull(result.Second);
        Assert.Equal(2, result.Second.Measurement.Component);
        Assert.Equal(5.0, result.ObservedKmPerS.Value, 5.0 * result.ObservedKmPerS.Uncertainty);
        Assert.Equal(velocityKmPerS, result.Second.ObservedKmPerS.Value, 5.0 * result.Second.ObservedKmPerS.Uncertainty);
    }

    [Fact]
    public void No_second_star_is_seen_in_single_spectra()
    {
        for (int k = 0; k < 150; k++)
        {
            LineList list = SyntheticStar.List(20 + k, seed: k);
            RestLine[] depths = [.. list.Lines.Select((line, j) => line with { Depth = line.Depth * (0.6 + (0.8 * ((j * 7 % 11) / 10.0))) })];
            Spectrum spectrum = SyntheticStar.Spectrum(
                new LineList("star", Medium.Vacuum, depths), 15.0 + (2.0 * k), seed: 400 + k, [(30.0, 1.0, 0.0)]);
            VelocityResult result = VelocityMeasurer.Measure(spectrum, SyntheticStar.Continuum(spectrum), LineTemplate.FromLineList(list));
            Assert.Equal(1, result.Measurement.Components);
        }
    }
}
