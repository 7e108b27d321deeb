using System;

namespace StarLines.Tables.Delimited;

/// <summary>Finds what separates the cells of a text.</summary>
internal static class Separators
{
    /// <summary>Records looked at: enough to see past a title row, few enough to cost nothing.</summary>
    private const int SampleRecords = 30;

    /// <summary>Candidates in order of trust; 0 stands for blanks.</summary>
    private static ReadOnlySpan<byte> Candidates => "\t;,\0"u8;

    /// <summary>The separator that splits all sampled records into the same number of cells, else the one that splits most; comma for a single column.</summary>
    internal static byte Detect(byte[] bytes, int start, int line, string source)
    {
        byte best = (byte)',';
        int bestScore = 1;
        foreach (byte candidate in Candidates)
        {
            int score = Score(bytes, start, line, candidate, source);
            if (score > bestScore)
            {
                best = candidate;
                bestScore = score;
            }
        }

        return best;
    }

    private static int Score(byte[] bytes, int start, int line, byte separator, string source)
    {
        const int Consistent = 1 << 20;
        DelimitedText sample;
        try
        {
            sample = DelimitedParser.Parse(bytes, start, line, separator, source, SampleRecords);
        }
        catch (TableFormatException)
        {
            // Quotes that do not fit this separator speak against it, or against every candidate: then comma is tried and reports.
            return 0;
        }

        int total = 0;
        bool same = sample.Count > 0;
        for (int r = 0; r < sample.Count; r++)
        {
            total += sample.CellCount(r);
            same = same && sample.CellCount(r) == sample.CellCount(0);
        }

        if (sample.Count == 0 || total <= sample.Count || SplitsQuotes(sample))
        {
            return 0;
        }

        // All consistent candidates tie, so the first in order of trust wins.
        return same ? Consistent : total / sample.Count;
    }

    /// <summary>A quote inside a cell that is not quoted: the separator has cut a quoted text.</summary>
    private static bool SplitsQuotes(DelimitedText sample)
    {
        foreach (DelimitedCell cell in sample.Cells)
        {
            if (!cell.Quoted && sample.Bytes(cell).Contains((byte)'"'))
            {
                return true;
            }
        }

        return false;
    }
}
