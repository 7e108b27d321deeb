using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.Ecsv;

/// <summary>Reads ECSV 0.9 and 1.0 with commas or blanks.</summary>
/// <remarks>
/// Integers up to 64 bits, real numbers, truth values and text; columns of other types (arrays, objects, complex numbers) are read as text.
/// Source: Astropy Proposal for Enhancement 6, Enhanced Character Separated Values table format.
/// </remarks>
internal static class EcsvReader
{
    private const string HeaderCure = "correct the header or remove it and read the file as CSV";

    internal static Table Read(byte[] bytes, string source)
    {
        List<YamlLine> lines = HeaderLines(bytes, source, out int start);
        TableMetadata header = YamlParser.Parse(lines, source).Map;
        if (!header.TryGetValue("datatype", out MetadataValue? declared) || declared.Items.Count == 0)
        {
            throw new TableFormatException(source, 1, "a header without columns", "the entry datatype with a list of columns", HeaderCure);
        }

        byte separator = SeparatorOf(header, source);
        DelimitedText text = DelimitedParser.Parse(bytes, start, lines.Count + 2, separator, source);
        CheckNames(text, declared.Items, source);
        text.Skip(1);
        CsvReader.CheckWidths(text, declared.Items.Count, source);
        var columns = new TableColumn[declared.Items.Count];
        for (int c = 0; c < columns.Length; c++)
        {
            columns[c] = ReadColumn(text, c, declared.Items[c].Map, separator == (byte)' ', source);
        }

        return MakeTable(columns, header, [.. text.Lines], source);
    }

    private static Table MakeTable(TableColumn[] columns, TableMetadata header, int[] lines, string source)
    {
        TableMetadata metadata = header.TryGetValue("meta", out MetadataValue? meta) ? meta.Map : [];

        // How another program packed its objects into columns; it would not fit the table written next.
        metadata.Remove("__serialized_columns__");
        try
        {
            return new Table(columns, metadata) { Lines = lines };
        }
        catch (ArgumentException exception)
        {
            throw new TableFormatException(source, 1, "a name of a column twice", "different names", exception.Message.TrimEnd('.'));
        }
    }

    /// <summary>The YAML lines after the first line, without their mark; <paramref name="start"/> receives the index of the first byte after them.</summary>
    private static List<YamlLine> HeaderLines(byte[] bytes, string source, out int start)
    {
        var lines = new List<YamlLine>();
        start = 0;
        for (int number = 1; start < bytes.Length; number++)
        {
            ReadOnlySpan<byte> rest = bytes.AsSpan(start);
            int end = rest.IndexOf((byte)'\n');
            ReadOnlySpan<byte> line = end < 0 ? rest : rest[..end];
            if (line.IsEmpty || line[0] != (byte)'#')
            {
                break;
            }

            string content = Encoding.UTF8.GetString(line).TrimEnd('\r');
            if (number == 1 && !content.StartsWith("# %ECSV ", StringComparison.Ordinal))
            {
                break;
            }

            if (number > 1)
            {
                content = content.StartsWith("# ", StringComparison.Ordinal) ? content[2..] : content[1..];
                lines.Add(content is "---" or "..." ? new YamlLine(number, 0, "") : YamlLine.From(number, content));
            }

            start += end < 0 ? rest.Length : end + 1;
        }

        return start > 0 ? lines : throw new TableFormatException(source, 1, "no ECSV mark", "# %ECSV 1.0 in the first line", "name the true format, such as csv");
    }

    private static byte SeparatorOf(TableMetadata header, string source)
    {
        string delimiter = header.TryGetValue("delimiter", out MetadataValue? value) ? value.Text : " ";
        return delimiter switch
        {
            " " => (byte)' ',
            "," => (byte)',',
            _ => throw new TableFormatException(source, 1, $"the delimiter \"{delimiter}\"", "a blank or a comma", HeaderCure),
        };
    }

    private static void CheckNames(DelimitedText text, IReadOnlyList<MetadataValue> declared, string source)
    {
        if (text.Count == 0)
        {
            throw new TableFormatException(source, 0, "no row of column names", "one after the YAML header", "the file is cut off: get it again");
        }

        int count = text.CellCount(0);
        for (int c = 0; c < Math.Max(count, declared.Count); c++)
        {
            string named = c < count ? text.Text(text.Cell(0, c)) : "nothing";
            string wanted = c < declared.Count ? declared[c].Map.TextOf("name") : "nothing";
            if (named != wanted)
            {
                throw new TableFormatException(
                    source,
                    text.Lines[0],
                    string.Create(CultureInfo.InvariantCulture, $"{named} as column {c + 1} of the row of names"),
                    $"{wanted}, as the header says",
                    "make the row of names and the header agree");
            }
        }
    }

    private static TableColumn ReadColumn(DelimitedText text, int index, TableMetadata declared, bool emptyIsMissing, string source)
    {
        string name = declared.TextOf("name");
        if (name.Length == 0)
        {
            throw new TableFormatException(source, 1, "a column without a name", "a name", HeaderCure);
        }

        ColumnType type = TypeOf(declared.TextOf("datatype"));
        TableColumn column = ReadCells(text, index, name, type, emptyIsMissing, source);
        string ucd = declared.TryGetValue("meta", out MetadataValue? meta) ? UcdOf(meta) : "";
        (int? decimals, int? digits) = DigitsOf(declared.TextOf("format"));
        return column.Noted(declared.TextOf("unit"), declared.TextOf("description"), ucd, decimals, digits);
    }

    private static TableColumn ReadCells(DelimitedText text, int index, string name, ColumnType type, bool emptyIsMissing, string source)
    {
        try
        {
            return ColumnReader.Read(text, index, name, type, source, emptyIsMissing);
        }
        catch (TableFormatException) when (type == ColumnType.Long && ColumnReader.TypeOf(text, index, false) == ColumnType.Double)
        {
            // uint64 beyond the range of long.
            return ColumnReader.Read(text, index, name, ColumnType.Double, source);
        }
    }

    private static string UcdOf(MetadataValue meta)
    {
        if (meta.Kind == MetadataKind.Map)
        {
            return meta.Map.TextOf("ucd");
        }

        foreach (MetadataValue item in meta.Items)
        {
            if (item.Map.TryGetValue("ucd", out MetadataValue? ucd))
            {
                return ucd.Text;
            }
        }

        return "";
    }

    private static ColumnType TypeOf(string datatype) => datatype switch
    {
        "float16" or "float32" or "float64" or "float128" => ColumnType.Double,
        "int8" or "int16" or "int32" or "int64" or "uint8" or "uint16" or "uint32" or "uint64" => ColumnType.Long,
        "bool" => ColumnType.Bool,
        _ => ColumnType.Text,
    };

    private static (int? Decimals, int? Digits) DigitsOf(string format)
    {
        ReadOnlySpan<char> text = format.AsSpan().Trim("%{}:");
        int point = text.IndexOf('.');
        if (point < 0 || text.Length < point + 3 || !int.TryParse(text[(point + 1)..^1], NumberStyles.None, CultureInfo.InvariantCulture, out int digits))
        {
            return (null, null);
        }

        return text[^1] switch
        {
            'f' or 'F' when digits <= 20 => (digits, null),
            'g' or 'G' when digits is >= 1 and <= 17 => (null, digits),
            _ => (null, null),
        };
    }
}
