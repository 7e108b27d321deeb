using System;

namespace StarLines.Fits.Tables;

/// <summary>Where the rows and the heap of a table lie.</summary>
internal sealed class TableLayout
{
    private TableLayout(HduData data, long rowBytes, long rowCount, long statedRowCount, long heapOffset)
    {
        Data = data;
        RowBytes = rowBytes;
        RowCount = rowCount;
        StatedRowCount = statedRowCount;
        HeapOffset = heapOffset;
    }

    internal HduData Data { get; }

    internal HduContext Context => Data.Context;

    internal long RowBytes { get; }

    /// <summary>Complete rows in the file.</summary>
    internal long RowCount { get; }

    internal long StatedRowCount { get; }

    /// <summary>Where the heap starts, from the start of the data.</summary>
    internal long HeapOffset { get; }

    internal static TableLayout Of(HduData data, FitsHeader header)
    {
        HduLayout hdu = data.Layout;
        if (hdu.Axes.Length != 2 || hdu.BitPix != 8)
        {
            throw data.Context.Error(hdu.BitPix == 8 ? "NAXIS" : "BITPIX", "a table needs BITPIX = 8 and NAXIS = 2; correct the header.");
        }

        if (hdu.GroupCount != 1)
        {
            throw data.Context.Error("GCOUNT", "a table needs GCOUNT = 1; correct the header.");
        }

        long rowBytes = hdu.Axes[0];
        if (rowBytes > Array.MaxLength)
        {
            throw data.Context.Error("NAXIS1", FormattableString.Invariant($"a row of {rowBytes} bytes is longer than {Array.MaxLength}, the most that is read; the header is damaged."));
        }

        long stated = hdu.Axes[1];
        long rows = rowBytes == 0 ? 0 : Math.Min(stated, data.StoredBytes / rowBytes);
        if (rows == 0 && stated > 0)
        {
            data.Context.Warn("no-rows", "NAXIS2", FormattableString.Invariant($"The header states {stated} rows, of which none is in the file."));
        }

        return new TableLayout(data, rowBytes, rows, stated, HeapOffsetOf(header, data, rowBytes * stated));
    }

    /// <summary>Bytes of the heap; the caller's count comes from the file and is checked here.</summary>
    internal ReadOnlyMemory<byte> ReadHeap(long offset, long bytes, string keyword)
    {
        long available = Data.StoredBytes - HeapOffset;
        return offset >= 0 && bytes >= 0 && offset <= available && bytes <= available - offset && bytes <= Array.MaxLength
            ? Data.Read(HeapOffset + offset, (int)bytes)
            : throw Context.Error(keyword, FormattableString.Invariant(
                $"a cell points to {bytes} bytes at {offset} of the heap, which has {Math.Max(0, available)} bytes; the file is damaged or cut short."));
    }

    private static long HeapOffsetOf(FitsHeader header, HduData data, long tableBytes)
    {
        long offset = header.OptionalInteger("THEAP", 0, long.MaxValue, tableBytes);
        return offset >= tableBytes || !header.Contains("PCOUNT") || data.Layout.ParameterCount == 0
            ? Math.Max(offset, tableBytes)
            : throw data.Context.Error("THEAP", FormattableString.Invariant($"found {offset}, expected at least {tableBytes}, the end of the rows; correct the header."));
    }
}
