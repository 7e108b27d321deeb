using System;
using System.Collections.Generic;

namespace StarLines.Cli;

/// <summary>Finds the word that a mistyped one was meant to be.</summary>
internal static class NearestWord
{
    /// <summary>The nearest word, or null where none is near: at most one slip in three letters.</summary>
    /// <param name="word">What was typed.</param>
    /// <param name="candidates">The right words.</param>
    public static string? Find(string word, IEnumerable<string> candidates)
    {
        string? best = null;
        int bestDistance = Math.Max(1, word.TrimStart('-').Length / 3) + 1;
        foreach (string candidate in candidates)
        {
            bool begins = word.Length > 2 && candidate.StartsWith(word, StringComparison.OrdinalIgnoreCase);
            int distance = begins ? 1 : Distance(word.ToUpperInvariant(), candidate.ToUpperInvariant());
            if (distance < bestDistance)
            {
                best = candidate;
                bestDistance = distance;
            }
        }

        return best;
    }

    /// <summary>Letters to insert, drop, change or swap with a neighbour (optimal string alignment).</summary>
    internal static int Distance(string a, string b)
    {
        var table = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
        {
            for (int j = 0; j <= b.Length; j++)
            {
                table[i, j] = i == 0 ? j : j == 0 ? i : Step(table, a, b, i, j);
            }
        }

        return table[a.Length, b.Length];
    }

    private static int Step(int[,] table, string a, string b, int i, int j)
    {
        int change = table[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
        int least = Math.Min(change, 1 + Math.Min(table[i - 1, j], table[i, j - 1]));
        bool swapped = i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1];
        return swapped ? Math.Min(least, table[i - 2, j - 2] + 1) : least;
    }
}
