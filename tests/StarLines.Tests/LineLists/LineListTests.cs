using System.IO;
using System.Linq;
using StarLines.LineLists;
using StarLines.Tables;
using Xunit;

namespace StarLines.Tests.LineLists;

public class LineListTests
{
    [Theory]
    [InlineData("Fe I", "Fe I", true)]
    [InlineData("fe1", "Fe I", true)]
    [InlineData("FeI", "Fe II", false)]
    [InlineData("Fe", "Fe II", true)]
    [InlineData("F", "Fe I", false)]
    [InlineData("[O III]", "O III", true)]
    [InlineData("si", "Si II", true)]
    [InlineData("S I", "Si II", false)]
    [InlineData("S I", "S I", true)]
    [InlineData("ca 2", "Ca II", true)]
    public void A_search_understands_names_of_species(string asked, string species, bool found)
    {
        var list = new LineList("x", Medium.Air, [new RestLine { Name = "x", Species = species, WavelengthAngstrom = 5000.0 }]);

        Assert.Equal(found ? 1 : 0, list.Search([asked], []).Lines.Count);
    }

    [Fact]
    public void A_search_takes_several_ranges()
    {
        LineList list = LineListCatalog.Find("balmer").Search([], [new WavelengthRange(4800, 4900), new WavelengthRange(6500, 6600)]);

        Assert.Equal(["H-beta", "H-alpha"], list.Lines.Select(line => line.Name));
    }

    [Fact]
    public void A_list_goes_to_vacuum_and_back()
    {
        LineList air = LineListCatalog.Find("metals-fgk");
        LineList vacuum = air.ToMedium(Medium.Vacuum);
        LineList back = vacuum.ToMedium(Medium.Air);

        Assert.Same(air, air.ToMedium(Medium.Air));
        Assert.Equal((Medium.Vacuum, air.Sha256), (vacuum.Medium, vacuum.Sha256));
        for (int i = 0; i < air.Lines.Count; i++)
        {
            Assert.Equal(air.Lines[i].WavelengthAngstrom, back.Lines[i].WavelengthAngstrom, 9);
        }
    }

    [Fact]
    public void A_list_comes_back_from_its_table()
    {
        LineList list = LineListCatalog.Find("nebular");
        using var stream = new MemoryStream();
        TableWriter.Write(LineListTable.ToTable(list), stream, TableFormat.Ecsv);
        stream.Position = 0;

        LineList back = LineListReader.Read(stream, "nebular");

        Assert.Equal(list.Medium, back.Medium);
        Assert.Equal(list.Citation, back.Citation);
        Assert.Equal(list.Lines.Select(line => (line.Name, line.Species)), back.Lines.Select(line => (line.Name, line.Species)));
        Assert.All(list.Lines.Zip(back.Lines), pair => Assert.Equal(pair.First.WavelengthAngstrom, pair.Second.WavelengthAngstrom, 0.0001));
    }

    [Fact]
    public void Columns_without_a_value_are_left_out_of_the_table()
    {
        Table table = LineListTable.ToTable(LineListCatalog.Find("balmer"));

        Assert.True(table.TryFind("log_gf", out _));
        Assert.False(table.TryFind("fwhm", out _));
        Assert.Equal("Angstrom", table["wavelength"].Unit);
    }
}
