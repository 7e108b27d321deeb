using System;
using System.IO;
using System.Linq;
using ScottPlot.Testing;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Plotting.Tests;

/// <summary>
/// A few figures against pictures that were looked at. Where one fails, the picture drawn and the difference are left beside
/// the test program; a picture that was changed on purpose is looked at and copied to <c>tests/Data/figures</c>.
/// </summary>
public sealed class ImageTests
{
    /// <summary>Edges of letters and lines may fall otherwise on another processor.</summary>
    private const double LargestPercentage = 2.0;

    private static readonly FigureOptions Options = new() { WidthPixels = 560, HeightPixels = 320, DotsPerInch = 80 };

    [Theory]
    [InlineData("spectrum")]
    [InlineData("normalized")]
    [InlineData("lines")]
    [InlineData("correlation")]
    public void A_figure_looks_as_it_did_when_it_was_looked_at(string name)
    {
        Assert.SkipUnless(FigureFonts.Status == FigureFontStatus.Embedded, "The build had no npm, so no font is embedded.");
        byte[] drawn = Draw(name).ToPng(Options);
        string folder = Path.Combine(AppContext.BaseDirectory, "figures");
        Directory.CreateDirectory(folder);
        string actual = Path.Combine(folder, name + ".png");
        File.WriteAllBytes(actual, drawn);
        string reference = ReferenceData.DataFile("figures", name + ".png");
        Assert.True(File.Exists(reference), $"There is no {reference}; look at {actual} and copy it there.");
        using var expected = new ScottPlot.Image(File.ReadAllBytes(reference));
        using var found = new ScottPlot.Image(drawn);
        Assert.Equal((expected.Width, expected.Height), (found.Width, found.Height));
        var difference = new ImageDiff(expected, found, true);
        if (difference.PercentOfDifferencePixels > LargestPercentage)
        {
            difference.DifferenceImage!.SavePng(Path.Combine(folder, name + ".difference.png"));
            Assert.Fail($"{difference.PercentOfDifferencePixels:F1} per cent of the pixels differ; see {folder}.");
        }
    }

    private static Figure Draw(string name)
    {
        Spectrum spectrum = Samples.Spectrum(change: static (flux, faults) =>
        {
            faults.AsSpan(700, 60).Fill(PixelFaults.Flagged);
            flux[1300] = 4;
            faults[1300] = PixelFaults.Outlier;
        });
        Continuum.ContinuumFit continuum = Samples.Continuum(spectrum.Count, 1.0, 300, 160);
        return name switch
        {
            "spectrum" => SpectrumFigure.Create(spectrum, continuum),
            "normalized" => NormalizedFigure.Create(spectrum, continuum, Samples.Marks(80, 1)),
            "lines" => LineFigure.Create([.. ((double[])[5012.5, 5062.5]).Select(centre => Panel(spectrum, centre))], "Lyra 2207 B"),
            _ => CorrelationFigure.Create([Curve()], "Lyra 2207 B"),
        };
    }

    private static LinePanel Panel(Spectrum spectrum, double centre)
    {
        int start = (int)spectrum.Scale.IndexOf(centre) - 16;
        ReadOnlySpan<double> x = spectrum.Scale.WavelengthsAngstrom.Slice(start, 33);
        double[] model = [.. x.ToArray().Select(w => 1 - (0.5 * Math.Exp(-0.5 * Math.Pow(w - centre, 2))))];
        return new LinePanel($"line {start}", x, spectrum.Flux.Slice(start, 33), spectrum.Sigma.Slice(start, 33), model)
        {
            CentreAngstrom = centre,
            ContinuumSigma = 0.01,
            Notes = ["EW = 1253 ± 12 mÅ"],
        };
    }

    private static CorrelationCurve Curve()
    {
        double[] x = [.. Enumerable.Range(0, 401).Select(i => -400.0 + (2 * i))];
        double[] y = [.. x.Select(v => (0.6 * Math.Exp(-Math.Pow((v + 42.5) / 12, 2))) + (0.03 * Math.Sin(v / 17)))];
        return new CorrelationCurve("metal", x, y) { PeakKmPerS = new Measured(-42.5, 0.4), PeakFwhmKmPerS = 20 };
    }
}
