using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Named values of a header, whatever format they came from.</summary>
internal abstract class HeaderKeywords
{
    /// <summary>Looks up a keyword; names are in capitals, those of HIERARCH cards with one blank between words.</summary>
    internal abstract bool TryGet(string name, [NotNullWhen(true)] out string? text, out string comment);

    /// <summary>Whether a keyword is there and has a value.</summary>
    internal bool Has(string name) => TryGet(name, out string? text, out _) && text.Length != 0;

    /// <summary>The text of a keyword; empty where it is absent.</summary>
    internal string Text(string name) => TryGet(name, out string? text, out _) ? text.Trim() : "";

    /// <summary>The comment of a keyword; empty where it is absent.</summary>
    internal string Comment(string name) => TryGet(name, out _, out string comment) ? comment : "";

    /// <summary>The first of some keywords that has a text; empty where none has.</summary>
    internal string FirstText(ReadOnlySpan<string> names) => FirstText(names, out _);

    /// <summary>The first of some keywords that has a text, and which.</summary>
    internal string FirstText(ReadOnlySpan<string> names, out string found)
    {
        foreach (string name in names)
        {
            string text = Text(name);
            if (text.Length != 0)
            {
                found = name;
                return text;
            }
        }

        found = "";
        return "";
    }

    /// <summary>Reads a number; false where the keyword is absent or no finite number.</summary>
    internal bool TryNumber(string name, out double value)
    {
        value = double.NaN;
        return TryGet(name, out string? text, out _) && TryParseNumber(text, out value);
    }

    /// <summary>The first of some keywords that is a number.</summary>
    internal bool TryFirstNumber(ReadOnlySpan<string> names, out double value, out string found)
    {
        foreach (string name in names)
        {
            if (TryNumber(name, out value))
            {
                found = name;
                return true;
            }
        }

        value = double.NaN;
        found = "";
        return false;
    }

    /// <summary>Reads a truth value: T, F, true, false, yes, no.</summary>
    internal bool? Flag(string name) => Text(name).ToUpperInvariant() switch
    {
        "T" or "TRUE" or "YES" or "Y" => true,
        "F" or "FALSE" or "NO" or "N" => false,
        _ => null,
    };

    /// <summary>Reads a finite number in the notation of FITS, which also writes exponents with D.</summary>
    internal static bool TryParseNumber(string text, out double value)
    {
        string plain = text.Contains('D', StringComparison.OrdinalIgnoreCase)
            ? text.Replace('D', 'E').Replace('d', 'e')
            : text;
        return double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
    }
}
