using System;
using Xunit;

namespace StarLines.Tests;

public sealed class SpectrumTests
{
    private static readonly WavelengthScale s_scale = WavelengthScale.Linear(5000.0, 1.0, 4, Medium.Air);

    [Fact]
    public void What_is_not_finite_is_flagged_and_stored_as_zero()
    {
        var spectrum = new Spectrum(s_scale, [1.0, double.NaN, double.PositiveInfinity, 2.0], [0.1, 0.1, 0.0, double.NaN]);
        Assert.Equal([1.0, 0.0, 0.0, 2.0], spectrum.Flux.ToArray());
        Assert.Equal(PixelFaults.None, spectrum.Faults[0]);
        Assert.Equal(PixelFaults.Missing, spectrum.Faults[1]);
        Assert.Equal(PixelFaults.Missing | PixelFaults.NoSigma, spectrum.Faults[2]);
        Assert.Equal(PixelFaults.NoSigma, spectrum.Faults[3]);
    }

    [Fact]
    public void The_arrays_of_the_caller_are_copied()
    {
        double[] flux = [1.0, 2.0, 3.0, 4.0];
        var spectrum = new Spectrum(s_scale, flux);
        flux[0] = 9.0;
        Assert.Equal(1.0, spectrum.Flux[0]);
    }

    [Fact]
    public void Excluded_ranges_include_both_ends()
    {
        Spectrum spectrum = new Spectrum(s_scale, [1.0, 2.0, 3.0, 4.0]).Excluding([new WavelengthRange(5001.0, 5002.0)]);
        Assert.True(spectrum.IsGood(0));
        Assert.Equal(PixelFaults.Excluded, spectrum.Faults[1]);
        Assert.Equal(PixelFaults.Excluded, spectrum.Faults[2]);
        Assert.True(spectrum.IsGood(3));
    }

    [Fact]
    public void Lengths_that_differ_are_refused()
    {
        Assert.Throws<ArgumentException>(() => new Spectrum(s_scale, [1.0, 2.0]));
        Assert.Throws<ArgumentException>(() => new Spectrum(s_scale, [1.0, 2.0, 3.0, 4.0], [1.0]));
    }
}
