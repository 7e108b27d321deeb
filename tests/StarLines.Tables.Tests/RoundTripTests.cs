using System.Linq;
using System.Xml;
using CsCheck;
using Xunit;

namespace StarLines.Tables.Tests;

public class RoundTripTests
{
    [Theory]
    [InlineData(TableFormat.Ecsv)]
    [InlineData(TableFormat.Json)]
    [InlineData(TableFormat.VoTable)]
    [InlineData(TableFormat.Parquet)]
    public void A_table_with_every_type_note_and_metadata_comes_back(TableFormat format)
    {
        Table table = TableSamples.Full();

        Table back = TableAssert.Read(TableAssert.Write(table, format));

        Assert.Equal(12.3456, back["rv"].Doubles[0]);
        TableAssert.SameValues(table, back);
        TableAssert.SameNotes(table, back);
        TableAssert.SameMetadata(table.Metadata, back.Metadata);
    }

    [Theory]
    [InlineData(TableFormat.Ecsv)]
    [InlineData(TableFormat.Json)]
    [InlineData(TableFormat.Parquet)]
    public void Random_tables_with_hostile_texts_come_back(TableFormat format) =>
        TableSamples.Random(TableSamples.Texts).Sample(
            table =>
            {
                Table back = TableAssert.Read(TableAssert.Write(table, format));
                TableAssert.SameValues(table, back);
                TableAssert.SameNotes(table, back);
                TableAssert.SameMetadata(table.Metadata, back.Metadata);
            },
            seed: "0000KfR2l9D4",
            iter: 500,
            threads: 1);

    [Fact]
    public void Random_tables_come_back_from_votable_apart_from_what_xml_cannot_hold() =>
        TableSamples.Random(TableSamples.Texts.Select(t => t is null ? null : string.Concat(t.Where(XmlConvert.IsXmlChar)))).Sample(
            table =>
            {
                Table back = TableAssert.Read(TableAssert.Write(table, TableFormat.VoTable));
                TableAssert.SameValues(table, back, emptyIsMissing: true);
                TableAssert.SameNotes(table, back);
                TableAssert.SameMetadata(table.Metadata, back.Metadata);
            },
            seed: "0000KfR2l9D4",
            iter: 500,
            threads: 1);

    [Fact]
    public void Texts_of_a_csv_file_come_back_as_the_same_texts() =>
        TableSamples.Random(TableSamples.Texts).Sample(
            table =>
            {
                Table back = TableAssert.Read(TableAssert.Write(table, TableFormat.Csv), TableFormat.Csv);
                Assert.Equal(table.RowCount, back.RowCount);
                for (int c = 0; c < table.Columns.Count; c++)
                {
                    Assert.Equal(table.Columns[c].Name, back.Columns[c].Name);
                    for (int r = 0; r < table.RowCount; r++)
                    {
                        Assert.Equal(table.Columns[c].IsMissing(r), back.Columns[c].IsMissing(r));
                        CompareCell(table.Columns[c], back.Columns[c], r);
                    }
                }
            },
            seed: "0000KfR2l9D4",
            iter: 500,
            threads: 1);

    // A column without values has no type in CSV, and reals that are all whole are whole numbers there.
    private static void CompareCell(TableColumn expected, TableColumn actual, int row)
    {
        if (expected.Type == ColumnType.Text)
        {
            Assert.Equal(expected.Texts[row], actual.Texts[row]);
        }
        else if (expected.Type == ColumnType.Double && !expected.IsMissing(row))
        {
            Assert.Equal(expected.Doubles[row], actual.ToDoubles()[row]);
        }
        else
        {
            Assert.Equal(expected.TextAt(row), actual.TextAt(row));
        }
    }
}
