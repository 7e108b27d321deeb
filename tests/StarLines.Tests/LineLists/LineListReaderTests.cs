using System;
using System.IO;
using System.Text;
using StarLines.LineLists;
using Xunit;

namespace StarLines.Tests.LineLists;

public class LineListReaderTests
{
    [Fact]
    public void A_csv_list_is_read_with_its_medium_from_a_comment()
    {
        LineList list = Read("# medium: air\nspecies,wavelength,log_gf,line\nfe1,6065.4814,-1.53,\nH I,6562.79,0.71,H-alpha\n");

        Assert.Equal(Medium.Air, list.Medium);
        Assert.Equal(["Fe I 6065.48", "H-alpha"], [list.Lines[0].Name, list.Lines[1].Name]);
        Assert.Equal("Fe I", list.Lines[0].Species);
        Assert.Equal(-1.53, list.Lines[0].LogGf);
        Assert.True(double.IsNaN(list.Lines[0].LowerEnergyEv));
        Assert.Equal(64, list.Sha256.Length);
    }

    [Fact]
    public void Units_of_the_columns_are_heeded()
    {
        LineList list = Read("""
            # %ECSV 1.0
            # ---
            # datatype:
            # - {name: species, datatype: string}
            # - {name: wavelength, unit: nm, datatype: float64}
            # - {name: lower_energy, unit: 1 / cm, datatype: float64}
            # meta: !!omap
            # - {medium: vacuum}
            species wavelength lower_energy
            "Na I" 589.1583264 16973.3662

            """);

        Assert.Equal(Medium.Vacuum, list.Medium);
        Assert.Equal(5891.583264, list.Lines[0].WavelengthAngstrom, 9);

        // 16973.3662 /cm is 2.104429 eV: NIST ASD, 3p level of Na I.
        Assert.Equal(2.104429, list.Lines[0].LowerEnergyEv, 5);
    }

    [Fact]
    public void Lines_of_mixed_media_become_those_of_the_first()
    {
        LineList list = Read("species,wavelength,medium\nNa I,5889.950954,air\nNa I,5897.558147,vacuum\n");

        // NIST ASD: 5897.558147 in vacuum is 5895.924237 in air.
        Assert.Equal(Medium.Air, list.Medium);
        Assert.Equal(5895.924237, list.Lines[1].WavelengthAngstrom, 3);
    }

    [Fact]
    public void The_caller_says_the_medium_only_where_the_file_does_not()
    {
        const string Silent = "species,wavelength\nH I,6562.79\n";
        const string Spoken = "# medium: air\n" + Silent;

        Assert.Equal(Medium.Vacuum, Read(Silent, Medium.Vacuum).Medium);
        Assert.Equal(Medium.Air, Read(Spoken, Medium.Vacuum).Medium);
    }

    [Theory]
    [InlineData("species,wavelenght\nH I,6562.79\n", "nearest right name is wavelength")]
    [InlineData("species,wavelength,loggf\nH I,6562.79,1\n", "nearest right name is log_gf")]
    [InlineData("species,x\nH I,6562.79\n", "no column wavelength")]
    [InlineData("species,wavelength\nH I,6562.79\n", "--medium")]
    [InlineData("# medium: water\nspecies,wavelength\nH I,6562.79\n", "\"water\"")]
    [InlineData("# medium: air\nspecies,wavelength\nH I,6562.79\nH I,48b1\n", "line 4, column wavelength: found \"48b1\"")]
    [InlineData("# medium: air\nspecies,wavelength\nH I,656.279\n", "line 3, column wavelength: found 656.279 Å")]
    [InlineData("# medium: air\nspecies,wavelength\n,6562.79\n", "line 3, column species: found nothing")]
    [InlineData("species,wavelength,medium\nH I,6562.79,gas\n", "line 2, column medium: found \"gas\"")]
    [InlineData("species,wavelength\nH I,6562.79,7\n", "line 2")]
    public void Bad_content_is_named_with_its_place_and_a_cure(string text, string part)
    {
        LineListFormatException exception = Assert.Throws<LineListFormatException>(() => Read(text));

        Assert.Contains(part, exception.Message, StringComparison.Ordinal);
        Assert.StartsWith("mine.csv", exception.Message, StringComparison.Ordinal);
    }

    private static LineList Read(string text, Medium medium = Medium.Unknown) =>
        LineListReader.Read(new MemoryStream(Encoding.UTF8.GetBytes(text)), "mine.csv", medium);
}
