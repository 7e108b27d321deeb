using System;
using System.IO;

namespace StarLines.Runs;

/// <summary>Turns what went wrong with an input into one sentence.</summary>
internal static class RunError
{
    /// <summary>The sentence, with the input's name.</summary>
    internal static string Sentence(Exception problem, string name)
    {
        string sentence = problem switch
        {
            FileNotFoundException or DirectoryNotFoundException when !File.Exists(name) => "there is no such file; check the path.",
            UnauthorizedAccessException => "the file may not be read; check its permissions.",
            EndOfStreamException => "the file ends too early; get it again.",
            IOException or InvalidDataException or FormatException or ArgumentException or NotSupportedException => FirstLine(problem.Message),
            _ when IsOurs(problem) => FirstLine(problem.Message),
            _ => $"the program met what it was not made for ({problem.GetType().Name}: {FirstLine(problem.Message)}); please report it with the file.",
        };
        string file = Path.GetFileName(name.Split('#')[0]);
        return file.Length > 0 && sentence.Contains(file, StringComparison.Ordinal) ? sentence : $"{name}: {sentence}";
    }

    private static bool IsOurs(Exception problem) =>
        problem.GetType().Namespace?.StartsWith(nameof(StarLines), StringComparison.Ordinal) == true;

    private static string FirstLine(string message)
    {
        string line = message.Split('\n')[0].TrimEnd();
        int parameter = line.IndexOf(" (Parameter '", StringComparison.Ordinal);
        return parameter < 0 ? line : line[..parameter];
    }
}
