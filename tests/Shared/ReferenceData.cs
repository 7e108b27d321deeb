using System;
using System.IO;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>Finds test data: the copies in <c>tests/Data</c>, and the reference folder beside the checkout where there is one.</summary>
internal static class ReferenceData
{
    /// <summary>Names another place of the reference folder.</summary>
    private const string Variable = "STARLINES_REFERENCE";

    /// <summary>The top of the checkout.</summary>
    public static string RepositoryRoot { get; } = FindRoot();

    /// <summary>A file of <c>tests/Data</c>; it always exists.</summary>
    public static string DataFile(params string[] parts) =>
        Path.Combine([RepositoryRoot, "tests", "Data", .. parts]);

    /// <summary>A file or folder of the reference material; the calling test is skipped where it is absent.</summary>
    public static string Require(params string[] parts)
    {
        string root = Environment.GetEnvironmentVariable(Variable)
            ?? Path.Combine(Path.GetDirectoryName(RepositoryRoot)!, "shared", "reference");
        string path = Path.Combine([root, .. parts]);
        bool there = File.Exists(path) || Directory.Exists(path);
        Assert.SkipUnless(there, $"The reference material {Path.Combine(parts)} is not on this machine.");
        return path;
    }

    private static string FindRoot()
    {
        string? folder = AppContext.BaseDirectory;
        while (folder is not null && !File.Exists(Path.Combine(folder, "StarLines.sln")))
        {
            folder = Path.GetDirectoryName(folder);
        }

        return folder ?? throw new InvalidOperationException("The tests run outside a checkout.");
    }
}
