using System;
using System.Buffers;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace StarLines.Tables.Json;

/// <summary>Metadata and notes of columns to and from JSON.</summary>
internal static class MetadataJson
{
    /// <summary>Text stays readable: only what JSON itself demands is escaped.</summary>
    internal static JsonWriterOptions WriterOptions => new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, SkipValidation = true };

    /// <summary>Writes a map as an object; a real number that JSON does not know becomes null.</summary>
    internal static void Write(Utf8JsonWriter writer, TableMetadata metadata)
    {
        writer.WriteStartObject();
        foreach ((string key, MetadataValue value) in metadata)
        {
            writer.WritePropertyName(key);
            Write(writer, value);
        }

        writer.WriteEndObject();
    }

    /// <summary>Writes a value.</summary>
    internal static void Write(Utf8JsonWriter writer, MetadataValue value)
    {
        switch (value.Kind)
        {
            case MetadataKind.Text:
                writer.WriteStringValue(value.Text);
                break;
            case MetadataKind.Integer or MetadataKind.Boolean:
                writer.WriteRawValue(value.Text, skipInputValidation: true);
                break;
            case MetadataKind.Real when double.IsFinite(value.ToReal()):
                bool marked = value.Text.AsSpan().ContainsAny('.', 'E');
                writer.WriteRawValue(marked ? value.Text : value.Text + ".0", skipInputValidation: true);
                break;
            case MetadataKind.List:
                writer.WriteStartArray();
                foreach (MetadataValue item in value.Items)
                {
                    Write(writer, item);
                }

                writer.WriteEndArray();
                break;
            case MetadataKind.Map:
                Write(writer, value.Map);
                break;
            default:
                writer.WriteNullValue();
                break;
        }
    }

    /// <summary>Writes what there is to say about each column, as an array of objects.</summary>
    internal static void WriteColumns(Utf8JsonWriter writer, IReadOnlyList<TableColumn> columns)
    {
        writer.WriteStartArray();
        foreach (TableColumn column in columns)
        {
            writer.WriteStartObject();
            writer.WriteString("name"u8, column.Name);
            writer.WriteString("type"u8, TypeName(column.Type));
            WriteNote(writer, "unit", column.Unit);
            WriteNote(writer, "description", column.Description);
            WriteNote(writer, "ucd", column.Ucd);
            WriteNote(writer, "decimals", column.Decimals);
            WriteNote(writer, "significant_digits", column.SignificantDigits);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }

    /// <summary>The text of what a writing action produces.</summary>
    internal static string Compose(Action<Utf8JsonWriter> write)
    {
        var buffer = new ArrayBufferWriter<byte>();
        using (var writer = new Utf8JsonWriter(buffer, WriterOptions))
        {
            write(writer);
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan);
    }

    /// <summary>A JSON value as metadata.</summary>
    internal static MetadataValue Read(JsonElement element)
    {
        switch (element.ValueKind)
        {
            case JsonValueKind.String:
                return element.GetString()!;
            case JsonValueKind.True or JsonValueKind.False:
                return element.GetBoolean();
            case JsonValueKind.Number:
                string text = element.GetRawText();
                bool whole = long.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out long number);
                return whole ? MetadataValue.FromInteger(number) : MetadataValue.FromReal(element.GetDouble());
            case JsonValueKind.Array:
                var items = new List<MetadataValue>();
                foreach (JsonElement item in element.EnumerateArray())
                {
                    items.Add(Read(item));
                }

                return MetadataValue.FromList(items);
            case JsonValueKind.Object:
                return ReadMap(element);
            default:
                return MetadataValue.Null;
        }
    }

    /// <summary>A JSON object as metadata.</summary>
    internal static TableMetadata ReadMap(JsonElement element)
    {
        var map = new TableMetadata();
        foreach (JsonProperty property in element.EnumerateObject())
        {
            map[property.Name] = Read(property.Value);
        }

        return map;
    }

    /// <summary>Adds the notes of one entry of the array that <see cref="WriteColumns"/> writes.</summary>
    internal static TableColumn Noted(TableColumn column, TableMetadata notes) => column.Noted(
        notes.TextOf("unit"),
        notes.TextOf("description"),
        notes.TextOf("ucd"),
        Digits(notes, "decimals", 0, 20),
        Digits(notes, "significant_digits", 1, 17));

    /// <summary>The name of a type in JSON.</summary>
    internal static string TypeName(ColumnType type) => type switch
    {
        ColumnType.Double => "double",
        ColumnType.Long => "long",
        ColumnType.Bool => "bool",
        _ => "string",
    };

    private static int? Digits(TableMetadata notes, string key, int least, int most)
    {
        double digits = notes.TryGetValue(key, out MetadataValue? value) ? value.ToReal() : double.NaN;
        return digits >= least && digits <= most ? (int)digits : null;
    }

    private static void WriteNote(Utf8JsonWriter writer, string name, string text)
    {
        if (text.Length > 0)
        {
            writer.WriteString(name, text);
        }
    }

    private static void WriteNote(Utf8JsonWriter writer, string name, int? number)
    {
        if (number is int value)
        {
            writer.WriteNumber(name, value);
        }
    }
}
