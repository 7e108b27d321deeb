using System;
using System.IO;
using System.Text;
using Xunit;

namespace StarLines.Fits.Tests;

public sealed class FitsTableTests
{
    [Fact]
    public void Every_binary_type_is_read()
    {
        byte[] row =
        [
            (byte)'T', 0, 0b1010_0000, 200, 0xFF, 0xFE, (byte)'a', (byte)'b', (byte)' ', (byte)'c', (byte)'d', (byte)' ',
            0x3F, 0x80, 0, 0, 0x40, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 7,
        ];
        FitsTable table = Binary(row, 1, "2L", "3X", "1B", "1I", "6A3", "1C", "1K");
        Assert.Equal([true, null], table.Columns[0].ReadLogicals());
        Assert.Equal([true, false, true], table.Columns[1].ReadLogicals(0));
        Assert.Equal([200.0], table.Columns[2].ReadDoubles());
        Assert.Equal([-2L], table.Columns[3].ReadIntegers());
        Assert.Equal(["ab", "cd"], table.Columns[4].ReadStrings(0));
        Assert.Equal([1.0, 2.0], table.Columns[5].ReadDoubles());
        Assert.Equal([7L], table.Columns[6].ReadIntegers(0));
    }

    [Fact]
    public void Asking_a_column_for_what_it_does_not_hold_says_so()
    {
        FitsTable table = Binary("abc"u8.ToArray(), 1, "3A");
        FitsFormatException error = Assert.Throws<FitsFormatException>(() => table.Columns[0].ReadDoubles());
        Assert.Equal("TFORM1", error.Keyword);
    }

    [Fact]
    public void Whole_columns_and_single_cells_agree()
    {
        byte[] rows = new byte[24 * 5];
        new Random(3).NextBytes(rows);
        FitsTable table = Binary(rows, 5, "2J", "3I", "1E", "6X", "1B", "4B");
        foreach (FitsColumn column in table.Columns)
        {
            double[] whole = column.ReadDoubles();
            int each = whole.Length / 5;
            for (int row = 0; row < 5; row++)
            {
                Assert.Equal(whole[(row * each)..((row + 1) * each)], column.ReadDoubles(row));
            }
        }
    }

    /// <summary>The rules of the FITS Standard 4.0, section 7.2: an implied decimal point, a blank cell is zero, TNULL as text.</summary>
    [Fact]
    public void Ascii_cells_follow_the_standard()
    {
        string rows = "  12345  7 abc" + "  1.5D2 -3 d  " + "         9    " + "  ***   10 e f";
        FitsTable table = Ascii(rows, 4, 14, ["TBCOL1  = 1", "TFORM1  = 'F7.2    '", "TNULL1  = '***     '", "TBCOL2  = 8", "TFORM2  = 'I3      '", "TBCOL3  = 12", "TFORM3  = 'A3      '"]);
        Assert.Equal([123.45, 150.0, 0.0, double.NaN], table.Columns[0].ReadDoubles());
        Assert.Equal([7L, -3L, 9L, 10L], table.Columns[1].ReadIntegers());
        Assert.Equal(["abc", "d", "", "e f"], table.Columns[2].ReadStrings());
    }

    [Fact]
    public void Rows_lost_at_the_end_of_the_file_are_not_counted()
    {
        byte[] file = BinaryFile(new byte[8 * 500], 500, "1D");
        using FitsFile cut = FitsFile.Open(new MemoryStream(file[..(5760 + (8 * 300) + 3)]), "cut");
        Assert.Equal((300, 500), (cut.Hdus[1].Table!.RowCount, cut.Hdus[1].Table!.StatedRowCount));
        Assert.Contains(cut.Warnings, warning => warning.Word == "truncated");
    }

    private static FitsTable Binary(byte[] rows, int count, params string[] forms) =>
        FitsFile.Open(new MemoryStream(BinaryFile(rows, count, forms)), "made").Hdus[1].Table!;

    private static byte[] BinaryFile(byte[] rows, int count, params string[] forms)
    {
        string[] cards = new string[forms.Length];
        for (int i = 0; i < forms.Length; i++)
        {
            cards[i] = $"TFORM{i + 1}  = '{forms[i],-8}'";
        }

        return Extension("BINTABLE", rows, count, rows.Length / count, forms.Length, cards, 0);
    }

    private static FitsTable Ascii(string rows, int count, int width, string[] cards) =>
        FitsFile.Open(new MemoryStream(Extension("TABLE   ", Encoding.ASCII.GetBytes(rows), count, width, 3, cards, (byte)' ')), "made").Hdus[1].Table!;

    private static byte[] Extension(string kind, byte[] rows, int count, int width, int fields, string[] cards, byte padding)
    {
        MemoryStream stream = new();
        new FitsWriter(stream).WriteEmptyPrimary();
        StringBuilder text = new();
        string[] head =
        [
            $"XTENSION= '{kind}'", "BITPIX  = 8", "NAXIS   = 2", $"NAXIS1  = {width}", $"NAXIS2  = {count}", "PCOUNT  = 0", "GCOUNT  = 1", $"TFIELDS = {fields}",
        ];
        foreach (string card in (string[])[.. head, .. cards, "END"])
        {
            text.Append(card.PadRight(80));
        }

        byte[] data = new byte[(rows.Length + 2879) / 2880 * 2880];
        Array.Fill(data, padding);
        rows.CopyTo(data, 0);
        return [.. stream.ToArray(), .. Encoding.ASCII.GetBytes(text.ToString().PadRight((text.Length + 2879) / 2880 * 2880)), .. data];
    }
}
