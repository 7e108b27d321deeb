using System;
using System.Collections.Generic;
using System.IO;
using System.Reflection;

namespace StarLines.LineLists;

/// <summary>The line lists that come with the program, and any other by its path.</summary>
public static class LineListCatalog
{
    private const string Prefix = "linelists/";
    private const string Suffix = ".ecsv";

    /// <summary>Names of the lists that come with the program, in alphabetical order.</summary>
    public static IReadOnlyList<string> Names { get; } = FindNames();

    /// <summary>Reads a list by its name or path.</summary>
    /// <param name="nameOrPath">A name of <see cref="Names"/>, in any case, else the path of a file.</param>
    /// <param name="medium">What the wavelengths of a file are where it does not say.</param>
    /// <returns>The list with the SHA-256 of its bytes.</returns>
    /// <exception cref="FileNotFoundException">There is neither such a name nor such a file; the message gives the nearest name.</exception>
    /// <exception cref="LineListFormatException">The file is not a line list.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static LineList Find(string nameOrPath, Medium medium = Medium.Unknown)
    {
        ArgumentNullException.ThrowIfNull(nameOrPath);
        foreach (string name in Names)
        {
            if (name.Equals(nameOrPath, StringComparison.OrdinalIgnoreCase))
            {
                using Stream stream = typeof(LineListCatalog).Assembly.GetManifestResourceStream(Prefix + name + Suffix)!;
                return LineListReader.Read(stream, name, medium);
            }
        }

        return File.Exists(nameOrPath) ? LineListReader.ReadFile(nameOrPath, medium) : throw NotFound(nameOrPath);
    }

    private static FileNotFoundException NotFound(string typed)
    {
        string? meant = NearestName.Of(typed, Names);
        string hint = meant is null ? "" : $"did you mean {meant}? ";
        return new FileNotFoundException(
            $"There is no line list and no file {typed}: {hint}The lists are {string.Join(", ", Names)}; or give the path of an ECSV or CSV file.", typed);
    }

    private static string[] FindNames()
    {
        Assembly assembly = typeof(LineListCatalog).Assembly;
        var names = new List<string>();
        foreach (string resource in assembly.GetManifestResourceNames())
        {
            if (resource.StartsWith(Prefix, StringComparison.Ordinal) && resource.EndsWith(Suffix, StringComparison.Ordinal))
            {
                names.Add(resource[Prefix.Length..^Suffix.Length]);
            }
        }

        names.Sort(StringComparer.Ordinal);
        return [.. names];
    }
}
