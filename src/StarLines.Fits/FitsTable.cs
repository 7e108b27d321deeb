using System;
using System.Collections.Generic;
using StarLines.Fits.Tables;

namespace StarLines.Fits;

/// <summary>A binary or ASCII table. Rows are counted from 0. Rows that a truncated file has lost are not counted.</summary>
public sealed class FitsTable
{
    private FitsTable(IReadOnlyList<FitsColumn> columns, long rowCount, long statedRowCount, bool isAscii)
    {
        Columns = columns;
        RowCount = rowCount;
        StatedRowCount = statedRowCount;
        IsAscii = isAscii;
    }

    /// <summary>The columns in order.</summary>
    public IReadOnlyList<FitsColumn> Columns { get; }

    /// <summary>The rows that can be read.</summary>
    public long RowCount { get; }

    /// <summary>The rows that the header states (NAXIS2); more than <see cref="RowCount"/> if the file was cut short.</summary>
    public long StatedRowCount { get; }

    /// <summary>Whether it is an ASCII table.</summary>
    public bool IsAscii { get; }

    /// <summary>The first column of a name.</summary>
    /// <param name="name">The TTYPE, in any case.</param>
    /// <returns>The column, or null where no column has that name.</returns>
    public FitsColumn? FindColumn(string name)
    {
        ArgumentNullException.ThrowIfNull(name);
        foreach (FitsColumn column in Columns)
        {
            if (column.Name.Equals(name.Trim(), StringComparison.OrdinalIgnoreCase))
            {
                return column;
            }
        }

        return null;
    }

    internal static FitsTable Read(HduData data, FitsHeader header, bool isAscii)
    {
        TableLayout layout = TableLayout.Of(data, header);
        return new FitsTable(ColumnReader.Read(layout, header, isAscii), layout.RowCount, layout.StatedRowCount, isAscii);
    }
}
