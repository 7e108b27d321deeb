using System;

namespace StarLines.Continuum;

/// <summary>The expectation and maximization steps for one stiffness, on the level kept in a <see cref="ContinuumData"/>.</summary>
internal sealed class ContinuumIteration
{
    // Knots a quarter of the stiffness apart resolve everything that the penalty lets through.
    private const double KnotsPerStiffness = 4.0;
    private const int MostIntervals = 400;

    private const double LeastNoiseScale = 0.25;
    private const double LargestNoiseScale = 1e6;

    private readonly ContinuumData _data;
    private readonly ContinuumNoise _noise;
    private readonly double _stiffness;
    private readonly PenalizedSpline _spline;

    internal ContinuumIteration(ContinuumData data, ContinuumNoise noise, double stiffness)
    {
        _data = data;
        _noise = noise;
        _stiffness = stiffness;
        double first = data.X[0];
        double range = Math.Max(data.X[^1] - first, first * 1e-9);
        int intervals = Math.Clamp((int)Math.Ceiling(range * KnotsPerStiffness / stiffness), 1, MostIntervals);
        _spline = new PenalizedSpline(first, first + range, intervals);
    }

    /// <summary>The fitted spline.</summary>
    internal PenalizedSpline Spline => _spline;

    /// <summary>Sum of ln p over the pixels: how well level and noise explain the data.</summary>
    internal double LogLikelihood { get; private set; }

    /// <summary>Number of free shapes of the continuum that the stiffness leaves.</summary>
    internal double Freedom => 3.0 + (2.0 * _spline.KnotStep * _spline.Intervals / _stiffness);

    /// <summary>One step: weights from the present level, and a new level from the weights.</summary>
    /// <param name="learn">Whether the noise model is learned too.</param>
    internal void Step(bool learn)
    {
        _spline.Clear();
        _noise.BeginStep();
        double total = 0.0;
        double scale = _noise.Scale;
        double inverseScale = 1.0 / scale;
        for (int block = 0; block < _noise.Blocks; block++)
        {
            total += AddBlock(block, scale, inverseScale);
        }

        Solve(total);
        if (learn)
        {
            _noise.EndStep(LeastNoiseScale, LargestNoiseScale);
        }
    }

    /// <summary>Evaluates ln p of the present level with the noise model as it stands.</summary>
    internal void Judge()
    {
        double inverseScale = 1.0 / _noise.Scale;
        double sum = 0.0;
        for (int block = 0; block < _noise.Blocks; block++)
        {
            ContinuumMixture mixture = _noise.Mixture(block);
            (int start, int end) = _noise.PixelsOf(block);
            for (int i = start; i < end; i++)
            {
                if (_data.InverseSigma[i] > 0.0)
                {
                    double r = (_data.Flux[i] - _data.Level[i]) * _data.InverseSigma[i] * inverseScale;
                    sum += mixture.LogDensity(r);
                }
            }
        }

        LogLikelihood = sum;
    }

    /// <summary>
    /// ln of the density of the data in units of the flux, the core against a flat background: compares different levels
    /// that each brought their own noise model.
    /// </summary>
    internal double Evidence()
    {
        double sum = 0.0;
        for (int block = 0; block < _noise.Blocks; block++)
        {
            double core = _noise.Mixture(block).Core;
            (int start, int end) = _noise.PixelsOf(block);
            for (int i = start; i < end; i++)
            {
                double w = _data.InverseSigma[i] / _noise.Scale;
                double r = (_data.Flux[i] - _data.Level[i]) * w;
                sum += w > 0.0 ? Math.Log((core * w * Math.Exp(-0.5 * r * r)) + (1.0 - core) + 0.1) : 0.0;
            }
        }

        return sum;
    }

    private double AddBlock(int block, double scale, double inverseScale)
    {
        ContinuumMixture mixture = _noise.Mixture(block);
        double shift = mixture.Shift;
        double raise = shift * scale;
        (int start, int end) = _noise.PixelsOf(block);
        double total = 0.0;
        double[] x = _data.X;
        double[] flux = _data.Flux;
        double[] inverseSigma = _data.InverseSigma;
        double[] level = _data.Level;
        for (int i = start; i < end; i++)
        {
            double w = inverseSigma[i];
            double r = (flux[i] - level[i]) * w * inverseScale;
            if (w <= 0.0 || Math.Abs(r) > ContinuumMixture.Reach)
            {
                continue;
            }

            double p = mixture.Probability(r, out double absorbed);
            _noise.Count(block, shift, r, p, absorbed);
            double ws = w * inverseScale;
            double weight = p * ws * ws;
            total += weight;
            int j = _spline.Locate(x[i], out double t);
            PenalizedSpline.Basis(t, out double b0, out double b1, out double b2, out double b3);
            _spline.Add(j, b0, b1, b2, b3, weight, flux[i] + (raise / w));
        }

        return total;
    }

    private void Solve(double total)
    {
        double range = _spline.KnotStep * _spline.Intervals;
        double perAngstrom = total / range;
        double penalty = perAngstrom * Math.Pow(_stiffness / (2.0 * Math.PI), 6.0) / Math.Pow(_spline.KnotStep, 5.0);
        _spline.Solve(penalty);
        for (int i = 0; i < _data.Count; i++)
        {
            _data.Level[i] = _spline.Evaluate(_data.X[i]);
        }
    }
}
