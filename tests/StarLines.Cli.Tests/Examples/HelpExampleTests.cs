using System;
using System.Collections.Generic;
using System.IO;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Cli.Tests.Examples;

public sealed class HelpExampleTests
{
    public static TheoryData<string> Commands =>
    [
        "inspect", "convert", "normalize", "measure", "velocity", "run", "barycentre", "lines", "plot", "completion",
    ];

    [Theory]
    [MemberData(nameof(Commands))]
    public void The_example_of_the_help_runs(string command)
    {
        string help = CommandLine.Run(command, "--help").Out;
        string example = help[(help.IndexOf("Example:", StringComparison.Ordinal) + "Example:".Length)..].Trim();
        Assert.StartsWith("starlines " + command, example, StringComparison.Ordinal);
        string folder = Directory.CreateTempSubdirectory("starlines").FullName;
        try
        {
            CommandResult result = CommandLine.Run(Words(example, folder));
            Assert.True(result.Code == 0, result.Error);
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    // Inputs are those of the checkout, outputs go to a folder of their own.
    private static string[] Words(string example, string folder)
    {
        string[] words = example.Replace("'Fe I'", "Fe_I", StringComparison.Ordinal).Split(' ');
        var resolved = new List<string>();
        for (int i = 1; i < words.Length; i++)
        {
            resolved.Add(
                words[i - 1] == "--out" ? Path.Combine(folder, words[i])
                : words[i].StartsWith("examples/", StringComparison.Ordinal) ? Path.Combine(ReferenceData.RepositoryRoot, words[i])
                : words[i]);
        }

        return [.. resolved];
    }
}
