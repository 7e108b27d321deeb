using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Continuum;
using StarLines.Numerics;
using StarLines.Velocities;

namespace StarLines.Templates;

/// <summary>The absorption of a spectrum, 1 − flux/continuum, between its pixels by a cubic spline in ln λ.</summary>
internal sealed class SpectrumProfile : TemplateProfile
{
    /// <summary>A spectrum is measured in about this many runs of pixels, so that what does not fit is found out.</summary>
    private const int WindowCount = 150;

    /// <summary>Fewest pixels of a run.</summary>
    private const int MinimumWindow = 32;

    private readonly double[] _log;
    private readonly double[] _absorption;
    private readonly double[] _second;
    private readonly double[] _variance;

    /// <summary>Takes a spectrum to rest.</summary>
    internal SpectrumProfile(Spectrum spectrum, ContinuumFit continuum, double logShift)
    {
        int n = spectrum.Count;
        _log = new double[n];
        _absorption = new double[n];
        _variance = new double[n];
        ReadOnlySpan<double> vacuum = VacuumAxis.Of(spectrum.Scale, Medium.Vacuum, _log);
        for (int i = 0; i < n; i++)
        {
            _log[i] = Math.Log(vacuum[i]) - logShift;
            double level = continuum.Level[i];
            if (spectrum.IsGood(i) && level > 0.0)
            {
                _absorption[i] = 1.0 - (spectrum.Flux[i] / level);
                _variance[i] = spectrum.HasSigma ? spectrum.Sigma[i] * spectrum.Sigma[i] / (level * level) : 0.0;
            }
        }

        _second = new double[n];
        CubicSpline.SecondDerivatives(_log, _absorption, _second);
    }

    /// <inheritdoc/>
    internal override double MinimumAngstrom => Math.Exp(_log[0]);

    /// <inheritdoc/>
    internal override double MaximumAngstrom => Math.Exp(_log[^1]);

    /// <inheritdoc/>
    internal override bool CanBroaden => false;

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
        byBroadening.Clear();
        int cell = 0;
        for (int i = 0; i < vacuumAngstrom.Length; i++)
        {
            double x = Math.Log(vacuumAngstrom[i]) - logShift;
            cell = Cell(x, cell);
            if (cell < 0)
            {
                absorption[i] = 0.0;
                byShift[i] = 0.0;
                cell = 0;
                continue;
            }

            (double value, double slope) = CubicSpline.At(_log, _absorption, _second, cell, x);
            absorption[i] = value;
            byShift[i] = -slope;
        }
    }

    /// <inheritdoc/>
    internal override void AddVariance(ReadOnlySpan<double> vacuumAngstrom, double logShift, Span<double> variance)
    {
        int cell = 0;
        for (int i = 0; i < vacuumAngstrom.Length; i++)
        {
            double x = Math.Log(vacuumAngstrom[i]) - logShift;
            cell = Cell(x, cell);
            if (cell < 0)
            {
                cell = 0;
                continue;
            }

            double t = (x - _log[cell]) / (_log[cell + 1] - _log[cell]);
            variance[i] += ((1.0 - t) * _variance[cell]) + (t * _variance[cell + 1]);
        }
    }

    /// <inheritdoc/>
    internal override TemplateWindow[] Windows(ReadOnlySpan<double> vacuumAngstrom, double logShift, double broadening)
    {
        double factor = Math.Exp(logShift);
        int start = FirstAtOrAbove(vacuumAngstrom, MinimumAngstrom * factor);
        int end = FirstAtOrAbove(vacuumAngstrom, MaximumAngstrom * factor);
        int length = Math.Max(MinimumWindow, (end - start + WindowCount - 1) / WindowCount);
        var windows = new List<TemplateWindow>();
        for (int i = start; i < end; i += length)
        {
            int stop = Math.Min(i + length, end);
            windows.Add(new TemplateWindow(i, stop, string.Create(
                CultureInfo.InvariantCulture, $"{vacuumAngstrom[i]:F1}–{vacuumAngstrom[stop - 1]:F1} Å")));
        }

        return [.. windows];
    }

    private static int FirstAtOrAbove(ReadOnlySpan<double> values, double limit)
    {
        int found = values.BinarySearch(limit);
        return found >= 0 ? found : ~found;
    }

    /// <summary>The interval that holds a value, searched from a guess upwards; −1 outside.</summary>
    private int Cell(double x, int guess)
    {
        if (x < _log[0] || x > _log[^1] || _log.Length < 2)
        {
            return -1;
        }

        if (x < _log[guess] || (guess + 8 < _log.Length && x > _log[guess + 8]))
        {
            int found = Array.BinarySearch(_log, x);
            guess = found >= 0 ? found : ~found - 1;
        }

        while (guess < _log.Length - 2 && _log[guess + 1] < x)
        {
            guess++;
        }

        return Math.Min(guess, _log.Length - 2);
    }
}
