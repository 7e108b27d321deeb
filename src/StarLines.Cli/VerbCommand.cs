using System.CommandLine;

namespace StarLines.Cli;

/// <summary>A command with an example that its help shows and that runs on <c>examples/</c>.</summary>
internal sealed class VerbCommand(string name, string description, string example) : Command(name, description)
{
    /// <summary>One command line that works in a checkout.</summary>
    public string Example { get; } = example;
}
