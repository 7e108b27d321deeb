using System;
using System.Collections.Generic;
using StarLines.Fits.Numerics;
using StarLines.Fits.Tables;

namespace StarLines.Fits;

/// <content>Reading cells and whole columns.</content>
public sealed partial class FitsColumn
{
    /// <summary>Variable-length cells may share one stretch of the heap; together they may not claim more than this many times the file.</summary>
    private const long MaximumHeapReuse = 16;

    /// <summary>All cells as real numbers, row after row; variable-length cells are joined. Complex numbers give two values each, logicals 1 or 0 (undefined NaN), bits 1 or 0.</summary>
    /// <returns>The values: rows × elements a cell.</returns>
    /// <exception cref="FitsFormatException">The column holds text, a cell is no number or points outside the heap, or there are more values than fit one array.</exception>
    public double[] ReadDoubles()
    {
        RequireNumbers();
        if (IsVariableLength)
        {
            return Join(ReadDoubles);
        }

        int perRow = PerCell(Repeat);
        double[] values = GC.AllocateUninitializedArray<double>(CountForArray(layout.RowCount, perRow));
        if (IsAscii)
        {
            for (int row = 0; row < values.Length; row++)
            {
                values[row] = AsciiDouble(row);
            }

            return values;
        }

        BinaryCells.ToDoubles(layout, Storage, scaling, values, perRow);
        return values;
    }

    /// <summary>One cell as real numbers.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <returns>The values of the cell.</returns>
    /// <exception cref="FitsFormatException">The column holds text, or the cell is no number or points outside the heap.</exception>
    public double[] ReadDoubles(long row)
    {
        RequireNumbers();
        RequireRow(row);
        if (IsAscii)
        {
            return [AsciiDouble(row)];
        }

        ReadOnlyMemory<byte> cell = BinaryCells.Cell(layout, Storage, row, FormKeyword, out long count);
        double[] values = GC.AllocateUninitializedArray<double>(CountForArray(1, PerCell(count)));
        ElementDecoder.ToDoubles(Storage.Format.Type, cell.Span, scaling, values);
        return values;
    }

    /// <summary>All cells of an integer or bit column, exactly, row after row; variable-length cells are joined.</summary>
    /// <returns>The values; undefined ones are <see cref="long.MinValue"/>.</returns>
    /// <exception cref="FitsFormatException">The column holds no integers, or a cell is damaged.</exception>
    public long[] ReadIntegers()
    {
        RequireIntegers();
        if (IsVariableLength)
        {
            return Join(ReadIntegers);
        }

        long[] values = new long[CountForArray(layout.RowCount, PerCell(Repeat))];
        if (IsAscii)
        {
            for (int row = 0; row < values.Length; row++)
            {
                values[row] = AsciiInteger(row);
            }

            return values;
        }

        BinaryCells.ToStoredIntegers(layout, Storage, values);
        IntegerScaling.Apply(values, scaling, layout.Context, ColumnReader.Numbered("TZERO", Number));
        return values;
    }

    /// <summary>One cell of an integer or bit column, exactly.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <returns>The values of the cell; undefined ones are <see cref="long.MinValue"/>.</returns>
    /// <exception cref="FitsFormatException">The column holds no integers, or the cell is damaged.</exception>
    public long[] ReadIntegers(long row)
    {
        RequireIntegers();
        RequireRow(row);
        if (IsAscii)
        {
            return [AsciiInteger(row)];
        }

        ReadOnlyMemory<byte> cell = BinaryCells.Cell(layout, Storage, row, FormKeyword, out long count);
        long[] values = new long[CountForArray(1, count)];
        ElementDecoder.ToStoredIntegers(Storage.Format.Type, cell.Span, values);
        IntegerScaling.Apply(values, scaling, layout.Context, ColumnReader.Numbered("TZERO", Number));
        return values;
    }

    /// <summary>All cells of a string column, one string a row.</summary>
    /// <returns>The strings, trailing blanks dropped.</returns>
    /// <exception cref="FitsFormatException">The column holds no text, or a cell points outside the heap.</exception>
    public string[] ReadStrings()
    {
        RequireText();
        string[] values = new string[CountForArray(layout.RowCount, 1)];
        for (int row = 0; row < values.Length; row++)
        {
            values[row] = ReadString(row);
        }

        return values;
    }

    /// <summary>One cell of a string column as one string.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <returns>The string up to a NUL, trailing blanks dropped.</returns>
    /// <exception cref="FitsFormatException">The column holds no text, or the cell points outside the heap.</exception>
    public string ReadString(long row)
    {
        RequireText();
        RequireRow(row);
        return Text(TextCell(row));
    }

    /// <summary>One cell of a string column that holds several strings: by TDIM, whose first size is their length, or by TFORM rAw.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <returns>The strings; one where the cell is not divided.</returns>
    /// <exception cref="FitsFormatException">The column holds no text, or the cell points outside the heap.</exception>
    public string[] ReadStrings(long row)
    {
        RequireText();
        RequireRow(row);
        ReadOnlySpan<byte> cell = TextCell(row);
        long length = Dimensions.Count > 1 ? Dimensions[0] : Storage.Format.SubstringLength;
        if (length <= 0 || length >= cell.Length)
        {
            return [Text(cell)];
        }

        string[] values = new string[cell.Length / length];
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = Text(cell.Slice(i * (int)length, (int)length));
        }

        return values;
    }

    /// <summary>All cells of a logical or bit column, row after row; variable-length cells are joined.</summary>
    /// <returns>The values; null where undefined.</returns>
    /// <exception cref="FitsFormatException">The column holds neither, or a cell points outside the heap.</exception>
    public bool?[] ReadLogicals()
    {
        RequireLogicals();
        return ToLogicals(ReadDoubles());
    }

    /// <summary>One cell of a logical or bit column.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <returns>The values of the cell; null where undefined.</returns>
    /// <exception cref="FitsFormatException">The column holds neither, or the cell points outside the heap.</exception>
    public bool?[] ReadLogicals(long row)
    {
        RequireLogicals();
        return ToLogicals(ReadDoubles(row));
    }

    /// <summary>The stored bytes of one cell.</summary>
    internal ReadOnlyMemory<byte> ReadBytes(long row)
    {
        RequireRow(row);
        return BinaryCells.Cell(layout, Storage, row, FormKeyword, out _);
    }

    private static bool?[] ToLogicals(double[] values) => Array.ConvertAll<double, bool?>(values, value => double.IsNaN(value) ? null : value != 0.0);

    private static string Text(ReadOnlySpan<byte> cell)
    {
        int end = cell.IndexOf((byte)0);
        return CardText.Decode(CardText.TrimEnd(end < 0 ? cell : cell[..end]));
    }

    private T[] Join<T>(Func<long, T[]> read)
    {
        long limit = (layout.Data.StoredBytes * MaximumHeapReuse) + CardText.BlockBytes;
        List<T[]> cells = [];
        long total = 0;
        for (long row = 0; row < layout.RowCount; row++)
        {
            T[] cell = read(row);
            total += cell.Length;
            if (total > limit || total > Array.MaxLength)
            {
                throw layout.Context.Error(FormKeyword, "the cells together claim far more elements than the heap holds; read them row by row.");
            }

            cells.Add(cell);
        }

        T[] all = new T[total];
        int at = 0;
        foreach (T[] cell in cells)
        {
            cell.CopyTo(all, at);
            at += cell.Length;
        }

        return all;
    }

    private ReadOnlySpan<byte> TextCell(long row) => IsAscii
        ? AsciiCells.Cell(layout, Storage, row)
        : BinaryCells.Cell(layout, Storage, row, FormKeyword, out _).Span;

    private double AsciiDouble(long row) =>
        AsciiCells.ToDouble(AsciiCells.Cell(layout, Storage, row), Storage, scaling, Keyword("TNULL"), layout.Context, FormKeyword);

    private long AsciiInteger(long row)
    {
        if (AsciiCells.ToInteger(AsciiCells.Cell(layout, Storage, row), Keyword("TNULL"), layout.Context, FormKeyword) is not long stored)
        {
            return IntegerScaling.Missing;
        }

        Span<long> value = [stored];
        IntegerScaling.Apply(value, scaling, layout.Context, ColumnReader.Numbered("TZERO", Number));
        return value[0];
    }

    private int PerCell(long elements) => CountForArray(elements, ElementTypes.IsComplex(Storage.Format.Type) ? 2 : 1);

    private int CountForArray(long rows, long perRow) => perRow == 0 || rows <= Array.MaxLength / perRow
        ? (int)(rows * perRow)
        : throw layout.Context.Error(FormKeyword, "the column has more values than fit one array; read it row by row.");

    private void RequireNumbers() => Require(!IsText, "numbers");

    private void RequireIntegers() => Require(IsInteger || Storage.Format.Type == ElementType.Bit, "integers");

    private void RequireText() => Require(IsText, "text");

    private void RequireLogicals() => Require(Storage.Format.Type is ElementType.Logical or ElementType.Bit, "logicals");

    private void Require(bool holds, string expected)
    {
        if (!holds)
        {
            throw layout.Context.Error(FormKeyword, $"column {Name} has the format '{Format}', expected {expected}.");
        }
    }
}
