using System;
using Xunit;

namespace StarLines.Tables.Tests.Aligned;

public class AlignedWriterTests
{
    [Fact]
    public void Numbers_stand_right_text_left_and_units_below_the_names()
    {
        var table = new Table(
        [
            new TableColumn("line", (ReadOnlySpan<string?>)["H-alpha", "Fe\u001b[31mI"]),
            new TableColumn("ew", (ReadOnlySpan<double>)[1234.567, double.NaN]) { Unit = "mÅ", Decimals = 1 },
            new TableColumn("status", (ReadOnlySpan<string?>)["measured", null]),
        ]);

        Assert.Equal(
            "line          ew  status\n              mÅ  \nH-alpha   1234.6  measured\nFe [31mI       -  -\n",
            TableAssert.WriteText(table, TableFormat.Aligned));
    }
}
