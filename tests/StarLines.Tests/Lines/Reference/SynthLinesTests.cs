using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using StarLines.Continuum;
using StarLines.Fits;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Profiles;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.Lines.Reference;

/// <summary>
/// Against the golden synth_lines: spectra of exactly known truth made with NumPy and SciPy, with the true continuum. Lines
/// whose bound on the equivalent width puts them above five standard deviations count.
/// </summary>
public sealed class SynthLinesTests
{
    // Allowed: for n lines three standard errors of the mean, 3/√n, and of the deviation, 3/√(2n), on top of the claim.
    [Theory]
    [InlineData(1, 1.05)]
    [InlineData(2, 1.05)]
    [InlineData(4, 1.15)]
    [InlineData(5, 1.10)]
    [InlineData(6, 1.05)]
    [InlineData(10, 1.05)]
    public void Pulls_are_standard_normal_and_no_line_fails_silently(int group, double overBound)
    {
        var centre = new List<double>();
        var width = new List<double>();
        var scatter = new List<double>();
        foreach ((Dictionary<string, string> truth, LineMeasurement line) in Measure(group))
        {
            double expected = 1000.0 * Number(truth["ew"]);
            double bound = 1000.0 * Number(truth["crlb_ew"]);
            if (line.Status != LineStatus.Measured)
            {
                bool outside = line.Status == LineStatus.OffSpectrum && truth["tag"].Contains("-0.5 FWHM", StringComparison.Ordinal);
                Assert.True(outside || (line.Status == LineStatus.Limit && Math.Abs(expected) < 6.0 * bound), $"{truth["file"]} {line.Line} {line.Status}");
                continue;
            }

            double centrePull = Pull(line.CentreAngstrom, Number(truth["centre"]));
            double widthPull = Pull(line.EquivalentWidthMilliangstrom, expected);
            bool warned = (line.Warnings & ~LineWarnings.Blended) != 0;
            Assert.True(warned || (Math.Abs(widthPull) < 5.0 && !(Math.Abs(centrePull) > 5.0)), $"{truth["file"]} {line.Line} fails silently");
            if (Math.Abs(expected) > 5.0 * bound)
            {
                centre.Add(centrePull);
                width.Add(widthPull);
                scatter.Add((line.EquivalentWidthMilliangstrom.Value - expected) / bound);
            }
        }

        double slack = 3.0 / Math.Sqrt(width.Count);
        Assert.InRange(width.Average(), -slack, slack);
        Assert.InRange(Deviation(width), 1.0 - slack, 1.0 + slack);
        Assert.InRange(centre.Where(double.IsFinite).Average(), -slack, slack);
        Assert.InRange(Deviation(scatter), 0.5, overBound + (slack / Math.Sqrt(2.0)));
    }

    private static IEnumerable<(Dictionary<string, string> Truth, LineMeasurement Line)> Measure(int group)
    {
        string folder = ReferenceData.Require("golden", "synth_lines");
        ILookup<string, Dictionary<string, string>> truths = Rows(Path.Combine(folder, "truth.csv")).ToLookup(static r => r["file"]);
        foreach (Dictionary<string, string> row in Rows(Path.Combine(folder, "spectra.csv")).Where(r => Number(r["group"]) == group))
        {
            var list = new LineList("truth", Medium.Vacuum, [.. truths[row["file"]].Select(static t => new RestLine
            {
                Name = t["line"],
                Species = "",
                WavelengthAngstrom = Number(t["rest"]),
            })]);
            var options = new LineMeasureOptions
            {
                VelocityKmPerS = Number(row["rv"]),
                Sampling = row["sampling"] == "point" ? PixelSampling.Point : PixelSampling.Integrated,
            };
            (Spectrum spectrum, ContinuumFit continuum) = Read(Path.Combine(folder, row["file"]));
            foreach (LineMeasurement line in LineMeasurer.Measure(spectrum, continuum, list, options).Lines)
            {
                yield return (truths[row["file"]].First(t => t["line"] == line.Line), line);
            }
        }
    }

    /// <summary>The wavelengths count as vacuum throughout: the truth shifts all of them by the plain Doppler factor.</summary>
    private static (Spectrum Spectrum, ContinuumFit Continuum) Read(string path)
    {
        using FitsFile file = FitsFile.Open(path);
        FitsTable data = file.FindHdu("SPECTRUM")!.Table!;
        double[] level = file.FindHdu("TRUTH")!.Table!.FindColumn("CONT")!.ReadDoubles();
        var scale = WavelengthScale.Tabulated(data.FindColumn("WAVE")!.ReadDoubles(), Medium.Vacuum);
        var spectrum = new Spectrum(scale, data.FindColumn("FLUX")!.ReadDoubles(), data.FindColumn("ERR")!.ReadDoubles());
        double[] sigma = [.. level.Select(static v => 1e-5 * v)];
        return (spectrum, new ContinuumFit(level, sigma, Enumerable.Repeat(true, level.Length).ToArray(), 100.0));
    }

    private static IEnumerable<Dictionary<string, string>> Rows(string path)
    {
        string[] lines = File.ReadAllLines(path);
        string[] names = lines[0].Split(',');
        foreach (string line in lines.Skip(2))
        {
            string[] cells = line.Split(',');
            yield return Enumerable.Range(0, names.Length).ToDictionary(i => names[i], i => cells[i]);
        }
    }

    private static double Number(string text) =>
        text is "nan" or "" ? double.NaN : double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static double Pull(Measured measured, double truth) => (measured.Value - truth) / measured.Uncertainty;

    private static double Deviation(List<double> values)
    {
        double mean = values.Average();
        return Math.Sqrt(values.Sum(v => (v - mean) * (v - mean)) / (values.Count - 1));
    }
}
