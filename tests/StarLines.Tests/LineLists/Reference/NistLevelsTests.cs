using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using StarLines.LineLists;
using StarLines.Tables;
using StarLines.TestSupport;
using StarLines.Velocities;
using Xunit;

namespace StarLines.Tests.LineLists.Reference;

/// <summary>Wavelengths of the metal lines against the differences of the energy levels (NIST ASD); skipped where the tables are absent.</summary>
public class NistLevelsTests
{
    private const double WavenumbersPerEv = 8065.543937;

    [Fact]
    public void Wavelengths_of_metal_lines_agree_with_the_energies_of_their_levels()
    {
        ILookup<string, (double Air, double LowerEv)> transitions = Transitions();
        int found = 0;
        LineList list = LineListCatalog.Find("metals-fgk");
        foreach (RestLine line in list.Lines)
        {
            IEnumerable<(double Air, double LowerEv)> near = transitions[line.Species]
                .Where(t => Math.Abs(t.Air - line.WavelengthAngstrom) < 0.03 && Math.Abs(t.LowerEv - line.LowerEnergyEv) < 0.001);
            if (!near.Any())
            {
                continue;
            }

            found++;
            Assert.True(near.Min(t => Math.Abs(t.Air - line.WavelengthAngstrom)) < 0.015, line.Name);
        }

        // A few solar lines come from papers and have no row with both levels.
        Assert.InRange(found, 0.9 * list.Lines.Count, list.Lines.Count);
    }

    private static ILookup<string, (double Air, double LowerEv)> Transitions()
    {
        using FileStream stream = File.OpenRead(ReferenceData.Require("atomic", "nist-lines.csv"));
        Table table = TableReader.Read(stream, TableFormat.Csv);
        double[] lower = table["e_lower_cm1"].ToDoubles();
        double[] upper = table["e_upper_cm1"].ToDoubles();
        string?[] elements = table["species"].Texts.ToArray();
        string?[] stages = table["ion"].Texts.ToArray();
        return Enumerable.Range(0, table.RowCount)
            .Where(i => 1e8 / (upper[i] - lower[i]) is > 3800.0 and < 9100.0)
            .ToLookup(
                i => $"{elements[i]} {stages[i]}",
                i => (AirVacuum.ToAirAngstrom(1e8 / (upper[i] - lower[i])), lower[i] / WavenumbersPerEv));
    }
}
