using System;
using System.Linq;
using BenchmarkDotNet.Attributes;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Numerics;
using StarLines.Templates;
using StarLines.Velocities;

namespace StarLines.Benchmarks;

/// <summary>Search and final fit of a 20,000-pixel spectrum with 100 lines, with two templates; and the transform underneath.</summary>
[MemoryDiagnoser]
public class VelocityBenchmarks
{
    private const int Pixels = 20_000;

    private readonly RealFft _fft = new(32_768);
    private readonly double[] _values = new double[32_768];
    private readonly double[] _re = new double[16_385];
    private readonly double[] _im = new double[16_385];
    private readonly double[] _work = new double[65_536];
    private Spectrum _spectrum = null!;
    private ContinuumFit _continuum = null!;
    private LineTemplate[] _templates = [];

    /// <summary>Makes the spectrum.</summary>
    [GlobalSetup]
    public void Setup()
    {
        var random = new Random(1);
        RestLine[] lines = [.. Enumerable.Range(0, 100).Select(j => new RestLine
        {
            Name = "L",
            Species = "Fe I",
            WavelengthAngstrom = 5015.0 + (9.7 * (j + random.NextDouble())),
            Depth = 0.1 + (0.7 * random.NextDouble()),
            FwhmAngstrom = 0.25,
        })];
        WavelengthScale scale = WavelengthScale.Linear(5000.0, 0.05, Pixels, Medium.Vacuum);
        var flux = new double[Pixels];
        for (int i = 0; i < Pixels; i++)
        {
            double x = scale.WavelengthsAngstrom[i] / 1.0002;
            flux[i] = 1.0 - lines.Sum(line => line.Depth * Math.Exp(-44.36 * (x - line.WavelengthAngstrom) * (x - line.WavelengthAngstrom)))
                + (0.01 * ((2.0 * random.NextDouble()) - 1.0));
        }

        _spectrum = new Spectrum(scale, flux, Enumerable.Repeat(0.00577, Pixels).ToArray());
        _continuum = new ContinuumFit(
            Enumerable.Repeat(1.0, Pixels).ToArray(), new double[Pixels], Enumerable.Repeat(true, Pixels).ToArray(), 300.0);
        _templates =
        [
            LineTemplate.FromLineList(new LineList("all", Medium.Vacuum, lines)),
            LineTemplate.FromLineList(new LineList("half", Medium.Vacuum, [.. lines.Where(static (_, j) => j % 2 == 0)])),
        ];
    }

    /// <summary>The whole measurement.</summary>
    [Benchmark]
    public VelocityResult[] TwoTemplates() => VelocityMeasurer.MeasureAll(_spectrum, _continuum, _templates);

    /// <summary>One forward transform of real values.</summary>
    [Benchmark]
    public double Transform()
    {
        _fft.Forward(_values, _re, _im, _work);
        return _re[1];
    }
}
