using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.Tables.Delimited;

/// <summary>Names of columns and metadata from what stands above the rows of delimited text.</summary>
internal static class CsvHeader
{
    private static readonly char[] s_blanks = [' ', '\t', ',', ';', '|'];

    /// <summary>Takes the header row off the records, or makes names up.</summary>
    internal static string[] Take(DelimitedText text, bool quotesMeanText)
    {
        if (IsHeader(text, quotesMeanText))
        {
            string[] names = new string[text.CellCount(0)];
            for (int c = 0; c < names.Length; c++)
            {
                names[c] = text.Text(text.Cell(0, c));
            }

            text.Skip(1);
            return MakeUnique(EndsInNothing(text, names) ? names[..^1] : names);
        }

        return MakeUnique(FromComment(text) ?? new string[text.CellCount(0)]);
    }

    /// <summary>Comments to metadata.</summary>
    internal static TableMetadata Metadata(List<(int RecordsBefore, string Text)> comments)
    {
        var metadata = new TableMetadata();
        var lines = new List<string>();
        foreach ((_, string comment) in comments)
        {
            string line = comment.Trim();
            lines.Add(line);
            int mark = line.AsSpan().IndexOfAny(':', '=');
            string key = mark > 0 ? line[..mark].Trim() : "";
            bool named = key.Length > 0 && !key.AsSpan().ContainsAny(s_blanks);
            if (named && !metadata.TryGetValue(key, out _))
            {
                metadata.Add(key, line[(mark + 1)..].Trim());
            }
        }

        if (lines.Count > 0)
        {
            metadata["comments"] = MetadataValue.FromTexts(lines);
        }

        return metadata;
    }

    /// <summary>Gives nameless columns a name and equal names a number.</summary>
    internal static string[] MakeUnique(string?[] names)
    {
        string[] unique = new string[names.Length];
        var seen = new HashSet<string>(StringComparer.Ordinal);
        for (int c = 0; c < names.Length; c++)
        {
            string wanted = string.IsNullOrEmpty(names[c])
                ? string.Create(CultureInfo.InvariantCulture, $"col{c + 1}")
                : names[c]!;
            unique[c] = wanted;
            for (int n = 2; !seen.Add(unique[c]); n++)
            {
                unique[c] = string.Create(CultureInfo.InvariantCulture, $"{wanted}_{n}");
            }
        }

        return unique;
    }

    private static bool IsHeader(DelimitedText text, bool quotesMeanText)
    {
        for (int c = 0; c < text.CellCount(0); c++)
        {
            DelimitedCell cell = text.Cell(0, c);
            bool isText = cell.Quoted && quotesMeanText;
            if (!isText && CellReader.TryDouble(text.Bytes(cell), out _))
            {
                return false;
            }
        }

        return true;
    }

    private static string[]? FromComment(DelimitedText text)
    {
        int columns = text.CellCount(0);
        for (int i = text.Comments.Count - 1; i >= 0; i--)
        {
            if (text.Comments[i].RecordsBefore > 0)
            {
                continue;
            }

            string[] names = text.Comments[i].Text.Split(s_blanks, StringSplitOptions.RemoveEmptyEntries);
            return names.Length == columns ? names : null;
        }

        return null;
    }

    /// <summary>True where a separator ends every line.</summary>
    private static bool EndsInNothing(DelimitedText text, string[] names)
    {
        int last = names.Length - 1;
        bool nothing = last > 0 && names[last].Length == 0;
        for (int r = 0; r < text.Count && nothing; r++)
        {
            nothing = text.CellCount(r) == last || (text.CellCount(r) == last + 1 && text.Cell(r, last).Length == 0);
        }

        return nothing;
    }
}
