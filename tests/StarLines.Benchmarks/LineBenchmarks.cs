using System;
using System.Collections.Generic;
using BenchmarkDotNet.Attributes;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;

namespace StarLines.Benchmarks;

/// <summary>Lines of a spectrum of 20,000 pixels: fit and summation, both with uncertainties.</summary>
[MemoryDiagnoser]
public class LineBenchmarks
{
    private const int Pixels = 20_000;
    private const double First = 5000.0;
    private const double Step = 0.05;

    private Spectrum spectrum = null!;
    private ContinuumFit continuum = null!;
    private LineList isolated = null!;
    private LineList blend = null!;

    /// <summary>Makes 100 isolated lines and a blend of ten.</summary>
    [GlobalSetup]
    public void Make()
    {
        var random = new Random(1);
        var flux = new double[Pixels];
        var sigma = new double[Pixels];
        Array.Fill(flux, 1.0);
        Array.Fill(sigma, 0.01);
        isolated = Lines(flux, 100, 5010.0, 8.9);
        blend = Lines(flux, 10, 5910.0, 0.45);
        for (int i = 0; i < Pixels; i++)
        {
            flux[i] += 0.01 * (random.NextDouble() + random.NextDouble() + random.NextDouble() - 1.5) * 2.0;
        }

        var level = new double[Pixels];
        var trusted = new bool[Pixels];
        Array.Fill(level, 1.0);
        Array.Fill(trusted, true);
        var levelSigma = new double[Pixels];
        Array.Fill(levelSigma, 0.001);
        spectrum = new Spectrum(
            WavelengthScale.Linear(First, Step, Pixels, Medium.Vacuum), flux, sigma);
        continuum = new ContinuumFit(level, levelSigma, trusted, 100.0);
    }

    /// <summary>100 isolated lines.</summary>
    [Benchmark(Baseline = true)]
    public double HundredIsolatedLines() =>
        LineMeasurer.Measure(spectrum, continuum, isolated, new LineMeasureOptions()).Lines[0].Depth.Value;

    /// <summary>Ten lines fitted together.</summary>
    [Benchmark]
    public double BlendOfTen() =>
        LineMeasurer.Measure(spectrum, continuum, blend, new LineMeasureOptions()).Lines[0].Depth.Value;

    private static LineList Lines(double[] flux, int count, double start, double spacing)
    {
        const double Sigma = 0.12;
        var lines = new List<RestLine>();
        for (int k = 0; k < count; k++)
        {
            double centre = start + (spacing * k);
            for (int i = 0; i < flux.Length; i++)
            {
                double u = (First + (Step * i) - centre) / Sigma;
                flux[i] -= 0.4 * Math.Exp(-0.5 * u * u);
            }

            lines.Add(new RestLine { Name = $"{k}", Species = "Fe I", WavelengthAngstrom = centre, FwhmAngstrom = 0.28 });
        }

        return new LineList("benchmark", Medium.Vacuum, lines);
    }
}
