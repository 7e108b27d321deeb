using System;
using System.IO;
using Xunit;

namespace StarLines.Tables.Tests.Reference;

/// <summary>ECSV against the reader and writer of Astropy, the reference library of the format; skipped where it is not installed.</summary>
public class AstropyEcsvTests
{
    private const string Judge = """
        import sys, warnings
        warnings.simplefilter('ignore')
        import numpy as np
        from astropy.table import Table
        t = Table.read(sys.argv[1], format='ascii.ecsv')
        for n in t.colnames:
            c = t[n]
            print('COLUMN', repr(n), c.dtype.kind, c.unit, repr(c.description), c.format, dict(c.meta))
            for i in range(len(t)):
                v = c[i]
                print('  ', '--' if v is np.ma.masked else ascii(v.item() if hasattr(v, 'item') else str(v)))
        for k, v in t.meta.items():
            print('META', ascii(k), ascii(v))
        t.write(sys.argv[2], format='ascii.ecsv', delimiter=sys.argv[3], overwrite=True)
        """;

    [Theory]
    [InlineData(" ")]
    [InlineData(",")]
    public void Astropy_reads_our_tables_and_we_read_what_it_writes(string delimiter)
    {
        Table table = TableSamples.Full();

        (string report, byte[] rewritten) = Run(TableAssert.Write(table, TableFormat.Ecsv), delimiter);

        Assert.Contains("COLUMN 'rv' f km / s 'Velocity: \"barycentric\", it\\'s' .4f {'ucd': 'spect.dopplerVeloc'}\n   12.3456\n   --\n", report, StringComparison.Ordinal);
        Assert.Contains("COLUMN 'pixels' i None None None {}\n   9223372036854775807\n   --\n", report, StringComparison.Ordinal);
        Assert.Contains("   'Fe I, \"6065.48\"'\n   --\n", report, StringComparison.Ordinal);
        Assert.Contains("COLUMN 'used' b None 'whether # it was used' None {}\n   True\n   --\n", report, StringComparison.Ordinal);
        Assert.Contains("META 'count' 12\nMETA 'real' 2.5e-07\nMETA 'whole real' 3.0\nMETA 'ok' True\nMETA 'none' None\nMETA 'looks' '123'\nMETA 'yes' 'yes'\n", report, StringComparison.Ordinal);
        Assert.Contains("META 'inputs' ['a.fits', '', '- b', 'multi\\nline\\t\\u2603']\n", report, StringComparison.Ordinal);
        Assert.Contains("META 'nested' {'sha256': '00ff', 'lists': [{'name': 'balmer', 'n': 2}]}\n", report, StringComparison.Ordinal);

        Table back = TableAssert.Read(rewritten);
        TableAssert.SameValues(table, back);
        Assert.Equal("km / s", back["rv"].Unit);
        Assert.Equal("spect.dopplerVeloc", back["rv"].Ucd);
        Assert.Equal(4, back["rv"].Decimals);
        foreach ((string key, MetadataValue value) in table.Metadata)
        {
            // Astropy sorts the keys of nested maps.
            Assert.Equal(key == "nested" ? "{lists: [{n: 2, name: balmer}], sha256: 00ff}" : value.ToString(), back.Metadata[key].ToString());
        }
    }

    [Fact]
    public void Astropy_reads_hostile_texts_of_one_line_as_we_wrote_them()
    {
        string[] texts = Array.FindAll(TableSamples.HostileTexts, t => t.AsSpan().IndexOfAny("\r\n\u0085\u2028") < 0 && t.Trim() == t && t.Length > 0);
        bool[] first = new bool[texts.Length]; // Astropy takes a row that begins with # for a comment, even one it wrote itself.
        var table = new Table(
            [new TableColumn("first", first), new TableColumn("text", texts), new TableColumn("again", texts)],
            new TableMetadata { { "texts", MetadataValue.FromTexts(texts) } });

        (string _, byte[] rewritten) = Run(TableAssert.Write(table, TableFormat.Ecsv), " ");

        Table back = TableAssert.Read(rewritten);
        TableAssert.SameValues(table, back);
        TableAssert.SameMetadata(table.Metadata, back.Metadata);
    }

    private static (string Report, byte[] Rewritten) Run(byte[] ecsv, string delimiter)
    {
        string folder = Directory.CreateTempSubdirectory("starlines-ecsv").FullName;
        try
        {
            string input = Path.Combine(folder, "in.ecsv");
            string output = Path.Combine(folder, "out.ecsv");
            File.WriteAllBytes(input, ecsv);
            string report = Python.Run(Judge, input, output, delimiter);
            return (report, File.ReadAllBytes(output));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }
}
