using System;
using System.Text;

namespace StarLines.Tables.Delimited;

/// <summary>Splits UTF-8 text into records and cells: RFC 4180 with any separator, comment lines and empty lines passed over.</summary>
/// <remarks>A separator of 0 means any run of spaces and tabs, a space any run of spaces.</remarks>
internal ref struct DelimitedParser
{
    private const byte Quote = (byte)'"';

    private readonly byte[] _bytes;
    private readonly byte _separator;
    private readonly string _source;
    private readonly int _mostRecords;
    private readonly DelimitedText _result;
    private int _at;
    private int _line;

    private DelimitedParser(byte[] bytes, int start, int line, byte separator, string source, int mostRecords)
    {
        _bytes = bytes;
        _at = start;
        _line = line;
        _separator = separator;
        _source = source;
        _mostRecords = mostRecords;
        _result = new DelimitedText(bytes);
    }

    /// <summary>Splits the bytes from a place on.</summary>
    /// <exception cref="TableFormatException">A quoted cell does not end, or text follows its end.</exception>
    internal static DelimitedText Parse(
        byte[] bytes, int start, int line, byte separator, string source, int mostRecords = int.MaxValue)
    {
        var parser = new DelimitedParser(bytes, start, line, separator, source, mostRecords);
        parser.ParseAll();
        return parser._result;
    }

    private readonly bool SplitsAtBlanks => _separator is 0 or (byte)' ';

    private void ParseAll()
    {
        while (_at < _bytes.Length && _result.Count < _mostRecords)
        {
            int lineStart = _at;
            SkipBlanks();
            if (_at < _bytes.Length && _bytes[_at] == (byte)'#')
            {
                TakeComment();
            }
            else if (AtLineEnd())
            {
                TakeLineEnd();
            }
            else
            {
                _at = lineStart;
                TakeRecord();
            }
        }
    }

    private void TakeComment()
    {
        int start = _at + 1;
        int length = _bytes.AsSpan(start).IndexOfAny((byte)'\n', (byte)'\r');
        length = length < 0 ? _bytes.Length - start : length;
        _result.Comments.Add((_result.Count, Encoding.UTF8.GetString(_bytes, start, length)));
        _at = start + length;
        TakeLineEnd();
    }

    private void TakeRecord()
    {
        int line = _line;
        while (true)
        {
            SkipBlanks();
            if (SplitsAtBlanks && AtLineEnd())
            {
                break;
            }

            TakeCell();
            if (!SplitsAtBlanks && _at < _bytes.Length && _bytes[_at] == _separator)
            {
                _at++;
            }
            else if (AtLineEnd())
            {
                break;
            }
        }

        TakeLineEnd();
        _result.EndRecord(line);
    }

    private void TakeCell()
    {
        if (_at < _bytes.Length && _bytes[_at] == Quote)
        {
            TakeQuotedCell();
            return;
        }

        ReadOnlySpan<byte> rest = _bytes.AsSpan(_at);
        int length = _separator == 0 ? rest.IndexOfAny(" \t\r\n"u8) : rest.IndexOfAny(_separator, (byte)'\n', (byte)'\r');
        length = length < 0 ? rest.Length : length;
        int trimmed = _separator == (byte)' ' ? length : rest[..length].TrimEnd(" \t"u8).Length;
        _result.Cells.Add(new DelimitedCell(_at, trimmed, false, false));
        _at += length;
    }

    private void TakeQuotedCell()
    {
        int line = _line;
        int start = ++_at;
        bool escaped = false;
        while (true)
        {
            int length = _bytes.AsSpan(_at).IndexOfAny(Quote, (byte)'\n', (byte)'\r');
            if (length < 0)
            {
                throw new TableFormatException(
                    _source, line, "a quoted cell without end", "a closing quote", "close the cell by \" or double a quote that belongs to the text");
            }

            _at += length;
            if (_bytes[_at] != Quote)
            {
                TakeLineEnd();
            }
            else if (_at + 1 < _bytes.Length && _bytes[_at + 1] == Quote)
            {
                escaped = true;
                _at += 2;
            }
            else
            {
                break;
            }
        }

        _result.Cells.Add(new DelimitedCell(start, _at - start, true, escaped));
        _at++;
        CheckAfterQuote();
    }

    private void CheckAfterQuote()
    {
        bool spaced = SkipBlanks();
        bool good = AtLineEnd() || (SplitsAtBlanks ? spaced : _bytes[_at] == _separator);
        if (!good)
        {
            throw new TableFormatException(
                _source, _line, "text after a closing quote", "a separator or the end of the line", "double a quote that belongs to the text");
        }
    }

    private bool SkipBlanks()
    {
        int start = _at;
        while (_at < _bytes.Length && (_bytes[_at] == (byte)' ' || (_bytes[_at] == (byte)'\t' && _separator is not ((byte)'\t' or (byte)' '))))
        {
            _at++;
        }

        return _at > start;
    }

    private readonly bool AtLineEnd() => _at >= _bytes.Length || _bytes[_at] is (byte)'\n' or (byte)'\r';

    private void TakeLineEnd()
    {
        if (_at >= _bytes.Length)
        {
            return;
        }

        bool pair = _bytes[_at] == (byte)'\r' && _at + 1 < _bytes.Length && _bytes[_at + 1] == (byte)'\n';
        _at += pair ? 2 : 1;
        _line++;
    }
}
