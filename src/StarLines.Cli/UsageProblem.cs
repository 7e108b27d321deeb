using System.Collections.Generic;
using System.CommandLine;
using System.CommandLine.Parsing;
using System.Linq;

namespace StarLines.Cli;

/// <summary>Finds what is wrong with a command line and says it with the nearest right word.</summary>
internal static class UsageProblem
{
    /// <summary>The first problem as one sentence, or null where there is none.</summary>
    public static string? Find(ParseResult parsed)
    {
        if (parsed.Action is HelpWithExample || IsDirective(parsed))
        {
            return null;
        }

        Command command = parsed.CommandResult.Command;
        string? option = UnknownOption(parsed);
        if (option is not null)
        {
            return $"'{Path(command)}' has no option '{option}'{Hint(option, OptionNames(parsed.CommandResult))}";
        }

        if (command is RootCommand root)
        {
            string? word = parsed.UnmatchedTokens.Count == 0 ? null : parsed.UnmatchedTokens[0];
            string[] names = [.. root.Subcommands.Where(static c => !c.Hidden).Select(static c => c.Name)];
            if (word is not null)
            {
                return $"There is no command '{word}'{Hint(word, names)}";
            }

            return parsed.Errors.Count == 0 ? null : "Give a command; 'starlines --help' lists them.";
        }

        if (parsed.Errors.Count == 0)
        {
            return null;
        }

        string sentence = parsed.Errors[0].Message.TrimEnd();
        return $"{sentence}{(sentence.EndsWith('.') ? "" : ".")} See '{Path(command)} --help'.";
    }

    /// <summary>A hint that names the nearest right word, and where to read on.</summary>
    public static string Hint(string word, IReadOnlyCollection<string> rightWords)
    {
        string? nearest = NearestWord.Find(word, rightWords);
        return nearest is null ? $"; there are {string.Join(", ", rightWords)}." : $"; did you mean '{nearest}'?";
    }

    private static bool IsDirective(ParseResult parsed) =>
        parsed.Tokens.Any(static token => token.Type == TokenType.Directive);

    private static string? UnknownOption(ParseResult parsed)
    {
        foreach (Token token in parsed.Tokens)
        {
            if (token.Type == TokenType.DoubleDash)
            {
                return null;
            }

            // A negative number is a value; anything else with a dash was meant as an option.
            bool isNumber = token.Value.Length > 1 && (char.IsAsciiDigit(token.Value[1]) || token.Value[1] == '.');
            if (token.Type == TokenType.Argument && token.Value.Length > 1 && token.Value[0] == '-' && !isNumber)
            {
                return token.Value.Split('=')[0];
            }
        }

        return null;
    }

    private static string[] OptionNames(CommandResult result)
    {
        IEnumerable<Option> options = result.Command.Options;
        for (SymbolResult? parent = result.Parent; parent is CommandResult above; parent = above.Parent)
        {
            options = options.Concat(above.Command.Options.Where(static option => option.Recursive));
        }

        return [.. options.Where(static option => !option.Hidden).Select(static option => option.Name)];
    }

    private static string Path(Command command) =>
        command is RootCommand ? "starlines" : "starlines " + command.Name;
}
