using System;
using System.Collections.Generic;
using System.Numerics.Tensors;

namespace StarLines.Templates;

/// <summary>The absorption of a set of computed lines: the sum of their profiles.</summary>
internal sealed class LineProfileSet : TemplateProfile
{
    /// <summary>Gaussians end at this many standard deviations, where exp(−u²/2) is 4 × 10⁻⁶.</summary>
    private const double GaussianReach = 5.0;

    /// <summary>Stark profiles end at this many full widths, where they fall to under 2 % of their depth.</summary>
    private const double StarkReach = 3.0;

    /// <summary>u at half depth of (1 + u²)^(−5/4).</summary>
    private static readonly double StarkHalf = Math.Sqrt(Math.Pow(2.0, 0.8) - 1.0);

    /// <summary>A window of more lines than this is cut where they overlap least.</summary>
    private const int MaximumLines = 6;

    private readonly string[] _names;
    private readonly double[] _centre;
    private readonly double[] _depth;
    private readonly double[] _width;
    private readonly bool[] _stark;
    private readonly double _largestReach;

    /// <summary>Makes a set.</summary>
    /// <param name="lines">Lines with wavelengths in vacuum, in order.</param>
    internal LineProfileSet(IReadOnlyList<TemplateLine> lines)
    {
        int n = lines.Count;
        _names = new string[n];
        _centre = new double[n];
        _depth = new double[n];
        _width = new double[n];
        _stark = new bool[n];
        for (int j = 0; j < n; j++)
        {
            TemplateLine line = lines[j];
            _names[j] = line.Name;
            _centre[j] = line.WavelengthAngstrom;
            _depth[j] = line.Depth;
            _stark[j] = line.Shape == LineShape.Stark;
            _width[j] = _stark[j]
                ? 0.5 * line.FwhmAngstrom / StarkHalf
                : line.FwhmAngstrom / PhysicalConstants.FwhmPerSigma;
            _largestReach = Math.Max(_largestReach, Reach(j, _width[j]) / _centre[j]);
        }
    }

    /// <inheritdoc/>
    internal override double MinimumAngstrom => _centre[0];

    /// <inheritdoc/>
    internal override double MaximumAngstrom => _centre[^1];

    /// <inheritdoc/>
    internal override bool CanBroaden => true;

    /// <summary>Mean full width at half maximum of the Gaussian lines in velocity, weighted by depth, km/s; NaN where there are none.</summary>
    internal double MeanFwhmKmPerS
    {
        get
        {
            double sum = 0.0;
            double weight = 0.0;
            for (int j = 0; j < _centre.Length; j++)
            {
                if (!_stark[j])
                {
                    sum += _depth[j] * _width[j] / _centre[j];
                    weight += _depth[j];
                }
            }

            return PhysicalConstants.FwhmPerSigma * PhysicalConstants.SpeedOfLightKmPerS * sum / weight;
        }
    }

    /// <inheritdoc/>
    internal override void Evaluate(
        ReadOnlySpan<double> vacuumAngstrom,
        double logShift,
        double broadening,
        Span<double> absorption,
        Span<double> byShift,
        Span<double> byBroadening,
        Span<double> work)
    {
        absorption.Clear();
        byShift.Clear();
        byBroadening.Clear();
        if (vacuumAngstrom.IsEmpty)
        {
            return;
        }

        double factor = Math.Exp(logShift);
        double relative = broadening / (PhysicalConstants.SpeedOfLightKmPerS * PhysicalConstants.SpeedOfLightKmPerS);
        double margin = _largestReach + (GaussianReach * Math.Sqrt(Math.Max(relative, 0.0)));
        int end = _centre.Length;
        int first = FirstAtOrAbove(_centre, vacuumAngstrom[0] / factor / (1.0 + margin));
        for (int j = first; j < end && _centre[j] * (1.0 - margin) * factor <= vacuumAngstrom[^1]; j++)
        {
            double width = Widened(j, relative);
            double observed = _centre[j] * factor;
            double reach = Reach(j, width) * factor;
            int start = FirstAtOrAbove(vacuumAngstrom, observed - reach);
            int length = FirstAtOrAbove(vacuumAngstrom, observed + reach) - start;
            if (length <= 0)
            {
                continue;
            }

            var line = new LineAt(observed, width * factor, _depth[j] * _width[j] / width, _centre[j] * _centre[j] / (width * width));
            if (_stark[j])
            {
                AddStark(line, vacuumAngstrom.Slice(start, length), absorption[start..], byShift[start..], byBroadening[start..]);
            }
            else
            {
                AddGaussian(
                    line, vacuumAngstrom.Slice(start, length), absorption[start..], byShift[start..], byBroadening[start..], work[..length]);
            }
        }
    }

    /// <inheritdoc/>
    internal override TemplateWindow[] Windows(ReadOnlySpan<double> vacuumAngstrom, double logShift, double broadening)
    {
        double factor = Math.Exp(logShift);
        double relative = broadening / (PhysicalConstants.SpeedOfLightKmPerS * PhysicalConstants.SpeedOfLightKmPerS);
        var windows = new List<TemplateWindow>(_centre.Length);
        int j = 0;
        int taken = 0;
        while (j < _centre.Length)
        {
            int from = j;
            double right = End(j, relative);
            j++;
            while (j < _centre.Length && Begin(j, relative) < right && j - from < MaximumLines)
            {
                right = Math.Max(right, End(j, relative));
                j++;
            }

            if (j < _centre.Length && Begin(j, relative) < right)
            {
                j = LeastOverlap(from, j, relative);
                right = 0.5 * (_centre[j - 1] + _centre[j]);
            }

            int start = Math.Max(taken, FirstAtOrAbove(vacuumAngstrom, Begin(from, relative) * factor));
            int end = FirstAtOrAbove(vacuumAngstrom, right * factor);
            if (end > start)
            {
                windows.Add(new TemplateWindow(start, end, _names[Deepest(from, j)]));
                taken = end;
            }
        }

        return [.. windows];
    }

    private static void AddGaussian(
        in LineAt line, ReadOnlySpan<double> x, Span<double> sum, Span<double> byShift, Span<double> byBroadening, Span<double> work)
    {
        double inverse = 1.0 / line.Width;
        for (int i = 0; i < x.Length; i++)
        {
            double u = (x[i] - line.Centre) * inverse;
            work[i] = -0.5 * u * u;
        }

        TensorPrimitives.Exp(work, work);
        double half = 0.5 * line.SquaredRatio / (PhysicalConstants.SpeedOfLightKmPerS * PhysicalConstants.SpeedOfLightKmPerS);
        for (int i = 0; i < x.Length; i++)
        {
            double u = (x[i] - line.Centre) * inverse;
            double g = line.Depth * work[i];
            sum[i] += g;
            byShift[i] += g * u * x[i] * inverse;
            byBroadening[i] += g * ((u * u) - 1.0) * half;
        }
    }

    private static void AddStark(
        in LineAt line, ReadOnlySpan<double> x, Span<double> sum, Span<double> byShift, Span<double> byBroadening)
    {
        double inverse = 1.0 / line.Width;
        double half = 0.5 * line.SquaredRatio * StarkVariance
            / (PhysicalConstants.SpeedOfLightKmPerS * PhysicalConstants.SpeedOfLightKmPerS);
        for (int i = 0; i < x.Length; i++)
        {
            double u = (x[i] - line.Centre) * inverse;
            double q = 1.0 / (1.0 + (u * u));
            double g = line.Depth * q * Math.Sqrt(Math.Sqrt(q));
            sum[i] += g;
            byShift[i] += 2.5 * g * q * u * x[i] * inverse;
            byBroadening[i] += g * ((2.5 * u * u * q) - 1.0) * half;
        }
    }

    /// <summary>
    /// How much of the variance of a Gaussian adds to the squared width parameter of a Stark profile, so that the half
    /// widths add in quadrature: 2 ln 2/u_half².
    /// </summary>
    private static double StarkVariance => 2.0 * Math.Log(2.0) / (StarkHalf * StarkHalf);

    /// <summary>Index of the first value not below a limit, in increasing values.</summary>
    private static int FirstAtOrAbove(ReadOnlySpan<double> values, double limit)
    {
        int found = values.BinarySearch(limit);
        return found >= 0 ? found : ~found;
    }

    /// <summary>Width parameter with the broadening added in quadrature, Å at rest.</summary>
    private double Widened(int j, double relative) =>
        Math.Sqrt((_width[j] * _width[j]) + ((_stark[j] ? StarkVariance : 1.0) * relative * _centre[j] * _centre[j]));

    private double Reach(int j, double width) => _stark[j] ? 2.0 * StarkReach * StarkHalf * width : GaussianReach * width;

    private double Begin(int j, double relative) => _centre[j] - Reach(j, Widened(j, relative));

    private double End(int j, double relative) => _centre[j] + Reach(j, Widened(j, relative));

    /// <summary>The line before which to cut, among those of a window: the widest gap in units of the line widths.</summary>
    private int LeastOverlap(int from, int end, double relative)
    {
        int best = end;
        double widest = double.NegativeInfinity;
        for (int j = from + 1; j <= end; j++)
        {
            double gap = (_centre[j] - _centre[j - 1]) / (Widened(j, relative) + Widened(j - 1, relative));
            if (gap > widest)
            {
                widest = gap;
                best = j;
            }
        }

        return best;
    }

    private int Deepest(int from, int end)
    {
        int deepest = from;
        for (int j = from + 1; j < end; j++)
        {
            deepest = _depth[j] > _depth[deepest] ? j : deepest;
        }

        return deepest;
    }

    /// <summary>A line as observed: centre and width in Å, its depth, and (λ/width)².</summary>
    private readonly record struct LineAt(double Centre, double Width, double Depth, double SquaredRatio);
}
