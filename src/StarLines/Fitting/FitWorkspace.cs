using System;

namespace StarLines.Fitting;

/// <summary>Memory of the solver, kept from fit to fit; it grows with the largest problem met.</summary>
internal sealed class FitWorkspace
{
    private double[] _matrices = [];
    private double[] _vectors = [];
    private bool[] _fixed = [];
    private int _count;

    /// <summary>JᵀJ at the current parameters, N × N by rows.</summary>
    internal Span<double> Matrix => _matrices.AsSpan(0, _count * _count);

    /// <summary>JᵀJ at the trial parameters.</summary>
    internal Span<double> TrialMatrix => _matrices.AsSpan(_count * _count, _count * _count);

    /// <summary>The damped, scaled matrix and its factor.</summary>
    internal Span<double> Factor => _matrices.AsSpan(2 * _count * _count, _count * _count);

    /// <summary>The covariance matrix of the parameters after <see cref="LevenbergMarquardt.TryCovariance"/>; rows of fixed parameters are 0.</summary>
    internal Span<double> Covariance => _matrices.AsSpan(3 * _count * _count, _count * _count);

    /// <summary>Jᵀr at the current parameters.</summary>
    internal Span<double> Gradient => _vectors.AsSpan(0, _count);

    /// <summary>Jᵀr at the trial parameters.</summary>
    internal Span<double> TrialGradient => _vectors.AsSpan(_count, _count);

    /// <summary>Trial parameters.</summary>
    internal Span<double> Trial => _vectors.AsSpan(2 * _count, _count);

    /// <summary>Step.</summary>
    internal Span<double> Step => _vectors.AsSpan(3 * _count, _count);

    /// <summary>Scales of the parameters.</summary>
    internal Span<double> Scale => _vectors.AsSpan(4 * _count, _count);

    /// <summary>Parameters that do not move in this step: held by the caller, or at a bound and pushed outwards.</summary>
    internal Span<bool> Fixed => _fixed.AsSpan(0, _count);

    /// <summary>Makes the equations of the trial those of the current parameters.</summary>
    internal void AcceptTrial()
    {
        TrialMatrix.CopyTo(Matrix);
        TrialGradient.CopyTo(Gradient);
    }

    /// <summary>Makes room for a problem of N parameters.</summary>
    internal void Prepare(int count)
    {
        _count = count;
        if (_fixed.Length < count)
        {
            _matrices = new double[4 * count * count];
            _vectors = new double[5 * count];
            _fixed = new bool[count];
        }
    }
}
