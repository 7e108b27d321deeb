using System;
using Xunit;

namespace StarLines.Tables.Tests.Delimited;

public class CsvReaderTests
{
    [Theory]
    [InlineData("wave,flux\n5000.5,1\n5001,0.5\n")]
    [InlineData("wave;flux\n5000.5;1\n5001;0.5\n")]
    [InlineData("wave;flux\r\n5000,5;1\r\n5001;0,5\r\n")]
    [InlineData("wave\tflux\n5000.5\t1\n5001\t0.5\n")]
    [InlineData("  wave   flux\n  5000.5  1\n  5001    0.5")]
    [InlineData("# a comment, with commas\n# wave flux\n5000.5 1\n5001 0.5\n")]
    [InlineData("# wave,flux\n5000.5,1\n\n5001,0.5\n")]
    [InlineData("\"wave\",\"flux\"\n\"5000.5\",\"1\"\n\"5001\",\"0.5\"\n")]
    [InlineData("wave,flux,\n5000.5,1,\n5001,0.5,\n")]
    [InlineData("wave flux\n5.0005D3 1\n5.001d+3 0.5\n")]
    public void Columns_of_numbers_are_read_from_what_people_write(string text)
    {
        Table table = TableAssert.Read(text);

        Assert.Equal(2, table.Columns.Count);
        Assert.Equal([5000.5, 5001.0], table["wave"].Doubles.ToArray());
        Assert.Equal([1.0, 0.5], table["flux"].Doubles.ToArray());
    }

    [Fact]
    public void A_file_without_a_header_gets_numbered_names()
    {
        Table table = TableAssert.Read("5000 1.5\n5001 2.5\n");

        Assert.Equal([5000L, 5001L], table["col1"].Longs.ToArray());
        Assert.Equal([1.5, 2.5], table["col2"].Doubles.ToArray());
    }

    [Fact]
    public void Text_columns_stay_text()
    {
        Table table = TableAssert.Read("id,name,quoted,flag\n007,Fe I,\"12\",true\n123,\"a, \"\"b\"\"\",\"13\",False\n");

        Assert.Equal(["007", "123"], table["id"].Texts.ToArray());
        Assert.Equal(["Fe I", "a, \"b\""], table["name"].Texts.ToArray());
        Assert.Equal(["12", "13"], table["quoted"].Texts.ToArray());
        Assert.Equal([true, false], table["flag"].Bools.ToArray());
    }

    [Fact]
    public void An_empty_cell_is_missing_and_an_empty_quoted_text_is_not()
    {
        Table table = TableAssert.Read("n,x,t\n1,,a\n,2.5,\n3,nan,\"\"\n");

        Assert.Equal([1L, null, 3L], table["n"].Longs.ToArray());
        Assert.Equal([double.NaN, 2.5, double.NaN], table["x"].Doubles.ToArray());
        Assert.Equal(["a", null, ""], table["t"].Texts.ToArray());
    }

    [Fact]
    public void Comments_become_metadata()
    {
        Table table = TableAssert.Read("# medium: air\n# made by hand\n#source = NIST\nspecies,wavelength\nFe I,5000\n");

        Assert.Equal("air", table.Metadata.TextOf("Medium"));
        Assert.Equal("NIST", table.Metadata.TextOf("source"));
        Assert.Equal(3, table.Metadata["comments"].Items.Count);
    }

    [Fact]
    public void Equal_names_are_numbered()
    {
        Table table = TableAssert.Read("a,a,\n1,2,3\n");

        Assert.Equal(["a", "a_2", "col3"], [table.Columns[0].Name, table.Columns[1].Name, table.Columns[2].Name]);
    }

    [Theory]
    [InlineData("a,b\n1,2\n1,2,3\n", 3, "3 cells")]
    [InlineData("a,b\n1\n", 2, "1 cells")]
    [InlineData("a,b\n1,2\n\"x,4\n", 3, "a quoted cell without end")]
    [InlineData("a,b\n\"x\"y,4\n", 2, "text after a closing quote")]
    [InlineData("SIMPLE  =                    T / conforms to FITS standard", 1, "a FITS file")]
    [InlineData("a\0b", 1, "binary data")]
    [InlineData("", 0, "no row")]
    [InlineData("# only a comment\n", 0, "no row")]
    public void Bad_content_is_named_with_its_line_and_a_cure(string text, int line, string found)
    {
        TableFormatException exception = Assert.Throws<TableFormatException>(() => TableAssert.Read(text, TableFormat.Csv));

        Assert.Equal((line, found, "test"), (exception.LineNumber, exception.Found, exception.SourceName));
        Assert.NotEmpty(exception.Cure);
        Assert.Contains(found, exception.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Utf16_and_byte_order_marks_are_understood()
    {
        byte[] utf16 = [.. System.Text.Encoding.Unicode.Preamble, .. System.Text.Encoding.Unicode.GetBytes("ä\tb\n1\t2\n")];
        byte[] utf8 = [.. System.Text.Encoding.UTF8.Preamble, .. "ä,b\n1,2\n"u8];

        Assert.Equal(1L, TableAssert.Read(utf16)["ä"].Longs[0]);
        Assert.Equal(1L, TableAssert.Read(utf8)["ä"].Longs[0]);
    }
}
