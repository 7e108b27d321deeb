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

    // A step is not lengthened to more than twice itself.
    private const double LeastInformation = 0.5;

    // What a pixel that is no continuum has for density, in units of the typical level.
    private const double Background = 0.1;

    private readonly ContinuumData _data;
    private readonly ContinuumNoise _noise;
    private readonly double _stiffness;
    private readonly PenalizedSpline _spline;
    private readonly int[] _ends;

    internal ContinuumIteration(ContinuumData data, ContinuumNoise noise, double stiffness)
    {
        _data = data;
        _noise = noise;
        _stiffness = stiffness;
        double first = data.X[0];
        double range = Math.Max(data.X[^1] - first, first * 1e-9);
        int intervals = Math.Clamp((int)Math.Ceiling(range * KnotsPerStiffness / stiffness), 1, MostIntervals);
        _spline = new PenalizedSpline(first, first + range, intervals);
        _ends = _spline.IntervalEnds(data.X);
    }

    /// <summary>The fitted spline.</summary>
    internal PenalizedSpline Spline => _spline;

    /// <summary>Number of free shapes of the continuum that the stiffness leaves.</summary>
    internal double Freedom => 3.0 + (2.0 * _spline.KnotStep * _spline.Intervals / _stiffness);

    /// <summary>One step: weights from the present level, and a new level from the weights.</summary>
    /// <param name="learn">Whether the noise model is learned too.</param>
    /// <param name="relax">
    /// Whether the step is lengthened by the information that an expectation step does not see, which makes it nearly a
    /// Newton step; the level is then ahead of the spline.
    /// </param>
    internal void Step(bool learn, bool relax = false)
    {
        _spline.Clear();
        _noise.BeginStep();
        double total = 0.0;
        int start = 0;
        int block = 0;
        int blockEnd = _noise.PixelsOf(0).End;
        for (int interval = 0; interval < _ends.Length; interval++)
        {
            int end = _ends[interval];
            while (start < end)
            {
                while (start >= blockEnd)
                {
                    block++;
                    blockEnd = _noise.PixelsOf(block).End;
                }

                int stop = Math.Min(end, blockEnd);
                total += AddPixels(start, stop, interval, block);
                start = stop;
            }
        }

        Solve(total, relax ? 1.0 / Math.Max(LeastInformation, _noise.Information) : 1.0);
        if (learn)
        {
            _noise.EndStep(LeastNoiseScale, LargestNoiseScale);
        }
    }

    /// <summary>The sum of ln p of the present level, by the noise model as it stands.</summary>
    internal double LogLikelihood()
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

        return sum;
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
                sum += w > 0.0 ? Math.Log((core * w * Math.Exp(-0.5 * r * r)) + (1.0 - core) + Background) : 0.0;
            }
        }

        return sum;
    }

    private double AddPixels(int start, int stop, int interval, int block)
    {
        ContinuumMixture mixture = _noise.Mixture(block);
        var frame = new KernelFrame(
            mixture.Core,
            mixture.Below,
            mixture.Above,
            mixture.Shift,
            1.0 / _noise.Scale,
            _spline.First + (interval * _spline.KnotStep),
            1.0 / _spline.KnotStep);
        var moments = default(SplineMoments);
        var counts = default(MixtureCounts);
        MixtureKernel.Add(
            _data.X.AsSpan(start, stop - start),
            _data.Flux.AsSpan(start, stop - start),
            _data.InverseSigma.AsSpan(start, stop - start),
            _data.Level.AsSpan(start, stop - start),
            frame,
            ref moments,
            ref counts);
        _noise.Count(block, counts);
        _spline.Add(interval, moments);
        return moments.W0;
    }

    private void Solve(double total, double length)
    {
        double range = _spline.KnotStep * _spline.Intervals;
        double perAngstrom = total / range;
        double penalty = perAngstrom * Math.Pow(_stiffness / (2.0 * Math.PI), 6.0) / Math.Pow(_spline.KnotStep, 5.0);
        _spline.Solve(penalty);
        _spline.Evaluate(_data.X, _ends, _data.Level, length);
    }
}
