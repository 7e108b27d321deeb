using System;
using System.IO;
using System.Text;

namespace StarLines.Cli.Tests;

/// <summary>Runs command lines in this process, as a shell would see them.</summary>
internal static class CommandLine
{
    /// <summary>Runs one command line.</summary>
    /// <param name="words">The words after the program's name.</param>
    public static CommandResult Run(params string[] words) => RunWith(Stream.Null, words);

    /// <summary>Runs one command line with bytes on standard input.</summary>
    public static CommandResult RunWith(Stream input, params string[] words)
    {
        using var output = new MemoryStream();
        using var error = new StringWriter { NewLine = "\n" };
        int code;
        using (var terminal = new Terminal(input, output, error))
        {
            code = Application.Run(words, terminal);
        }

        return new CommandResult(code, Encoding.UTF8.GetString(output.ToArray()), error.ToString());
    }
}

/// <summary>What a shell sees of a command.</summary>
internal sealed record CommandResult(int Code, string Out, string Error)
{
    /// <summary>The lines on standard error.</summary>
    public string[] ErrorLines => Error.Split('\n', StringSplitOptions.RemoveEmptyEntries);
}
