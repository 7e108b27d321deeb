using System.Linq;
using StarLines.LineLists;
using StarLines.Lines;
using Xunit;

namespace StarLines.Tests.Lines;

public sealed class LineDetectorTests
{
    [Fact]
    public void Lines_of_both_signs_and_several_widths_are_found_and_named_by_their_wavelength()
    {
        var made = new SyntheticSpectrum(1400, 100.0, 21, (6010.0, 0.3, 0.2), (6022.3, -0.8, 0.6), (6040.1, 0.5, 3.0), (6060.0, 0.1, 0.3));
        LineList found = LineDetector.Detect(made.ToSpectrum(), made.Continuum(), new LineDetectOptions());
        Assert.Equal(["6010.0", "6022.3", "6040.1", "6060.0"], found.Lines.Select(static l => l.Name));
        Assert.Equal(0.6, found.Lines[1].FwhmAngstrom, 0.15);
        Assert.Equal(3.0, found.Lines[2].FwhmAngstrom, 0.75);
    }

    [Fact]
    public void Noise_alone_has_no_lines()
    {
        var made = new SyntheticSpectrum(4000, 30.0, 22);
        Assert.Empty(LineDetector.Detect(made.ToSpectrum(), made.Continuum(), new LineDetectOptions()).Lines);
    }

    [Fact]
    public void Velocity_brings_the_lines_back_to_rest()
    {
        var made = new SyntheticSpectrum(1400, 100.0, 23, (6020.0, 0.5, 0.3));
        RestLine line = Assert.Single(LineDetector.Detect(
            made.ToSpectrum(), made.Continuum(), new LineDetectOptions { VelocityKmPerS = 100.0 }).Lines);

        // λ₀ = λ √((1 − β)/(1 + β)), β = 100/299792.458.
        Assert.Equal(6017.9923, line.WavelengthAngstrom, 0.01);
    }
}
