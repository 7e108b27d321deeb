using System;
using System.IO;
using System.Text.Json;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.Json;

/// <summary>Writes a table as a JSON object: <c>metadata</c>, <c>columns</c> with their units, and <c>rows</c>, one object a row.</summary>
/// <remarks>A missing value is null; an infinity is the text <c>Infinity</c> or <c>-Infinity</c>, since JSON has no number for it.</remarks>
internal static class JsonTableWriter
{
    /// <summary>Bytes gathered before they go to the stream.</summary>
    private const int BlockSize = 1 << 16;

    internal static void Write(Table table, Stream stream)
    {
        using var writer = new Utf8JsonWriter(stream, MetadataJson.WriterOptions);
        writer.WriteStartObject();
        writer.WritePropertyName("metadata"u8);
        MetadataJson.Write(writer, table.Metadata);
        writer.WritePropertyName("columns"u8);
        MetadataJson.WriteColumns(writer, table.Columns);
        writer.WriteStartArray("rows"u8);
        WriteRows(writer, table);
        writer.WriteEndArray();
        writer.WriteEndObject();
        writer.Flush();
        stream.WriteByte((byte)'\n');
    }

    private static void WriteRows(Utf8JsonWriter writer, Table table)
    {
        var names = new JsonEncodedText[table.Columns.Count];
        for (int c = 0; c < names.Length; c++)
        {
            names[c] = JsonEncodedText.Encode(table.Columns[c].Name, MetadataJson.WriterOptions.Encoder);
        }

        Span<byte> scratch = stackalloc byte[NumberText.MaximumLength];
        for (int r = 0; r < table.RowCount; r++)
        {
            writer.WriteStartObject();
            for (int c = 0; c < names.Length; c++)
            {
                writer.WritePropertyName(names[c]);
                WriteCell(writer, table.Columns[c], r, scratch);
            }

            writer.WriteEndObject();
            if (writer.BytesPending > BlockSize)
            {
                writer.Flush();
            }
        }
    }

    private static void WriteCell(Utf8JsonWriter writer, TableColumn column, int row, Span<byte> scratch)
    {
        switch (column.Type)
        {
            case ColumnType.Double when double.IsFinite(column.Doubles[row]):
                writer.WriteRawValue(scratch[..NumberText.Write(column.Doubles[row], column, scratch)], skipInputValidation: true);
                break;
            case ColumnType.Double when double.IsInfinity(column.Doubles[row]):
                writer.WriteStringValue(column.Doubles[row] > 0.0 ? "Infinity"u8 : "-Infinity"u8);
                break;
            case ColumnType.Long when column.Longs[row] is long whole:
                writer.WriteNumberValue(whole);
                break;
            case ColumnType.Bool when column.Bools[row] is bool truth:
                writer.WriteBooleanValue(truth);
                break;
            case ColumnType.Text when column.Texts[row] is string text:
                writer.WriteStringValue(text);
                break;
            default:
                writer.WriteNullValue();
                break;
        }
    }
}
