using System;
using System.Collections.Generic;
using System.Linq;
using MathNet.Numerics;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;

namespace StarLines.Tests.Lines;

/// <summary>Spectra of Gaussian lines averaged over pixels, with known truth and seeded noise; continuum 1000.</summary>
internal sealed class SyntheticSpectrum
{
    internal const double First = 6000.0;
    internal const double Step = 0.05;
    internal const double ContinuumLevel = 1000.0;

    internal SyntheticSpectrum(int pixels, double signalToNoise, int seed, params (double Centre, double Depth, double Fwhm)[] lines)
    {
        var random = new Random(seed);
        Lines = lines;
        Flux = new double[pixels];
        Sigma = new double[pixels];
        for (int i = 0; i < pixels; i++)
        {
            double normalized = 1.0 - lines.Sum(line => line.Depth * Mean(First + (Step * i) - line.Centre, line.Fwhm));
            Sigma[i] = ContinuumLevel / signalToNoise;
            Flux[i] = (ContinuumLevel * normalized) + (seed == 0 ? 0.0 : Sigma[i] * Gaussian.Next(random));
        }
    }

    internal (double Centre, double Depth, double Fwhm)[] Lines { get; }

    internal double[] Flux { get; }

    internal double[] Sigma { get; }

    internal static double EquivalentWidth(double depth, double fwhm) =>
        1000.0 * depth * fwhm * Math.Sqrt(Math.PI / (4.0 * Math.Log(2.0)));

    internal static LineList List(IEnumerable<double> rests, double fwhm = double.NaN) => new(
        "test",
        Medium.Vacuum,
        [.. rests.Select((rest, i) => new RestLine { Name = $"line {i}", Species = "Fe I", WavelengthAngstrom = rest, FwhmAngstrom = fwhm })]);

    internal Spectrum ToSpectrum(string fluxUnit = "", PixelFaults[]? faults = null) => new(
        WavelengthScale.Linear(First, Step, Flux.Length, Medium.Vacuum), Flux, Sigma, faults ?? [], fluxUnit);

    internal ContinuumFit Continuum(double relativeSigma = 1e-6) => new(
        Enumerable.Repeat(ContinuumLevel, Flux.Length).ToArray(),
        Enumerable.Repeat(ContinuumLevel * relativeSigma, Flux.Length).ToArray(),
        Enumerable.Repeat(true, Flux.Length).ToArray(),
        100.0);

    internal LineMeasurementSet Measure(LineMeasureOptions? options = null, PixelFaults[]? faults = null, double relativeSigma = 1e-6) =>
        LineMeasurer.Measure(
            ToSpectrum(faults: faults), Continuum(relativeSigma), List(Lines.Select(static l => l.Centre)), options ?? new());

    private static double Mean(double offset, double fwhm)
    {
        double scale = 2.0 * Math.Sqrt(Math.Log(2.0)) / fwhm;
        return Math.Sqrt(Math.PI) / (2.0 * scale * Step)
            * (SpecialFunctions.Erf((offset + (0.5 * Step)) * scale) - SpecialFunctions.Erf((offset - (0.5 * Step)) * scale));
    }
}
