using System;
using System.Globalization;
using System.IO;
using System.Xml;
using StarLines.Tables.Delimited;
using StarLines.Tables.Json;

namespace StarLines.Tables.VoTables;

/// <summary>Writes VOTable 1.4 with one table as TABLEDATA.</summary>
/// <remarks>
/// Metadata become INFO elements; a value that is not a text is written as JSON and marked by xtype. A missing real number is NaN,
/// any other missing value an empty cell. Characters that XML cannot hold are replaced by U+FFFD.
/// Source: VOTable 1.4, IVOA Recommendation 2019.
/// </remarks>
internal static class VoTableWriter
{
    internal static void Write(Table table, Stream stream)
    {
        using var output = new Utf8Output(stream);
        output.Bytes("""
            <?xml version="1.0" encoding="UTF-8"?>
            <VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3">
            <RESOURCE type="results">
            <TABLE
            """u8);
        WriteAttribute(output, " name=\""u8, table.Name);
        output.Bytes(">\n"u8);

        foreach ((string key, MetadataValue value) in table.Metadata)
        {
            WriteInfo(output, key, value);
        }

        foreach (TableColumn column in table.Columns)
        {
            WriteField(output, column);
        }

        output.Bytes("<DATA>\n<TABLEDATA>\n"u8);
        for (int r = 0; r < table.RowCount; r++)
        {
            output.Bytes("<TR>"u8);
            foreach (TableColumn column in table.Columns)
            {
                output.Bytes("<TD>"u8);
                WriteCell(output, column, r);
                output.Bytes("</TD>"u8);
            }

            output.Bytes("</TR>\n"u8);
        }

        output.Bytes("</TABLEDATA>\n</DATA>\n</TABLE>\n</RESOURCE>\n</VOTABLE>\n"u8);
        output.Flush();
    }

    private static void WriteField(Utf8Output output, TableColumn column)
    {
        output.Bytes("<FIELD name=\""u8);
        WriteEscaped(output, column.Name);
        output.Bytes(column.Type switch
        {
            ColumnType.Double => "\" datatype=\"double\""u8,
            ColumnType.Long => "\" datatype=\"long\""u8,
            ColumnType.Bool => "\" datatype=\"boolean\""u8,
            _ => "\" datatype=\"unicodeChar\" arraysize=\"*\""u8,
        });
        WriteAttribute(output, " unit=\""u8, column.Unit);
        WriteAttribute(output, " ucd=\""u8, column.Ucd);
        WriteAttribute(output, " precision=\""u8, PrecisionOf(column));
        if (column.Description.Length == 0)
        {
            output.Bytes("/>\n"u8);
            return;
        }

        output.Bytes("><DESCRIPTION>"u8);
        WriteEscaped(output, column.Description);
        output.Bytes("</DESCRIPTION></FIELD>\n"u8);
    }

    private static string PrecisionOf(TableColumn column) => column.Type != ColumnType.Double ? ""
        : column.Decimals is int decimals ? string.Create(CultureInfo.InvariantCulture, $"F{decimals}")
        : column.SignificantDigits is int digits ? string.Create(CultureInfo.InvariantCulture, $"E{digits}")
        : "";

    private static void WriteInfo(Utf8Output output, string key, MetadataValue value)
    {
        output.Bytes("<INFO name=\""u8);
        WriteEscaped(output, key);
        output.Bytes("\" value=\""u8);
        bool isText = value.Kind == MetadataKind.Text;
        WriteEscaped(output, isText ? value.Text : MetadataJson.Compose(json => MetadataJson.Write(json, value)));
        output.Bytes(isText ? "\"/>\n"u8 : "\" xtype=\"json\"/>\n"u8);
    }

    private static void WriteAttribute(Utf8Output output, ReadOnlySpan<byte> opening, string value)
    {
        if (value.Length > 0)
        {
            output.Bytes(opening);
            WriteEscaped(output, value);
            output.Byte((byte)'"');
        }
    }

    private static void WriteCell(Utf8Output output, TableColumn column, int row)
    {
        switch (column.Type)
        {
            case ColumnType.Double when double.IsFinite(column.Doubles[row]):
                output.Number(column.Doubles[row], column);
                break;
            case ColumnType.Double:
                output.Bytes(double.IsNaN(column.Doubles[row]) ? "NaN"u8 : column.Doubles[row] > 0.0 ? "+Inf"u8 : "-Inf"u8);
                break;
            case ColumnType.Long when column.Longs[row] is long whole:
                output.Number(whole);
                break;
            case ColumnType.Bool when column.Bools[row] is bool truth:
                output.Byte(truth ? (byte)'T' : (byte)'F');
                break;
            case ColumnType.Text when column.Texts[row] is string text:
                WriteEscaped(output, text);
                break;
        }
    }

    private static void WriteEscaped(Utf8Output output, string text)
    {
        int start = 0;
        for (int i = 0; i < text.Length; i++)
        {
            ReadOnlySpan<byte> escape = text[i] switch
            {
                '<' => "&lt;"u8,
                '>' => "&gt;"u8,
                '&' => "&amp;"u8,
                '"' => "&quot;"u8,
                '\t' => "&#9;"u8,
                '\n' => "&#10;"u8,
                '\r' => "&#13;"u8,
                char c when !XmlConvert.IsXmlChar(c) && !char.IsSurrogate(c) => "\uFFFD"u8,
                _ => default,
            };
            if (!escape.IsEmpty)
            {
                output.Text(text.AsSpan(start, i - start));
                output.Bytes(escape);
                start = i + 1;
            }
        }

        output.Text(text.AsSpan(start));
    }
}
