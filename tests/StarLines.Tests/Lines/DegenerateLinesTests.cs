using System;
using System.Linq;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;
using Xunit;

namespace StarLines.Tests.Lines;

public sealed class DegenerateLinesTests
{
    [Fact]
    public void A_line_that_stands_twice_in_a_list_never_gives_numbers_beyond_the_data()
    {
        for (int seed = 0; seed < 30; seed++)
        {
            LineMeasurementSet set = Measure(seed, 0.0005);
            foreach (LineMeasurement line in set.Lines)
            {
                Assert.True(
                    line.Status == LineStatus.Failed
                    || !line.Depth.HasValue
                    || Math.Abs(line.Depth.Value) < 1.5,
                    $"seed {seed}: {line}");
            }
        }
    }

    private static LineMeasurementSet Measure(int seed, double apartAngstrom)
    {
        var random = new Random(seed);
        const int Pixels = 600;
        WavelengthScale scale = WavelengthScale.Linear(5000.0, 0.05, Pixels, Medium.Air);
        double[] sigma = [.. Enumerable.Repeat(0.01, Pixels)];
        double[] flux = [.. Enumerable.Range(0, Pixels).Select(i =>
            1.0 - (0.4 * Math.Exp(-0.5 * Math.Pow((scale.WavelengthsAngstrom[i] - 5015.0) / 0.15, 2))) + (0.01 * Gaussian.Next(random)))];
        double[] one = [.. Enumerable.Repeat(1.0, Pixels)];
        double[] little = [.. Enumerable.Repeat(1e-4, Pixels)];
        bool[] trusted = [.. Enumerable.Repeat(true, Pixels)];
        var list = new LineList("twice", Medium.Air,
        [
            new RestLine { Name = "a", Species = "Fe I", WavelengthAngstrom = 5015.0 },
            new RestLine { Name = "b", Species = "Cr I", WavelengthAngstrom = 5015.0 + apartAngstrom },
        ]);
        return LineMeasurer.Measure(
            new Spectrum(scale, flux, sigma), new ContinuumFit(one, little, trusted, 30.0), list, new LineMeasureOptions());
    }
}
