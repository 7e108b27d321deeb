using System.Text;

namespace StarLines.Tables.Ecsv;

/// <summary>Gathers the lines of a value that spans several, and knows whether a quote or a bracket is still open.</summary>
internal sealed class YamlGather
{
    private readonly StringBuilder _text = new();
    private int _depth;
    private char _quote;
    private char _before;

    internal YamlGather(string first)
    {
        _text.Append(first);
        Scan(first);
    }

    /// <summary>True while the end of the value is still to come.</summary>
    internal bool IsOpen => _quote != '\0' || _depth > 0;

    /// <summary>The value so far on one line.</summary>
    internal string Text => _text.ToString();

    /// <summary>Folds the next line in: an empty line is a line feed, others are parted by one blank.</summary>
    internal void Add(string line)
    {
        char last = _text[^1];
        if (_quote == '"' && EndsInEscape())
        {
            // A backslash at the end of a line joins the lines without a blank.
            _text.Length--;
        }
        else if (line.Length == 0)
        {
            _text.Append('\n');
        }
        else if (last != '\n')
        {
            _text.Append(' ');
        }

        _text.Append(line);
        Scan(line);
    }

    private bool EndsInEscape()
    {
        int count = 0;
        while (count < _text.Length && _text[_text.Length - 1 - count] == '\\')
        {
            count++;
        }

        return count % 2 == 1;
    }

    private void Scan(string line)
    {
        for (int i = 0; i < line.Length; i++)
        {
            char c = line[i];
            if (_quote != '\0')
            {
                i += InQuote(line, i);
            }
            else if (c is '"' or '\'' && (_before == '\0' || (_depth > 0 && _before is '[' or '{' or ',' or ':')))
            {
                _quote = c;
            }
            else
            {
                Count(c);
            }
        }
    }

    /// <summary>Looks at a character inside quotes; returns how many more to pass over.</summary>
    private int InQuote(string line, int at)
    {
        char c = line[at];
        if (c == '\\' && _quote == '"')
        {
            return 1;
        }

        if (c == '\'' && _quote == '\'' && at + 1 < line.Length && line[at + 1] == '\'')
        {
            return 1;
        }

        if (c == _quote)
        {
            _quote = '\0';
            _before = c;
        }

        return 0;
    }

    private void Count(char c)
    {
        bool inFlow = _depth > 0 || _before == '\0';
        _depth += !inFlow ? 0 : c is '[' or '{' ? 1 : c is ']' or '}' ? -1 : 0;
        _before = c == ' ' ? _before : c;
    }
}
