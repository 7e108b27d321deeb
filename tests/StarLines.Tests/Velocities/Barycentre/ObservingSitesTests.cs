using System;
using System.Linq;
using StarLines.Tests.Velocities.Reference;
using StarLines.TestSupport;
using StarLines.Velocities.Barycentre;
using Xunit;

namespace StarLines.Tests.Velocities.Barycentre;

public class ObservingSitesTests
{
    [Fact]
    public void Twenty_observatories_stand_where_the_golden_table_puts_them()
    {
        // tests/Data/golden/barycentric.csv gives approximate public coordinates of twenty observatories; some rows move one in longitude.
        GoldenTable table = new(ReferenceData.DataFile("golden", "barycentric.csv"));
        int compared = 0;
        for (int row = 100; row < table.Count; row++)
        {
            string name = table.Text(row, "site");
            if (name is "random" or "pole" or "southpole")
            {
                continue;
            }

            Assert.True(ObservingSites.TryFind(name, out ObservingSite? site), name);
            Assert.Equal(table.Number(row, "lat"), site.LatitudeDegrees, 0.02);
            Assert.Equal(table.Number(row, "lon"), site.LongitudeDegrees, 0.02);
            Assert.Equal(table.Number(row, "height"), site.HeightMetres, 60.0);
            compared++;
        }

        Assert.True(compared > 150);
    }

    [Fact]
    public void There_are_many_observatories_and_each_is_found_by_its_name()
    {
        Assert.InRange(ObservingSites.All.Count, 80, 200);
        foreach (ObservingSite site in ObservingSites.All)
        {
            Assert.True(ObservingSites.TryFind(site.Name, out ObservingSite? found));
            Assert.Same(site, found);
        }
    }

    [Theory]
    [InlineData("CFHT 3.6m", "Mauna Kea")]
    [InlineData("eso-vlt-u2", "Paranal")]
    [InlineData("Observatoire de Haute-Provence", "Haute-Provence")]
    [InlineData("Mont-Mégantic", "Mont-Megantic")]
    [InlineData("lamost", "Xinglong")]
    public void Other_names_and_spellings_are_found(string name, string observatory)
    {
        Assert.True(ObservingSites.TryFind(name, out ObservingSite? site));
        Assert.Equal(observatory, site.Name);
    }

    [Fact]
    public void Three_numbers_are_a_place()
    {
        ObservingSite site = ObservingSites.Parse(" 46.2083, -12.3417 ,1180");
        Assert.Equal((46.2083, -12.3417, 1180.0), (site.LatitudeDegrees, site.LongitudeDegrees, site.HeightMetres));
    }

    [Theory]
    [InlineData("Parannal", "Paranal")]
    [InlineData("La Sila", "La Silla")]
    public void A_mistyped_name_is_answered_with_the_nearest(string name, string meant) =>
        Assert.Contains($"'{meant}'", Assert.Throws<FormatException>(() => ObservingSites.Parse(name)).Message, StringComparison.Ordinal);

    [Theory]
    [InlineData("12,13")]
    [InlineData("a,b,c")]
    [InlineData("95,10,100")]
    [InlineData("45,10,NaN")]
    [InlineData("")]
    public void What_is_no_place_is_refused(string text) =>
        Assert.Contains("The site", Assert.Throws<FormatException>(() => ObservingSites.Parse(text)).Message, StringComparison.Ordinal);

    [Fact]
    public void No_two_observatories_share_a_name() =>
        Assert.Equal(ObservingSites.All.Count, ObservingSites.All.Select(static s => s.Name).Distinct(StringComparer.OrdinalIgnoreCase).Count());
}
