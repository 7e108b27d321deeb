using System.CommandLine;

namespace StarLines.Cli.Options;

/// <summary>Options of every command.</summary>
internal sealed class CommonOptions
{
    private readonly Option<bool> _quiet = new("--quiet")
    {
        Description = "Say errors only: no progress, no notes.",
        Recursive = true,
    };

    private readonly Option<bool> _verbose = new("--verbose")
    {
        Description = "Say more about what is done.",
        Recursive = true,
    };

    /// <summary>Adds the options to the root.</summary>
    public void AddTo(RootCommand root)
    {
        root.Add(_quiet);
        root.Add(_verbose);
    }

    /// <summary>Tells the terminal how much to say.</summary>
    public void Apply(ParseResult parsed, Terminal terminal)
    {
        terminal.Quiet = parsed.GetValue(_quiet);
        terminal.Verbose = parsed.GetValue(_verbose);
    }
}
