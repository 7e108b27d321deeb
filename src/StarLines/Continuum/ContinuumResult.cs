using System;

namespace StarLines.Continuum;

/// <summary>Turns a fitted spline into levels, uncertainties and trust for every pixel.</summary>
internal static class ContinuumResult
{
    // The level is trusted where at least this part of the pixels within a quarter of the stiffness is continuum.
    private const double LeastSupport = 0.1;
    private const int CellsPerStiffness = 4;

    internal static ContinuumFit Make(
        Spectrum spectrum, ContinuumData data, ContinuumNoise noise, PenalizedSpline spline, double stiffness)
    {
        int count = spectrum.Count;
        var level = new double[count];
        var sigma = new double[count];
        var trusted = new bool[count];
        ReadOnlySpan<double> wavelengths = spectrum.Scale.WavelengthsAngstrom;
        double[] nodes = VarianceAtKnots(spline);
        double[] support = Support(data, noise, spline.First, stiffness);
        double inflation = data.Unit * Math.Sqrt(1.0 / noise.Information);
        double last = spline.First + (spline.KnotStep * spline.Intervals);
        for (int i = 0; i < count; i++)
        {
            double x = Math.Clamp(wavelengths[i], spline.First, last);
            level[i] = data.Unit * spline.Evaluate(x);
            double position = (x - spline.First) / spline.KnotStep;
            int k = Math.Min((int)position, spline.Intervals - 1);
            double variance = nodes[k] + ((position - k) * (nodes[k + 1] - nodes[k]));
            sigma[i] = inflation * Math.Sqrt(Math.Max(0.0, variance));
            int cell = Math.Clamp((int)((x - spline.First) / stiffness * CellsPerStiffness), 0, support.Length - 1);
            trusted[i] = support[cell] >= LeastSupport && level[i] > 0.0;
        }

        return new ContinuumFit(level, sigma, trusted, stiffness);
    }

    private static double[] VarianceAtKnots(PenalizedSpline spline)
    {
        var nodes = new double[spline.Intervals + 1];
        var scratch = new double[spline.Coefficients.Length];
        for (int k = 0; k < nodes.Length; k++)
        {
            nodes[k] = spline.Variance(spline.First + (k * spline.KnotStep), scratch);
        }

        return nodes;
    }

    private static double[] Support(ContinuumData data, ContinuumNoise noise, double first, double stiffness)
    {
        double range = data.X[^1] - first;
        int cells = Math.Max(1, (int)Math.Ceiling(range / stiffness * CellsPerStiffness));
        var core = new double[cells];
        var total = new double[cells];
        double inverseScale = 1.0 / noise.Scale;
        for (int block = 0; block < noise.Blocks; block++)
        {
            ContinuumMixture mixture = noise.Mixture(block);
            (int start, int end) = noise.PixelsOf(block);
            for (int i = start; i < end; i++)
            {
                int cell = Math.Clamp((int)((data.X[i] - first) / stiffness * CellsPerStiffness), 0, cells - 1);
                double w = data.InverseSigma[i];
                total[cell] += 1.0;
                double r = (data.Flux[i] - data.Level[i]) * w * inverseScale;
                core[cell] += w > 0.0 && Math.Abs(r) < ContinuumMixture.Reach ? mixture.Probability(r, out _) : 0.0;
            }
        }

        for (int k = 0; k < cells; k++)
        {
            core[k] = total[k] > 0.0 ? core[k] / total[k] : 0.0;
        }

        return core;
    }
}
