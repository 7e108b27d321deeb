using System;
using System.IO;

namespace StarLines.Cli.Output;

/// <summary>Names of output files after the spectrum they come from.</summary>
internal static class SpectrumName
{
    /// <summary>The file's name without folder and endings; a part of a file adds its HDU and row: <c>night.fits#1:3</c> gives <c>night-1-3</c>.</summary>
    /// <param name="source">The spectrum as the user names it.</param>
    public static string Of(string source)
    {
        int hash = source.LastIndexOf('#');
        bool hasPart = hash > 0 && !source[hash..].Contains(Path.DirectorySeparatorChar, StringComparison.Ordinal);
        string name = Path.GetFileName(hasPart ? source[..hash] : source);
        if (name.EndsWith(".gz", StringComparison.OrdinalIgnoreCase))
        {
            name = name[..^3];
        }

        string stem = Path.GetFileNameWithoutExtension(name);
        return hasPart ? stem + "-" + source[(hash + 1)..].Replace(':', '-') : stem;
    }
}
