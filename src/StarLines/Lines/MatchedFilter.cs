using System;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Lines;

/// <summary>
/// The least-squares depth of a Gaussian of given centre and width in normalized flux:
/// A = Σ w² φ (b − f) / Σ w² φ², with variance 1/Σ w² φ².
/// </summary>
internal static class MatchedFilter
{
    /// <summary>Half of the summed window in units of σ; φ² beyond it is below 1e-5 of its peak.</summary>
    internal const double ReachInSigma = 3.5;

    /// <summary>Applies the filter.</summary>
    /// <param name="wavelengths">N pixel centres, Å.</param>
    /// <param name="flux">N normalized fluxes f.</param>
    /// <param name="model">N values b of what is already explained.</param>
    /// <param name="weight">N inverse standard deviations w; 0 for a pixel that is not used.</param>
    /// <param name="centre">Centre, Å.</param>
    /// <param name="sigma">Standard deviation of the Gaussian, Å.</param>
    internal static FilterResponse Apply(
        ReadOnlySpan<double> wavelengths,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> model,
        ReadOnlySpan<double> weight,
        double centre,
        double sigma)
    {
        Vector256<double> signal = Vector256<double>.Zero;
        Vector256<double> power = Vector256<double>.Zero;
        Vector256<double> level = Vector256<double>.Zero;
        double factor = -0.5 / (sigma * sigma);
        int lanes = Vector256<double>.Count;
        int i = 0;
        for (; i <= wavelengths.Length - lanes; i += lanes)
        {
            Add(Load(wavelengths, i), Load(flux, i), Load(model, i), Load(weight, i), centre, factor, ref signal, ref power, ref level);
        }

        for (; i < wavelengths.Length; i++)
        {
            // One pixel in lane 0, the other lanes without weight.
            Add(
                Vector256.Create(wavelengths[i]),
                Vector256.CreateScalar(flux[i]),
                Vector256.CreateScalar(model[i]),
                Vector256.CreateScalar(weight[i]),
                centre,
                factor,
                ref signal,
                ref power,
                ref level);
        }

        return new FilterResponse(Vector256.Sum(signal), Vector256.Sum(power), Vector256.Sum(level));
    }

    private static void Add(
        Vector256<double> wavelength,
        Vector256<double> flux,
        Vector256<double> model,
        Vector256<double> weight,
        double centre,
        double factor,
        ref Vector256<double> signal,
        ref Vector256<double> power,
        ref Vector256<double> level)
    {
        Vector256<double> distance = wavelength - Vector256.Create(centre);
        Vector256<double> profile = Vector256.Exp(distance * distance * factor);
        Vector256<double> weighted = weight * weight * profile;
        signal += weighted * (model - flux);
        power += weighted * profile;
        level += weighted;
    }

    private static Vector256<double> Load(ReadOnlySpan<double> values, int index) =>
        Vector256.LoadUnsafe(ref MemoryMarshal.GetReference(values), (nuint)index);
}
