using System;
using System.Linq;
using BenchmarkDotNet.Attributes;
using StarLines.Analysis;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Templates;

namespace StarLines.Benchmarks;

/// <summary>The continuum and the whole analysis of a 20,000-pixel spectrum with 100 lines and one template.</summary>
[MemoryDiagnoser]
public class AnalysisBenchmarks
{
    private const int Pixels = 20_000;

    private Spectrum _spectrum = null!;
    private ContinuumFit _continuum = null!;
    private AnalysisOptions _options = null!;
    private double[] _model = [];

    /// <summary>Makes the spectrum.</summary>
    [GlobalSetup]
    public void Setup()
    {
        var random = new Random(1);
        RestLine[] lines = [.. Enumerable.Range(0, 100).Select(j => new RestLine
        {
            Name = $"L{j}",
            Species = "Fe I",
            WavelengthAngstrom = 5015.0 + (9.7 * (j + (0.3 * random.NextDouble()))),
            Depth = 0.1 + (0.7 * random.NextDouble()),
            FwhmAngstrom = 0.25,
        })];
        WavelengthScale scale = WavelengthScale.Linear(5000.0, 0.05, Pixels, Medium.Vacuum, VelocityFrame.Topocentric);
        var flux = new double[Pixels];
        _model = new double[Pixels];
        for (int i = 0; i < Pixels; i++)
        {
            double x = scale.WavelengthsAngstrom[i];
            _model[i] = 1.0 - lines.Sum(line => line.Depth * Math.Exp(-44.36 * (x - line.WavelengthAngstrom) * (x - line.WavelengthAngstrom)));
            double noise = random.NextDouble() + random.NextDouble() + random.NextDouble() - 1.5;
            flux[i] = (1.0 + (0.1 * Math.Sin(i / 6000.0))) * (_model[i] + (0.02 * noise));
        }

        var list = new LineList("made", Medium.Vacuum, lines);
        _spectrum = new Spectrum(scale, flux, Enumerable.Repeat(0.01, Pixels).ToArray());
        _continuum = ContinuumFitter.Fit(_spectrum);
        _options = new AnalysisOptions { Templates = [LineTemplate.FromLineList(list)], Lines = list };
    }

    /// <summary>The continuum, its stiffness chosen by the data.</summary>
    [Benchmark]
    public ContinuumFit Continuum() => ContinuumFitter.Fit(_spectrum);

    /// <summary>The continuum again, with the lines divided out.</summary>
    [Benchmark]
    public ContinuumFit Refinement() => ContinuumFitter.Refine(_spectrum, _continuum, _model);

    /// <summary>Noise, continuum, velocity and lines.</summary>
    [Benchmark]
    public AnalysisResult Analysis() => SpectrumAnalysis.Analyse(_spectrum, _options);
}
