using System;
using System.Buffers.Binary;
using Xunit;

namespace StarLines.Tables.Tests.VoTables;

public class VoTableReaderTests
{
    private const string Fields = """
        <FIELD name="wave" datatype="double" unit="Angstrom" ucd="em.wl"><DESCRIPTION>Wavelength</DESCRIPTION></FIELD>
        <FIELD name="n" datatype="int"><VALUES null="-99"/></FIELD>
        <FIELD name="name" datatype="char" arraysize="*"/>
        <FIELD name="ok" datatype="boolean"/>
        """;

    [Fact]
    public void Rows_of_text_are_read()
    {
        Table table = Read(Fields, "<TABLEDATA><TR><TD> 5000.5 </TD><TD>0x10</TD><TD>Fe I</TD><TD>T</TD></TR><TR><TD/><TD>-99</TD><TD></TD><TD>?</TD></TR></TABLEDATA>");

        CheckTwoRows(table);
        Assert.Equal(("Angstrom", "em.wl", "Wavelength"), (table["wave"].Unit, table["wave"].Ucd, table["wave"].Description));
        Assert.Equal("value of p", table.Metadata.TextOf("p"));
    }

    [Theory]
    [InlineData("BINARY")]
    [InlineData("BINARY2")]
    public void Binary_rows_are_read(string element)
    {
        bool flagged = element == "BINARY2";
        byte[] first = Row(flagged, 0, 5000.5, 16, "Fe I", (byte)'T');
        byte[] second = Row(flagged, 0b0100_0000, double.NaN, flagged ? 7 : -99, "", (byte)'?');

        Table table = Read(Fields, $"<{element}><STREAM encoding='base64'>\n{Convert.ToBase64String([.. first, .. second])}\n</STREAM></{element}>");

        CheckTwoRows(table);
    }

    [Fact]
    public void One_row_of_arrays_becomes_a_row_an_element()
    {
        Table table = Read(
            "<FIELD name='id' datatype='char' arraysize='8'/><FIELD name='wave' datatype='double' arraysize='*'/><FIELD name='flux' datatype='float' arraysize='3'/>",
            "<TABLEDATA><TR><TD>HD 1</TD><TD>1 2 3</TD><TD>0.5 NaN 1</TD></TR></TABLEDATA>");

        Assert.Equal([1.0, 2.0, 3.0], table["wave"].Doubles.ToArray());
        Assert.Equal([0.5, double.NaN, 1.0], table["flux"].Doubles.ToArray());
        Assert.Equal(["HD 1", "HD 1", "HD 1"], table["id"].Texts.ToArray());
    }

    [Fact]
    public void Arrays_in_several_rows_become_text()
    {
        Table table = Read("<FIELD name='v' datatype='int' arraysize='2'/>", "<TABLEDATA><TR><TD>1 2</TD></TR><TR><TD>3 4</TD></TR></TABLEDATA>");

        Assert.Equal(["1 2", "3 4"], table["v"].Texts.ToArray());
    }

    [Theory]
    [InlineData("<TABLEDATA><TR><TD>x</TD><TD>1</TD><TD/><TD/></TR></TABLEDATA>", "\"x\" in field wave")]
    [InlineData("<TABLEDATA><TR><TD>1</TD></TR></TABLEDATA>", "1 TD elements in a row")]
    [InlineData("<BINARY><STREAM encoding='base64'>AAAA</STREAM></BINARY>", "the end of the binary data inside row 1")]
    [InlineData("<BINARY><STREAM encoding='base64'>*</STREAM></BINARY>", "text that is not base64")]
    [InlineData("<BINARY><STREAM href='http://a.invalid/b'/></BINARY>", "a STREAM in another file or none")]
    [InlineData("<FITS><STREAM/></FITS>", "a FITS serialization")]
    public void Bad_content_is_named(string data, string found)
    {
        TableFormatException exception = Assert.Throws<TableFormatException>(() => Read(Fields, data));

        Assert.Equal(found, exception.Found);
    }

    [Fact]
    public void An_entity_that_grows_without_bound_is_refused()
    {
        const string Bomb = "<!DOCTYPE V [<!ENTITY a 'aaaaaaaaaa'><!ENTITY b '&a;&a;&a;&a;&a;&a;&a;&a;&a;'>]><VOTABLE><INFO name='x' value='&b;'/></VOTABLE>";

        Assert.Throws<TableFormatException>(() => TableAssert.Read(Bomb));
    }

    [Fact]
    public void A_service_error_is_quoted()
    {
        TableFormatException exception = Assert.Throws<TableFormatException>(() => TableAssert.Read(
            "<VOTABLE><RESOURCE><INFO name='QUERY_STATUS' value='ERROR'>no such target</INFO></RESOURCE></VOTABLE>"));

        Assert.Contains("no such target", exception.Message, StringComparison.Ordinal);
    }

    private static void CheckTwoRows(Table table)
    {
        Assert.Equal([5000.5, double.NaN], table["wave"].Doubles.ToArray());
        Assert.Equal([16L, null], table["n"].Longs.ToArray());
        Assert.Equal(["Fe I", null], [table["name"].Texts[0], table["name"].Texts[1] is "" ? null : table["name"].Texts[1]]);
        Assert.Equal([true, null], table["ok"].Bools.ToArray());
    }

    private static Table Read(string fields, string data) => TableAssert.Read(
        $"<?xml version='1.0'?>\n<VOTABLE version='1.3' xmlns='http://www.ivoa.net/xml/VOTable/v1.3'><RESOURCE><TABLE><PARAM name='p' value='value of p'/>{fields}<DATA>{data}</DATA></TABLE></RESOURCE></VOTABLE>");

    private static byte[] Row(bool flagged, byte flags, double wave, int n, string name, byte ok)
    {
        byte[] numbers = new byte[16];
        BinaryPrimitives.WriteDoubleBigEndian(numbers, wave);
        BinaryPrimitives.WriteInt32BigEndian(numbers.AsSpan(8), n);
        BinaryPrimitives.WriteInt32BigEndian(numbers.AsSpan(12), name.Length);
        byte[] text = System.Text.Encoding.ASCII.GetBytes(name);
        return [.. (flagged ? new byte[] { flags } : []), .. numbers, .. text, ok];
    }
}
