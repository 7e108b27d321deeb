using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using StarLines.LineLists;
using StarLines.Tables;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.LineLists.Reference;

/// <summary>The metal lines against the Sun: Kitt Peak solar flux atlas (Kurucz, Furenlid, Brault and Testerman 1984), air, nm; skipped where absent.</summary>
public class SolarAtlasTests
{
    private const double LightKmPerS = 299792.458;

    // Gravitational redshift of sunlight at the Earth: G M / (R c), 0.633 km/s (Lindegren and Dravins 2003).
    private const double RedshiftKmPerS = 0.633;

    // Half of the search, a little under the distance to neighbours the list allows.
    private const double SearchKmPerS = 2.1;

    [Fact]
    public void Every_line_is_seen_in_the_sun_where_the_list_says()
    {
        List<(string Name, double KmPerS, double Depth)> cores = Cores();

        Assert.True(cores.Count > 90, $"Only {cores.Count} lines lie in the pieces of the atlas.");
        Assert.All(cores, core => Assert.True(core.Depth > 0.05, $"{core.Name}: depth {core.Depth}"));

        // Convection moves cores to the blue by some tenths of a km/s, weak lines more than strong ones (common practice, no source).
        // The limits were set around what the lists gave, so this guards against gross errors and changes rather than proving the zero point.
        Assert.InRange(Median(cores.Select(core => core.KmPerS)), -0.45, -0.15);
        Assert.InRange(1.4826 * Median(cores.Select(core => Math.Abs(core.KmPerS + 0.3))), 0.0, 0.25);
        Assert.All(cores, core => Assert.True(core.KmPerS is > -0.95 and < 0.5, $"{core.Name}: {core.KmPerS} km/s"));
    }

    private static List<(string Name, double KmPerS, double Depth)> Cores()
    {
        var cores = new List<(string, double, double)>();
        LineList list = LineListCatalog.Find("metals-fgk");
        foreach (string path in Directory.GetFiles(ReferenceData.Require("spectra", "solar_atlas"), "lm*.txt").Order(StringComparer.Ordinal))
        {
            using FileStream stream = File.OpenRead(path);
            Table table = TableReader.Read(stream, TableFormat.Csv, path);
            double[] nanometres = table.Columns[0].ToDoubles();
            double[] flux = table.Columns[1].ToDoubles();
            var inside = new WavelengthRange((10.0 * nanometres[0]) + 1.0, (10.0 * nanometres[^1]) - 1.0);
            foreach (RestLine line in list.Search([], [inside]).Lines.Where(line => !cores.Exists(core => core.Item1 == line.Name)))
            {
                (double velocity, double depth) = Core(nanometres, flux, line.WavelengthAngstrom * (1.0 + (RedshiftKmPerS / LightKmPerS)) / 10.0);
                cores.Add((line.Name, velocity, depth));
            }
        }

        return cores;
    }

    /// <summary>Vertex of the parabola through the lowest pixel near a wavelength and the pixels half a km/s to either side of it.</summary>
    private static (double KmPerS, double Depth) Core(double[] nanometres, double[] flux, double expected)
    {
        double Velocity(int i) => (nanometres[i] / expected - 1.0) * LightKmPerS;
        int lowest = Enumerable.Range(0, flux.Length).Where(i => Math.Abs(Velocity(i)) < SearchKmPerS).MinBy(i => flux[i]);
        int below = lowest;
        int above = lowest;
        while (Velocity(lowest) - Velocity(below) < 0.5)
        {
            below--;
        }

        while (Velocity(above) - Velocity(lowest) < 0.5)
        {
            above++;
        }

        double left = (flux[below] - flux[lowest]) / (Velocity(below) - Velocity(lowest));
        double right = (flux[above] - flux[lowest]) / (Velocity(above) - Velocity(lowest));
        double curvature = (right - left) / (Velocity(above) - Velocity(below));
        double slope = left + (curvature * (Velocity(lowest) - Velocity(below)));
        return (Velocity(lowest) - (slope / (2.0 * curvature)), 1.0 - flux[lowest]);
    }

    private static double Median(IEnumerable<double> values)
    {
        double[] sorted = [.. values.Order()];
        return sorted[sorted.Length / 2];
    }
}
