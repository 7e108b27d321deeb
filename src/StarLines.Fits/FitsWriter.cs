using System;
using System.Buffers.Binary;
using System.Collections.Generic;
using System.IO;
using StarLines.Fits.Tables;
using StarLines.Fits.Writing;

namespace StarLines.Fits;

/// <summary>
/// Writes a FITS file, HDU after HDU, with checksums. The first image becomes the primary HDU; before a first table an empty primary HDU is written.
/// Writes forward only and leaves the stream open; to replace a file safely, write beside it and rename.
/// </summary>
/// <param name="stream">Where to write; at the start of the file.</param>
public sealed class FitsWriter(Stream stream)
{
    private const int PiecePixels = CardText.BlockBytes * 32;
    private const int PieceBytes = 1 << 20;
    private const int MaximumColumns = 999;
    private const int MaximumAxes = 999;

    private readonly Stream stream = stream ?? throw new ArgumentNullException(nameof(stream));
    private bool isStarted;

    /// <summary>Writes an image of real numbers.</summary>
    /// <param name="values">The pixels, first axis fastest; NaN for undefined ones.</param>
    /// <param name="axes">The lengths of the axes, NAXIS1 first; their product is the number of pixels.</param>
    /// <param name="bitPix">-64 for float64, -32 for float32.</param>
    /// <param name="header">Further cards, or null.</param>
    /// <param name="name">The EXTNAME; empty for none.</param>
    /// <exception cref="ArgumentException">The axes do not fit the pixels, or bitPix is none of these.</exception>
    public void WriteImage(ReadOnlySpan<double> values, IReadOnlyList<long> axes, int bitPix = -64, FitsHeaderBuilder? header = null, string name = "")
    {
        if (bitPix is not (-64 or -32))
        {
            throw new ArgumentOutOfRangeException(nameof(bitPix), bitPix, "bitPix must be -64 or -32 for real numbers.");
        }

        HduBytes hdu = new(stream, ImageCards(values.Length, axes, bitPix, name), header, (long)values.Length * -bitPix / 8);
        byte[] buffer = new byte[Math.Min(values.Length, PiecePixels) * -bitPix / 8];
        foreach (bool isWriting in HduBytes.Passes)
        {
            for (int start = 0; start < values.Length; start += PiecePixels)
            {
                ReadOnlySpan<double> piece = values.Slice(start, Math.Min(PiecePixels, values.Length - start));
                hdu.Add(EncodeReals(piece, bitPix, buffer), isWriting);
            }

            hdu.Finish(isWriting);
        }
    }

    /// <summary>Writes an image of integers.</summary>
    /// <param name="values">The pixels, first axis fastest.</param>
    /// <param name="axes">The lengths of the axes, NAXIS1 first; their product is the number of pixels.</param>
    /// <param name="bitPix">8 for 0 to 255, or 16, 32, 64 for signed integers.</param>
    /// <param name="header">Further cards, or null.</param>
    /// <param name="name">The EXTNAME; empty for none.</param>
    /// <exception cref="ArgumentException">The axes do not fit the pixels, bitPix is none of these, or a pixel does not fit it.</exception>
    public void WriteImage(ReadOnlySpan<long> values, IReadOnlyList<long> axes, int bitPix, FitsHeaderBuilder? header = null, string name = "")
    {
        RequireFit(values, bitPix);
        HduBytes hdu = new(stream, ImageCards(values.Length, axes, bitPix, name), header, (long)values.Length * bitPix / 8);
        int size = bitPix / 8;
        byte[] buffer = new byte[Math.Min(values.Length, PiecePixels) * size];
        foreach (bool isWriting in HduBytes.Passes)
        {
            for (int start = 0; start < values.Length; start += PiecePixels)
            {
                ReadOnlySpan<long> piece = values.Slice(start, Math.Min(PiecePixels, values.Length - start));
                for (int i = 0; i < piece.Length; i++)
                {
                    IntegerWidth.Write(buffer.AsSpan(i * size), piece[i], size);
                }

                hdu.Add(buffer.AsSpan(0, piece.Length * size), isWriting);
            }

            hdu.Finish(isWriting);
        }
    }

    /// <summary>Writes a primary HDU without data, where the file is to start with a header of its own before tables.</summary>
    /// <param name="header">Its cards, or null.</param>
    /// <exception cref="InvalidOperationException">Something was written before.</exception>
    public void WriteEmptyPrimary(FitsHeaderBuilder? header = null)
    {
        if (isStarted)
        {
            throw new InvalidOperationException("The primary HDU must be the first.");
        }

        HduBytes hdu = new(stream, ImageCards(0, [], 8, ""), header, 0);
        foreach (bool isWriting in HduBytes.Passes)
        {
            hdu.Finish(isWriting);
        }
    }

    /// <summary>Writes a binary table.</summary>
    /// <param name="columns">The columns, all of the same number of rows; 1 to 999.</param>
    /// <param name="header">Further cards, or null.</param>
    /// <param name="name">The EXTNAME; empty for none.</param>
    /// <exception cref="ArgumentException">There is no column, there are too many, or their rows differ.</exception>
    public void WriteTable(IReadOnlyList<FitsColumnData> columns, FitsHeaderBuilder? header = null, string name = "")
    {
        RequireColumns(columns);
        if (!isStarted)
        {
            WriteEmptyPrimary();
        }

        TableBytes table = new(columns);
        HduBytes hdu = new(stream, table.Cards(name), header, table.RowBytes * table.RowCount);
        int rowsAtOnce = (int)Math.Clamp(PieceBytes / table.RowBytes, 1, Math.Max(1, table.RowCount));

        // Rows are handed over in whole blocks of four, as the checksum sums words of four bytes.
        rowsAtOnce = (rowsAtOnce + 3) / 4 * 4;
        byte[] buffer = new byte[rowsAtOnce * table.RowBytes];
        foreach (bool isWriting in HduBytes.Passes)
        {
            for (long row = 0; row < table.RowCount; row += rowsAtOnce)
            {
                hdu.Add(table.Encode(row, (int)Math.Min(rowsAtOnce, table.RowCount - row), buffer), isWriting);
            }

            hdu.Finish(isWriting);
        }
    }

    private static ReadOnlySpan<byte> EncodeReals(ReadOnlySpan<double> values, int bitPix, byte[] buffer)
    {
        int size = -bitPix / 8;
        for (int i = 0; i < values.Length; i++)
        {
            Span<byte> pixel = buffer.AsSpan(i * size);
            if (size == sizeof(double))
            {
                BinaryPrimitives.WriteDoubleBigEndian(pixel, values[i]);
            }
            else
            {
                BinaryPrimitives.WriteSingleBigEndian(pixel, (float)values[i]);
            }
        }

        return buffer.AsSpan(0, values.Length * size);
    }

    private static void RequireFit(ReadOnlySpan<long> values, int bitPix)
    {
        (long least, long most) = bitPix switch
        {
            8 => (byte.MinValue, byte.MaxValue),
            16 => (short.MinValue, short.MaxValue),
            32 => (int.MinValue, int.MaxValue),
            64 => (long.MinValue, long.MaxValue),
            _ => throw new ArgumentOutOfRangeException(nameof(bitPix), bitPix, "bitPix must be 8, 16, 32 or 64 for integers."),
        };
        foreach (long value in values)
        {
            if (value < least || value > most)
            {
                throw new ArgumentException(FormattableString.Invariant($"The pixel value {value} does not fit BITPIX {bitPix}: {least} to {most}."), nameof(values));
            }
        }
    }

    private static void RequireColumns(IReadOnlyList<FitsColumnData> columns)
    {
        ArgumentNullException.ThrowIfNull(columns);
        if (columns.Count is < 1 or > MaximumColumns)
        {
            throw new ArgumentException(FormattableString.Invariant($"A table has 1 to {MaximumColumns} columns, not {columns.Count}."), nameof(columns));
        }

        foreach (FitsColumnData column in columns)
        {
            if (column.RowCount != columns[0].RowCount)
            {
                throw new ArgumentException(FormattableString.Invariant(
                    $"Column {column.Name} has {column.RowCount} rows, column {columns[0].Name} has {columns[0].RowCount}."), nameof(columns));
            }
        }
    }

    private CardWriter ImageCards(int pixels, IReadOnlyList<long> axes, int bitPix, string name)
    {
        ArgumentNullException.ThrowIfNull(axes);
        RequireAxes(pixels, axes);
        CardWriter cards = new();
        if (isStarted)
        {
            cards.Add("XTENSION", "IMAGE", "image extension");
        }
        else
        {
            cards.Add("SIMPLE", true, "conforms to the FITS standard");
        }

        cards.Add("BITPIX", bitPix, "type of the pixels");
        cards.Add("NAXIS", axes.Count, "number of axes");
        for (int i = 0; i < axes.Count; i++)
        {
            cards.Add(ColumnReader.Numbered("NAXIS", i + 1), axes[i], FormattableString.Invariant($"length of axis {i + 1}"));
        }

        if (isStarted)
        {
            cards.Add("PCOUNT", 0L, "no parameters");
            cards.Add("GCOUNT", 1L, "one group");
        }
        else
        {
            cards.Add("EXTEND", true, "extensions may follow");
        }

        if (name.Length > 0)
        {
            cards.Add("EXTNAME", name, "name of this HDU");
        }

        isStarted = true;
        return cards;
    }

    private static void RequireAxes(int pixels, IReadOnlyList<long> axes)
    {
        Int128 product = axes.Count == 0 ? 0 : 1;
        foreach (long axis in axes)
        {
            ArgumentOutOfRangeException.ThrowIfNegative(axis, nameof(axes));
            product *= axis;
            if (product > int.MaxValue)
            {
                break;
            }
        }

        if (product != pixels || axes.Count > MaximumAxes)
        {
            throw new ArgumentException(FormattableString.Invariant($"The axes ask for {product} pixels, {pixels} are given."), nameof(axes));
        }
    }
}
