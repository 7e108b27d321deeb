using BenchmarkDotNet.Running;

namespace StarLines.Benchmarks;

/// <summary>Runs the benchmarks that the command line names.</summary>
internal static class Program
{
    private static void Main(string[] args) => BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run(args);
}
