using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.VoTables;

/// <summary>Gathers the cells of one FIELD.</summary>
internal sealed class VoColumn
{
    private readonly List<double> _doubles = [];
    private readonly List<long?> _longs = [];
    private readonly List<bool?> _bools = [];
    private readonly List<string?> _texts = [];
    private readonly List<int> _lengths = [];

    internal VoColumn(VoField field) => Field = field;

    internal VoField Field { get; }

    /// <summary>Elements of each cell of an array column.</summary>
    internal IReadOnlyList<int> Lengths => _lengths;

    /// <summary>Adds a cell written as text.</summary>
    /// <exception cref="FormatException">The text is not of the field's type.</exception>
    internal void AddText(string cell)
    {
        if (!Field.IsArray)
        {
            AddElement(cell);
            return;
        }

        string[] elements = cell.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries);
        foreach (string element in elements)
        {
            AddElement(element);
        }

        _lengths.Add(elements.Length);
    }

    /// <summary>Adds a missing cell.</summary>
    internal void AddMissing() => AddText("");

    /// <summary>Adds a cell from its bytes, most significant first.</summary>
    internal void AddBinary(ReadOnlySpan<byte> cell, int count)
    {
        if (Field.IsText)
        {
            AddElement((Field.Datatype == "char" ? Encoding.UTF8 : Encoding.BigEndianUnicode).GetString(cell).TrimEnd('\0'));
            return;
        }

        int size = Field.ElementSize;
        for (int i = 0; i < count; i++)
        {
            AddBinaryElement(Field.Datatype == "bit" ? cell.Slice(i / 8, 1) : cell.Slice(i * size, size), i);
        }

        if (Field.IsArray)
        {
            _lengths.Add(count);
        }
    }

    /// <summary>The column with one row a cell; cells of several numbers become text.</summary>
    internal TableColumn ToColumn(string name) =>
        Field.Noted(Field.IsArray ? TableColumn.Owning(name, ColumnType.Text, JoinedCells()) : Elements(name, 0));

    /// <summary>The column with one row an element; the single value of a scalar column repeats.</summary>
    internal TableColumn ToElements(string name, int count) => Field.Noted(Elements(name, Field.IsArray ? 0 : count));

    private void AddElement(string text)
    {
        string trimmed = text.Trim();
        bool missing = trimmed.Length == 0 || (Field.Null.Length > 0 && trimmed == Field.Null);
        switch (Field.Type)
        {
            case ColumnType.Double:
                _doubles.Add(missing ? double.NaN : ParseDouble(trimmed));
                break;
            case ColumnType.Long:
                _longs.Add(missing ? null : ParseLong(trimmed));
                break;
            case ColumnType.Bool:
                _bools.Add(missing || trimmed == "?" ? null : ParseBool(trimmed));
                break;
            default:
                _texts.Add(text.Length == 0 || (Field.Null.Length > 0 && text == Field.Null) ? null : text);
                break;
        }
    }

    private void AddBinaryElement(ReadOnlySpan<byte> bytes, int index)
    {
        switch (Field.Datatype)
        {
            case "float":
                _doubles.Add(System.Buffers.Binary.BinaryPrimitives.ReadSingleBigEndian(bytes));
                break;
            case "double":
                _doubles.Add(System.Buffers.Binary.BinaryPrimitives.ReadDoubleBigEndian(bytes));
                break;
            case "unsignedByte":
                AddLong(bytes[0]);
                break;
            case "short":
                AddLong(System.Buffers.Binary.BinaryPrimitives.ReadInt16BigEndian(bytes));
                break;
            case "int":
                AddLong(System.Buffers.Binary.BinaryPrimitives.ReadInt32BigEndian(bytes));
                break;
            case "long":
                AddLong(System.Buffers.Binary.BinaryPrimitives.ReadInt64BigEndian(bytes));
                break;
            case "boolean":
                _bools.Add((char)bytes[0] switch { 'T' or 't' or '1' => true, 'F' or 'f' or '0' => false, _ => null });
                break;
            case "bit":
                _texts.Add((bytes[0] & (0x80 >> (index % 8))) != 0 ? "1" : "0");
                break;
            default:
                _texts.Add(Complex(bytes));
                break;
        }
    }

    private void AddLong(long value) =>
        _longs.Add(Field.Null.Length > 0 && Field.Null == value.ToString(CultureInfo.InvariantCulture) ? null : value);

    private static string Complex(ReadOnlySpan<byte> bytes) => bytes.Length == 8
        ? string.Create(
            CultureInfo.InvariantCulture,
            $"{System.Buffers.Binary.BinaryPrimitives.ReadSingleBigEndian(bytes)} {System.Buffers.Binary.BinaryPrimitives.ReadSingleBigEndian(bytes[4..])}")
        : string.Create(
            CultureInfo.InvariantCulture,
            $"{System.Buffers.Binary.BinaryPrimitives.ReadDoubleBigEndian(bytes)} {System.Buffers.Binary.BinaryPrimitives.ReadDoubleBigEndian(bytes[8..])}");

    private TableColumn Elements(string name, int repeat) => Field.Type switch
    {
        ColumnType.Double => TableColumn.Owning(name, ColumnType.Double, Repeated(_doubles, repeat)),
        ColumnType.Long => TableColumn.Owning(name, ColumnType.Long, Repeated(_longs, repeat)),
        ColumnType.Bool => TableColumn.Owning(name, ColumnType.Bool, Repeated(_bools, repeat)),
        _ => TableColumn.Owning(name, ColumnType.Text, Repeated(_texts, repeat)),
    };

    private static T[] Repeated<T>(List<T> values, int count)
    {
        if (count == 0)
        {
            return [.. values];
        }

        var repeated = new T[count];
        Array.Fill(repeated, values[0]);
        return repeated;
    }

    private string?[] JoinedCells()
    {
        TableColumn elements = Elements("elements", 0);
        string?[] cells = new string?[_lengths.Count];
        int at = 0;
        for (int r = 0; r < cells.Length; r++)
        {
            string[] words = new string[_lengths[r]];
            for (int i = 0; i < words.Length; i++)
            {
                words[i] = elements.TextAt(at++) ?? "NaN";
            }

            cells[r] = words.Length == 0 ? null : string.Join(' ', words);
        }

        return cells;
    }

    private static double ParseDouble(string text) => CellReader.TryDouble(Encoding.UTF8.GetBytes(text), out double value)
        ? value
        : throw new FormatException("a number");

    private static long ParseLong(string text)
    {
        bool hexadecimal = text.StartsWith("0x", StringComparison.OrdinalIgnoreCase);
        bool good = hexadecimal
            ? long.TryParse(text.AsSpan(2), NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture, out long value)
            : long.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out value);
        return good ? value : throw new FormatException("a whole number");
    }

    private static bool ParseBool(string text) => text.ToUpperInvariant() switch
    {
        "T" or "TRUE" or "1" => true,
        "F" or "FALSE" or "0" => false,
        _ => throw new FormatException("T, F or ?"),
    };
}
