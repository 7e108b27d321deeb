using System;
using System.Collections.Generic;
using System.IO;
using System.Text;
using StarLines.IO;

namespace StarLines.Runs.Inputs;

/// <summary>Turns the inputs of a plan into files: folders, patterns and manifests are opened, always in the same order.</summary>
internal static class InputExpansion
{
    private static readonly string[] Endings =
        [".fits", ".fit", ".fts", ".csv", ".ecsv", ".vot", ".votable", ".xml", ".txt", ".dat", ".ascii"];

    /// <summary>All inputs, in order; a file named twice stays once where it was named first.</summary>
    /// <exception cref="RunPlanException">A folder or pattern holds nothing, or a manifest is wrong.</exception>
    internal static IReadOnlyList<RunInput> Expand(IReadOnlyList<string> names, SpectrumReadOptions reading)
    {
        var found = new List<(string Name, SpectrumReadOptions Reading)>();
        foreach (string name in names)
        {
            Add(found, name, reading);
        }

        var inputs = new List<RunInput>(found.Count);
        var seen = new HashSet<string>(StringComparer.Ordinal);
        var stems = new Dictionary<string, int>(StringComparer.OrdinalIgnoreCase);
        foreach ((string name, SpectrumReadOptions how) in found)
        {
            if (seen.Add(name))
            {
                inputs.Add(new RunInput(name, how, Unique(Stem(name), stems)));
            }
        }

        return inputs;
    }

    private static void Add(List<(string Name, SpectrumReadOptions Reading)> found, string name, SpectrumReadOptions reading)
    {
        if (Directory.Exists(name))
        {
            AddAll(found, FilesBelow(name), reading, $"The folder {name} holds no file with an ending of spectra ({string.Join(", ", Endings)}, also .gz).");
        }
        else if (!File.Exists(name) && Path.GetFileName(name).AsSpan().IndexOfAny('*', '?') >= 0)
        {
            string folder = Path.GetDirectoryName(name) is { Length: > 0 } given ? given : ".";
            string[] matches = Directory.Exists(folder) ? Directory.GetFiles(folder, Path.GetFileName(name)) : [];
            string[] files = folder == "." ? Array.ConvertAll(matches, static f => Path.GetFileName(f)) : matches;
            AddAll(found, Sorted(files), reading, $"No file matches {name}; check the folder and the pattern.");
        }
        else if (RunManifest.TryRead(name, reading, out IReadOnlyList<(string, SpectrumReadOptions)>? rows))
        {
            found.AddRange(rows);
        }
        else
        {
            found.Add((name, reading));
        }
    }

    private static void AddAll(
        List<(string Name, SpectrumReadOptions Reading)> found, string[] files, SpectrumReadOptions reading, string whenEmpty)
    {
        if (files.Length == 0)
        {
            throw new RunPlanException(whenEmpty);
        }

        foreach (string file in files)
        {
            found.Add((file, reading));
        }
    }

    private static string[] FilesBelow(string folder) => Sorted(Array.FindAll(
        Directory.GetFiles(folder, "*", SearchOption.AllDirectories),
        file =>
        {
            string plain = file.EndsWith(".gz", StringComparison.OrdinalIgnoreCase) ? file[..^3] : file;
            bool hidden = Path.GetFileName(file).StartsWith('.');
            return !hidden && Array.Exists(Endings, e => plain.EndsWith(e, StringComparison.OrdinalIgnoreCase));
        }));

    private static string[] Sorted(string[] files)
    {
        Array.Sort(files, StringComparer.Ordinal);
        return files;
    }

    // File name without its endings; + and ~ are kept for parts of a file and for equal names.
    private static string Stem(string name)
    {
        string path = File.Exists(name) ? name : name.Split('#')[0];
        string part = name[path.Length..];
        string file = Path.GetFileName(path);
        if (file.EndsWith(".gz", StringComparison.OrdinalIgnoreCase))
        {
            file = file[..^3];
        }

        return Safe(Path.GetFileNameWithoutExtension(file) + part);
    }

    /// <summary>A text as a part of a file name.</summary>
    internal static string Safe(string text)
    {
        var safe = new StringBuilder(text.Length);
        foreach (char letter in text)
        {
            safe.Append(char.IsAsciiLetterOrDigit(letter) || letter is '.' or '-' or '_' ? letter : '_');
        }

        return safe.Length == 0 ? "_" : safe.ToString();
    }

    private static string Unique(string stem, Dictionary<string, int> stems)
    {
        int times = stems.GetValueOrDefault(stem) + 1;
        stems[stem] = times;
        return times == 1 ? stem : FormattableString.Invariant($"{stem}~{times}");
    }
}
