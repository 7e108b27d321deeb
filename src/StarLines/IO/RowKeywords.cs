using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Keywords of one row of a table: columns of one value a row answer before the headers do.</summary>
internal sealed class RowKeywords(FitsTable table, int row, HeaderKeywords header) : HeaderKeywords
{
    internal override bool TryGet(string name, [NotNullWhen(true)] out string? text, out string comment)
    {
        foreach (FitsColumn column in table.Columns)
        {
            if (column.Name.Equals(name, StringComparison.OrdinalIgnoreCase) && Value(column) is string value)
            {
                text = value;
                comment = "";
                return true;
            }
        }

        return header.TryGet(name, out text, out comment);
    }

    private string? Value(FitsColumn column)
    {
        if (column.IsText)
        {
            return column.ReadString(row).Trim();
        }

        if (column.IsVariableLength || column.Repeat != 1 || column.TypeLetter is 'C' or 'M')
        {
            return null;
        }

        double[] values = column.ReadDoubles(row);
        return values.Length == 1 && double.IsFinite(values[0]) ? values[0].ToString("R", CultureInfo.InvariantCulture) : null;
    }
}
