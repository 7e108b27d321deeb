using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace StarLines.IO;

/// <summary>Plain text with free lines above its numbers, as instruments and people write it.</summary>
internal static class TextPreamble
{
    /// <summary>A preamble is looked for in this many bytes.</summary>
    private const int SearchedBytes = 1 << 16;

    private static readonly char[] Separators = [' ', '\t', ',', ';', '|'];

    /// <summary>Turns the free lines above the numbers into comments; the names of the columns, just above the numbers, stay.</summary>
    internal static byte[] Comment(byte[] bytes)
    {
        if (bytes[0] is (byte)'<' or (byte)'{' or (byte)'[' || bytes.AsSpan().StartsWith("PAR1"u8) || bytes.AsSpan().StartsWith("# %ECSV"u8)
            || bytes[0] is 0xFF or 0xFE)
        {
            return bytes;
        }

        string head = Encoding.Latin1.GetString(bytes, 0, Math.Min(bytes.Length, SearchedBytes));
        var lines = new List<(int Start, int Length)>();
        int at = 0;
        int dataCells = 0;
        while (at < head.Length && dataCells == 0)
        {
            int end = head.IndexOf('\n', at);
            end = end < 0 ? head.Length : end;
            dataCells = NumbersIn(head.AsSpan(at, end - at).Trim().ToString());
            if (dataCells == 0)
            {
                lines.Add((at, end - at));
            }

            at = end + 1;
        }

        return dataCells == 0 ? bytes : Rewrite(bytes, head, lines, dataCells);
    }

    private static byte[] Rewrite(byte[] bytes, string head, List<(int Start, int Length)> lines, int dataCells)
    {
        var free = new List<int>();
        int last = lines.Count - 1;
        while (last >= 0 && head.AsSpan(lines[last].Start, lines[last].Length).Trim().Length == 0)
        {
            last--;
        }

        for (int i = 0; i < lines.Count; i++)
        {
            string line = head.Substring(lines[i].Start, lines[i].Length).Trim();
            bool names = i == last && Cells(line).Length == dataCells;
            if (line.Length != 0 && line[0] != '#' && !names)
            {
                free.Add(lines[i].Start);
            }
        }

        if (free.Count == 0)
        {
            return bytes;
        }

        byte[] rewritten = new byte[bytes.Length + free.Count];
        int from = 0;
        int to = 0;
        foreach (int start in free)
        {
            bytes.AsSpan(from, start - from).CopyTo(rewritten.AsSpan(to));
            to += start - from;
            rewritten[to++] = (byte)'#';
            from = start;
        }

        bytes.AsSpan(from).CopyTo(rewritten.AsSpan(to));
        return rewritten;
    }

    /// <summary>The number of cells of a line that holds numbers only; 0 for any other.</summary>
    private static int NumbersIn(string line)
    {
        string[] cells = Cells(line);
        if (cells.Length < 2)
        {
            return 0;
        }

        foreach (string cell in cells)
        {
            if (!HeaderKeywords.TryParseNumber(cell, out _) && !double.TryParse(cell, NumberStyles.Float, CultureInfo.InvariantCulture, out _))
            {
                return 0;
            }
        }

        return cells.Length;
    }

    private static string[] Cells(string line) => line.Split(Separators, StringSplitOptions.RemoveEmptyEntries);
}
