using System;
using System.Globalization;

namespace StarLines.Tables.Delimited;

/// <summary>Reads character-separated values: RFC 4180, and what people write instead of it.</summary>
/// <remarks>
/// The separator is found from the text: comma, semicolon, tab or blanks. Lines that begin with # are comments; those of the form
/// <c>name: value</c> or <c>name = value</c> become metadata, all of them the list <c>comments</c>. A first row without any number is
/// the header; without one, a comment just above the rows that names as many columns serves, else the columns are col1, col2, …
/// A quoted cell is text, unless everything in the file is quoted. With semicolons or tabs a decimal comma is understood.
/// </remarks>
internal static class CsvReader
{
    internal static Table Read(byte[] bytes, string source)
    {
        if (bytes.AsSpan().StartsWith("SIMPLE  ="u8) || bytes.AsSpan().Contains((byte)0))
        {
            string found = bytes[0] == (byte)'S' ? "a FITS file" : "binary data";
            throw new TableFormatException(source, 1, found, "a table of text", "give a CSV, ECSV, VOTable, JSON or Parquet file");
        }

        byte separator = Separators.Detect(bytes, 0, 1, source);
        DelimitedText text = DelimitedParser.Parse(bytes, 0, 1, separator, source);
        if (text.Count == 0)
        {
            throw new TableFormatException(source, 0, "no row", "a header row or rows of values", "give a file with content");
        }

        if (separator is (byte)';' or (byte)'\t')
        {
            DecimalCommas.Replace(bytes, text);
        }

        bool quotesMeanText = !EverythingIsQuoted(text);
        string[] names = CsvHeader.Take(text, quotesMeanText);
        int columnCount = CheckWidths(text, names.Length, source);
        var columns = new TableColumn[columnCount];
        for (int c = 0; c < columnCount; c++)
        {
            columns[c] = ColumnReader.Read(text, c, names[c], ColumnReader.TypeOf(text, c, quotesMeanText), source);
        }

        return new Table(columns, CsvHeader.Metadata(text.Comments)) { Lines = [.. text.Lines] };
    }

    /// <summary>Every record has one cell a name; one empty cell more at the end of every record, from a separator there, is passed over.</summary>
    internal static int CheckWidths(DelimitedText text, int expected, string source)
    {
        for (int r = 0; r < text.Count; r++)
        {
            int found = text.CellCount(r);
            bool trailing = found == expected + 1 && text.Cell(r, expected).Length == 0;
            if (found != expected && !trailing)
            {
                throw new TableFormatException(
                    source,
                    text.Lines[r],
                    string.Create(CultureInfo.InvariantCulture, $"{found} cells"),
                    string.Create(CultureInfo.InvariantCulture, $"{expected}, one for each column"),
                    "quote a cell that holds the separator, and leave nothing out");
            }
        }

        return expected;
    }

    private static bool EverythingIsQuoted(DelimitedText text)
    {
        foreach (DelimitedCell cell in text.Cells)
        {
            if (!cell.Quoted && cell.Length > 0)
            {
                return false;
            }
        }

        return true;
    }
}
