using System;
using System.Collections.Generic;
using System.Linq;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>Dependencies point one way: formats, domain, figures and runs, program.</summary>
public sealed class LayerRules
{
    /// <summary>Which assemblies of ours and of others each project may use, besides the base class library.</summary>
    private static readonly Dictionary<string, string[]> Allowed = new(StringComparer.Ordinal)
    {
        ["StarLines.Fits"] = [],
        ["StarLines.Tables"] = ["Parquet"],
        ["StarLines"] = ["StarLines.Fits", "StarLines.Tables", "MathNet.Numerics"],
        ["StarLines.Plotting"] = ["StarLines.Core", "ScottPlot", "SkiaSharp"],
        ["StarLines.Runs"] = ["StarLines.Core", "StarLines.Tables", "StarLines.Fits", "StarLines.Plotting", "Tomlyn"],
        ["StarLines.Cli"] =
        [
            "StarLines.Core", "StarLines.Tables", "StarLines.Fits", "StarLines.Plotting", "StarLines.Runs",
            "System.CommandLine", "Spectre.Console", "Spectre.Console.Ansi",
        ],
    };

    private static readonly AssemblyUses Uses = AssemblyUses.Of(ProjectUnderTest.Assembly);

    /// <summary>Below the runs nothing starts a thread, so that the caller decides what runs beside what.</summary>
    private static bool MayRunInParallel => ProjectUnderTest.Name is "StarLines.Runs" or "StarLines.Cli";

    [Fact]
    public void Only_the_layers_below_are_used()
    {
        string[] allowed = Allowed[ProjectUnderTest.Name];
        IEnumerable<string> others = Uses.Assemblies.Where(static name => !IsBaseClassLibrary(name));
        Assert.Empty(others.Except(allowed, StringComparer.Ordinal));
    }

    [Fact]
    public void Only_the_program_writes_to_the_console()
    {
        bool isProgram = ProjectUnderTest.Name == "StarLines.Cli";
        Assert.Equal(isProgram, Uses.Types.Contains("System.Console"));
    }

    [Fact]
    public void Only_runs_and_the_program_start_threads()
    {
        string[] threads =
        [
            "System.Threading.Thread", "System.Threading.ThreadPool", "System.Threading.Tasks.Parallel",
            "System.Threading.Tasks.TaskFactory", "System.Linq.ParallelEnumerable", "System.Threading.Timer",
        ];
        IEnumerable<string> found = Uses.Types.Intersect(threads, StringComparer.Ordinal)
            .Concat(Uses.Members.Where(static member => member == "System.Threading.Tasks.Task.Run"));
        Assert.True(MayRunInParallel || !found.Any(), "Threads are started through " + string.Join(", ", found));
    }

    [Fact]
    public void Only_runs_and_the_program_read_the_clock()
    {
        string[] clocks =
        [
            "System.DateTime.get_Now", "System.DateTime.get_UtcNow", "System.DateTime.get_Today",
            "System.DateTimeOffset.get_Now", "System.DateTimeOffset.get_UtcNow", "System.TimeProvider.get_System",
            "System.Environment.get_TickCount", "System.Environment.get_TickCount64",
            "System.Diagnostics.Stopwatch.StartNew", "System.Diagnostics.Stopwatch.GetTimestamp",
        ];
        IEnumerable<string> found = Uses.Members.Intersect(clocks, StringComparer.Ordinal);
        Assert.True(MayRunInParallel || !found.Any(), "The clock is read through " + string.Join(", ", found));
    }

    [Fact]
    public void Nobody_draws_random_numbers_without_a_seed()
    {
        Assert.DoesNotContain("System.Random.get_Shared", Uses.Members);
    }

    private static bool IsBaseClassLibrary(string name) =>
        name is "netstandard" or "mscorlib" or "Microsoft.Win32.Primitives"
        || (name.StartsWith("System.", StringComparison.Ordinal) && name != "System.CommandLine");
}
