using System;
using System.Buffers.Binary;
using StarLines.Fits.Numerics;
using StarLines.Fits.Writing;

namespace StarLines.Fits;

/// <summary>A column of a binary table that is to be written. Values stand row after row; a cell of several values is a vector. Arrays are not copied.</summary>
public sealed class FitsColumnData
{
    private const int LongestText = 1 << 24;

    private readonly Action<long, Span<byte>> encode;

    private FitsColumnData(string name, char letter, long repeat, long rowCount, long? missing, Action<long, Span<byte>> encode)
    {
        Name = name;
        Letter = letter;
        Repeat = repeat;
        RowCount = rowCount;
        Missing = missing;
        this.encode = encode;
    }

    /// <summary>The name (TTYPE): ASCII letters, digits and underscores.</summary>
    public string Name { get; }

    /// <summary>The unit (TUNIT), in FITS spelling, e.g. <c>Angstrom</c>; empty for none.</summary>
    public string Unit { get; private init; } = "";

    /// <summary>The unified content descriptor (TUCD); empty for none.</summary>
    public string Ucd { get; private init; } = "";

    /// <summary>The role in a data model (TUTYP); empty for none.</summary>
    public string Utype { get; private init; } = "";

    /// <summary>What the column holds (TCOMM); empty for none.</summary>
    public string Description { get; private init; } = "";

    /// <summary>The number of rows.</summary>
    public long RowCount { get; }

    internal char Letter { get; }

    internal long Repeat { get; }

    /// <summary>The stored integer for an undefined value, where there is one (TNULL).</summary>
    internal long? Missing { get; }

    internal long Width => ElementTypes.BytesOf(ElementTypes.OfLetter(Letter)!.Value, Repeat);

    /// <summary>A column of doubles (D); NaN means undefined.</summary>
    /// <param name="name">The name.</param>
    /// <param name="values">Rows × repeat values.</param>
    /// <param name="repeat">Values a cell.</param>
    /// <returns>The column.</returns>
    public static FitsColumnData OfDoubles(string name, double[] values, int repeat = 1)
    {
        long rows = Rows(name, values, repeat);
        return new FitsColumnData(name, 'D', repeat, rows, null, (row, cell) =>
        {
            for (int i = 0; i < repeat; i++)
            {
                BinaryPrimitives.WriteDoubleBigEndian(cell[(i * sizeof(double))..], values[(row * repeat) + i]);
            }
        });
    }

    /// <summary>A column of float32 (E); NaN means undefined.</summary>
    /// <param name="name">The name.</param>
    /// <param name="values">Rows × repeat values.</param>
    /// <param name="repeat">Values a cell.</param>
    /// <returns>The column.</returns>
    public static FitsColumnData OfSingles(string name, float[] values, int repeat = 1)
    {
        long rows = Rows(name, values, repeat);
        return new FitsColumnData(name, 'E', repeat, rows, null, (row, cell) =>
        {
            for (int i = 0; i < repeat; i++)
            {
                BinaryPrimitives.WriteSingleBigEndian(cell[(i * sizeof(float))..], values[(row * repeat) + i]);
            }
        });
    }

    /// <summary>A column of integers, in the smallest of 16, 32 and 64 bits that holds them all (I, J, K). <see cref="long.MinValue"/> means undefined and is written with TNULL.</summary>
    /// <param name="name">The name.</param>
    /// <param name="values">Rows × repeat values.</param>
    /// <param name="repeat">Values a cell.</param>
    /// <returns>The column.</returns>
    public static FitsColumnData OfIntegers(string name, long[] values, int repeat = 1)
    {
        long rows = Rows(name, values, repeat);
        IntegerWidth width = IntegerWidth.For(values);
        return new FitsColumnData(name, width.Letter, repeat, rows, width.Missing, (row, cell) =>
        {
            for (int i = 0; i < repeat; i++)
            {
                long value = values[(row * repeat) + i];
                width.Write(cell[(i * width.Bytes)..], value == IntegerScaling.Missing ? width.Least : value);
            }
        });
    }

    /// <summary>A column of logicals (L); null means undefined.</summary>
    /// <param name="name">The name.</param>
    /// <param name="values">Rows × repeat values.</param>
    /// <param name="repeat">Values a cell.</param>
    /// <returns>The column.</returns>
    public static FitsColumnData OfLogicals(string name, bool?[] values, int repeat = 1)
    {
        long rows = Rows(name, values, repeat);
        return new FitsColumnData(name, 'L', repeat, rows, null, (row, cell) =>
        {
            for (int i = 0; i < repeat; i++)
            {
                cell[i] = values[(row * repeat) + i] switch { true => (byte)'T', false => (byte)'F', null => 0 };
            }
        });
    }

    /// <summary>A column of strings (A), as wide as the longest. Text becomes ASCII: accents are dropped, other characters become question marks.</summary>
    /// <param name="name">The name.</param>
    /// <param name="values">One string a row.</param>
    /// <returns>The column.</returns>
    public static FitsColumnData OfStrings(string name, string[] values)
    {
        long rows = Rows(name, values, 1);
        string[] ascii = Array.ConvertAll(values, value => AsciiText.From(value ?? "").TrimEnd(' '));
        int width = 1;
        foreach (string value in ascii)
        {
            width = Math.Max(width, value.Length);
        }

        if (width > LongestText)
        {
            throw new ArgumentException($"A string of column {name} is longer than {LongestText} characters.", nameof(values));
        }

        return new FitsColumnData(name, 'A', width, rows, null, (row, cell) =>
        {
            int count = System.Text.Encoding.ASCII.GetBytes(ascii[row], cell);
            cell[count..].Fill((byte)' ');
        });
    }

    /// <summary>The same column with what its values mean.</summary>
    /// <param name="unit">The unit (TUNIT), in FITS spelling.</param>
    /// <param name="ucd">The unified content descriptor (TUCD).</param>
    /// <param name="utype">The role in a data model (TUTYP).</param>
    /// <param name="description">What the column holds (TCOMM).</param>
    /// <returns>The column; the values are shared.</returns>
    public FitsColumnData With(string unit = "", string ucd = "", string utype = "", string description = "") =>
        new(Name, Letter, Repeat, RowCount, Missing, encode) { Unit = unit, Ucd = ucd, Utype = utype, Description = description };

    /// <summary>Writes the cell of a row.</summary>
    internal void Encode(long row, Span<byte> cell) => encode(row, cell);

    private static long Rows(string name, Array values, int repeat)
    {
        ArgumentException.ThrowIfNullOrWhiteSpace(name);
        ArgumentNullException.ThrowIfNull(values);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(repeat);
        return values.Length % repeat == 0
            ? values.Length / repeat
            : throw new ArgumentException(FormattableString.Invariant($"Column {name} has {values.Length} values, no multiple of its {repeat} values a cell."), nameof(values));
    }
}
