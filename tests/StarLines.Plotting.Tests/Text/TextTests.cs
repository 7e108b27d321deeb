using StarLines.Plotting.Text;
using Xunit;

namespace StarLines.Plotting.Tests.Text;

public sealed class TextTests
{
    [Theory]
    [InlineData("erg/cm2/s/A", "erg cm⁻² s⁻¹ Å⁻¹", 0)]
    [InlineData("erg/cm^2/s/Angstrom", "erg cm⁻² s⁻¹ Å⁻¹", 0)]
    [InlineData("10**(-17)erg/cm2/s/Ang", "erg cm⁻² s⁻¹ Å⁻¹", -17)]
    [InlineData("1E-17 erg/cm^2/s/Ang", "erg cm⁻² s⁻¹ Å⁻¹", -17)]
    [InlineData("erg s**-1 cm**-2 Angstrom**-1", "erg s⁻¹ cm⁻² Å⁻¹", 0)]
    [InlineData("W m-2 um-1", "W m⁻² µm⁻¹", 0)]
    [InlineData("adu", "ADU", 0)]
    [InlineData("Jy", "Jy", 0)]
    [InlineData("relative flux, corrected", "relative flux, corrected", 0)]
    [InlineData("", "", 0)]
    public void Units_are_written_as_in_a_paper(string unit, string expected, int exponent) =>
        Assert.Equal((expected, exponent), UnitText.Pretty(unit));

    [Theory]
    [InlineData("", 0, "Flux (arbitrary unit)")]
    [InlineData("adu", 4, "Flux (10⁴ ADU)")]
    [InlineData("Relative Flux", 0, "Relative flux")]
    [InlineData("10**(-17)erg/cm2/s/Ang", 2, "Flux (10⁻¹⁵ erg cm⁻² s⁻¹ Å⁻¹)")]
    public void The_flux_axis_tells_unit_and_power(string unit, int exponent, string expected) =>
        Assert.Equal(expected, UnitText.FluxLabel(unit, exponent));

    [Theory]
    [InlineData(Medium.Air, VelocityFrame.Unknown, "Wavelength in air (Å)")]
    [InlineData(Medium.Vacuum, VelocityFrame.Barycentric, "Wavelength in vacuum, barycentric (Å)")]
    [InlineData(Medium.Air, VelocityFrame.Topocentric, "Wavelength in air, topocentric (Å)")]
    [InlineData(Medium.Unknown, VelocityFrame.Unknown, "Wavelength (Å)")]
    [InlineData(Medium.Air, VelocityFrame.Rest, "Rest wavelength in air (Å)")]
    public void The_wavelength_axis_tells_medium_and_frame(Medium medium, VelocityFrame frame, string expected) =>
        Assert.Equal(expected, UnitText.WavelengthLabel(WavelengthScale.Linear(5000, 1, 3, medium, frame)));

    [Theory]
    [InlineData("H-alpha", "Hα")]
    [InlineData("H-zeta", "Hζ")]
    [InlineData("Fe I 6065.48", "Fe I 6065.48")]
    public void Names_of_lines_have_their_Greek_letters(string name, string expected) =>
        Assert.Equal(expected, LineText.Name(name));

    [Theory]
    [InlineData(123.456, 2.13, "123.5 ± 2.1")]
    [InlineData(-42.8312, 0.0851, "−42.831 ± 0.085")]
    [InlineData(1234.0, 56.0, "1234 ± 56")]
    [InlineData(-3.25, double.NaN, "−3.25")]
    [InlineData(double.NaN, double.NaN, "—")]
    public void Values_have_the_digits_that_their_uncertainty_allows(double value, double uncertainty, string expected) =>
        Assert.Equal(expected, LineText.WithUncertainty(new Measured(value, uncertainty)));

    [Fact]
    public void A_heading_falls_back_to_the_name_of_the_file() =>
        Assert.Equal("night3.fits#2", TitleText.Of(new SpectrumMetadata { Source = "data/night3.fits#2" }));
}
