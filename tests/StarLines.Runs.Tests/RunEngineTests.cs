using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Threading;
using StarLines.Runs.Plans;
using StarLines.Tables;
using Xunit;

namespace StarLines.Runs.Tests;

public class RunEngineTests
{
    private static readonly RunContext Context = new("StarLines test", "starlines run", new DateTime(2025, 3, 14, 0, 0, 0, DateTimeKind.Utc));

    [Fact]
    public void A_folder_gives_tables_normalized_spectra_figures_plan_and_journal()
    {
        using var folder = new TemporaryFolder();
        folder.WriteSpectrum("in/alpha.csv", 1, 20.0);
        folder.WriteSpectrum("in/beta.csv", 2, -35.0);
        RunPlan plan = Plan(folder, [folder["in"]], RunSteps.All) with { LineLists = ["balmer"] };
        RunOutcome outcome = RunEngine.Run(plan, Context, null, TestContext.Current.CancellationToken);

        Assert.Equal((2, 0, 2), (outcome.Inputs, outcome.Failed, outcome.Spectra));
        Assert.All(outcome.Files, file => Assert.True(File.Exists(folder["out", file]), file));
        Assert.Contains("normalized/alpha.normalized.fits", outcome.Files);
        Assert.Contains("plots/beta.spectrum.png", outcome.Files);

        Table velocities = Read(folder["out", "velocities.ecsv"]);
        double[] rv = velocities["rv_topocentric"].ToDoubles();
        Assert.Equal(["balmer", "metal", "both", "balmer", "metal", "both"], velocities["template"].Texts.ToArray());
        for (int i = 0; i < 3; i++)
        {
            // The two spectra have the same lines, 55 km/s apart by the generator; the invented line pattern offsets both alike.
            Assert.Equal(20.0 - -35.0, rv[i] - rv[i + 3], 3.0);
        }

        Table lines = Read(folder["out", "lines.ecsv"]);
        Assert.Contains("measured", lines["status"].Texts.ToArray());
        Assert.Equal("StarLines test", lines.Metadata.TextOf("program"));
        Assert.Equal("2025-03-14T00:00:00Z", lines.Metadata.TextOf("date_utc"));
        Table spectra = Read(folder["out", "spectra.ecsv"]);
        Assert.Equal(["done", "done"], spectra["state"].Texts.ToArray());
    }

    [Fact]
    public void The_same_bytes_come_out_whatever_the_number_of_jobs()
    {
        using var folder = new TemporaryFolder();
        for (int i = 0; i < 6; i++)
        {
            folder.WriteSpectrum($"in/star{i}.csv", i, 10.0 * i);
        }

        folder.WriteText("in/bad.csv", "this,is\nno,spectrum\n");
        foreach ((string name, int jobs) in new[] { ("one", 1), ("four", 4) })
        {
            RunPlan plan = Plan(folder, [folder["in"]], RunSteps.All) with
            {
                OutputFolder = folder[name],
                Jobs = jobs,
                LineLists = ["balmer"],
                FigureFormat = Plotting.FigureFormat.Svg,
            };
            RunEngine.Run(plan, Context, null, TestContext.Current.CancellationToken);
        }

        string[] first = Files(folder["one"]);
        Assert.Equal(first, Files(folder["four"]));
        Assert.True(first.Length > 20);
        foreach (string file in first.Where(static f => f != "journal.jsonl"))
        {
            Assert.True(
                File.ReadAllBytes(folder["one", file]).AsSpan().SequenceEqual(File.ReadAllBytes(folder["four", file])), file);
        }
    }

    [Fact]
    public void A_bad_input_is_said_and_the_others_go_on()
    {
        using var folder = new TemporaryFolder();
        string good = folder.WriteSpectrum("good.csv", 3);
        string empty = folder.WriteText("empty.fits", "");
        string missing = folder["missing.fits"];
        var told = new Told();
        RunOutcome outcome = RunEngine.Run(
            Plan(folder, [empty, good, missing], RunSteps.Continuum), Context, told, TestContext.Current.CancellationToken);

        Assert.Equal((3, 2, 2, 1), (outcome.Inputs, outcome.Failed, outcome.Unusable, outcome.Spectra));
        Table spectra = Read(folder["out", "spectra.ecsv"]);
        Assert.Equal(["failed", "done", "failed"], spectra["state"].Texts.ToArray());
        Assert.Equal([empty, good, missing], spectra["file"].Texts.ToArray());
        Assert.Contains("no such file", spectra["error"].Texts[2], StringComparison.Ordinal);
        Assert.True(spectra["pixels"].IsMissing(0));
        Assert.Equal(3, told.Reports.Count);
        Assert.Equal(2, told.Reports.Count(static r => r.Error.Length > 0));

        string[] journal = File.ReadAllLines(folder["out", "journal.jsonl"]);
        Assert.Equal(3, journal.Length);
        Assert.All(journal, static line => Assert.True(JsonDocument.Parse(line).RootElement.GetProperty("seconds").GetDouble() >= 0.0));
    }

    [Fact]
    public void A_stopped_run_leaves_no_table_and_no_half_file()
    {
        using var folder = new TemporaryFolder();
        for (int i = 0; i < 4; i++)
        {
            folder.WriteSpectrum($"in/star{i}.csv", i);
        }

        using var stop = new CancellationTokenSource();
        Assert.ThrowsAny<OperationCanceledException>(() => RunEngine.Run(
            Plan(folder, [folder["in"]], RunSteps.Continuum), Context, new Told(_ => stop.Cancel()), stop.Token));
        string[] files = Files(folder["out"]);
        Assert.DoesNotContain("spectra.ecsv", files);
        Assert.DoesNotContain(files, static f => f.EndsWith(".part", StringComparison.Ordinal));
        Assert.Single(File.ReadAllLines(folder["out", "journal.jsonl"]));
    }

    [Fact]
    public void The_plan_that_is_written_is_the_plan_that_ran()
    {
        using var folder = new TemporaryFolder();
        string file = folder.WriteSpectrum("star.csv", 5);
        RunPlan plan = Plan(folder, [file], RunSteps.Continuum | RunSteps.Lines) with { StiffnessAngstrom = 120.0, LineVelocityKmPerS = -3.5 };
        RunEngine.Run(plan, Context, null, TestContext.Current.CancellationToken);
        string text = File.ReadAllText(folder["out", "plan.toml"]);
        Assert.Equal(text, PlanFile.Write(PlanFile.Parse(text)));
        RunPlan back = PlanFile.Parse(text);
        Assert.Equal((plan.Steps, 120.0, -3.5), (back.Steps, back.StiffnessAngstrom, back.LineVelocityKmPerS));
        Assert.Equal(plan.Inputs, back.Inputs);
    }

    [Theory]
    [InlineData("ecsv")]
    [InlineData("csv")]
    [InlineData("json")]
    [InlineData("fits")]
    [InlineData("votable")]
    [InlineData("parquet")]
    public void Tables_come_in_every_format(string format)
    {
        using var folder = new TemporaryFolder();
        string file = folder.WriteSpectrum("star.csv", 6);
        RunPlan plan = PlanFile.Parse($"format = '{format}'\nsteps = ['lines']\n[lines]\nlists = ['balmer']\nvelocity = 0\n") with
        {
            Inputs = [file],
            OutputFolder = folder["out"],
        };
        RunOutcome outcome = RunEngine.Run(plan, Context, null, TestContext.Current.CancellationToken);
        Assert.Equal(2, outcome.Files.Count(f => f.StartsWith("lines.", StringComparison.Ordinal) || f.StartsWith("spectra.", StringComparison.Ordinal)));
        Assert.All(outcome.Files, f => Assert.True(new FileInfo(folder["out", f]).Length > 0));
    }

    [Fact]
    public void A_run_without_inputs_folder_or_steps_is_refused()
    {
        using var folder = new TemporaryFolder();
        RunPlan plan = Plan(folder, [folder["a.csv"]], RunSteps.All);
        Refused<RunPlanException>(plan with { Inputs = [] });
        Refused<RunPlanException>(plan with { OutputFolder = "" });
        Refused<RunPlanException>(plan with { Jobs = 0 });
        Refused<RunPlanException>(plan with { Steps = RunSteps.None });
        Refused<FileNotFoundException>(plan with { LineLists = ["no-such-list"] });

        static void Refused<T>(RunPlan plan)
            where T : Exception =>
            Assert.Throws<T>(() => RunEngine.Run(plan, Context, null, TestContext.Current.CancellationToken));
    }

    private static RunPlan Plan(TemporaryFolder folder, IReadOnlyList<string> inputs, RunSteps steps) =>
        new() { Inputs = inputs, OutputFolder = folder["out"], Steps = steps };

    private static Table Read(string path)
    {
        using FileStream stream = File.OpenRead(path);
        return TableReader.Read(stream);
    }

    private static string[] Files(string folder) =>
        [.. Directory.GetFiles(folder, "*", SearchOption.AllDirectories).Select(f => Path.GetRelativePath(folder, f)).Order(StringComparer.Ordinal)];

    private sealed class Told(Action<RunProgress>? then = null) : IProgress<RunProgress>
    {
        public List<RunProgress> Reports { get; } = [];

        public void Report(RunProgress value)
        {
            lock (Reports)
            {
                Reports.Add(value);
            }

            then?.Invoke(value);
        }
    }
}
