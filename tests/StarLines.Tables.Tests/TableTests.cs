using System;
using System.Collections.Generic;
using System.IO;
using System.IO.Compression;
using Xunit;

namespace StarLines.Tables.Tests;

public class TableTests
{
    [Fact]
    public void A_map_turns_records_into_columns()
    {
        TableMap<(string Name, double Value, int? Count)> map = new TableMap<(string Name, double Value, int? Count)>()
            .Text("name", row => row.Name)
            .Double("value", row => row.Value, "km/s", "a velocity", decimals: 2)
            .Long("count", row => row.Count)
            .Bool("large", row => row.Value > 1.0);

        Table table = map.ToTable([("a", 1.5, 3), ("b", double.NaN, null)]);

        Assert.Equal("name,value,count,large\na,1.50,3,true\nb,,,false\n", TableAssert.WriteText(table, TableFormat.Csv));
        Assert.Equal(0, map.ToTable([]).RowCount);
    }

    [Fact]
    public void Tables_of_the_same_columns_are_joined_by_name()
    {
        Table one = Make(("a", [1.0]), ("b", [2.0]));
        Table two = Make(("b", [4.0]), ("a", [3.0]));

        Table joined = Table.Concatenate([one, two]);

        Assert.Equal([1.0, 3.0], joined["a"].Doubles.ToArray());
        Assert.Equal([2.0, 4.0], joined["b"].Doubles.ToArray());
        Assert.Throws<ArgumentException>(() => Table.Concatenate([one, Make(("a", [1.0]))]));
    }

    [Fact]
    public void A_table_refuses_columns_that_do_not_fit()
    {
        Assert.Throws<ArgumentException>(() => new Table([]));
        Assert.Throws<ArgumentException>(() => Make(("a", [1.0]), ("b", [1.0, 2.0])));
        Assert.Throws<ArgumentException>(() => Make(("a", [1.0]), ("a", [1.0])));
        KeyNotFoundException exception = Assert.Throws<KeyNotFoundException>(() => Make(("a", [1.0]))["x"]);
        Assert.Contains("the columns are a", exception.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_column_of_another_type_is_refused_and_whole_numbers_convert()
    {
        var column = new TableColumn("n", (ReadOnlySpan<long?>)[1, null]);

        Assert.Throws<InvalidOperationException>(() => column.Doubles.Length);
        Assert.Equal([1.0, double.NaN], column.ToDoubles());
    }

    [Theory]
    [InlineData(TableFormat.Ecsv)]
    [InlineData(TableFormat.Csv)]
    [InlineData(TableFormat.Json)]
    [InlineData(TableFormat.VoTable)]
    [InlineData(TableFormat.Parquet)]
    public void A_gzipped_table_is_recognised(TableFormat format)
    {
        using var packed = new MemoryStream();
        using (var packer = new GZipStream(packed, CompressionLevel.Fastest))
        {
            packer.Write(TableAssert.Write(Make(("a", [1.5])), format));
        }

        Assert.Equal(1.5, TableAssert.Read(packed.ToArray())["a"].Doubles[0]);
    }

    [Theory]
    [InlineData(TableFormat.Ecsv)]
    [InlineData(TableFormat.Json)]
    [InlineData(TableFormat.VoTable)]
    [InlineData(TableFormat.Parquet)]
    public void A_table_without_rows_comes_back(TableFormat format)
    {
        Table back = TableAssert.Read(TableAssert.Write(Make(("a", []), ("b", [])), format));

        Assert.Equal((0, 2, ColumnType.Double), (back.RowCount, back.Columns.Count, back["b"].Type));
    }

    private static Table Make(params (string Name, double[] Values)[] columns) =>
        new(Array.ConvertAll(columns, c => new TableColumn(c.Name, (ReadOnlySpan<double>)c.Values)));
}
