using System;
using System.Collections.Generic;
using System.IO;

namespace StarLines.Cli.Output;

/// <summary>The formats a table can be written in.</summary>
internal enum OutputFormat
{
    /// <summary>Enhanced character-separated values.</summary>
    Ecsv,

    /// <summary>Comma-separated values.</summary>
    Csv,

    /// <summary>JSON.</summary>
    Json,

    /// <summary>A FITS binary table.</summary>
    Fits,

    /// <summary>VOTable.</summary>
    VoTable,

    /// <summary>Apache Parquet.</summary>
    Parquet,

    /// <summary>Columns aligned for eyes.</summary>
    Aligned,
}

/// <summary>Names and file endings of the formats.</summary>
internal static class OutputFormats
{
    /// <summary>The words of <c>--format</c>.</summary>
    public static (string Word, OutputFormat Value)[] Words { get; } =
    [
        ("ecsv", OutputFormat.Ecsv), ("csv", OutputFormat.Csv), ("json", OutputFormat.Json),
        ("fits", OutputFormat.Fits), ("votable", OutputFormat.VoTable), ("parquet", OutputFormat.Parquet),
    ];

    private static readonly Dictionary<string, OutputFormat> ByExtension = new(StringComparer.OrdinalIgnoreCase)
    {
        [".ecsv"] = OutputFormat.Ecsv,
        [".csv"] = OutputFormat.Csv,
        [".json"] = OutputFormat.Json,
        [".fits"] = OutputFormat.Fits,
        [".fit"] = OutputFormat.Fits,
        [".fts"] = OutputFormat.Fits,
        [".vot"] = OutputFormat.VoTable,
        [".xml"] = OutputFormat.VoTable,
        [".votable"] = OutputFormat.VoTable,
        [".parquet"] = OutputFormat.Parquet,
    };

    /// <summary>The format that a file's ending names.</summary>
    /// <exception cref="UsageException">The ending names none.</exception>
    public static OutputFormat OfFile(string path)
    {
        string extension = Path.GetExtension(path);
        return ByExtension.TryGetValue(extension, out OutputFormat format)
            ? format
            : throw new UsageException(
                $"The ending '{extension}' of --out {path} names no format; use {string.Join(", ", ByExtension.Keys)}, or give --format.");
    }
}
