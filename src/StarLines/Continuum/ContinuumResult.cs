using System;

namespace StarLines.Continuum;

/// <summary>Turns a fitted spline into levels, uncertainties and trust for every pixel.</summary>
internal static class ContinuumResult
{
    // The level is trusted where at least this part of the pixels of a knot interval is continuum.
    private const double LeastSupport = 0.1;
    private const int SupportPixels = 8000;

    internal static ContinuumFit Make(
        Spectrum spectrum, ContinuumData data, ContinuumNoise noise, PenalizedSpline spline, double stiffness)
    {
        int count = spectrum.Count;
        var level = new double[count];
        var sigma = new double[count];
        var trusted = new bool[count];
        ReadOnlySpan<double> wavelengths = spectrum.Scale.WavelengthsAngstrom;
        int[] ends = spline.IntervalEnds(wavelengths);
        spline.Evaluate(wavelengths, ends, level);
        double[] nodes = SigmaAtKnots(spline, data.Unit * Math.Sqrt(1.0 / noise.Information));
        bool[] support = Support(data, noise, spline);
        int i = 0;
        for (int k = 0; k < ends.Length; k++)
        {
            double left = spline.First + (k * spline.KnotStep);
            double slope = (nodes[k + 1] - nodes[k]) / spline.KnotStep;
            for (; i < ends[k]; i++)
            {
                // Beyond the good pixels the level is held, and so is its uncertainty.
                double x = Math.Clamp(wavelengths[i] - left, 0.0, spline.KnotStep);
                level[i] *= data.Unit;
                sigma[i] = nodes[k] + (x * slope);
                trusted[i] = support[k] && level[i] > 0.0;
            }
        }

        return new ContinuumFit(level, sigma, trusted, stiffness, takeOwnership: true) { Noise = noise };
    }

    private static double[] SigmaAtKnots(PenalizedSpline spline, double factor)
    {
        var nodes = new double[spline.Intervals + 1];
        var scratch = new double[spline.Coefficients.Length];
        for (int k = 0; k < nodes.Length; k++)
        {
            double variance = spline.Variance(spline.First + (k * spline.KnotStep), scratch);
            nodes[k] = factor * Math.Sqrt(Math.Max(0.0, variance));
        }

        return nodes;
    }

    private static bool[] Support(ContinuumData data, ContinuumNoise noise, PenalizedSpline spline)
    {
        // A sample of the pixels tells as well as all of them.
        int stride = Math.Max(1, data.Count / SupportPixels);
        var core = new double[spline.Intervals];
        var total = new double[spline.Intervals];
        double inverseScale = 1.0 / noise.Scale;
        for (int block = 0; block < noise.Blocks; block++)
        {
            ContinuumMixture mixture = noise.Mixture(block);
            (int start, int end) = noise.PixelsOf(block);
            for (int i = start; i < end; i += stride)
            {
                int interval = spline.Locate(data.X[i], out _);
                double r = (data.Flux[i] - data.Level[i]) * data.InverseSigma[i] * inverseScale;
                total[interval] += 1.0;
                core[interval] += data.InverseSigma[i] > 0.0 ? mixture.Probability(r) : 0.0;
            }
        }

        var support = new bool[spline.Intervals];
        for (int k = 0; k < support.Length; k++)
        {
            support[k] = core[k] >= LeastSupport * Math.Max(1.0, total[k]);
        }

        return support;
    }
}
