using System;
using System.Collections.Generic;
using System.CommandLine;
using System.CommandLine.Parsing;

namespace StarLines.Cli.Options;

/// <summary>Makes options whose values are read by a function that explains what it does not like.</summary>
internal static class Make
{
    /// <summary>An option that is given once.</summary>
    /// <param name="name">Name with its dashes.</param>
    /// <param name="valueName">What stands for the value in the help.</param>
    /// <param name="description">One sentence.</param>
    /// <param name="read">Reads the value; throws <see cref="FormatException"/>.</param>
    /// <param name="words">Words that a shell may complete.</param>
    public static Option<T> One<T>(
        string name, string valueName, string description, Func<string, T> read, params string[] words)
    {
        var option = new Option<T>(name)
        {
            HelpName = valueName,
            Description = description,
            Arity = ArgumentArity.ExactlyOne,
            CustomParser = result => Read(result, name, result.Tokens[0].Value, read)!,
        };
        Complete(option, words);
        return option;
    }

    /// <summary>An option that may be given several times.</summary>
    /// <param name="name">Name with its dashes.</param>
    /// <param name="valueName">What stands for the value in the help.</param>
    /// <param name="description">One sentence.</param>
    /// <param name="read">Reads one value; throws <see cref="FormatException"/>.</param>
    /// <param name="mayRepeat">False for an option that shares this form and is given once.</param>
    public static Option<List<T>> Many<T>(
        string name, string valueName, string description, Func<string, T> read, bool mayRepeat = true)
    {
        return new Option<List<T>>(name)
        {
            HelpName = valueName,
            Description = mayRepeat ? description + " May repeat." : description,
            Arity = mayRepeat ? ArgumentArity.OneOrMore : ArgumentArity.ExactlyOne,
            AllowMultipleArgumentsPerToken = false,
            DefaultValueFactory = static _ => [],
            CustomParser = result => ReadAll(result, name, read),
        };
    }

    /// <summary>An option without a value.</summary>
    public static Option<bool> Flag(string name, string description) => new(name) { Description = description };

    /// <summary>Lets a shell complete the words of an option.</summary>
    public static void Complete(Option option, params string[] words)
    {
        if (words.Length != 0)
        {
            option.CompletionSources.Clear();
            option.CompletionSources.Add(words);
        }
    }

    private static List<T> ReadAll<T>(ArgumentResult result, string name, Func<string, T> read)
    {
        var values = new List<T>(result.Tokens.Count);
        foreach (Token token in result.Tokens)
        {
            if (Read(result, name, token.Value, read) is { } value)
            {
                values.Add(value);
            }
        }

        return values;
    }

    private static T? Read<T>(ArgumentResult result, string name, string text, Func<string, T> read)
    {
        try
        {
            return read(text);
        }
        catch (FormatException problem)
        {
            result.AddError($"{name}: {problem.Message}");
            return default;
        }
    }
}
