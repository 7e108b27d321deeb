using System;
using System.CommandLine;
using System.IO;
using StarLines.Cli.Options;
using StarLines.Cli.Output;

namespace StarLines.Cli;

/// <summary>Parses a command line, runs its command and turns what goes wrong into one sentence and an exit code.</summary>
internal static class Application
{
    /// <summary>Runs one command line.</summary>
    /// <param name="args">The words after the program's name.</param>
    /// <param name="terminal">Where data and words go.</param>
    /// <returns>The exit code.</returns>
    public static int Run(string[] args, Terminal terminal)
    {
        var common = new CommonOptions();
        RootCommand root = CommandTree.Create(terminal, new Provenance(args), common);
        ParseResult parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        try
        {
            string? usage = UsageProblem.Find(parsed);
            if (usage is not null)
            {
                terminal.SayError(usage);
                return ExitCode.Usage;
            }

            common.Apply(parsed, terminal);
            int code = parsed.Invoke(new InvocationConfiguration
            {
                EnableDefaultExceptionHandler = false,
                ProcessTerminationTimeout = null,
                Output = terminal.Out,
                Error = terminal.Error,
            });
            terminal.Out.Flush();
            return code;
        }
        catch (UsageException problem)
        {
            terminal.SayError(problem.Message);
            return ExitCode.Usage;
        }
        catch (OperationCanceledException)
        {
            terminal.SayError("Stopped by Ctrl-C; files already finished stay, nothing is left half written.");
            return ExitCode.Interrupted;
        }
        catch (IOException problem)
        {
            // Standard output was closed by the reader (as `head` does), or a result could not be written.
            terminal.SayError(problem.Message);
            return ExitCode.SomeFailed;
        }
        catch (UnauthorizedAccessException problem)
        {
            terminal.SayError(problem.Message + " Choose another place with --out.");
            return ExitCode.SomeFailed;
        }
    }
}
