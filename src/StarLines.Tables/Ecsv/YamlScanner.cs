using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace StarLines.Tables.Ecsv;

/// <summary>Scalars and flow collections of YAML.</summary>
internal static class YamlScanner
{
    /// <summary>Nesting of brackets allowed.</summary>
    private const int MaximumDepth = 64;

    /// <summary>Length of the key at the start of a line; −1 where the line is not an entry of a map.</summary>
    internal static int KeyLength(string content)
    {
        if (content.Length == 0 || content[0] is '[' or '{' or '!' or '&' or '*' or '|' or '>')
        {
            return -1;
        }

        int at = 0;
        if (content[0] is '"' or '\'')
        {
            at = EndOfQuoted(content, 0);
            if (at < 0)
            {
                return -1;
            }
        }

        for (; at < content.Length; at++)
        {
            if (content[at] == ':' && (at + 1 == content.Length || content[at + 1] == ' '))
            {
                return at;
            }

            if (content[0] is '"' or '\'' && content[at] != ' ')
            {
                return -1;
            }

            if (content[at] == '#' && at > 0 && content[at - 1] == ' ')
            {
                return -1;
            }
        }

        return -1;
    }

    /// <summary>Joins the lines of a literal (|) or folded (&gt;) block.</summary>
    internal static MetadataValue JoinBlock(List<string> lines, string mark)
    {
        bool strip = mark.Contains('-', StringComparison.Ordinal);
        bool keep = mark.Contains('+', StringComparison.Ordinal);
        int count = lines.Count;
        while (count > 0 && lines[count - 1].Length == 0)
        {
            count--;
        }

        var text = new StringBuilder();
        for (int i = 0; i < count; i++)
        {
            bool folded = mark[0] == '>' && i > 0 && lines[i].Length > 0 && lines[i - 1].Length > 0 && lines[i][0] != ' ' && lines[i - 1][0] != ' ';
            bool joined = mark[0] == '>' && i > 0 && lines[i].Length > 0 && lines[i - 1].Length == 0;
            text.Append(i == 0 || joined ? "" : folded ? " " : "\n").Append(lines[i]);
        }

        text.Append('\n', strip || count == 0 ? 0 : keep ? 1 + lines.Count - count : 1);
        return text.ToString();
    }

    /// <summary>Reads a value that is whole: a scalar, a flow collection or an alias.</summary>
    /// <exception cref="FormatException">The text is no such value; the message quotes it.</exception>
    internal static MetadataValue Value(string text, Dictionary<string, MetadataValue> anchors)
    {
        int at = 0;
        MetadataValue value = Flow(text, ref at, anchors, 0, inFlow: false);
        ReadOnlySpan<char> rest = text.AsSpan(at).TrimStart();
        return rest.IsEmpty || rest[0] == '#' ? value : throw new FormatException($"\"{Short(rest.ToString())}\" after a value");
    }

    private static MetadataValue Flow(string text, ref int at, Dictionary<string, MetadataValue> anchors, int depth, bool inFlow)
    {
        SkipBlanks(text, ref at);
        if (depth > MaximumDepth)
        {
            throw new FormatException("brackets nested too deep");
        }

        switch (at < text.Length ? text[at] : '\0')
        {
            case '[':
                return FlowList(text, ref at, anchors, depth);
            case '{':
                return FlowMap(text, ref at, anchors, depth);
            case '"' or '\'':
                int end = EndOfQuoted(text, at);
                string body = end < 0 ? throw new FormatException("a quoted text without end") : text[(at + 1)..(end - 1)];
                bool isDouble = text[at] == '"';
                at = end;
                return isDouble ? YamlEscapes.Decode(body) : body.Replace("''", "'", StringComparison.Ordinal);
            case '!' or '&':
                string mark = PlainText(text, ref at, inFlow, blankEnds: true);
                MetadataValue value = Flow(text, ref at, anchors, depth + 1, inFlow);
                if (mark[0] == '&')
                {
                    anchors[mark[1..]] = value;
                }

                return value;
            case '*':
                string alias = PlainText(text, ref at, inFlow, blankEnds: true)[1..];
                return anchors.TryGetValue(alias, out MetadataValue? known) ? known : throw new FormatException($"the unknown alias *{Short(alias)}");
            default:
                return Plain(PlainText(text, ref at, inFlow, blankEnds: false));
        }
    }

    private static MetadataValue FlowList(string text, ref int at, Dictionary<string, MetadataValue> anchors, int depth)
    {
        var items = new List<MetadataValue>();
        at++;
        while (!Closes(text, ref at, ']'))
        {
            MetadataValue item = Flow(text, ref at, anchors, depth + 1, inFlow: true);
            SkipBlanks(text, ref at);
            if (at < text.Length && text[at] == ':')
            {
                at++;
                item = new TableMetadata { { item.Text, Flow(text, ref at, anchors, depth + 1, inFlow: true) } };
            }

            items.Add(item);
            TakeComma(text, ref at, ']');
        }

        return MetadataValue.FromList(items);
    }

    private static MetadataValue FlowMap(string text, ref int at, Dictionary<string, MetadataValue> anchors, int depth)
    {
        var map = new TableMetadata();
        at++;
        while (!Closes(text, ref at, '}'))
        {
            string key = Flow(text, ref at, anchors, depth + 1, inFlow: true).Text;
            SkipBlanks(text, ref at);
            MetadataValue value = MetadataValue.Null;
            if (at < text.Length && text[at] == ':')
            {
                at++;
                value = Flow(text, ref at, anchors, depth + 1, inFlow: true);
            }

            map[key] = value;
            TakeComma(text, ref at, '}');
        }

        return MetadataValue.FromMap(map);
    }

    private static bool Closes(string text, ref int at, char bracket)
    {
        SkipBlanks(text, ref at);
        if (at >= text.Length)
        {
            throw new FormatException($"no closing {bracket}");
        }

        if (text[at] != bracket)
        {
            return false;
        }

        at++;
        return true;
    }

    private static void TakeComma(string text, ref int at, char bracket)
    {
        SkipBlanks(text, ref at);
        if (at < text.Length && text[at] == ',')
        {
            at++;
        }
        else if (at >= text.Length || text[at] != bracket)
        {
            throw new FormatException(at < text.Length ? $"\"{Short(text[at..])}\" inside brackets" : $"no closing {bracket}");
        }
    }

    private static string PlainText(string text, ref int at, bool inFlow, bool blankEnds)
    {
        int start = at;
        for (; at < text.Length; at++)
        {
            char c = text[at];
            bool ends = (inFlow && c is ',' or ']' or '}')
                || (inFlow && c == ':' && (at + 1 == text.Length || text[at + 1] is ' ' or ',' or ']' or '}'))
                || (c == '#' && at > start && text[at - 1] == ' ')
                || (blankEnds && c == ' ');
            if (ends)
            {
                break;
            }
        }

        return text[start..at].Trim(' ');
    }

    private static MetadataValue Plain(string text)
    {
        switch (text)
        {
            case "" or "~" or "null" or "Null" or "NULL":
                return MetadataValue.Null;
            case "true" or "True" or "TRUE":
                return true;
            case "false" or "False" or "FALSE":
                return false;
            case ".nan" or ".NaN" or ".NAN":
                return double.NaN;
            case ".inf" or "+.inf" or ".Inf" or ".INF":
                return double.PositiveInfinity;
            case "-.inf" or "-.Inf" or "-.INF":
                return double.NegativeInfinity;
            default:
                return Number(text);
        }
    }

    private static MetadataValue Number(string text)
    {
        char last = text[^1];
        bool numeric = (char.IsAsciiDigit(last) || last == '.') && (char.IsAsciiDigit(text[0]) || text[0] is '-' or '+' or '.');
        if (!numeric)
        {
            return text;
        }

        if (long.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out long whole))
        {
            return whole;
        }

        // YAML 1.1: a real number has a point, and its exponent a sign; anything else is text.
        int exponent = text.AsSpan().IndexOfAny('e', 'E');
        bool isReal = text.Contains('.', StringComparison.Ordinal)
            && (exponent < 0 || (exponent + 1 < text.Length && text[exponent + 1] is '-' or '+'));
        const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
        return isReal && double.TryParse(text, Style, CultureInfo.InvariantCulture, out double real) ? real : text;
    }

    /// <summary>Index after the closing quote; −1 where there is none.</summary>
    private static int EndOfQuoted(string text, int start)
    {
        char quote = text[start];
        for (int i = start + 1; i < text.Length; i++)
        {
            if (text[i] == '\\' && quote == '"')
            {
                i++;
            }
            else if (text[i] == quote && quote == '\'' && i + 1 < text.Length && text[i + 1] == quote)
            {
                i++;
            }
            else if (text[i] == quote)
            {
                return i + 1;
            }
        }

        return -1;
    }

    private static void SkipBlanks(string text, ref int at)
    {
        while (at < text.Length && text[at] is ' ' or '\n' or '\t')
        {
            at++;
        }
    }

    private static string Short(string text) => text.Length > 40 ? string.Concat(text.AsSpan(0, 40), "…") : text;
}
