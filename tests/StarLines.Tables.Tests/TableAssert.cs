using System.Collections.Generic;
using System.IO;
using System.Text;
using Xunit;

namespace StarLines.Tables.Tests;

/// <summary>Writes, reads and compares tables.</summary>
internal static class TableAssert
{
    public static byte[] Write(Table table, TableFormat format)
    {
        using var stream = new MemoryStream();
        TableWriter.Write(table, stream, format);
        return stream.ToArray();
    }

    public static string WriteText(Table table, TableFormat format) => Encoding.UTF8.GetString(Write(table, format));

    public static Table Read(byte[] bytes, TableFormat format = TableFormat.Auto) =>
        TableReader.Read(new MemoryStream(bytes), format, "test");

    public static Table Read(string text, TableFormat format = TableFormat.Auto) => Read(Encoding.UTF8.GetBytes(text), format);

    /// <summary>Same names, types and values; with <paramref name="emptyIsMissing"/> an empty text counts as a missing one.</summary>
    public static void SameValues(Table expected, Table actual, bool emptyIsMissing = false)
    {
        Assert.Equal(Names(expected), Names(actual));
        Assert.Equal(expected.RowCount, actual.RowCount);
        for (int c = 0; c < expected.Columns.Count; c++)
        {
            SameValues(expected.Columns[c], actual.Columns[c], emptyIsMissing);
        }
    }

    public static void SameNotes(Table expected, Table actual)
    {
        for (int c = 0; c < expected.Columns.Count; c++)
        {
            TableColumn one = expected.Columns[c];
            TableColumn other = actual.Columns[c];
            Assert.Equal(
                (one.Unit, one.Description, one.Ucd, one.Decimals, one.SignificantDigits),
                (other.Unit, other.Description, other.Ucd, other.Decimals, other.SignificantDigits));
        }
    }

    public static void SameMetadata(TableMetadata expected, TableMetadata actual)
    {
        Assert.Equal(expected.ToString(), actual.ToString());
        var others = new List<KeyValuePair<string, MetadataValue>>(actual);
        int at = 0;
        foreach ((string key, MetadataValue value) in expected)
        {
            Assert.Equal(key, others[at].Key);
            SameValue(value, others[at].Value);
            at++;
        }
    }

    private static void SameValue(MetadataValue expected, MetadataValue actual)
    {
        Assert.Equal(expected.Kind, actual.Kind);
        Assert.Equal(expected.Text, actual.Text);
        Assert.Equal(expected.Items.Count, actual.Items.Count);
        for (int i = 0; i < expected.Items.Count; i++)
        {
            SameValue(expected.Items[i], actual.Items[i]);
        }

        SameMetadata(expected.Map, actual.Map);
    }

    private static void SameValues(TableColumn expected, TableColumn actual, bool emptyIsMissing)
    {
        Assert.Equal(expected.Type, actual.Type);
        switch (expected.Type)
        {
            case ColumnType.Double:
                Assert.Equal(expected.Doubles.ToArray(), actual.Doubles.ToArray());
                break;
            case ColumnType.Long:
                Assert.Equal(expected.Longs.ToArray(), actual.Longs.ToArray());
                break;
            case ColumnType.Bool:
                Assert.Equal(expected.Bools.ToArray(), actual.Bools.ToArray());
                break;
            default:
                Assert.Equal(Texts(expected, emptyIsMissing), Texts(actual, emptyIsMissing));
                break;
        }
    }

    private static string?[] Texts(TableColumn column, bool emptyIsMissing)
    {
        string?[] texts = column.Texts.ToArray();
        for (int i = 0; i < texts.Length && emptyIsMissing; i++)
        {
            texts[i] = texts[i] == "" ? null : texts[i];
        }

        return texts;
    }

    private static List<string> Names(Table table)
    {
        var names = new List<string>();
        foreach (TableColumn column in table.Columns)
        {
            names.Add(column.Name);
        }

        return names;
    }
}
