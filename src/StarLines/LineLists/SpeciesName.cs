using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.LineLists;

/// <summary>Names of atoms and ions as people type them.</summary>
internal static class SpeciesName
{
    private static readonly string[] s_stages = ["I", "II", "III", "IV", "V", "VI", "VII", "VIII", "IX", "X"];

    /// <summary>The usual spelling: <c>fe2</c>, <c>FeII</c> and <c>fe ii</c> are <c>Fe II</c>; an element without a stage stays alone.</summary>
    internal static string Normalize(string text)
    {
        string trimmed = text.Trim().Trim('[', ']');
        string packed = trimmed.Replace(" ", "", StringComparison.Ordinal);

        // Two letters before one: "Si" is silicon, "S i" with its blank is sulphur.
        int blank = trimmed.IndexOf(' ', StringComparison.Ordinal);
        for (int letters = blank is 1 or 2 ? blank : Math.Min(2, packed.Length); letters >= 1; letters--)
        {
            string stage = packed[letters..].ToUpperInvariant();
            string? roman = stage.Length == 0 ? "" : StageOf(stage);
            if (roman is not null && IsWord(packed.AsSpan(0, letters)))
            {
                string element = char.ToUpperInvariant(packed[0]) + packed[1..letters].ToLowerInvariant();
                return roman.Length > 0 ? $"{element} {roman}" : element;
            }
        }

        return trimmed;
    }

    /// <summary>Says whether a species is one of those asked for; an element alone stands for all its stages, no name for everything.</summary>
    internal static bool Matches(string species, IReadOnlyCollection<string> normalizedNames)
    {
        foreach (string name in normalizedNames)
        {
            bool same = species.Equals(name, StringComparison.OrdinalIgnoreCase);
            bool stage = species.Length > name.Length && species[name.Length] == ' '
                && !name.Contains(' ', StringComparison.Ordinal) && species.StartsWith(name, StringComparison.OrdinalIgnoreCase);
            if (same || stage)
            {
                return true;
            }
        }

        return normalizedNames.Count == 0;
    }

    private static string? StageOf(string text)
    {
        bool arabic = int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out int number);
        return arabic && number >= 1 && number <= s_stages.Length ? s_stages[number - 1]
            : Array.IndexOf(s_stages, text) >= 0 ? text
            : null;
    }

    private static bool IsWord(ReadOnlySpan<char> text)
    {
        foreach (char c in text)
        {
            if (!char.IsAsciiLetter(c))
            {
                return false;
            }
        }

        return true;
    }
}
