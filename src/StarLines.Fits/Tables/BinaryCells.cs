using System;
using System.Buffers.Binary;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tables;

/// <summary>The bytes of the cells of a binary table.</summary>
internal static class BinaryCells
{
    /// <summary>Rows of a large file are read in pieces of about this size.</summary>
    private const int PieceBytes = 1 << 22;

    /// <summary>The bytes and the number of elements of one cell.</summary>
    internal static ReadOnlyMemory<byte> Cell(TableLayout layout, ColumnStorage column, long row, string keyword, out long count)
    {
        ReadOnlyMemory<byte> cell = layout.Data.Read((row * layout.RowBytes) + column.Offset, checked((int)column.Width));
        ColumnFormat format = column.Format;
        count = format.Repeat;
        if (!format.IsVariable || format.Repeat == 0)
        {
            return cell;
        }

        ReadDescriptor(cell.Span, format.Descriptor, out count, out long offset);
        if (count < 0 || count > (layout.Data.StoredBytes * 8))
        {
            throw layout.Context.Error(keyword, FormattableString.Invariant($"a cell in row {row + 1} has {count} elements, more than the file can hold; the file is damaged."));
        }

        return count == 0 ? default : layout.ReadHeap(offset, ElementTypes.BytesOf(format.Type, count), keyword);
    }

    /// <summary>The number of elements of one cell.</summary>
    internal static long CountOf(TableLayout layout, ColumnStorage column, long row, string keyword)
    {
        _ = Cell(layout, column, row, keyword, out long count);
        return count;
    }

    /// <summary>All cells of a column of fixed length, decoded to doubles, row after row.</summary>
    internal static void ToDoubles(TableLayout layout, ColumnStorage column, in Scaling scaling, Span<double> destination, int perRow)
    {
        int repeat = (int)column.Format.Repeat;
        int rowsAtOnce = RowsAtOnce(layout);
        for (long first = 0; first < layout.RowCount; first += rowsAtOnce)
        {
            int rows = (int)Math.Min(rowsAtOnce, layout.RowCount - first);
            ReadOnlySpan<byte> bytes = layout.Data.Read(first * layout.RowBytes, rows * (int)layout.RowBytes).Span;
            Span<double> part = destination.Slice((int)first * perRow, rows * perRow);
            if (repeat == 1 && column.Format.Type is ElementType.Float32 or ElementType.Float64)
            {
                Strided(column.Format.Type, bytes[(int)column.Offset..], (int)layout.RowBytes, part);
                ElementDecoder.Rescale(part, scaling);
                continue;
            }

            for (int row = 0; row < rows; row++)
            {
                ReadOnlySpan<byte> cell = bytes.Slice((row * (int)layout.RowBytes) + (int)column.Offset, (int)column.Width);
                ElementDecoder.ToDoubles(column.Format.Type, cell, scaling, part.Slice(row * perRow, perRow));
            }
        }
    }

    /// <summary>All cells of an integer column of fixed length, as they are stored.</summary>
    internal static void ToStoredIntegers(TableLayout layout, ColumnStorage column, Span<long> destination)
    {
        int repeat = (int)column.Format.Repeat;
        for (long row = 0; row < layout.RowCount; row++)
        {
            ReadOnlySpan<byte> cell = layout.Data.Read((row * layout.RowBytes) + column.Offset, (int)column.Width).Span;
            ElementDecoder.ToStoredIntegers(column.Format.Type, cell, destination.Slice((int)row * repeat, repeat));
        }
    }

    /// <summary>One number a row.</summary>
    private static void Strided(ElementType type, ReadOnlySpan<byte> bytes, int stride, Span<double> destination)
    {
        if (type == ElementType.Float64)
        {
            for (int i = 0; i < destination.Length; i++)
            {
                destination[i] = BinaryPrimitives.ReadDoubleBigEndian(bytes[(i * stride)..]);
            }

            return;
        }

        for (int i = 0; i < destination.Length; i++)
        {
            destination[i] = BinaryPrimitives.ReadSingleBigEndian(bytes[(i * stride)..]);
        }
    }

    private static int RowsAtOnce(TableLayout layout) => layout.Data.Source.InMemory
        ? (int)Math.Max(1, layout.RowCount)
        : (int)Math.Max(1, PieceBytes / layout.RowBytes);

    private static void ReadDescriptor(ReadOnlySpan<byte> cell, char descriptor, out long count, out long offset)
    {
        bool isShort = descriptor == 'P';
        count = isShort ? BinaryPrimitives.ReadInt32BigEndian(cell) : BinaryPrimitives.ReadInt64BigEndian(cell);
        offset = isShort ? BinaryPrimitives.ReadInt32BigEndian(cell[4..]) : BinaryPrimitives.ReadInt64BigEndian(cell[8..]);
    }
}
