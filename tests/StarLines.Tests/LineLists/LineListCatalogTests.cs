using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using StarLines.LineLists;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.LineLists;

public class LineListCatalogTests
{
    public static TheoryData<string> Names => [.. LineListCatalog.Names];

    [Fact]
    public void The_promised_lists_are_there() =>
        Assert.Equal(["balmer", "early-type", "metals-fgk", "nebular"], LineListCatalog.Names);

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_list_reads_by_name_with_provenance_and_without_duplicates(string name)
    {
        LineList list = LineListCatalog.Find(name.ToUpperInvariant());

        Assert.Equal((name, Medium.Air), (list.Name, list.Medium));
        Assert.NotEmpty(list.Title);
        Assert.NotEmpty(list.Source);
        Assert.NotEmpty(list.Citation);
        Assert.All(list.Lines, line => Assert.NotEmpty(line.Source));
        Assert.Equal(list.Lines.Count, list.Lines.Select(line => line.Name).Distinct().Count());
        foreach (IGrouping<string, RestLine> group in list.Lines.GroupBy(line => line.Species))
        {
            IEnumerable<(RestLine, RestLine)> neighbours = group.Zip(group.Skip(1));
            Assert.All(neighbours, pair => Assert.True(pair.Item2.WavelengthAngstrom - pair.Item1.WavelengthAngstrom > 0.2, pair.Item1.Name));
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void The_hash_is_that_of_the_file_and_the_path_gives_the_same_list(string name)
    {
        string path = Path.Combine(ReferenceData.RepositoryRoot, "linelists", name + ".ecsv");

        LineList list = LineListCatalog.Find(path);

        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(path))), list.Sha256);
        Assert.Equal(list.Sha256, LineListCatalog.Find(name).Sha256);
        Assert.Equal(list.Lines.Count, LineListCatalog.Find(name).Lines.Count);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Lines_stand_in_the_file_in_order_of_wavelength(string name)
    {
        string path = Path.Combine(ReferenceData.RepositoryRoot, "linelists", name + ".ecsv");
        using FileStream stream = File.OpenRead(path);

        double[] wavelengths = Tables.TableReader.Read(stream)["wavelength"].ToDoubles();

        Assert.Equal(wavelengths.Order(), wavelengths);
    }

    [Fact]
    public void A_mistyped_name_is_answered_with_the_nearest()
    {
        FileNotFoundException exception = Assert.Throws<FileNotFoundException>(() => LineListCatalog.Find("metal-fgk"));

        Assert.Contains("did you mean metals-fgk?", exception.Message, StringComparison.Ordinal);
    }
}
