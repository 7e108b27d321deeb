using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace StarLines.Tables.Ecsv;

/// <summary>Writes the flow style of YAML 1.1, one value a line.</summary>
internal static class YamlWriter
{
    /// <summary>Appends a value in flow style.</summary>
    internal static void Append(StringBuilder output, MetadataValue value)
    {
        switch (value.Kind)
        {
            case MetadataKind.Null:
                output.Append("null");
                break;
            case MetadataKind.Text:
                AppendText(output, value.Text);
                break;
            case MetadataKind.Real:
                AppendReal(output, value.ToReal());
                break;
            case MetadataKind.List:
                AppendList(output, value.Items);
                break;
            case MetadataKind.Map:
                AppendMap(output, value.Map);
                break;
            default:
                output.Append(value.Text);
                break;
        }
    }

    /// <summary>Appends a text, quoted where YAML could read something else.</summary>
    internal static void AppendText(StringBuilder output, string text)
    {
        if (IsPlain(text))
        {
            output.Append(text);
        }
        else
        {
            YamlEscapes.AppendQuoted(output, text);
        }
    }

    private static void AppendList(StringBuilder output, IReadOnlyList<MetadataValue> items)
    {
        output.Append('[');
        for (int i = 0; i < items.Count; i++)
        {
            output.Append(i > 0 ? ", " : "");
            Append(output, items[i]);
        }

        output.Append(']');
    }

    private static void AppendMap(StringBuilder output, TableMetadata map)
    {
        output.Append('{');
        bool first = true;
        foreach ((string key, MetadataValue value) in map)
        {
            output.Append(first ? "" : ", ");
            first = false;
            AppendText(output, key);
            output.Append(": ");
            Append(output, value);
        }

        output.Append('}');
    }

    private static void AppendReal(StringBuilder output, double value)
    {
        string text = double.IsNaN(value) ? ".nan"
            : double.IsInfinity(value) ? (value > 0.0 ? ".inf" : "-.inf")
            : value.ToString("R", CultureInfo.InvariantCulture);

        // YAML 1.1 knows a real number by its point, and an exponent by its sign.
        int exponent = text.IndexOf('E', StringComparison.Ordinal);
        if (exponent >= 0 && !text.Contains('.', StringComparison.Ordinal))
        {
            text = text.Insert(exponent, ".0");
        }

        output.Append(text);
        output.Append(double.IsFinite(value) && !text.Contains('.', StringComparison.Ordinal) ? ".0" : "");
    }

    /// <summary>Letters, digits and harmless signs, beginning with a letter, and no word with a meaning of its own.</summary>
    private static bool IsPlain(string text)
    {
        if (text.Length == 0 || !char.IsAsciiLetter(text[0]) || text[^1] == ' ')
        {
            return false;
        }

        foreach (char c in text)
        {
            if (!char.IsAsciiLetterOrDigit(c) && c is not (' ' or '_' or '-' or '.' or '/' or '(' or ')' or '+' or '^' or ';'))
            {
                return false;
            }
        }

        return text.ToUpperInvariant() is not ("TRUE" or "FALSE" or "YES" or "NO" or "ON" or "OFF" or "Y" or "N" or "NULL");
    }
}
