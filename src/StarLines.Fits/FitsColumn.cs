using System;
using System.Collections.Generic;
using StarLines.Fits.Numerics;
using StarLines.Fits.Tables;

namespace StarLines.Fits;

/// <summary>
/// A column of a table. A cell is what it holds in one row: one value, or several. Rows and elements count from 0.
/// Numbers come scaled (TSCAL, TZERO); undefined ones (TNULL) are NaN.
/// </summary>
public sealed partial class FitsColumn
{
    private readonly TableLayout layout;
    private readonly FitsHeader header;
    private readonly Scaling scaling;

    internal FitsColumn(TableLayout layout, FitsHeader header, int number, ColumnStorage storage)
    {
        this.layout = layout;
        this.header = header;
        Number = number;
        Storage = storage;
        FormKeyword = ColumnReader.Numbered("TFORM", number);
        Name = Keyword("TTYPE") ?? "";
        scaling = ReadScaling();
        Dimensions = ReadDimensions();
    }

    /// <summary>The number of the column in the table, from 1.</summary>
    public int Number { get; }

    /// <summary>The name (TTYPE); empty where there is none.</summary>
    public string Name { get; }

    /// <summary>The unit (TUNIT); empty where there is none.</summary>
    public string Unit => Keyword("TUNIT") ?? "";

    /// <summary>The unified content descriptor (TUCD); empty where there is none.</summary>
    public string Ucd => Keyword("TUCD") ?? "";

    /// <summary>The role in a data model (TUTYP or TUTYPE); empty where there is none.</summary>
    public string Utype => Keyword("TUTYP") ?? Keyword("TUTYPE") ?? "";

    /// <summary>The format (TFORM) as it is written, e.g. <c>400D</c>, <c>1PE(400)</c> or, in an ASCII table, <c>F12.4</c>.</summary>
    public string Format => Storage.Form.Trim();

    /// <summary>The letter of the element type: L X B I J K A E D C M; in an ASCII table A I F E D.</summary>
    public char TypeLetter => Storage.Format.Letter;

    /// <summary>The elements in a cell; characters in a string column. Meaningless for a variable-length column: see <see cref="CountElements"/>.</summary>
    public long Repeat => Storage.Format.Repeat;

    /// <summary>Whether each cell has its own number of elements.</summary>
    public bool IsVariableLength => Storage.Format.IsVariable;

    /// <summary>Whether the column holds strings.</summary>
    public bool IsText => Storage.Format.Type == ElementType.Text;

    /// <summary>Whether the column holds real or complex numbers, or integers that are scaled to real ones.</summary>
    public bool IsReal => Storage.Format.Type is ElementType.Float32 or ElementType.Float64 or ElementType.Complex32 or ElementType.Complex64
        || (IsInteger && scaling.Scale != 1.0);

    /// <summary>The shape of a cell (TDIM), first axis fastest; empty where none is given or it does not fit the cell.</summary>
    public IReadOnlyList<long> Dimensions { get; }

    /// <summary>The factor TSCAL from stored to true values.</summary>
    public double Scale => scaling.Scale;

    /// <summary>The offset TZERO from stored to true values.</summary>
    public double Zero => scaling.Zero;

    /// <summary>The stored integer that means "undefined" (TNULL), if there is one.</summary>
    public long? Null => scaling.Null;

    internal ColumnStorage Storage { get; }

    internal string FormKeyword { get; }

    private bool IsInteger => ElementTypes.IsInteger(Storage.Format.Type);

    private bool IsAscii => Storage.Ascii is not null;

    /// <summary>The value of a keyword of this column.</summary>
    /// <param name="prefix">The keyword without the number of the column, e.g. <c>TDISP</c>.</param>
    /// <returns>The text, without blanks around it, or null where it is absent.</returns>
    public string? Keyword(string prefix)
    {
        ArgumentException.ThrowIfNullOrEmpty(prefix);
        return header.TryGetString(ColumnReader.Numbered(prefix, Number), out string? text) ? text.Trim() : null;
    }

    /// <summary>The number of elements of a cell.</summary>
    /// <param name="row">The row, from 0.</param>
    /// <exception cref="FitsFormatException">The cell points outside the heap.</exception>
    public long CountElements(long row)
    {
        RequireRow(row);
        return IsVariableLength ? BinaryCells.CountOf(layout, Storage, row, FormKeyword) : Repeat;
    }

    private Scaling ReadScaling()
    {
        if (Storage.Format.Type is ElementType.Text or ElementType.Logical or ElementType.Bit)
        {
            return Scaling.None;
        }

        double scale = header.TryGetDouble(ColumnReader.Numbered("TSCAL", Number), out double factor) ? factor : 1.0;
        double zero = header.TryGetDouble(ColumnReader.Numbered("TZERO", Number), out double offset) ? offset : 0.0;
        long? missing = IsInteger && !IsAscii && header.TryGetInteger(ColumnReader.Numbered("TNULL", Number), out long undefined) ? undefined : null;
        if (scale == 0.0)
        {
            layout.Context.Warn("scale-zero", ColumnReader.Numbered("TSCAL", Number), $"TSCAL{Number} is 0, so that every cell has the value of TZERO{Number}.");
        }

        return new Scaling(scale, zero, missing);
    }

    private long[] ReadDimensions()
    {
        string? text = Keyword("TDIM");
        if (string.IsNullOrEmpty(text))
        {
            return [];
        }

        string[] parts = text.Trim('(', ')').Split(',');
        long[] sizes = new long[parts.Length];
        bool fits = text.StartsWith('(') && text.EndsWith(')');
        long product = 1;
        for (int i = 0; i < parts.Length && fits; i++)
        {
            fits = long.TryParse(parts[i], System.Globalization.CultureInfo.InvariantCulture, out sizes[i])
                && sizes[i] >= 0 && (sizes[i] == 0 || product <= long.MaxValue / sizes[i]);
            product *= fits ? sizes[i] : 1;
        }

        if (!fits || (!IsVariableLength && product > Repeat))
        {
            layout.Context.Warn("dimensions", ColumnReader.Numbered("TDIM", Number), $"TDIM{Number} = '{text}' does not fit the cell; it was left out.");
            return [];
        }

        return sizes;
    }

    private void RequireRow(long row)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(row);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(row, layout.RowCount);
    }
}
