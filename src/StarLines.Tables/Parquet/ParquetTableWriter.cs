using System;
using System.Collections.Generic;
using System.IO;
using System.IO.Compression;
using System.Threading.Tasks;
using Parquet;
using Parquet.Schema;
using StarLines.Tables.Json;

namespace StarLines.Tables.Parquet;

/// <summary>Writes Apache Parquet, compressed by Zstandard; every column may be null, and a missing number is null.</summary>
/// <remarks>The file's key-value metadata hold <c>metadata</c> and <c>columns</c>, the same JSON as in a JSON table.</remarks>
internal static class ParquetTableWriter
{
    /// <summary>Rows in a group: large enough to compress well, small enough to hold in memory.</summary>
    private const int GroupRows = 1 << 20;

    internal static void Write(Table table, Stream stream)
    {
        // The footer needs positions, which a pipe does not have.
        using var memory = new MemoryStream();
        WriteAsync(table, memory).GetAwaiter().GetResult();
        memory.WriteTo(stream);
    }

    private static async Task WriteAsync(Table table, Stream stream)
    {
        var fields = new DataField[table.Columns.Count];
        for (int c = 0; c < fields.Length; c++)
        {
            fields[c] = Field(table.Columns[c]);
        }

        // The default level of Zstandard is tens of times slower for a few per cent.
        var options = new ParquetOptions { CompressionMethod = CompressionMethod.Zstd, CompressionLevel = CompressionLevel.Optimal };
        ParquetWriter writer = await ParquetWriter.CreateAsync(new ParquetSchema(fields), stream, options).ConfigureAwait(false);
        await using (writer.ConfigureAwait(false))
        {
            writer.CustomMetadata = new Dictionary<string, string>
            {
                ["metadata"] = MetadataJson.Compose(json => MetadataJson.Write(json, table.Metadata)),
                ["columns"] = MetadataJson.Compose(json => MetadataJson.WriteColumns(json, table.Columns)),
            };
            for (int start = 0; start == 0 || start < table.RowCount; start += GroupRows)
            {
                using ParquetRowGroupWriter group = writer.CreateRowGroup();
                for (int c = 0; c < fields.Length; c++)
                {
                    await WriteColumn(group, fields[c], table.Columns[c], start, Math.Min(GroupRows, table.RowCount - start)).ConfigureAwait(false);
                }
            }
        }
    }

    private static DataField Field(TableColumn column) => column.Type switch
    {
        ColumnType.Double => new DataField<double?>(column.Name),
        ColumnType.Long => new DataField<long?>(column.Name),
        ColumnType.Bool => new DataField<bool?>(column.Name),
        _ => new DataField<string>(column.Name),
    };

    private static Task WriteColumn(ParquetRowGroupWriter group, DataField field, TableColumn column, int start, int count)
    {
        switch (column.Type)
        {
            case ColumnType.Double:
                double?[] values = new double?[count];
                ReadOnlySpan<double> doubles = column.Doubles.Slice(start, count);
                for (int i = 0; i < count; i++)
                {
                    values[i] = double.IsNaN(doubles[i]) ? null : doubles[i];
                }

                return group.WriteAsync<double>(field, values);
            case ColumnType.Long:
                return group.WriteAsync<long>(field, column.Longs.Slice(start, count).ToArray());
            case ColumnType.Bool:
                return group.WriteAsync<bool>(field, column.Bools.Slice(start, count).ToArray());
            default:
                return group.WriteAsync(field, column.Texts.Slice(start, count).ToArray()!);
        }
    }
}
