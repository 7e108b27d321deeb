using System;
using System.Buffers.Binary;
using System.Globalization;

namespace StarLines.Tables.VoTables;

/// <summary>Decodes the serializations BINARY and BINARY2.</summary>
internal static class VoBinary
{
    /// <summary>Reads rows to the end of the bytes.</summary>
    /// <param name="bytes">The decoded stream.</param>
    /// <param name="columns">Receive the cells.</param>
    /// <param name="hasNullFlags">True for BINARY2, where each row begins with one bit a column that is 1 for a missing cell.</param>
    /// <param name="source">Name of the file for messages.</param>
    /// <returns>Number of rows.</returns>
    /// <exception cref="TableFormatException">The bytes end inside a row.</exception>
    internal static int Read(ReadOnlySpan<byte> bytes, VoColumn[] columns, bool hasNullFlags, string source)
    {
        int flagBytes = hasNullFlags ? (columns.Length + 7) / 8 : 0;
        int rows = 0;
        int at = 0;
        while (at < bytes.Length)
        {
            int start = at;
            ReadOnlySpan<byte> flags = Take(bytes, ref at, flagBytes, rows, source);
            for (int c = 0; c < columns.Length; c++)
            {
                bool missing = hasNullFlags && (flags[c / 8] & (0x80 >> (c % 8))) != 0;
                ReadCell(bytes, ref at, columns[c], missing, rows, source);
            }

            rows++;
            if (at == start)
            {
                // Only columns without any bytes: the rows cannot be counted.
                break;
            }
        }

        return rows;
    }

    private static void ReadCell(ReadOnlySpan<byte> bytes, ref int at, VoColumn column, bool missing, int row, string source)
    {
        int count = column.Field.ElementCount;
        if (count < 0)
        {
            uint stated = BinaryPrimitives.ReadUInt32BigEndian(Take(bytes, ref at, 4, row, source));
            count = stated <= VoField.MostElements ? (int)stated : throw CutOff(row, source);
        }

        long length = column.Field.Datatype == "bit" ? (count + 7L) / 8L : (long)count * column.Field.ElementSize;
        ReadOnlySpan<byte> cell = Take(bytes, ref at, length, row, source);
        if (missing)
        {
            column.AddMissing();
        }
        else
        {
            column.AddBinary(cell, count);
        }
    }

    private static ReadOnlySpan<byte> Take(ReadOnlySpan<byte> bytes, ref int at, long length, int row, string source)
    {
        if (length > bytes.Length - at)
        {
            throw CutOff(row, source);
        }

        ReadOnlySpan<byte> taken = bytes.Slice(at, (int)length);
        at += (int)length;
        return taken;
    }

    private static TableFormatException CutOff(int row, string source) => new(
        source,
        0,
        string.Create(CultureInfo.InvariantCulture, $"the end of the binary data inside row {row + 1}"),
        "whole rows of the declared fields",
        "get the file again, or as TABLEDATA");
}
