using System;
using System.Collections.Generic;

namespace StarLines.Tables.Ecsv;

/// <summary>Reads the part of YAML 1.1 that table headers use: block and flow maps and lists, all styles of scalars, tags, anchors and aliases.</summary>
/// <remarks>A list of one-entry maps under the tag <c>!!omap</c> becomes a map; other tags are passed over.</remarks>
internal sealed class YamlParser
{
    /// <summary>Nesting allowed; headers of tables use four or five levels.</summary>
    private const int MaximumDepth = 64;

    private readonly List<YamlLine> _lines;
    private readonly string _source;
    private readonly Dictionary<string, MetadataValue> _anchors = new(StringComparer.Ordinal);
    private int _at;
    private int _depth;

    private YamlParser(List<YamlLine> lines, string source)
    {
        _lines = lines;
        _source = source;
    }

    /// <summary>Reads one document.</summary>
    /// <param name="lines">Its lines, without the marks that begin or end a document.</param>
    /// <param name="source">Name of the file for messages.</param>
    /// <exception cref="TableFormatException">The lines are not such YAML.</exception>
    internal static MetadataValue Parse(IEnumerable<YamlLine> lines, string source)
    {
        var parser = new YamlParser([.. lines], source);
        parser.SkipEmpty();
        if (parser._at >= parser._lines.Count)
        {
            return MetadataValue.Null;
        }

        MetadataValue value = parser.Node(parser._lines[parser._at].Indent);
        parser.SkipEmpty();
        return parser._at >= parser._lines.Count
            ? value
            : throw parser.Fault("a line indented less than its block", "the next entry of the same block");
    }

    /// <summary>The value that begins on the present line.</summary>
    private MetadataValue Node(int indent)
    {
        if (++_depth > MaximumDepth)
        {
            throw Fault("blocks nested too deep", "at most 64 levels");
        }

        YamlLine line = _lines[_at];
        MetadataValue value = line.IsItem ? Sequence(indent)
            : YamlScanner.KeyLength(line.Content) >= 0 ? Mapping(indent)
            : Inline(line.Content, indent);
        _depth--;
        return value;
    }

    private MetadataValue Sequence(int indent)
    {
        var items = new List<MetadataValue>();
        while (SkipEmpty() && _lines[_at].Indent == indent && _lines[_at].IsItem)
        {
            YamlLine line = _lines[_at];
            string rest = line.Content[1..];
            int blanks = rest.Length - rest.TrimStart(' ').Length;
            rest = rest[blanks..];
            if (rest.Length == 0 || rest[0] == '#')
            {
                _at++;
                items.Add(Below(indent, allowSameIndentItems: false));
                continue;
            }

            // The item's content counts as a line of its own, indented by the mark.
            int inner = indent + 1 + blanks;
            _lines[_at] = new YamlLine(line.Number, inner, rest);
            bool block = _lines[_at].IsItem || YamlScanner.KeyLength(rest) >= 0;
            items.Add(block ? Node(inner) : Inline(rest, indent));
        }

        return MetadataValue.FromList(items);
    }

    private MetadataValue Mapping(int indent)
    {
        var map = new TableMetadata();
        while (SkipEmpty() && _lines[_at].Indent == indent && !_lines[_at].IsItem)
        {
            string content = _lines[_at].Content;
            int length = YamlScanner.KeyLength(content);
            if (length < 0)
            {
                throw Fault($"\"{content}\"", "an entry of the form name: value");
            }

            string key = Scalar(content[..length].Trim()).Text;
            string rest = content[(length + 1)..].TrimStart(' ');
            MetadataValue value = rest.Length == 0 || rest[0] == '#' ? Next(indent) : Inline(rest, indent);
            map[key] = value;
        }

        if (_at < _lines.Count && _lines[_at].Indent > indent)
        {
            throw Fault("a line indented deeper than its block", "the next entry of the same block");
        }

        return MetadataValue.FromMap(map);
    }

    private MetadataValue Next(int indent)
    {
        _at++;
        return Below(indent, allowSameIndentItems: true);
    }

    /// <summary>The block below a key or a mark; nothing where no line is indented deeper.</summary>
    private MetadataValue Below(int indent, bool allowSameIndentItems)
    {
        if (!SkipEmpty())
        {
            return MetadataValue.Null;
        }

        YamlLine line = _lines[_at];
        bool below = line.Indent > indent || (allowSameIndentItems && line.Indent == indent && line.IsItem);
        return below ? Node(line.Indent) : MetadataValue.Null;
    }

    /// <summary>A value that begins in the rest of a line and may go on below.</summary>
    private MetadataValue Inline(string rest, int indent)
    {
        if (rest[0] is '!' or '&')
        {
            return Decorated(rest, indent);
        }

        if (rest[0] is '|' or '>')
        {
            return BlockScalar(rest, indent);
        }

        var gather = new YamlGather(rest);
        int first = _at++;
        while (gather.IsOpen || Continues(rest, indent))
        {
            if (_at >= _lines.Count)
            {
                _at = first;
                throw Fault("a quoted text or a bracket without end", "its end");
            }

            gather.Add(_lines[_at++].Content);
        }

        int last = _at;
        _at = first;
        MetadataValue value = Scalar(gather.Text.Trim(' '));
        _at = last;
        return value;
    }

    /// <summary>A plain text goes on in lines that are indented deeper.</summary>
    private bool Continues(string text, int indent) =>
        text[0] is not ('"' or '\'' or '[' or '{' or '*') && _at < _lines.Count && _lines[_at].Indent > indent && _lines[_at].Content.Length > 0;

    private MetadataValue Decorated(string rest, int indent)
    {
        int end = rest.IndexOf(' ', StringComparison.Ordinal);
        string mark = end < 0 ? rest : rest[..end];
        string after = end < 0 ? "" : rest[end..].TrimStart(' ');
        MetadataValue value;
        if (after.Length == 0)
        {
            value = Next(indent);
        }
        else
        {
            value = Inline(after, indent);
        }

        if (mark == "!!omap")
        {
            value = ToMap(value);
        }

        if (mark[0] == '&')
        {
            _anchors[mark[1..]] = value;
        }

        return value;
    }

    private MetadataValue BlockScalar(string mark, int indent)
    {
        var lines = new List<string>();
        int inner = -1;
        for (_at++; _at < _lines.Count && (_lines[_at].Content.Length == 0 || _lines[_at].Indent > indent); _at++)
        {
            YamlLine line = _lines[_at];
            inner = inner < 0 && line.Content.Length > 0 ? line.Indent : inner;
            lines.Add(line.Content.Length == 0 ? "" : new string(' ', Math.Max(0, line.Indent - inner)) + line.Content);
        }

        return YamlScanner.JoinBlock(lines, mark);
    }

    private MetadataValue Scalar(string text)
    {
        try
        {
            return YamlScanner.Value(text, _anchors);
        }
        catch (FormatException exception)
        {
            throw Fault(exception.Message, "a value");
        }
    }

    private static MetadataValue ToMap(MetadataValue list)
    {
        if (list.Kind != MetadataKind.List)
        {
            return list;
        }

        var map = new TableMetadata();
        foreach (MetadataValue item in list.Items)
        {
            foreach ((string key, MetadataValue value) in item.Map)
            {
                map[key] = value;
            }
        }

        return MetadataValue.FromMap(map);
    }

    private bool SkipEmpty()
    {
        while (_at < _lines.Count && (_lines[_at].Content.Length == 0 || _lines[_at].Content[0] == '#'))
        {
            _at++;
        }

        return _at < _lines.Count;
    }

    private TableFormatException Fault(string found, string expected) => new(
        _source,
        _lines[Math.Min(_at, _lines.Count - 1)].Number,
        found,
        expected,
        "correct the YAML header or remove it and read the file as CSV");
}
