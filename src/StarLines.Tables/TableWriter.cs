using System;
using System.IO;
using StarLines.Tables.Aligned;
using StarLines.Tables.Delimited;
using StarLines.Tables.Ecsv;
using StarLines.Tables.Json;
using StarLines.Tables.Parquet;
using StarLines.Tables.VoTables;

namespace StarLines.Tables;

/// <summary>Writes tables in every format.</summary>
public static class TableWriter
{
    /// <summary>Writes a table.</summary>
    /// <param name="table">The table.</param>
    /// <param name="stream">Receives the bytes; left open; need not seek.</param>
    /// <param name="format">The format, not <see cref="TableFormat.Auto"/>.</param>
    /// <exception cref="ArgumentException">The format is <see cref="TableFormat.Auto"/>.</exception>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    /// <remarks>
    /// Text formats write numbers in invariant culture: with the decimals or digits that the column states, else as the shortest text
    /// that gives the same number again. Text is UTF-8 without a byte-order mark; lines end in a line feed.
    /// </remarks>
    public static void Write(Table table, Stream stream, TableFormat format)
    {
        ArgumentNullException.ThrowIfNull(table);
        ArgumentNullException.ThrowIfNull(stream);
        switch (format)
        {
            case TableFormat.Ecsv:
                EcsvWriter.Write(table, stream);
                break;
            case TableFormat.Csv:
                CsvWriter.Write(table, stream);
                break;
            case TableFormat.Json:
                JsonTableWriter.Write(table, stream);
                break;
            case TableFormat.VoTable:
                VoTableWriter.Write(table, stream);
                break;
            case TableFormat.Parquet:
                ParquetTableWriter.Write(table, stream);
                break;
            case TableFormat.Aligned:
                AlignedWriter.Write(table, stream);
                break;
            default:
                throw new ArgumentException($"Tables are not written as {format}.", nameof(format));
        }
    }
}
