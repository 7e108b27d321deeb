using System;
using System.Buffers;
using System.IO;
using System.Text;

namespace StarLines.Tables.Delimited;

/// <summary>Writes comma-separated values by RFC 4180, with a header row and lines that end in a line feed.</summary>
/// <remarks>A missing value is an empty cell; an empty text is <c>""</c>; a text that a reader would take for something else is quoted.</remarks>
internal static class CsvWriter
{
    private const byte Quote = (byte)'"';

    private static readonly SearchValues<char> s_special = SearchValues.Create(",\"\r\n;\t");

    internal static void Write(Table table, Stream stream)
    {
        using var output = new Utf8Output(stream);
        WriteRows(table, output, "true"u8, "false"u8);
        output.Flush();
    }

    /// <summary>Writes the header row and the rows.</summary>
    internal static void WriteRows(Table table, Utf8Output output, ReadOnlySpan<byte> trueWord, ReadOnlySpan<byte> falseWord)
    {
        int columnCount = table.Columns.Count;
        for (int c = 0; c < columnCount; c++)
        {
            WriteText(output, table.Columns[c].Name);
            output.Byte(c + 1 < columnCount ? (byte)',' : (byte)'\n');
        }

        for (int r = 0; r < table.RowCount; r++)
        {
            for (int c = 0; c < columnCount; c++)
            {
                WriteCell(output, table.Columns[c], r, trueWord, falseWord, columnCount == 1);
                output.Byte(c + 1 < columnCount ? (byte)',' : (byte)'\n');
            }
        }
    }

    private static void WriteCell(
        Utf8Output output, TableColumn column, int row, ReadOnlySpan<byte> trueWord, ReadOnlySpan<byte> falseWord, bool alone)
    {
        switch (column.Type)
        {
            case ColumnType.Double when !double.IsNaN(column.Doubles[row]):
                output.Number(column.Doubles[row], column);
                break;
            case ColumnType.Long when column.Longs[row] is long whole:
                output.Number(whole);
                break;
            case ColumnType.Bool when column.Bools[row] is bool truth:
                output.Bytes(truth ? trueWord : falseWord);
                break;
            case ColumnType.Text when column.Texts[row] is string text:
                WriteText(output, text);
                break;
            default:
                // A line without anything would be passed over as empty.
                output.Bytes(alone ? "\"\""u8 : ""u8);
                break;
        }
    }

    private static void WriteText(Utf8Output output, string text)
    {
        if (!NeedsQuotes(text))
        {
            output.Text(text);
            return;
        }

        output.Byte(Quote);
        ReadOnlySpan<char> rest = text;
        for (int at = rest.IndexOf('"'); at >= 0; at = rest.IndexOf('"'))
        {
            output.Text(rest[..(at + 1)]);
            output.Byte(Quote);
            rest = rest[(at + 1)..];
        }

        output.Text(rest);
        output.Byte(Quote);
    }

    private static bool NeedsQuotes(string text)
    {
        if (text.Length == 0)
        {
            return true;
        }

        char first = text[0];
        if (first is '#' or ' ' or '\t' || text[^1] is ' ' or '\t' || text.AsSpan().ContainsAny(s_special))
        {
            return true;
        }

        // Digits, signs and the words for numbers and truth values.
        return (char.IsAsciiDigit(first) || first is '+' or '-' or '.' or 'n' or 'N' or 'i' or 'I' or 't' or 'T' or 'f' or 'F')
            && LooksTyped(text);
    }

    private static bool LooksTyped(string text)
    {
        Span<byte> bytes = stackalloc byte[64];
        if (text.Length > bytes.Length || !Ascii.IsValid(text))
        {
            return false;
        }

        Ascii.FromUtf16(text, bytes, out int length);
        ReadOnlySpan<byte> cell = bytes[..length];
        return CellReader.TryDouble(cell, out _) || CellReader.TryBool(cell, out _);
    }
}
