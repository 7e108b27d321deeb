using System;
using System.Linq;
using Xunit;

namespace StarLines.Tables.Tests.Ecsv;

public class EcsvReaderTests
{
    // Written by Astropy 5.2: a description folded over two lines, an anchor and its alias, a text with escapes, a column of arrays.
    private const string Sample = """
        # %ECSV 1.0
        # ---
        # datatype:
        # - name: a
        #   unit: km / s
        #   datatype: float64
        #   format: .3f
        #   description: 'A long description A long description A long description
        #     A long description '
        #   meta: !!omap
        #   - {ucd: em.wl}
        # - {name: b, datatype: int64}
        # - {name: name x, datatype: string}
        # - {name: ok, datatype: bool}
        # - {name: vec, datatype: string, subtype: 'int64[2]'}
        # meta: !!omap
        # - {title: 'x: y # z'}
        # - list: [a, 1, 2.5, null, true]
        # - nested:
        #     k:
        #       z:
        #       - {n: 1, name: q}
        # - {multi: "line1\nline2\ttab \xE9 \u2603"}
        # - {num: '123'}
        # - {long: 'word word word word word word word word word word word word word word word word
        #     word word '}
        # - l1: &id001 [1, 2]
        # - l2: *id001
        # - literal: |
        #     two
        #       lines
        # - folded: >-
        #     one
        #     line
        # schema: astropy-2.0
        a b "name x" ok vec
        1.5 1 "Fe I" True [1,2]
        nan "" "" False [3,4]
        inf 3 "say ""hi"", ok" True [5,6]

        """;

    [Fact]
    public void A_file_of_the_reference_library_is_read_with_all_it_says()
    {
        Table table = TableAssert.Read(Sample);

        Assert.Equal([1.5, double.NaN, double.PositiveInfinity], table["a"].Doubles.ToArray());
        Assert.Equal([1L, null, 3L], table["b"].Longs.ToArray());
        Assert.Equal(["Fe I", null, "say \"hi\", ok"], table["name x"].Texts.ToArray());
        Assert.Equal([true, false, true], table["ok"].Bools.ToArray());
        Assert.Equal("[3,4]", table["vec"].Texts[1]);
        Assert.Equal(("km / s", "em.wl", 3), (table["a"].Unit, table["a"].Ucd, table["a"].Decimals));
        Assert.Equal("A long description A long description A long description A long description ", table["a"].Description);
    }

    [Fact]
    public void Metadata_keep_their_kinds_and_nesting()
    {
        TableMetadata metadata = TableAssert.Read(Sample).Metadata;

        Assert.Equal("x: y # z", metadata["title"].Text);
        Assert.Equal(
            [MetadataKind.Text, MetadataKind.Integer, MetadataKind.Real, MetadataKind.Null, MetadataKind.Boolean],
            metadata["list"].Items.Select(item => item.Kind));
        Assert.Equal("{k: {z: [{n: 1, name: q}]}}", metadata["nested"].ToString());
        Assert.Equal("line1\nline2\ttab é ☃", metadata["multi"].Text);
        Assert.Equal(MetadataKind.Text, metadata["num"].Kind);
        Assert.EndsWith("word word word ", metadata["long"].Text, StringComparison.Ordinal);
        Assert.Equal("[1, 2]", metadata["l2"].ToString());
        Assert.Equal("two\n  lines\n", metadata["literal"].Text);
        Assert.Equal("one line", metadata["folded"].Text);
    }

    [Theory]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: float64}\na\nx\n", 6, "\"x\" in column a")]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: float64}\nb\n1\n", 5, "b as column 1 of the row of names")]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: float64}\n", 0, "no row of column names")]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: float64\na\n1\n", 4, "a quoted text or a bracket without end")]
    [InlineData("# %ECSV 1.0\n# ---\n# meta: {x: 1}\na\n1\n", 1, "a header without columns")]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: int64}\n# delimiter: ;\na\n1\n", 1, "the delimiter \";\"")]
    [InlineData("# %ECSV 1.0\n# ---\n# datatype: *x\na\n1\n", 3, "the unknown alias *x")]
    [InlineData("a,b\n1,2\n", 1, "no ECSV mark")]
    public void Bad_content_is_named_with_its_line(string text, int line, string found)
    {
        TableFormatException exception = Assert.Throws<TableFormatException>(() => TableAssert.Read(text, TableFormat.Ecsv));

        Assert.Equal((line, found), (exception.LineNumber, exception.Found));
    }

    [Fact]
    public void Deep_nesting_is_refused()
    {
        string header = "# %ECSV 1.0\n# ---\n# datatype: " + new string('[', 100_000) + "\na\n1\n";

        Assert.Throws<TableFormatException>(() => TableAssert.Read(header));
    }

    [Fact]
    public void A_row_knows_its_line()
    {
        Table table = TableAssert.Read("# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: int64}\na\n1\n\n2\n");

        Assert.Equal([6, 8], [table.LineNumberOf(0), table.LineNumberOf(1)]);
    }
}
