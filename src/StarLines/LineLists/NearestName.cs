using System;
using System.Collections.Generic;

namespace StarLines.LineLists;

/// <summary>Finds the name that was meant by a mistyped one.</summary>
internal static class NearestName
{
    /// <summary>The candidate with the fewest typing errors, at most a third of its letters; null where none is near.</summary>
    internal static string? Of(string typed, IEnumerable<string> candidates)
    {
        string? best = null;
        int bestDistance = int.MaxValue;
        foreach (string candidate in candidates)
        {
            int distance = Distance(typed.ToUpperInvariant(), candidate.ToUpperInvariant());
            if (distance < bestDistance && distance <= Math.Max(1, candidate.Length / 3))
            {
                best = candidate;
                bestDistance = distance;
            }
        }

        return best;
    }

    /// <summary>Insertions, deletions and replacements between two words (Levenshtein).</summary>
    private static int Distance(string one, string other)
    {
        int[] previous = new int[other.Length + 1];
        int[] current = new int[other.Length + 1];
        for (int j = 0; j <= other.Length; j++)
        {
            previous[j] = j;
        }

        for (int i = 1; i <= one.Length; i++)
        {
            current[0] = i;
            for (int j = 1; j <= other.Length; j++)
            {
                int replaced = previous[j - 1] + (one[i - 1] == other[j - 1] ? 0 : 1);
                current[j] = Math.Min(replaced, 1 + Math.Min(previous[j], current[j - 1]));
            }

            (previous, current) = (current, previous);
        }

        return previous[other.Length];
    }
}
