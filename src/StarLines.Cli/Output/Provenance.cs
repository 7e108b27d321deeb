using System;
using System.Buffers;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Reflection;
using System.Security.Cryptography;
using StarLines.LineLists;
using StarLines.Runs;
using StarLines.Tables;

namespace StarLines.Cli.Output;

/// <summary>What every table says about its making: program, command line, date, inputs and line lists.</summary>
internal sealed class Provenance
{
    /// <summary>Characters that no shell takes for its own.</summary>
    private static readonly SearchValues<char> PlainCharacters =
        SearchValues.Create("ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-+_./,:=@%");

    /// <summary>Options that change no result: two runs that differ in them give the same bytes.</summary>
    private static readonly string[] Idle = ["--jobs", "--quiet", "--verbose"];

    private readonly List<(string Name, string Sha256)> _inputs = [];
    private readonly List<(string Name, string Sha256)> _lists = [];
    private readonly string _commandLine;

    /// <summary>Begins with a command line.</summary>
    /// <param name="words">The words after the program's name.</param>
    public Provenance(IReadOnlyList<string> words)
    {
        var quoted = new List<string>(words.Count + 1) { "starlines" };
        for (int i = 0; i < words.Count; i++)
        {
            string word = words[i];
            if (Array.Exists(Idle, idle => word == idle || word.StartsWith(idle + "=", StringComparison.Ordinal)))
            {
                i += word == "--jobs" ? 1 : 0;
                continue;
            }

            quoted.Add(NeedsQuotes(word) ? "'" + word.Replace("'", "'\\''", StringComparison.Ordinal) + "'" : word);
        }

        _commandLine = string.Join(' ', quoted);
    }

    /// <summary>What the tables of a run say about their making.</summary>
    public RunContext ToRunContext() => new("StarLines " + Version, _commandLine, Now());

    /// <summary>Version of the program.</summary>
    public static string Version { get; } =
        typeof(Provenance).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()!.InformationalVersion;

    /// <summary>Adds a file that was read, once; anything that is no file, such as standard input, is named alone.</summary>
    /// <param name="source">The file, or a part of it as <c>FILE#HDU:ROW</c>.</param>
    public void AddInput(string source)
    {
        string path = File.Exists(source) ? source : source.Split('#')[0];
        if (_inputs.Exists(input => input.Name == path))
        {
            return;
        }

        string sha256 = "";
        if (File.Exists(path))
        {
            using FileStream stream = File.OpenRead(path);
            sha256 = Convert.ToHexStringLower(SHA256.HashData(stream));
        }

        _inputs.Add((path, sha256));
    }

    /// <summary>Adds a line list that was used, once.</summary>
    public void AddList(LineList list)
    {
        if (!_lists.Contains((list.Name, list.Sha256)))
        {
            _lists.Add((list.Name, list.Sha256));
        }
    }

    /// <summary>The making of a spectrum in a few lines.</summary>
    /// <param name="source">The spectrum it was made from.</param>
    public IReadOnlyList<string> History(string source)
    {
        AddInput(source);
        string path = File.Exists(source) ? source : source.Split('#')[0];
        string sha256 = _inputs.Find(input => input.Name == path).Sha256;
        var lines = new List<string> { $"StarLines {Version}: {_commandLine}", "Date (UTC): " + NowIso() };
        lines.Add(sha256.Length == 0 ? $"Input: {source}" : $"Input: {source}, SHA-256 {sha256}");
        return lines;
    }

    /// <summary>Writes everything into the metadata of a table.</summary>
    public void WriteTo(TableMetadata metadata)
    {
        metadata["program"] = "StarLines " + Version;
        metadata["command_line"] = _commandLine;
        metadata["date_utc"] = NowIso();
        if (_inputs.Count != 0)
        {
            metadata["inputs"] = MetadataValue.FromList(_inputs.ConvertAll(static input => Entry("file", input)));
        }

        if (_lists.Count != 0)
        {
            metadata["line_lists"] = MetadataValue.FromList(_lists.ConvertAll(static list => Entry("name", list)));
        }
    }

    private static string NowIso() => Now().ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);

    private static DateTime Now() => RunContext.Now();

    private static MetadataValue Entry(string key, (string Name, string Sha256) item)
    {
        var entry = new TableMetadata { [key] = item.Name };
        if (item.Sha256.Length != 0)
        {
            entry["sha256"] = item.Sha256;
        }

        return entry;
    }

    private static bool NeedsQuotes(string word) =>
        word.Length == 0 || word.AsSpan().IndexOfAnyExcept(PlainCharacters) >= 0;
}
