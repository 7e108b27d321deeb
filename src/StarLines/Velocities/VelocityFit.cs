using System;
using System.Buffers;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// The final velocity: least squares of the template, computed at the pixels themselves, against the spectrum. In each window
/// of pixels with a line (or a few that overlap) the depth and a tilted continuum are free within their uncertainties; the
/// velocity, and the width where the template does not know it, are common. The windows are then joined as measurements of their
/// own, so that what does not belong is found and scatter beyond the noise is in the error.
/// </summary>
internal sealed partial class VelocityFit
{
    private const int MaximumIterations = 15;

    /// <summary>The pass after which single pixels are judged; two more follow at least.</summary>
    private const int ClippingIteration = 1;

    private const int FewestIterations = 2;

    /// <summary>No star turns so fast: 250 km/s squared is the variance of v sin i = 530 km/s; instruments of R under 500 are wider.</summary>
    internal const double LargestBroadening = 62_500.0;

    /// <summary>Converged when a step is below this part of the uncertainty: 1 % adds nothing to it.</summary>
    private const double Convergence = 0.01;

    /// <summary>A continuum is never known better than this.</summary>
    private const double LeastContinuumSigma = 1e-5;

    /// <summary>Where the continuum is not supported, its level is free within this.</summary>
    private const double LargestContinuumSigma = 0.1;

    /// <summary>Part of the information of a window that must lie on good pixels.</summary>
    private const double LeastCoverage = 0.4;

    /// <summary>A pixel further off than this many standard deviations is left out.</summary>
    private const double PixelCut = 5.0;

    private readonly ResidualSpectrum _spectrum;
    private readonly TemplateProfile _profile;
    private readonly TemplateWindow[] _windows;
    private readonly WindowState[] _states;
    private readonly double[] _memory;
    private readonly int[] _place;
    private readonly int _pixels;
    private readonly bool _fitBroadening;
    private readonly double _start;
    private readonly double _reach;
    private double _depthMean;
    private double _depthSigma;

    private VelocityFit(
        ResidualSpectrum spectrum, TemplateProfile profile, double logShift, double reach, double broadening, bool fitBroadening)
    {
        _spectrum = spectrum;
        _start = logShift;
        _reach = reach;
        _profile = profile;
        LogShift = logShift;
        Broadening = broadening;
        _fitBroadening = fitBroadening && profile.CanBroaden;
        _windows = profile.Windows(spectrum.VacuumAngstrom, logShift, broadening);
        _states = new WindowState[_windows.Length];
        _place = new int[_windows.Length];
        for (int g = 0; g < _windows.Length; g++)
        {
            _place[g] = _pixels;
            _pixels += _windows[g].Length;
        }

        _memory = ArrayPool<double>.Shared.Rent(Math.Max(6 * _pixels, 1));
    }

    /// <summary>ζ = ln(1 + z).</summary>
    internal double LogShift { get; private set; }

    /// <summary>Variance of the Gaussian that widens the template, (km/s)².</summary>
    internal double Broadening { get; private set; }

    /// <summary>Standard deviation of the broadening, (km/s)²; NaN where it was not fitted.</summary>
    internal double BroadeningSigma { get; private set; } = double.NaN;

    /// <summary>The joined windows at the end.</summary>
    internal Combination Joint { get; private set; }

    /// <summary>Photon limit of ζ: one standard deviation.</summary>
    internal double PhotonSigma { get; private set; } = double.NaN;

    /// <summary>χ² of the windows used, over their pixels.</summary>
    internal double ReducedChiSquare { get; private set; } = double.NaN;

    /// <summary>Pixels used.</summary>
    internal int Pixels { get; private set; }

    /// <summary>Mean depth of the lines in units of the template's.</summary>
    internal double Depth => _depthMean;

    /// <summary>Whether it ended well.</summary>
    internal bool Converged { get; private set; }

    /// <summary>The windows.</summary>
    internal ReadOnlySpan<TemplateWindow> Windows => _windows;

    /// <summary>What became of them.</summary>
    internal ReadOnlySpan<WindowState> States => _states;

    private Span<double> Template => _memory.AsSpan(0, _pixels);

    private Span<double> ByShift => _memory.AsSpan(_pixels, _pixels);

    private Span<double> ByBroadening => _memory.AsSpan(2 * _pixels, _pixels);

    private Span<double> Work => _memory.AsSpan(3 * _pixels, _pixels);

    private Span<double> Weight => _memory.AsSpan(4 * _pixels, _pixels);

    private Span<double> Absorption => _memory.AsSpan(5 * _pixels, _pixels);

    /// <summary>Fits.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="profile">The template.</param>
    /// <param name="logShift">ζ = ln(1 + z) to start from, good to a line width.</param>
    /// <param name="reach">How far ζ may move from there.</param>
    /// <param name="broadening">Widening to start from, (km/s)².</param>
    /// <param name="fitBroadening">Whether the widening is fitted.</param>
    internal static VelocityFit Run(
        ResidualSpectrum spectrum, TemplateProfile profile, double logShift, double reach, double broadening, bool fitBroadening)
    {
        var fit = new VelocityFit(spectrum, profile, logShift, reach, broadening, fitBroadening);
        fit.Iterate();
        ArrayPool<double>.Shared.Return(fit._memory);
        return fit;
    }

    private void Iterate()
    {
        Gather();
        Evaluate();
        if (!Start())
        {
            return;
        }

        var scratch = new double[_states.Length];
        for (int iteration = 0; iteration < MaximumIterations; iteration++)
        {
            double broadeningStep = SolveWindows();
            if (iteration == ClippingIteration)
            {
                ClipPixels();
            }

            Inflate();
            Joint = WindowCombination.Join(_states, scratch);
            if (Joint.Used == 0 || !(Joint.Variance > 0.0))
            {
                return;
            }

            double sigma = Math.Sqrt(Joint.Variance);
            double limit = Math.Max(3.0 * sigma, LongestStep());
            double step = Math.Clamp(Joint.Step, -limit, limit);
            LogShift = Math.Clamp(LogShift + step, _start - _reach, _start + _reach);
            bool settled = Widen(broadeningStep);
            if (settled && iteration >= FewestIterations && Math.Abs(step) < Convergence * sigma)
            {
                Converged = true;
                break;
            }

            Evaluate();
        }

        Converged |= Math.Abs(Joint.Step) < Math.Sqrt(Joint.Variance);
        Converged &= Math.Abs(LogShift - _start) < 0.999 * _reach;
        Summarize();
    }

    /// <summary>Moves the broadening; whether it has come to rest.</summary>
    private bool Widen(double step)
    {
        if (!_fitBroadening || double.IsNaN(BroadeningSigma))
        {
            return true;
        }

        double before = Broadening;
        Broadening = Math.Clamp(before + Math.Clamp(step, -0.7 * before, 50.0 + (2.0 * before)), 0.0, LargestBroadening);
        return Math.Abs(Broadening - before) <= Math.Max(0.1 * BroadeningSigma, 1e-3 * before);
    }

    /// <summary>Copies the pixels of the windows side by side and sets the priors of the continuum.</summary>
    private void Gather()
    {
        for (int g = 0; g < _windows.Length; g++)
        {
            TemplateWindow window = _windows[g];
            _spectrum.Weight.AsSpan(window.Start, window.Length).CopyTo(Weight[_place[g]..]);
            _spectrum.Absorption.AsSpan(window.Start, window.Length).CopyTo(Absorption[_place[g]..]);
            Span<double> variance = Work.Slice(_place[g], window.Length);
            variance.Clear();
            _profile.AddVariance(_spectrum.VacuumAngstrom.Slice(window.Start, window.Length), LogShift, variance);
            Span<double> weight = Weight.Slice(_place[g], window.Length);
            for (int i = 0; i < weight.Length; i++)
            {
                weight[i] /= 1.0 + (weight[i] * variance[i]);
            }

            double sigma = _spectrum.ContinuumSigma[(window.Start + window.End) / 2];
            double length = _spectrum.VacuumAngstrom[window.End - 1] - _spectrum.VacuumAngstrom[window.Start];
            double bend = _spectrum.StiffnessAngstrom > 0.0 ? Math.Min(1.0, length / _spectrum.StiffnessAngstrom) : 1.0;
            _states[g].LevelSigma = Math.Clamp(sigma, LeastContinuumSigma, LargestContinuumSigma);
            _states[g].TiltSigma = Math.Clamp(sigma * bend, LeastContinuumSigma, LargestContinuumSigma);
            _states[g].Inflation = 1.0;
        }
    }

    private void Evaluate()
    {
        for (int g = 0; g < _windows.Length; g++)
        {
            TemplateWindow window = _windows[g];
            int place = _place[g];
            _profile.Evaluate(
                _spectrum.VacuumAngstrom.Slice(window.Start, window.Length),
                LogShift,
                Broadening,
                Template.Slice(place, window.Length),
                ByShift.Slice(place, window.Length),
                ByBroadening.Slice(place, window.Length),
                Work.Slice(place, window.Length));
        }
    }

    /// <summary>One pass over the windows; returns the step of the broadening.</summary>
    private double SolveWindows()
    {
        Span<double> reduced = stackalloc double[5];
        double matrix = 0.0;
        double right = 0.0;
        for (int g = 0; g < _windows.Length; g++)
        {
            if (_states[g].Fate is WindowFate.Masked or WindowFate.Emission)
            {
                continue;
            }

            int place = _place[g];
            int length = _windows[g].Length;
            WindowEquations.Solve(
                Absorption.Slice(place, length),
                Weight.Slice(place, length),
                Template.Slice(place, length),
                ByShift.Slice(place, length),
                ByBroadening.Slice(place, length),
                _depthMean,
                _depthSigma,
                ref _states[g],
                reduced);
            if (_states[g].Fate == WindowFate.Used && reduced[0] > 0.0)
            {
                // The velocity of the window is eliminated too: each line has its own as far as the width goes.
                matrix += (reduced[2] - (reduced[1] * reduced[1] / reduced[0])) / _states[g].Inflation;
                right += (reduced[4] - (reduced[1] * reduced[3] / reduced[0])) / _states[g].Inflation;
            }
        }

        if (!_fitBroadening || !(matrix > 0.0))
        {
            return 0.0;
        }

        BroadeningSigma = 1.0 / Math.Sqrt(matrix);
        return right / matrix;
    }

    /// <summary>
    /// Raises the variance of windows, and of all, where the residuals are larger than the noise by more than chance:
    /// there the template does not fit.
    /// </summary>
    private void Inflate()
    {
        double chi = 0.0;
        double freedom = 0.0;
        foreach (ref readonly WindowState state in _states.AsSpan())
        {
            if (state.Fate == WindowFate.Used)
            {
                chi += OwnChiSquare(state);
                freedom += Math.Max(state.Pixels - 3, 0);
            }
        }

        double pooled = freedom > 0.0 ? Excess(chi, freedom) : 1.0;
        foreach (ref WindowState state in _states.AsSpan())
        {
            double chiSquare = OwnChiSquare(state);
            double own = state.Pixels > 4 ? Excess(chiSquare, state.Pixels - 3) : 1.0;
            state.Inflation = Math.Max(own, Math.Min(pooled, Math.Max(chiSquare / Math.Max(state.Pixels - 3, 1), 1.0)));
        }
    }

    /// <summary>χ² of a window at its own velocity: a line at the wrong place is not one of the wrong shape.</summary>
    private static double OwnChiSquare(in WindowState state) =>
        Math.Max(state.ChiSquare - (state.Step * state.Step * state.Information), 0.0);

    /// <summary>χ² over its degrees of freedom, less three standard deviations of that; at least 1.</summary>
    private static double Excess(double chiSquare, double freedom) =>
        Math.Max(1.0, (chiSquare / freedom) - (3.0 * Math.Sqrt(2.0 / freedom)));

    /// <summary>No step is longer than a good part of a line width, where the linear model ends.</summary>
    private double LongestStep()
    {
        double squares = 0.0;
        double slopes = 0.0;
        for (int i = 0; i < _pixels; i++)
        {
            squares += Template[i] * Template[i];
            slopes += ByShift[i] * ByShift[i];
        }

        return slopes > 0.0 ? Math.Sqrt(squares / slopes) : 0.0;
    }

    private void Summarize()
    {
        double photon = 0.0;
        double chi = 0.0;
        int pixels = 0;
        foreach (ref readonly WindowState state in _states.AsSpan())
        {
            if (state.Fate == WindowFate.Used)
            {
                photon += state.PhotonInformation;
                chi += state.ChiSquare;
                pixels += state.Pixels;
            }
        }

        Pixels = pixels;
        PhotonSigma = photon > 0.0 ? 1.0 / Math.Sqrt(photon) : double.NaN;
        ReducedChiSquare = pixels > 0 ? chi / pixels : double.NaN;
    }
}
