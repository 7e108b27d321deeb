using System;
using System.IO;

namespace StarLines.Cli;

/// <summary>Turns what went wrong with an input into one sentence that names it and the cure.</summary>
internal static class ErrorSentence
{
    /// <summary>The sentence.</summary>
    /// <param name="problem">What was thrown.</param>
    /// <param name="name">The input as the user named it.</param>
    public static string Of(Exception problem, string name)
    {
        string sentence = problem switch
        {
            FileNotFoundException or DirectoryNotFoundException => "there is no such file" + NearName(name),
            UnauthorizedAccessException when Directory.Exists(name) => "this is a folder; name the files in it, such as " + Path.Combine(name, "*.fits") + ".",
            UnauthorizedAccessException => "the file may not be read; check its permissions.",
            EndOfStreamException => "the file ends too early; get it again.",
            ArgumentException or IOException or InvalidDataException or FormatException or NotSupportedException => FirstLine(problem.Message),
            _ when problem.GetType().Namespace?.StartsWith(nameof(StarLines), StringComparison.Ordinal) == true => FirstLine(problem.Message),
            _ => $"the program met what it was not made for ({problem.GetType().Name}: {FirstLine(problem.Message)}); please report it with the file.",
        };
        string file = Path.GetFileName(name.Split('#')[0]);
        bool isNamed = file.Length > 0 && sentence.Contains(file, StringComparison.Ordinal);
        return isNamed ? sentence : $"{name}: {sentence}";
    }

    private static string FirstLine(string message)
    {
        string line = message.Split('\n')[0].TrimEnd();

        // The class library appends the name of a parameter, which means nothing to a user.
        int parameter = line.IndexOf(" (Parameter '", StringComparison.Ordinal);
        return parameter < 0 ? line : line[..parameter];
    }

    private static string NearName(string name)
    {
        string path = name.Split('#')[0];
        string folder = Path.GetDirectoryName(path) is { Length: > 0 } given ? given : ".";
        if (!Directory.Exists(folder))
        {
            return $", nor a folder {folder}; check the path.";
        }

        string[] files = Array.ConvertAll(Directory.GetFiles(folder), static file => Path.GetFileName(file));
        string? near = NearestWord.Find(Path.GetFileName(path), files);
        return near is null ? "; check the name." : $"; did you mean {Path.Combine(Path.GetDirectoryName(path) ?? "", near)}?";
    }
}
