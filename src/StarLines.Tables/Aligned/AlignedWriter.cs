using System;
using System.IO;
using System.Text;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.Aligned;

/// <summary>Writes a table for eyes: a row of names, a row of units where there are any, then the rows; numbers to the right, text to the left.</summary>
/// <remarks>A missing value is a dash; characters that control a terminal are replaced by blanks. Metadata are left out.</remarks>
internal static class AlignedWriter
{
    private const int Gap = 2;

    internal static void Write(Table table, Stream stream)
    {
        var cells = new string[table.Columns.Count][];
        int[] widths = new int[cells.Length];
        bool hasUnits = false;
        for (int c = 0; c < cells.Length; c++)
        {
            cells[c] = Cells(table.Columns[c]);
            hasUnits |= table.Columns[c].Unit.Length > 0;
            foreach (string cell in cells[c])
            {
                widths[c] = Math.Max(widths[c], Width(cell));
            }
        }

        using var output = new Utf8Output(stream);
        for (int r = 0; r < cells[0].Length; r++)
        {
            if (r != 1 || hasUnits)
            {
                WriteRow(output, table, cells, widths, r);
            }
        }

        output.Flush();
    }

    private static void WriteRow(Utf8Output output, Table table, string[][] cells, int[] widths, int row)
    {
        for (int c = 0; c < cells.Length; c++)
        {
            string cell = cells[c][row];
            int blanks = widths[c] - Width(cell);
            bool right = table.Columns[c].IsNumeric;
            bool last = c == cells.Length - 1;
            output.Spaces(right ? blanks : 0);
            output.Text(cell);
            output.Spaces((right || last ? 0 : blanks) + (last ? 0 : Gap));
        }

        output.Byte((byte)'\n');
    }

    private static string[] Cells(TableColumn column)
    {
        string[] cells = new string[column.Count + 2];
        cells[0] = Clean(column.Name);
        cells[1] = Clean(column.Unit);
        for (int r = 0; r < column.Count; r++)
        {
            cells[r + 2] = Clean(column.TextAt(r) ?? "-");
        }

        return cells;
    }

    private static string Clean(string text)
    {
        foreach (char c in text)
        {
            if (char.IsControl(c))
            {
                return string.Create(text.Length, text, static (span, from) =>
                {
                    for (int i = 0; i < span.Length; i++)
                    {
                        span[i] = char.IsControl(from[i]) ? ' ' : from[i];
                    }
                });
            }
        }

        return text;
    }

    private static int Width(string text)
    {
        int width = 0;
        foreach (Rune rune in text.EnumerateRunes())
        {
            bool combines = Rune.GetUnicodeCategory(rune)
                is System.Globalization.UnicodeCategory.NonSpacingMark or System.Globalization.UnicodeCategory.EnclosingMark;
            width += combines ? 0 : 1;
        }

        return width;
    }
}
