using System.CommandLine;
using System.CommandLine.Help;
using StarLines.Cli.Commands;
using StarLines.Cli.Options;
using StarLines.Cli.Output;

namespace StarLines.Cli;

/// <summary>All commands of the program.</summary>
internal static class CommandTree
{
    private const string Description =
        "Measures stellar spectra: continuum, equivalent widths, line profiles and radial velocities.";

    /// <summary>Makes the tree.</summary>
    /// <param name="terminal">Where the commands write.</param>
    /// <param name="provenance">What their tables say about their making.</param>
    /// <param name="common">Options of every command.</param>
    public static RootCommand Create(Terminal terminal, Provenance provenance, CommonOptions common)
    {
        var root = new RootCommand(Description)
        {
            InspectCommand.Create(terminal, provenance),
            ConvertCommand.Create(terminal, provenance),
            NormalizeCommand.Create(terminal, provenance),
            MeasureCommand.Create(terminal, provenance),
            VelocityCommand.Create(terminal, provenance),
            RunCommand.Create(terminal, provenance),
            BarycentreCommand.Create(terminal, provenance),
            LinesCommand.Create(terminal, provenance),
            PlotCommand.Create(terminal, provenance),
            CompletionCommand.Create(terminal),
        };
        common.AddTo(root);
        foreach (Option option in root.Options)
        {
            if (option is HelpOption { Action: HelpAction help } asked)
            {
                help.MaxWidth = terminal.Width;
                asked.Action = new HelpWithExample(help);
            }
        }

        return root;
    }
}
