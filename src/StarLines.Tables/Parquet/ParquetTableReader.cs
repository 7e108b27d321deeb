using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text.Json;
using System.Threading.Tasks;
using Parquet;
using Parquet.Schema;
using StarLines.Tables.Json;

namespace StarLines.Tables.Parquet;

/// <summary>Reads flat columns of Apache Parquet: numbers, truth values and text; times become ISO text.</summary>
internal static class ParquetTableReader
{
    /// <summary>Rows that a byte of the file may stand for: repeated values compress without bound, and a damaged count must not claim all memory.</summary>
    private const long MostRowsPerByte = 10_000;

    internal static Table Read(byte[] bytes, string source)
    {
        try
        {
            return ReadAsync(bytes, source).GetAwaiter().GetResult();
        }
        catch (Exception exception) when (exception is not TableFormatException)
        {
            // The Parquet library answers damaged files with exceptions of many types.
            throw new TableFormatException(
                $"{(source.Length > 0 ? source : "the table")}: the Parquet data are damaged or of a kind that is not known ({exception.Message}); write the file again.",
                exception);
        }
    }

    private static async Task<Table> ReadAsync(byte[] bytes, string source)
    {
        ParquetReader reader = await ParquetReader.CreateAsync(new MemoryStream(bytes)).ConfigureAwait(false);
        await using (reader.ConfigureAwait(false))
        {
            DataField[] fields = reader.Schema.GetDataFields();
            var parts = new List<TableColumn>[fields.Length];
            for (int c = 0; c < fields.Length; c++)
            {
                parts[c] = [];
            }

            for (int g = 0; g < reader.RowGroupCount; g++)
            {
                using ParquetRowGroupReader group = reader.OpenRowGroupReader(g);
                int rows = CheckRows(group.RowCount, bytes.Length, source);
                for (int c = 0; c < fields.Length; c++)
                {
                    parts[c].Add(await ReadColumn(group, fields[c], rows, source).ConfigureAwait(false));
                }
            }

            return MakeTable(fields, parts, reader.CustomMetadata, source);
        }
    }

    private static int CheckRows(long rows, long bytes, string source) => rows >= 0 && rows <= Math.Min(int.MaxValue / 8, bytes * MostRowsPerByte)
        ? (int)rows
        : throw new TableFormatException(
            source, 0, string.Create(CultureInfo.InvariantCulture, $"a group of {rows} rows"), "as many as the file can hold", "write the file again");

    private static Table MakeTable(DataField[] fields, List<TableColumn>[] parts, IReadOnlyDictionary<string, string>? described, string source)
    {
        if (fields.Length == 0)
        {
            throw new TableFormatException(source, 0, "no column", "at least one", "write the file again");
        }

        TableMetadata metadata = [];
        var notes = new Dictionary<string, TableMetadata>(StringComparer.Ordinal);
        Describe(described, metadata, notes);
        var columns = new TableColumn[fields.Length];
        for (int c = 0; c < columns.Length; c++)
        {
            TableColumn column = parts[c].Count > 0 ? TableColumn.Joined(parts[c]) : new TableColumn(fields[c].Name, (ReadOnlySpan<string?>)[]);
            columns[c] = notes.TryGetValue(fields[c].Name, out TableMetadata? note) ? MetadataJson.Noted(column, note) : column;
        }

        return new Table(columns, metadata);
    }

    private static void Describe(IReadOnlyDictionary<string, string>? described, TableMetadata metadata, Dictionary<string, TableMetadata> notes)
    {
        foreach ((string key, string text) in described ?? new Dictionary<string, string>())
        {
            MetadataValue value = FromJson(text);
            if (key == "columns")
            {
                foreach (MetadataValue item in value.Items)
                {
                    notes[item.Map.TextOf("name")] = item.Map;
                }
            }
            else if (key == "metadata" && value.Kind == MetadataKind.Map)
            {
                foreach ((string name, MetadataValue entry) in value.Map)
                {
                    metadata[name] = entry;
                }
            }
            else
            {
                metadata[key] = text;
            }
        }
    }

    private static MetadataValue FromJson(string text)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(text);
            return MetadataJson.Read(document.RootElement);
        }
        catch (JsonException)
        {
            // Metadata of another program: a text.
            return text;
        }
    }

    private static async Task<TableColumn> ReadColumn(ParquetRowGroupReader group, DataField field, int rows, string source)
    {
        if (field.IsArray || field.MaxRepetitionLevel > 0)
        {
            throw new TableFormatException(source, 0, $"lists in column {field.Name}", "one value a row", "unnest the column before");
        }

        Type type = field.ClrType;
        if (type == typeof(string) || type == typeof(ReadOnlyMemory<char>))
        {
            string?[] texts = new string?[rows];
            await group.ReadAsync(field, texts.AsMemory()!).ConfigureAwait(false);
            return TableColumn.Owning(field.Name, ColumnType.Text, texts);
        }

        return type == typeof(double) ? Reals(field, await Values<double>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(float) ? Reals(field, await Values<float>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(decimal) ? Reals(field, await Values<decimal>(group, field, rows).ConfigureAwait(false), static v => (double)v)
            : type == typeof(ulong) ? Reals(field, await Values<ulong>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(long) ? TableColumn.Owning(field.Name, ColumnType.Long, await Values<long>(group, field, rows).ConfigureAwait(false))
            : type == typeof(bool) ? TableColumn.Owning(field.Name, ColumnType.Bool, await Values<bool>(group, field, rows).ConfigureAwait(false))
            : type == typeof(int) ? Wholes(field, await Values<int>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(uint) ? Wholes(field, await Values<uint>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(short) ? Wholes(field, await Values<short>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(ushort) ? Wholes(field, await Values<ushort>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(byte) ? Wholes(field, await Values<byte>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(sbyte) ? Wholes(field, await Values<sbyte>(group, field, rows).ConfigureAwait(false), static v => v)
            : type == typeof(DateTime) ? Times(field, await Values<DateTime>(group, field, rows).ConfigureAwait(false))
            : throw new TableFormatException(source, 0, $"values of type {type.Name} in column {field.Name}", "numbers, truth values or text", "convert the column before");
    }

    private static async Task<T?[]> Values<T>(ParquetRowGroupReader group, DataField field, int rows)
        where T : struct
    {
        var values = new T?[rows];
        if (field.IsNullable)
        {
            await group.ReadAsync(field, values.AsMemory()).ConfigureAwait(false);
            return values;
        }

        var bare = new T[rows];
        await group.ReadAsync(field, bare.AsMemory()).ConfigureAwait(false);
        for (int i = 0; i < rows; i++)
        {
            values[i] = bare[i];
        }

        return values;
    }

    private static TableColumn Reals<T>(DataField field, T?[] values, Func<T, double> convert)
        where T : struct =>
        TableColumn.Owning(field.Name, ColumnType.Double, Array.ConvertAll(values, v => v is T value ? convert(value) : double.NaN));

    private static TableColumn Wholes<T>(DataField field, T?[] values, Func<T, long> convert)
        where T : struct =>
        TableColumn.Owning(field.Name, ColumnType.Long, Array.ConvertAll(values, v => v is T value ? convert(value) : (long?)null));

    private static TableColumn Times(DataField field, DateTime?[] values) =>
        TableColumn.Owning(field.Name, ColumnType.Text, Array.ConvertAll(values, static v => v?.ToString("O", CultureInfo.InvariantCulture)));
}
