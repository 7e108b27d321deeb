using StarLines.IO;
using Xunit;

namespace StarLines.Tests.IO;

public sealed class SpectralUnitTests
{
    [Theory]
    [InlineData("Angstrom", 1e-10)]
    [InlineData("ANGSTROMS", 1e-10)]
    [InlineData("A", 1e-10)]
    [InlineData("\u00C5", 1e-10)]
    [InlineData("0.1nm", 1e-10)]
    [InlineData("nm", 1e-9)]
    [InlineData("Nanometers", 1e-9)]
    [InlineData("um", 1e-6)]
    [InlineData("\u00B5m", 1e-6)]
    [InlineData("micron", 1e-6)]
    [InlineData("m", 1.0)]
    public void Units_of_length_are_known_by_their_usual_spellings(string text, double factor)
    {
        Assert.True(SpectralUnit.TryParse(text, out SpectralUnit unit));
        Assert.Equal(SpectralQuantity.Length, unit.Quantity);
        Assert.Equal(SpectralForm.Linear, unit.Form);
        Assert.Equal(factor, unit.SiFactor, factor * 1e-15);
    }

    [Theory]
    [InlineData("log10(Angstrom)")]
    [InlineData("log(Angstrom)")]
    [InlineData("Log10 Angstroms")]
    [InlineData("[Angstrom]")]
    [InlineData("dex(Angstrom)")]
    [InlineData("log10(lambda/Angstrom)")]
    public void Logarithms_are_known_by_their_usual_spellings(string text)
    {
        Assert.True(SpectralUnit.TryParse(text, out SpectralUnit unit));
        Assert.Equal(SpectralForm.Log10, unit.Form);
        Assert.Equal(1e-10, unit.SiFactor);
    }

    [Theory]
    [InlineData("Hz", (int)SpectralQuantity.Frequency, 1.0)]
    [InlineData("THz", (int)SpectralQuantity.Frequency, 1e12)]
    [InlineData("MHz", (int)SpectralQuantity.Frequency, 1e6)]
    [InlineData("eV", (int)SpectralQuantity.Energy, 1.602176634e-19)]
    [InlineData("cm-1", (int)SpectralQuantity.Wavenumber, 100.0)]
    [InlineData("1/m", (int)SpectralQuantity.Wavenumber, 1.0)]
    [InlineData("m**-1", (int)SpectralQuantity.Wavenumber, 1.0)]
    [InlineData("km/s", (int)SpectralQuantity.Velocity, 1000.0)]
    [InlineData("km s-1", (int)SpectralQuantity.Velocity, 1000.0)]
    public void Other_spectral_quantities_are_told_apart(string text, int quantity, double factor)
    {
        Assert.True(SpectralUnit.TryParse(text, out SpectralUnit unit));
        Assert.Equal(quantity, (int)unit.Quantity);
        Assert.Equal(factor, unit.SiFactor, factor * 1e-15);
    }

    [Theory]
    [InlineData("furlong")]
    [InlineData("")]
    [InlineData("deg")]
    [InlineData("pixel")]
    public void What_is_no_spectral_unit_is_refused(string text) => Assert.False(SpectralUnit.TryParse(text, out _));
}
