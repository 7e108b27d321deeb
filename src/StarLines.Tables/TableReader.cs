using System;
using System.IO;
using System.IO.Compression;
using System.Text;
using StarLines.Tables.Delimited;
using StarLines.Tables.Ecsv;
using StarLines.Tables.Json;
using StarLines.Tables.Parquet;
using StarLines.Tables.VoTables;

namespace StarLines.Tables;

/// <summary>Reads tables in every format that can be read.</summary>
public static class TableReader
{
    /// <summary>Reads a table.</summary>
    /// <param name="stream">The bytes from here to the end; left open; need not seek. A gzip stream is unpacked.</param>
    /// <param name="format">The format; <see cref="TableFormat.Auto"/> recognises it by its first bytes.</param>
    /// <param name="name">Name of the source for messages, such as the file's path; may be empty.</param>
    /// <returns>The table.</returns>
    /// <exception cref="TableFormatException">The bytes are not such a table.</exception>
    /// <exception cref="ArgumentException">The format is <see cref="TableFormat.Aligned"/>, which is for eyes alone.</exception>
    /// <exception cref="IOException">The stream does not give its bytes.</exception>
    public static Table Read(Stream stream, TableFormat format = TableFormat.Auto, string name = "")
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentNullException.ThrowIfNull(name);
        byte[] bytes = ReadAll(stream, name);
        return (format == TableFormat.Auto ? Recognise(bytes) : format) switch
        {
            TableFormat.Ecsv => EcsvReader.Read(bytes, name),
            TableFormat.Csv => CsvReader.Read(bytes, name),
            TableFormat.Json => JsonTableReader.Read(bytes, name),
            TableFormat.VoTable => VoTableReader.Read(bytes, name),
            TableFormat.Parquet => ParquetTableReader.Read(bytes, name),
            _ => throw new ArgumentException($"Tables are not read as {format}.", nameof(format)),
        };
    }

    /// <summary>Recognises a format by its first bytes.</summary>
    internal static TableFormat Recognise(ReadOnlySpan<byte> bytes)
    {
        if (bytes.StartsWith("PAR1"u8))
        {
            return TableFormat.Parquet;
        }

        ReadOnlySpan<byte> text = bytes.TrimStart(" \t\r\n"u8);
        if (text.StartsWith("# %ECSV"u8))
        {
            return TableFormat.Ecsv;
        }

        if (text.StartsWith("<"u8))
        {
            return TableFormat.VoTable;
        }

        bool isArray = text.StartsWith("["u8) && text[1..].TrimStart(" \t\r\n"u8).StartsWith("{"u8);
        return isArray || text.StartsWith("{"u8) ? TableFormat.Json : TableFormat.Csv;
    }

    private static byte[] ReadAll(Stream stream, string name)
    {
        using var memory = new MemoryStream();
        stream.CopyTo(memory);
        byte[] bytes = memory.ToArray();
        if (bytes.AsSpan().StartsWith(stackalloc byte[] { 0x1F, 0x8B }))
        {
            bytes = Unpack(bytes, name);
        }

        if (bytes.AsSpan().StartsWith(stackalloc byte[] { 0xFF, 0xFE }) || bytes.AsSpan().StartsWith(stackalloc byte[] { 0xFE, 0xFF }))
        {
            Encoding encoding = bytes[0] == 0xFF ? Encoding.Unicode : Encoding.BigEndianUnicode;
            return Encoding.UTF8.GetBytes(encoding.GetString(bytes, 2, bytes.Length - 2));
        }

        return bytes.AsSpan().StartsWith(Encoding.UTF8.Preamble) ? bytes[3..] : bytes;
    }

    private static byte[] Unpack(byte[] bytes, string name)
    {
        try
        {
            using var unpacker = new GZipStream(new MemoryStream(bytes), CompressionMode.Decompress);
            using var memory = new MemoryStream();
            unpacker.CopyTo(memory);
            return memory.ToArray();
        }
        catch (InvalidDataException exception)
        {
            throw new TableFormatException($"{name}: the gzip data are damaged ({exception.Message}); get the file again.", exception);
        }
    }
}
