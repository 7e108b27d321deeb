using System;
using System.IO;
using PublicApiGenerator;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>
/// The public API is what is written down: set <c>STARLINES_UPDATE_API=1</c> and run the tests to write it anew.
/// </summary>
public sealed class PublicApiRules
{
    private const string Variable = "STARLINES_UPDATE_API";

    [Fact]
    public void The_public_API_is_the_listed_one()
    {
        string listing = ProjectUnderTest.Assembly.GeneratePublicApi(new ApiGeneratorOptions
        {
            IncludeAssemblyAttributes = false,
        }).ReplaceLineEndings("\n").TrimEnd() + "\n";
        string file = Path.Combine(
            ReferenceData.RepositoryRoot, "tests", ProjectUnderTest.Name + ".Tests", "PublicApi", ProjectUnderTest.Name + ".txt");
        if (Environment.GetEnvironmentVariable(Variable) == "1")
        {
            Directory.CreateDirectory(Path.GetDirectoryName(file)!);
            File.WriteAllText(file, listing);
        }

        Assert.True(File.Exists(file), $"There is no listing {file}; run the tests once with {Variable}=1.");
        string listed = File.ReadAllText(file).ReplaceLineEndings("\n");
        Assert.True(listed == listing, $"The public API changed; run the tests once with {Variable}=1 and commit {file}.");
    }
}
