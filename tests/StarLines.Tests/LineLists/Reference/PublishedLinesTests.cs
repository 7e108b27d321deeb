using System.Linq;
using StarLines.LineLists;
using Xunit;

namespace StarLines.Tests.LineLists.Reference;

/// <summary>
/// Well-known lines against the values that NIST prints, air wavelengths in Å (NIST ASD; Sansonetti and Martin, Handbook of Basic Atomic
/// Spectroscopic Data, 2005). The numbers of this table are from memory, apart from the list's own source.
/// </summary>
public class PublishedLinesTests
{
    // Hydrogen: NIST prints blends as seen in the laboratory, the list the centroid by g f; they differ by up to 0.03 Å.
    // Fine-structure blends of He I and Mg II: the list gives the centroid, NIST the strongest component. Others: the last digit.
    [Theory]
    [InlineData("balmer", "H-alpha", 6562.79, 0.03)]
    [InlineData("balmer", "H-beta", 4861.35, 0.03)]
    [InlineData("balmer", "H-gamma", 4340.472, 0.03)]
    [InlineData("balmer", "H-delta", 4101.734, 0.03)]
    [InlineData("balmer", "H-epsilon", 3970.075, 0.03)]
    [InlineData("balmer", "Pa-delta", 10049.4, 0.1)]
    [InlineData("metals-fgk", "Na I D2", 5889.951, 0.001)]
    [InlineData("metals-fgk", "Na I D1", 5895.924, 0.001)]
    [InlineData("metals-fgk", "Ca II K", 3933.66, 0.01)]
    [InlineData("metals-fgk", "Ca II H", 3968.47, 0.01)]
    [InlineData("metals-fgk", "Ca II 8542.09", 8542.09, 0.01)]
    [InlineData("metals-fgk", "Mg I b1", 5183.604, 0.001)]
    [InlineData("metals-fgk", "Mg I b2", 5172.684, 0.001)]
    [InlineData("metals-fgk", "Mg I b4", 5167.321, 0.001)]
    [InlineData("metals-fgk", "Fe I 5269.54", 5269.537, 0.002)]
    [InlineData("metals-fgk", "Fe I 6065.48", 6065.482, 0.002)]
    [InlineData("metals-fgk", "Ca I 4226.73", 4226.728, 0.002)]
    [InlineData("early-type", "He I 5875.62", 5875.621, 0.01)]
    [InlineData("early-type", "He I 4471.50", 4471.48, 0.03)]
    [InlineData("early-type", "He I 6678.15", 6678.152, 0.002)]
    [InlineData("early-type", "He II 4685.70", 4685.7, 0.03)]
    [InlineData("early-type", "Mg II 4481.21", 4481.2, 0.02)]
    [InlineData("nebular", "[O III] 5006.84", 5006.84, 0.01)]
    [InlineData("nebular", "[O III] 4958.91", 4958.91, 0.01)]
    [InlineData("nebular", "[N II] 6583.45", 6583.46, 0.02)]
    [InlineData("nebular", "[S II] 6716.43", 6716.44, 0.02)]
    [InlineData("nebular", "[O I] 6300.30", 6300.304, 0.002)]
    public void A_known_line_stands_at_its_published_wavelength(string list, string name, double airAngstrom, double tolerance)
    {
        RestLine line = LineListCatalog.Find(list).Lines.Single(line => line.Name == name);

        Assert.InRange(line.WavelengthAngstrom, airAngstrom - tolerance, airAngstrom + tolerance);
    }

    // log g f of H-alpha 0.710 and H-beta -0.020 (Wiese and Fuhr 2009), of Na D2 0.108 and D1 -0.194 (NIST ASD, accuracy AA).
    [Theory]
    [InlineData("balmer", "H-alpha", 0.710, 10.1988)]
    [InlineData("balmer", "H-beta", -0.020, 10.1988)]
    [InlineData("metals-fgk", "Na I D2", 0.108, 0.0)]
    [InlineData("metals-fgk", "Na I D1", -0.194, 0.0)]
    public void A_known_line_has_its_published_strength(string list, string name, double logGf, double lowerEv)
    {
        RestLine line = LineListCatalog.Find(list).Lines.Single(line => line.Name == name);

        Assert.Equal(logGf, line.LogGf, 3);
        Assert.Equal(lowerEv, line.LowerEnergyEv, 3);
    }

    // Sum of g f over the components of He I D3: 5.49 (NIST ASD); 8/9 of it lie within the line listed, the rest in a satellite.
    [Fact]
    public void Components_that_share_a_wavelength_are_summed()
    {
        RestLine line = LineListCatalog.Find("early-type").Lines.Single(line => line.Name == "He I 5875.62");

        Assert.InRange(System.Math.Pow(10.0, line.LogGf) / 5.49, 0.87, 0.91);
    }
}
