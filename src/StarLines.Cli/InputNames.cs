using System;
using System.Collections.Generic;
using System.IO;

namespace StarLines.Cli;

/// <summary>Resolves patterns that the shell left alone, as it does on Windows and between quotes.</summary>
internal static class InputNames
{
    /// <summary>The names with patterns replaced by the files that match, in order of name; a pattern that matches nothing stays.</summary>
    public static IReadOnlyList<string> Expand(IReadOnlyList<string> names)
    {
        var expanded = new List<string>(names.Count);
        foreach (string name in names)
        {
            string pattern = Path.GetFileName(name);
            string folder = Path.GetDirectoryName(name) ?? "";
            bool isPattern = pattern.AsSpan().IndexOfAny('*', '?') >= 0 && !File.Exists(name);
            string[] matches = isPattern && Directory.Exists(folder.Length == 0 ? "." : folder)
                ? Directory.GetFiles(folder.Length == 0 ? "." : folder, pattern)
                : [];
            if (matches.Length == 0)
            {
                expanded.Add(name);
                continue;
            }

            Array.Sort(matches, StringComparer.Ordinal);
            foreach (string match in matches)
            {
                expanded.Add(folder.Length == 0 ? Path.GetFileName(match) : match);
            }
        }

        return expanded;
    }
}
