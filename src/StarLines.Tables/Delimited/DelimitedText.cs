using System;
using System.Collections.Generic;
using System.Text;

namespace StarLines.Tables.Delimited;

/// <summary>One cell of delimited text: where its bytes lie and how it was quoted.</summary>
internal readonly record struct DelimitedCell(int Start, int Length, bool Quoted, bool Escaped);

/// <summary>Delimited text split into records and cells; the bytes stay where they are.</summary>
internal sealed class DelimitedText
{
    private readonly byte[] _bytes;

    internal DelimitedText(byte[] bytes) => _bytes = bytes;

    /// <summary>The cells of all records, one after the other.</summary>
    internal List<DelimitedCell> Cells { get; } = [];

    /// <summary>Index of the first cell of each record, and the number of cells at the end.</summary>
    internal List<int> Records { get; } = [0];

    /// <summary>Line of each record, from 1.</summary>
    internal List<int> Lines { get; } = [];

    /// <summary>Comment lines without their mark, with the number of records before them.</summary>
    internal List<(int RecordsBefore, string Text)> Comments { get; } = [];

    /// <summary>Number of records.</summary>
    internal int Count => Lines.Count;

    /// <summary>The cells of a record.</summary>
    internal int CellCount(int record) => Records[record + 1] - Records[record];

    /// <summary>A cell of a record.</summary>
    internal DelimitedCell Cell(int record, int column) => Cells[Records[record] + column];

    /// <summary>The bytes of a cell; doubled quotes are still doubled.</summary>
    internal ReadOnlySpan<byte> Bytes(DelimitedCell cell) => _bytes.AsSpan(cell.Start, cell.Length);

    /// <summary>The text of a cell.</summary>
    internal string Text(DelimitedCell cell)
    {
        string text = Encoding.UTF8.GetString(Bytes(cell));
        return cell.Escaped ? text.Replace("\"\"", "\"", StringComparison.Ordinal) : text;
    }

    /// <summary>Ends a record, which began on a line.</summary>
    internal void EndRecord(int line)
    {
        Records.Add(Cells.Count);
        Lines.Add(line);
    }

    /// <summary>Drops the first records.</summary>
    internal void Skip(int count)
    {
        Records.RemoveRange(0, count);
        Lines.RemoveRange(0, count);
    }
}
