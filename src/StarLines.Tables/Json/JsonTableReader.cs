using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using System.Text.Json;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.Json;

/// <summary>Reads a table from JSON: the object that <see cref="JsonTableWriter"/> writes, its rows as objects or arrays, or a bare array of objects.</summary>
internal static class JsonTableReader
{
    internal static Table Read(byte[] bytes, string source)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(bytes, new JsonDocumentOptions { AllowTrailingCommas = true });
            return Read(document.RootElement, source);
        }
        catch (JsonException exception)
        {
            int line = (int)Math.Min(exception.LineNumber ?? 0, int.MaxValue - 1) + 1;
            throw new TableFormatException(source, line, "text that is not JSON", "a JSON object with rows", exception.Message.TrimEnd('.'));
        }
        catch (InvalidOperationException exception)
        {
            // Text of a value that is not valid Unicode shows only when it is read.
            throw new TableFormatException(source, 0, "a text that is not valid Unicode", "UTF-8", exception.Message.TrimEnd('.'));
        }
    }

    private static Table Read(JsonElement root, string source)
    {
        bool bare = root.ValueKind == JsonValueKind.Array;
        JsonElement rows = root;
        if (!bare && (root.ValueKind != JsonValueKind.Object || !root.TryGetProperty("rows", out rows) || rows.ValueKind != JsonValueKind.Array))
        {
            throw Fault(source, "no array named rows", "an object with metadata, columns and rows");
        }

        List<TableMetadata> columns = bare ? [] : Columns(root);
        if (columns.Count == 0)
        {
            columns = ColumnsOfRows(rows);
        }

        if (columns.Count == 0)
        {
            throw Fault(source, "no column", "an array named columns, or rows that are objects");
        }

        var result = new TableColumn[columns.Count];
        string[] names = CsvHeader.MakeUnique(columns.ConvertAll(static c => (string?)c.TextOf("name")).ToArray());
        for (int c = 0; c < result.Length; c++)
        {
            List<JsonElement> cells = Cells(rows, columns[c].TextOf("name"), c, source);
            result[c] = MetadataJson.Noted(ReadColumn(names[c], columns[c].TextOf("type"), cells, source), columns[c]);
        }

        bool described = !bare && root.TryGetProperty("metadata", out JsonElement metadata) && metadata.ValueKind == JsonValueKind.Object;
        return new Table(result, described ? MetadataJson.ReadMap(root.GetProperty("metadata")) : null);
    }

    private static List<TableMetadata> Columns(JsonElement root)
    {
        var columns = new List<TableMetadata>();
        if (root.TryGetProperty("columns", out JsonElement declared) && declared.ValueKind == JsonValueKind.Array)
        {
            foreach (JsonElement column in declared.EnumerateArray())
            {
                columns.Add(column.ValueKind == JsonValueKind.Object ? MetadataJson.ReadMap(column) : new TableMetadata { { "name", column.ToString() } });
            }
        }

        return columns;
    }

    private static List<TableMetadata> ColumnsOfRows(JsonElement rows)
    {
        var columns = new List<TableMetadata>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (JsonElement row in rows.EnumerateArray())
        {
            if (row.ValueKind != JsonValueKind.Object)
            {
                continue;
            }

            foreach (JsonProperty property in row.EnumerateObject())
            {
                if (seen.Add(property.Name))
                {
                    columns.Add(new TableMetadata { { "name", property.Name } });
                }
            }
        }

        return columns;
    }

    /// <summary>The cells of a column; a default element where a row has none.</summary>
    private static List<JsonElement> Cells(JsonElement rows, string name, int index, string source)
    {
        var cells = new List<JsonElement>(rows.GetArrayLength());
        foreach (JsonElement row in rows.EnumerateArray())
        {
            JsonElement cell = default;
            if (row.ValueKind == JsonValueKind.Object)
            {
                _ = row.TryGetProperty(name, out cell);
            }
            else if (row.ValueKind == JsonValueKind.Array && index < row.GetArrayLength())
            {
                cell = row[index];
            }
            else if (row.ValueKind != JsonValueKind.Array)
            {
                throw Fault(source, $"a row that is {Shown(row)}", "an object or an array");
            }

            cells.Add(cell);
        }

        return cells;
    }

    private static TableColumn ReadColumn(string name, string type, List<JsonElement> cells, string source)
    {
        switch (type.Length > 0 ? type : TypeOf(cells))
        {
            case "double":
                return TableColumn.Owning(name, ColumnType.Double, cells.ConvertAll(c => Double(c, name, source)).ToArray());
            case "long":
                return TableColumn.Owning(name, ColumnType.Long, cells.ConvertAll(c => Long(c, name, source)).ToArray());
            case "bool":
                return TableColumn.Owning(name, ColumnType.Bool, cells.ConvertAll(c => Bool(c, name, source)).ToArray());
            default:
                return TableColumn.Owning(name, ColumnType.Text, cells.ConvertAll(Text).ToArray());
        }
    }

    private static string TypeOf(List<JsonElement> cells)
    {
        bool bools = true;
        bool longs = true;
        bool doubles = true;
        bool any = false;
        foreach (JsonElement cell in cells)
        {
            if (IsMissing(cell))
            {
                continue;
            }

            any = true;
            bools &= cell.ValueKind is JsonValueKind.True or JsonValueKind.False;
            doubles &= cell.ValueKind == JsonValueKind.Number;
            longs &= cell.ValueKind == JsonValueKind.Number && cell.TryGetInt64(out _);
        }

        return !any ? "string" : bools ? "bool" : longs ? "long" : doubles ? "double" : "string";
    }

    private static double Double(JsonElement cell, string name, string source)
    {
        if (IsMissing(cell))
        {
            return double.NaN;
        }

        double value = double.NaN;
        bool good = cell.ValueKind == JsonValueKind.Number ? cell.TryGetDouble(out value)
            : cell.ValueKind == JsonValueKind.String && CellReader.TryDouble(Encoding.UTF8.GetBytes(cell.GetString()!), out value);
        return good ? value : throw Fault(source, $"{Shown(cell)} in column {name}", "a number or null");
    }

    private static long? Long(JsonElement cell, string name, string source) =>
        IsMissing(cell) ? null
        : cell.ValueKind == JsonValueKind.Number && cell.TryGetInt64(out long value) ? value
        : throw Fault(source, $"{Shown(cell)} in column {name}", "a whole number or null");

    private static bool? Bool(JsonElement cell, string name, string source) =>
        IsMissing(cell) ? null
        : cell.ValueKind is JsonValueKind.True or JsonValueKind.False ? cell.GetBoolean()
        : throw Fault(source, $"{Shown(cell)} in column {name}", "true, false or null");

    private static string? Text(JsonElement cell) =>
        IsMissing(cell) ? null : cell.ValueKind == JsonValueKind.String ? cell.GetString() : cell.GetRawText();

    private static bool IsMissing(JsonElement cell) => cell.ValueKind is JsonValueKind.Undefined or JsonValueKind.Null;

    private static string Shown(JsonElement cell)
    {
        string text = cell.ValueKind == JsonValueKind.Undefined ? "nothing" : cell.GetRawText();
        return text.Length > 40 ? string.Create(CultureInfo.InvariantCulture, $"{text.AsSpan(0, 40)}…") : text;
    }

    private static TableFormatException Fault(string source, string found, string expected) =>
        new(source, 0, found, expected, "correct the JSON or write the table again");
}
