using Xunit;

namespace StarLines.Cli.Tests;

public sealed class UsageTests
{
    [Theory]
    [InlineData("", "Give a command")]
    [InlineData("complition", "did you mean 'completion'?")]
    [InlineData("completion bush", "did you mean 'bash'?")]
    [InlineData("completion bash --quit", "did you mean '--quiet'?")]
    [InlineData("completion", "SHELL")]
    public void A_wrong_command_line_exits_2_with_one_sentence_and_no_data(string line, string hint)
    {
        CommandResult result = CommandLine.Run(line.Split(' ', System.StringSplitOptions.RemoveEmptyEntries));
        Assert.Equal(2, result.Code);
        Assert.Empty(result.Out);
        Assert.Contains(hint, Assert.Single(result.ErrorLines), System.StringComparison.Ordinal);
    }

    [Fact]
    public void Help_lists_the_commands_and_exits_0()
    {
        CommandResult result = CommandLine.Run("--help");
        Assert.Equal(0, result.Code);
        Assert.Contains("completion", result.Out, System.StringComparison.Ordinal);
        Assert.Empty(result.Error);
    }

    [Theory]
    [InlineData("bash")]
    [InlineData("zsh")]
    [InlineData("fish")]
    [InlineData("powershell")]
    public void Completion_asks_the_program_for_words(string shell)
    {
        CommandResult result = CommandLine.Run("completion", shell);
        Assert.Equal(0, result.Code);
        Assert.Contains("[suggest:", result.Out, System.StringComparison.Ordinal);
    }

    [Fact]
    public void Suggestions_complete_a_command()
    {
        CommandResult result = CommandLine.Run("[suggest:13]", "starlines com");
        Assert.Equal("completion", result.Out.Trim());
    }
}
