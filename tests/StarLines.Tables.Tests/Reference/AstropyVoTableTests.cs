using System;
using System.IO;
using Xunit;

namespace StarLines.Tables.Tests.Reference;

/// <summary>VOTable against the reader, writer and validator of Astropy; skipped where it is not installed.</summary>
public class AstropyVoTableTests
{
    private const string Judge = """
        import sys, warnings
        from astropy.io import votable
        import numpy as np
        warnings.simplefilter('error')
        v = votable.parse(sys.argv[1], verify='exception')
        t = v.get_first_table().to_table()
        for n in t.colnames:
            c = t[n]
            print('COLUMN', n, c.unit, c.description, c.meta.get('ucd'))
            for x in c:
                print('  ', '--' if x is np.ma.masked else ascii(x.item() if hasattr(x, 'item') else x))
        for i in v.get_first_table().infos:
            print('INFO', i.name, ascii(i.value))
        warnings.simplefilter('ignore')
        v.set_all_tables_format(sys.argv[3])
        v.to_xml(sys.argv[2])
        """;

    [Theory]
    [InlineData("tabledata")]
    [InlineData("binary")]
    [InlineData("binary2")]
    public void Astropy_finds_our_votable_valid_and_we_read_what_it_writes(string serialization)
    {
        var table = new Table(
            [
                new TableColumn("rv", (ReadOnlySpan<double>)[12.3456, -0.5]) { Unit = "km/s", Description = "Velocity & more", Ucd = "spect.dopplerVeloc" },
                new TableColumn("pixels", (ReadOnlySpan<long?>)[long.MaxValue, -7]),
                new TableColumn("line", (ReadOnlySpan<string?>)["Fe I, \"6065.48\" <b> λ", "x"]) { Ucd = "meta.id" },
                new TableColumn("used", (ReadOnlySpan<bool?>)[true, false]),
            ],
            new TableMetadata { { "command", "starlines measure \"a b.fits\"" } });

        string folder = Directory.CreateTempSubdirectory("starlines-vot").FullName;
        try
        {
            string input = Path.Combine(folder, "in.xml");
            string output = Path.Combine(folder, "out.xml");
            File.WriteAllBytes(input, TableAssert.Write(table, TableFormat.VoTable));

            string report = Python.Run(Judge, input, output, serialization);

            Assert.Contains("COLUMN rv km / s Velocity & more spect.dopplerVeloc\n   12.3456\n   -0.5\n", report, StringComparison.Ordinal);
            Assert.Contains("   9223372036854775807\n   -7\n", report, StringComparison.Ordinal);
            Assert.Contains("   'Fe I, \"6065.48\" <b> \\u03bb'\n", report, StringComparison.Ordinal);
            Assert.Contains("INFO command 'starlines measure \"a b.fits\"'\n", report, StringComparison.Ordinal);
            Table back = TableAssert.Read(File.ReadAllBytes(output));
            TableAssert.SameValues(table, back);
            Assert.Equal("starlines measure \"a b.fits\"", back.Metadata.TextOf("command"));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }
}
