using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;

namespace StarLines.Cli;

/// <summary>The usual help, and after it the example of the command.</summary>
internal sealed class HelpWithExample(HelpAction usual) : SynchronousCommandLineAction
{
    /// <inheritdoc/>
    public override bool Terminating => true;

    /// <inheritdoc/>
    public override bool ClearsParseErrors => true;

    /// <inheritdoc/>
    public override int Invoke(ParseResult parseResult)
    {
        usual.Invoke(parseResult);
        if (parseResult.CommandResult.Command is VerbCommand verb)
        {
            parseResult.InvocationConfiguration.Output.WriteLine("Example:");
            parseResult.InvocationConfiguration.Output.WriteLine("  " + verb.Example);
        }

        return ExitCode.Done;
    }
}
