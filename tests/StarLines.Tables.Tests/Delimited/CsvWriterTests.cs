using System;
using Xunit;

namespace StarLines.Tables.Tests.Delimited;

public class CsvWriterTests
{
    [Fact]
    public void Cells_are_written_by_rfc_4180()
    {
        var table = new Table(
        [
            new TableColumn("name, quoted", (ReadOnlySpan<string?>)["say \"so\"", null, "12", "plain"]),
            new TableColumn("n", (ReadOnlySpan<long?>)[1, null, -3, 4]),
            new TableColumn("x", (ReadOnlySpan<double>)[0.1, double.NaN, 1e-20, double.NegativeInfinity]),
            new TableColumn("ok", (ReadOnlySpan<bool?>)[true, null, false, true]),
        ]);

        Assert.Equal(
            "\"name, quoted\",n,x,ok\n\"say \"\"so\"\"\",1,0.1,true\n,,,\n\"12\",-3,1E-20,false\nplain,4,-inf,true\n",
            TableAssert.WriteText(table, TableFormat.Csv));
    }

    [Theory]
    [InlineData(2, null, "1.00\n-0.75\n0.00\n12345678.12\n")]
    [InlineData(0, null, "1\n-1\n0\n12345678\n")]
    [InlineData(null, 3, "1\n-0.75\n-0.0001\n1.23E+07\n")]
    [InlineData(null, null, "1\n-0.75\n-0.0001\n12345678.125\n")]
    public void Numbers_have_the_digits_of_their_column(int? decimals, int? digits, string expected)
    {
        var column = new TableColumn("x", (ReadOnlySpan<double>)[1.0, -0.75, -0.0001, 12345678.125]) { Decimals = decimals, SignificantDigits = digits };

        string text = TableAssert.WriteText(new Table([column]), TableFormat.Csv);

        Assert.Equal("x\n" + expected, text);
    }
}
