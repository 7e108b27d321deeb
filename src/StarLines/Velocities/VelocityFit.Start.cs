using System;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <content>The first depths of the lines, and which windows can be used at all.</content>
internal sealed partial class VelocityFit
{
    /// <summary>
    /// First depths: of each window by least squares, then their mean and scatter, between which the fit is drawn where
    /// a window alone says little.
    /// </summary>
    private bool Start()
    {
        double sum = 0.0;
        double total = 0.0;
        for (int g = 0; g < _windows.Length; g++)
        {
            (double projection, double squares) = Project(g);
            _states[g].Fate = Covered(g) ? WindowFate.Used : WindowFate.Masked;
            _states[g].Depth = squares > 0.0 ? projection / squares : 0.0;
            _states[g].Information = squares;
            if (_states[g].Fate == WindowFate.Used)
            {
                sum += projection;
                total += squares;
            }
        }

        _depthMean = total > 0.0 ? sum / total : 0.0;
        if (!(_depthMean > 0.0))
        {
            return false;
        }

        _depthSigma = DepthScatter();
        for (int g = 0; g < _states.Length; g++)
        {
            MarkEmission(ref _states[g]);
            double precision = 1.0 / (_depthSigma * _depthSigma);
            _states[g].Depth = ((_states[g].Depth * _states[g].Information) + (_depthMean * precision)) / (_states[g].Information + precision);
        }

        return true;
    }

    /// <summary>Standard deviation of the depths beyond their noise, between a tenth of the mean and all of it.</summary>
    private double DepthScatter()
    {
        double squares = 0.0;
        double noise = 0.0;
        int n = 0;
        foreach (ref readonly WindowState state in _states.AsSpan())
        {
            if (state.Fate == WindowFate.Used && state.Information > 0.0)
            {
                double offset = Math.Clamp(state.Depth - _depthMean, -2.0 * _depthMean, 2.0 * _depthMean);
                double weight = 1.0 / (1.0 + (1.0 / (state.Information * _depthMean * _depthMean)));
                squares += weight * offset * offset;
                noise += weight * Math.Min(1.0 / state.Information, 4.0 * _depthMean * _depthMean);
                n++;
            }
        }

        double scatter = n > 1 ? Math.Sqrt(Math.Max(squares - noise, 0.0) / n) : _depthMean;
        return Math.Clamp(scatter, 0.1 * _depthMean, _depthMean);
    }

    private static void MarkEmission(ref WindowState state)
    {
        if (state.Fate == WindowFate.Used && state.Information > 0.0 && state.Depth * Math.Sqrt(state.Information) < -3.0)
        {
            state.Fate = WindowFate.Emission;
        }
    }

    private (double Projection, double Squares) Project(int g)
    {
        double projection = 0.0;
        double squares = 0.0;
        int end = _place[g] + _windows[g].Length;
        for (int i = _place[g]; i < end; i++)
        {
            double weighted = Weight[i] * Template[i];
            projection += weighted * Absorption[i];
            squares += weighted * Template[i];
        }

        return (projection, squares);
    }

    /// <summary>Whether the slopes of the template, which carry the velocity, lie on good pixels for the most part, on both sides.</summary>
    private bool Covered(int g)
    {
        Span<double> all = stackalloc double[2];
        Span<double> good = stackalloc double[2];
        all.Clear();
        good.Clear();
        int end = _place[g] + _windows[g].Length;
        for (int i = _place[g]; i < end; i++)
        {
            int side = ByShift[i] < 0.0 ? 0 : 1;
            double slope = ByShift[i] * ByShift[i];
            all[side] += slope;
            good[side] += Weight[i] > 0.0 ? slope : 0.0;
        }

        // A line cut by the end of the spectrum has one side only.
        return good[0] > LeastCoverage * Math.Max(all[0], 0.5 * all[1]) && good[1] > LeastCoverage * Math.Max(all[1], 0.5 * all[0]);
    }

    /// <summary>Adds the absorption of the fitted star to an array over the whole spectrum.</summary>
    internal void AddModel(ReadOnlySpan<double> vacuumAngstrom, Span<double> model)
    {
        int longest = 0;
        foreach (TemplateWindow window in _windows)
        {
            longest = Math.Max(longest, window.Length);
        }

        var memory = new double[4 * longest];
        for (int g = 0; g < _windows.Length; g++)
        {
            TemplateWindow window = _windows[g];
            int n = window.Length;
            Span<double> template = memory.AsSpan(0, n);
            _profile.Evaluate(
                vacuumAngstrom.Slice(window.Start, n),
                LogShift,
                Broadening,
                template,
                memory.AsSpan(longest, n),
                memory.AsSpan(2 * longest, n),
                memory.AsSpan(3 * longest, n));
            double depth = _states[g].Fate == WindowFate.Used ? _states[g].Depth : _depthMean;
            for (int i = 0; i < n; i++)
            {
                model[window.Start + i] += depth * template[i];
            }
        }
    }
}
