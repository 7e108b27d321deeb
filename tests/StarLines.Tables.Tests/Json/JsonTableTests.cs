using System.Text.Json;
using Xunit;

namespace StarLines.Tables.Tests.Json;

public class JsonTableTests
{
    [Fact]
    public void The_object_holds_metadata_columns_and_rows()
    {
        using JsonDocument document = JsonDocument.Parse(TableAssert.Write(TableSamples.Full(), TableFormat.Json));
        JsonElement root = document.RootElement;

        Assert.Equal("starlines 0.1.0", root.GetProperty("metadata").GetProperty("program").GetString());
        Assert.Equal("km/s", root.GetProperty("columns")[0].GetProperty("unit").GetString());
        Assert.Equal("12.3456", root.GetProperty("rows")[0].GetProperty("rv").GetRawText());
        Assert.Equal(JsonValueKind.Null, root.GetProperty("rows")[1].GetProperty("rv").ValueKind);
        Assert.Equal("Infinity", root.GetProperty("rows")[1].GetProperty("flux").GetString());
    }

    [Theory]
    [InlineData("""[{"a": 1, "b": "x"}, {"a": 2.5}]""")]
    [InlineData("""{"columns": ["a", "b"], "rows": [[1, "x"], [2.5, null]]}""")]
    [InlineData("""{"rows": [{"a": 1, "b": "x"}, {"a": 2.5}]}""")]
    public void Rows_of_others_are_read(string json)
    {
        Table table = TableAssert.Read(json, TableFormat.Json);

        Assert.Equal([1.0, 2.5], table["a"].Doubles.ToArray());
        Assert.Equal(["x", null], table["b"].Texts.ToArray());
    }

    [Theory]
    [InlineData("{\n\"rows\": [\n{]", 3)]
    [InlineData("{}", 0)]
    [InlineData("""{"rows": [1]}""", 0)]
    [InlineData("""{"columns": [{"name": "a", "type": "double"}], "rows": [["x"]]}""", 0)]
    [InlineData("""{"rows": [{"a": "\ud800"}]}""", 0)]
    public void Bad_content_is_refused(string json, int line)
    {
        TableFormatException exception = Assert.Throws<TableFormatException>(() => TableAssert.Read(json, TableFormat.Json));

        Assert.Equal(line, exception.LineNumber);
    }
}
