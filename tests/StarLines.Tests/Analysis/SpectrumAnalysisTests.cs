using System;
using System.Linq;
using StarLines.Analysis;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Templates;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.Analysis;

public sealed class SpectrumAnalysisTests
{
    private const double Velocity = 37.25;
    private const int Pixels = 12_000;

    private static readonly LineList s_list = MakeList();

    [Fact]
    public void Velocity_and_widths_of_a_made_star_come_out_within_their_errors()
    {
        AnalysisResult result = SpectrumAnalysis.Analyse(Make(1), Options());
        Measured velocity = result.Velocities[0].ObservedKmPerS;
        Assert.InRange(Math.Abs(velocity.Value - Velocity), 0.0, 4.0 * velocity.Uncertainty);
        Assert.Equal(s_list.Lines.Count, result.Lines!.Lines.Count);
        double squares = 0.0;
        foreach ((LineMeasurement line, RestLine rest) in result.Lines.Lines.Zip(s_list.Lines))
        {
            double truth = 1000.0 * rest.Depth * rest.FwhmAngstrom * Doppler.Factor(Velocity) * Math.Sqrt(Math.PI / (4.0 * Math.Log(2.0)));
            Assert.Equal(LineStatus.Measured, line.Status);
            double pull = (line.EquivalentWidthMilliangstrom.Value - truth) / line.EquivalentWidthMilliangstrom.Uncertainty;
            squares += pull * pull;
        }

        Assert.InRange(Math.Sqrt(squares / s_list.Lines.Count), 0.6, 1.5);
    }

    [Fact]
    public void A_spectrum_without_uncertainties_takes_them_from_its_flux_and_says_so()
    {
        Spectrum spectrum = Make(2);
        AnalysisResult result = SpectrumAnalysis.Analyse(new Spectrum(spectrum.Scale, spectrum.Flux), Options());
        Assert.True(result.NoiseFromFlux);
        Assert.All(result.Lines!.Lines, line => Assert.True(line.Warnings.HasFlag(LineWarnings.NoiseFromFlux)));
    }

    [Fact]
    public void The_same_spectrum_gives_the_same_bits()
    {
        AnalysisResult one = SpectrumAnalysis.Analyse(Make(3), Options());
        AnalysisResult other = SpectrumAnalysis.Analyse(Make(3), Options());
        Assert.True(one.Continuum.Level.SequenceEqual(other.Continuum.Level));
        Assert.Equal(one.Velocities[0].ObservedKmPerS, other.Velocities[0].ObservedKmPerS);
        Assert.Equal(one.Lines!.Lines, other.Lines!.Lines);
    }

    [Fact]
    public void Without_site_or_time_the_velocity_stays_topocentric_and_the_cure_is_said()
    {
        AnalysisResult result = SpectrumAnalysis.Analyse(Make(4), Options());
        Assert.Null(result.Barycentre);
        Assert.Equal(VelocityStatus.Topocentric, result.Velocities[0].Measurement.Status);
        Remark remark = Assert.Single(result.Remarks, r => r.Word == "no-barycentre");
        Assert.Contains("--site", remark.Sentence, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(0.0)]
    public void A_spectrum_of_nothing_measures_nothing(double value)
    {
        var flux = new double[Pixels];
        Array.Fill(flux, value);
        AnalysisResult result = SpectrumAnalysis.Analyse(new Spectrum(Make(5).Scale, flux), Options());
        Assert.False(result.Velocities[0].ObservedKmPerS.HasValue);
        Assert.DoesNotContain(result.Lines!.Lines, line => line.Status is LineStatus.Measured or LineStatus.Limit);
    }

    [Fact]
    public void An_excluded_line_is_masked()
    {
        double at = s_list.Lines[3].WavelengthAngstrom * Doppler.Factor(Velocity);
        AnalysisResult result = SpectrumAnalysis.Analyse(Make(6), Options() with { Exclude = [new WavelengthRange(at - 3.0, at + 3.0)] });
        Assert.Equal(LineStatus.Masked, result.Lines!.Lines[3].Status);
    }

    private static AnalysisOptions Options() => new() { Templates = [LineTemplate.FromLineList(s_list)], Lines = s_list };

    private static LineList MakeList()
    {
        var random = new Random(42);
        return new LineList("made", Medium.Vacuum, [.. Enumerable.Range(0, 40).Select(j => new RestLine
        {
            Name = $"L{j}",
            Species = "Fe I",
            WavelengthAngstrom = 5015.0 + (14.0 * j) + (4.0 * random.NextDouble()),
            Depth = 0.1 + (0.6 * random.NextDouble()),
            FwhmAngstrom = 0.35,
        })]);
    }

    private static Spectrum Make(int seed)
    {
        var random = new Random(seed);
        WavelengthScale scale = WavelengthScale.Linear(5000.0, 0.05, Pixels, Medium.Vacuum, VelocityFrame.Topocentric);
        var flux = new double[Pixels];
        var sigma = new double[Pixels];
        for (int i = 0; i < Pixels; i++)
        {
            double depth = 0.0;
            foreach (RestLine line in s_list.Lines)
            {
                double width = line.FwhmAngstrom * Doppler.Factor(Velocity) / PhysicalConstants.FwhmPerSigma;
                double u = (scale.WavelengthsAngstrom[i] - (line.WavelengthAngstrom * Doppler.Factor(Velocity))) / width;
                depth += Math.Abs(u) < 8.0 ? line.Depth * Math.Exp(-0.5 * u * u) : 0.0;
            }

            double level = 800.0 * (1.0 + (0.2 * Math.Sin(i / 4000.0)));
            sigma[i] = level / 80.0;
            flux[i] = (level * (1.0 - depth)) + (sigma[i] * Gaussian.Next(random));
        }

        return new Spectrum(scale, flux, sigma);
    }
}
