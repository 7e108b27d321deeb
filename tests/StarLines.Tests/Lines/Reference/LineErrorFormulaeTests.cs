using System.Globalization;
using System.IO;
using StarLines.Lines;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.Lines.Reference;

/// <summary>Against the golden statistics.csv, computed with NumPy from the published formulae; the examples are those of its text.</summary>
public sealed class LineErrorFormulaeTests
{
    [Fact]
    public void Cayrel_agrees()
    {
        Assert.Equal(Golden("cayrel1988.sigma_ew"), LineErrorFormulae.CayrelMilliangstrom(0.12, 0.02, 100.0), 1e-12);
        Assert.Equal(
            Golden("cayrel2004.sigma_ew"),
            LineErrorFormulae.CayrelMilliangstrom(0.12, 0.02, 100.0, LineErrorFormulae.Cayrel2004Coefficient),
            1e-12);
    }

    [Fact]
    public void Vollmann_and_Eversberg_agrees()
    {
        Assert.Equal(
            1000.0 * Golden("ve2006.sigma_ew_abs"), LineErrorFormulae.VollmannEversbergMilliangstrom(4.0, 800.0, 0.8, 150.0), 1e-10);
        Assert.Equal(
            1000.0 * Golden("ve2006.sigma_ew_em"), LineErrorFormulae.VollmannEversbergMilliangstrom(20.0, -12000.0, 1.6, 150.0), 1e-10);
    }

    [Fact]
    public void Cramer_Rao_bounds_agree()
    {
        GaussianBounds bounds = LineErrorFormulae.CramerRao(0.4, 0.06, 0.015, 100.0);
        Assert.Equal(Golden("crlb_known_continuum.centre"), bounds.CentreAngstrom, 1e-15);
        Assert.Equal(Golden("crlb_known_continuum.fwhm"), bounds.FwhmAngstrom, 1e-11);
        Assert.Equal(Golden("crlb_known_continuum.depth"), bounds.Depth, 1e-11);
        Assert.Equal(1000.0 * Golden("crlb_known_continuum.ew"), bounds.EquivalentWidthMilliangstrom, 1e-11);
    }

    private static double Golden(string key)
    {
        foreach (string line in File.ReadLines(ReferenceData.DataFile("golden", "statistics.csv")))
        {
            string[] cells = line.Split(',');
            if (cells[0] == key)
            {
                return double.Parse(cells[1], CultureInfo.InvariantCulture);
            }
        }

        throw new InvalidDataException($"statistics.csv has no {key}.");
    }
}
