using System.Collections.Generic;
using System.IO;
using StarLines.Tables;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Runs.Tests;

/// <summary>The invented night of <c>examples/night</c>, whose generator wrote the truth to <c>examples/night-truth</c>.</summary>
public class NightRunTests
{
    [Fact]
    public void Velocities_of_the_night_are_those_of_its_stars()
    {
        using var folder = new TemporaryFolder();
        string night = Path.Combine(ReferenceData.RepositoryRoot, "examples", "night");
        RunPlan plan = new()
        {
            Inputs = [Path.Combine(night, "*.fits")],
            OutputFolder = folder["out"],
            Steps = RunSteps.Velocity,
            Templates = ["both"],
            Jobs = 2,
        };
        RunOutcome outcome = RunEngine.Run(
            plan, new RunContext("StarLines test", "", RunContext.Now()), null, TestContext.Current.CancellationToken);
        Assert.Equal((6, 0), (outcome.Inputs, outcome.Failed));

        Table truth = Read(Path.Combine(night + "-truth", "stars.ecsv"));
        Table found = Read(folder["out", "velocities.ecsv"]);
        var velocities = new Dictionary<(string, long), Measured>();
        var corrections = new Dictionary<string, double>();
        for (int row = 0; row < found.RowCount; row++)
        {
            string file = Path.GetFileName(found["file"].Texts[row]!);
            if (found["template"].Texts[row] == "both")
            {
                velocities[(file, found["component"].Longs[row]!.Value)] =
                    new Measured(found["rv"].Doubles[row], found["rv_err"].Doubles[row]);
            }
        }

        Table spectra = Read(folder["out", "spectra.ecsv"]);
        for (int row = 0; row < spectra.RowCount; row++)
        {
            corrections[Path.GetFileName(spectra["file"].Texts[row]!)] = spectra["barycentric_correction"].Doubles[row];
        }

        int measured = 0;
        for (int row = 0; row < truth.RowCount; row++)
        {
            string file = truth["file"].Texts[row]!;

            // The truth has four decimals.
            Assert.Equal(truth["barycentric_correction"].Doubles[row], corrections[file], 1e-4);
            if (truth["component"].Longs[row] == 1 && velocities[(file, 1)] is { HasValue: true } rv)
            {
                // Four quoted uncertainties, and the floor of templates that are not the star itself.
                Assert.Equal(truth["rv"].Doubles[row], rv.Value, (4.0 * rv.Uncertainty) + 0.2);
                measured++;
            }
        }

        Assert.InRange(measured, 4, 6);
    }

    private static Table Read(string path)
    {
        using FileStream stream = File.OpenRead(path);
        return TableReader.Read(stream);
    }
}
