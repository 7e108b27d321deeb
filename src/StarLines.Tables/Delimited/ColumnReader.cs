using System;

namespace StarLines.Tables.Delimited;

/// <summary>One column of delimited text to typed values.</summary>
internal static class ColumnReader
{
    /// <summary>Finds the narrowest type that fits every cell of a column: truth values, whole numbers, real numbers, else text.</summary>
    /// <param name="text">The records, without the header.</param>
    /// <param name="column">Column, from 0.</param>
    /// <param name="quotesMeanText">True where a quoted cell is text even if it looks like a number.</param>
    internal static ColumnType TypeOf(DelimitedText text, int column, bool quotesMeanText)
    {
        bool bools = true;
        bool longs = true;
        bool doubles = true;
        bool any = false;
        for (int r = 0; r < text.Count && (bools || doubles); r++)
        {
            DelimitedCell cell = text.Cell(r, column);
            if (cell.Length == 0)
            {
                continue;
            }

            if (cell.Quoted && quotesMeanText)
            {
                return ColumnType.Text;
            }

            ReadOnlySpan<byte> bytes = text.Bytes(cell);
            any = true;
            bools = bools && CellReader.TryBool(bytes, out _);
            longs = longs && CellReader.TryLong(bytes, out _);
            doubles = doubles && CellReader.TryDouble(bytes, out _) && !CellReader.IsPadded(bytes);
        }

        if (!any)
        {
            return ColumnType.Text;
        }

        return bools ? ColumnType.Bool : !doubles ? ColumnType.Text : longs ? ColumnType.Long : ColumnType.Double;
    }

    /// <summary>Reads the cells of a column as a type; with <paramref name="emptyIsMissing"/> a quoted empty text is missing too.</summary>
    /// <exception cref="TableFormatException">A cell does not fit the type.</exception>
    internal static TableColumn Read(
        DelimitedText text, int column, string name, ColumnType type, string source, bool emptyIsMissing = false) => type switch
        {
            ColumnType.Double => TableColumn.Owning(name, type, Doubles(text, column, name, source)),
            ColumnType.Long => TableColumn.Owning(name, type, Longs(text, column, name, source)),
            ColumnType.Bool => TableColumn.Owning(name, type, Bools(text, column, name, source)),
            _ => TableColumn.Owning(name, type, Texts(text, column, emptyIsMissing)),
        };

    private static double[] Doubles(DelimitedText text, int column, string name, string source)
    {
        double[] values = new double[text.Count];
        for (int r = 0; r < values.Length; r++)
        {
            DelimitedCell cell = text.Cell(r, column);
            if (cell.Length == 0)
            {
                values[r] = double.NaN;
            }
            else if (!CellReader.TryDouble(text.Bytes(cell), out values[r]))
            {
                throw Misfit(text, r, cell, name, "a number", source);
            }
        }

        return values;
    }

    private static long?[] Longs(DelimitedText text, int column, string name, string source)
    {
        long?[] values = new long?[text.Count];
        for (int r = 0; r < values.Length; r++)
        {
            DelimitedCell cell = text.Cell(r, column);
            if (cell.Length > 0)
            {
                values[r] = CellReader.TryLong(text.Bytes(cell), out long value)
                    ? value
                    : throw Misfit(text, r, cell, name, "a whole number", source);
            }
        }

        return values;
    }

    private static bool?[] Bools(DelimitedText text, int column, string name, string source)
    {
        bool?[] values = new bool?[text.Count];
        for (int r = 0; r < values.Length; r++)
        {
            DelimitedCell cell = text.Cell(r, column);
            if (cell.Length > 0)
            {
                values[r] = CellReader.TryBool(text.Bytes(cell), out bool value)
                    ? value
                    : throw Misfit(text, r, cell, name, "True or False", source);
            }
        }

        return values;
    }

    private static string?[] Texts(DelimitedText text, int column, bool emptyIsMissing)
    {
        string?[] values = new string?[text.Count];
        string? last = null;
        DelimitedCell lastCell = default;
        for (int r = 0; r < values.Length; r++)
        {
            DelimitedCell cell = text.Cell(r, column);
            if (cell.Length == 0 && (emptyIsMissing || !cell.Quoted))
            {
                continue;
            }

            // Columns such as species repeat: one string serves equal neighbours.
            if (last is null || !text.Bytes(cell).SequenceEqual(text.Bytes(lastCell)) || cell.Escaped != lastCell.Escaped)
            {
                last = text.Text(cell);
                lastCell = cell;
            }

            values[r] = last;
        }

        return values;
    }

    private static TableFormatException Misfit(
        DelimitedText text, int record, DelimitedCell cell, string name, string expected, string source)
    {
        string found = text.Text(cell);
        string shown = found.Length > 40 ? string.Concat(found.AsSpan(0, 40), "…") : found;
        return new TableFormatException(
            source, text.Lines[record], $"\"{shown}\" in column {name}", expected, "correct the cell or leave it empty");
    }
}
