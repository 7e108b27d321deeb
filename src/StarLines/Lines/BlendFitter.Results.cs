using System;
using StarLines.Fitting;

namespace StarLines.Lines;

/// <content>What a finished fit says of each line.</content>
internal sealed partial class BlendFitter
{
    /// <summary>Separation at which the dip between two equal Gaussians vanishes: 2 σ (Sparrow 1916, ApJ 44, 76).</summary>
    private const double SparrowLimitFwhm = 0.849;

    /// <summary>Score of the wings from which the profile is called wrong; noise passes it in 5 of 10 000 lines.</summary>
    private const double WingScoreBound = 3.5;

    private void Keep(LineTask[] tasks, double origin)
    {
        for (int i = 0; i < _count; i++)
        {
            LineTask task = tasks[_fitted[i]];
            ReadOnlySpan<double> line = _parameters.AsSpan(1 + (i * _model.Stride), _model.Stride);
            task.Depth = line[0];
            task.Centre = origin + line[1];
            task.Width = line[2];
            task.SecondWidth = _model.Stride > 3 ? line[3] : 0.0;
        }
    }

    private void Store(LineTask[] tasks, FitOutcome outcome, double origin, int first, int last)
    {
        Keep(tasks, origin);
        foreach (int index in _dropped.AsSpan(0, _outliers))
        {
            _pixels.Drop(first + index);
        }

        int used = UsedPixels();

        // The prior of the continuum counts as one more datum and the continuum as one more parameter.
        double freedom = used + 1 - FreeParameters();
        double reduced = freedom > 0.0 ? outcome.ChiSquare / freedom : double.NaN;
        for (int i = 0; i < _count; i++)
        {
            LineTask task = tasks[_fitted[i]];
            task.Status = LineStatus.Measured;
            task.Continuum = _parameters[0];
            task.First = first;
            task.Last = last;
            task.Pixels = used;
            task.ReducedChiSquare = reduced;
            if (!outcome.Converged)
            {
                task.Warnings |= LineWarnings.NoConvergence;
            }

            if (freedom > 0.0 && reduced > PoorFitBound(freedom))
            {
                task.Warnings |= LineWarnings.PoorFit;
            }

            StoreUncertainties(task, i);
            ReadOnlySpan<double> parameters = _parameters.AsSpan(0, _model.ParameterCount);
            if (Math.Abs(_model.WingScore(i, task.Fwhm, parameters, _workspace.Covariance)) > WingScoreBound)
            {
                task.Warnings |= LineWarnings.PoorFit;
            }
        }

        NoteUnresolved(tasks);
    }

    private void StoreUncertainties(LineTask task, int line)
    {
        int at = 1 + (line * _model.Stride);
        int widths = _profile.WidthCount;
        ReadOnlySpan<double> width = _parameters.AsSpan(at + 2, widths);
        if (_workspace.Fixed[at] || _workspace.Fixed[at + 1])
        {
            task.Warnings |= LineWarnings.AtBound;
        }

        task.DepthSigma = Sigma(at);
        task.CentreSigma = Sigma(at + 1);
        task.Fwhm = _profile.Fwhm(width, _widthGradient);
        task.FwhmSigma = task.WidthHeld ? double.NaN : Math.Sqrt(Form(at + 2, _widthGradient, at + 2, _widthGradient, widths));
        double area = _profile.Area(width, _widthGradient);
        task.EquivalentWidth = task.Depth * area;
        Span<double> gradient = stackalloc double[4];
        gradient.Clear();
        gradient[0] = area;
        for (int k = 0; k < widths; k++)
        {
            gradient[2 + k] = task.Depth * _widthGradient[k];
        }

        double total = Form(at, gradient, at, gradient, _model.Stride);
        double withContinuum = 0.0;
        for (int k = 0; k < _model.Stride; k++)
        {
            withContinuum += gradient[k] * Covariance(at + k, 0);
        }

        // With the continuum known the variance is less by what the continuum explains of it.
        double continuum = Covariance(0, 0);
        double noise = continuum > 0.0 ? total - (withContinuum * withContinuum / continuum) : total;
        task.TotalSigma = Math.Sqrt(total);
        task.NoiseSigma = Math.Sqrt(Math.Max(noise, 0.0));
        double level = _parameters[0];
        task.FluxSigma = Math.Sqrt(Math.Max(
            0.0,
            (level * level * total)
                + (2.0 * level * task.EquivalentWidth * withContinuum)
                + (task.EquivalentWidth * task.EquivalentWidth * continuum)));
        task.ContinuumPosterior = Math.Sqrt(continuum);
    }

    private void NoteUnresolved(LineTask[] tasks)
    {
        for (int i = 1; i < _count; i++)
        {
            LineTask left = tasks[_fitted[i - 1]];
            LineTask right = tasks[_fitted[i]];
            if (right.Centre - left.Centre < SparrowLimitFwhm * Math.Max(left.Fwhm, right.Fwhm))
            {
                left.Warnings |= LineWarnings.Unresolved;
                right.Warnings |= LineWarnings.Unresolved;
            }
        }
    }

    /// <summary>The bound of reduced χ² that noise alone passes in 3 of 100 000 fits (Wilson and Hilferty 1931, PNAS 17, 684).</summary>
    private static double PoorFitBound(double freedom)
    {
        const double Deviations = 4.0;
        double spread = 2.0 / (9.0 * freedom);
        double root = 1.0 - spread + (Deviations * Math.Sqrt(spread));
        return root * root * root;
    }

    private int FreeParameters()
    {
        int free = 0;
        foreach (bool isFixed in _workspace.Fixed)
        {
            free += isFixed ? 0 : 1;
        }

        return free;
    }

    private double Covariance(int row, int column) => _workspace.Covariance[(row * _model.ParameterCount) + column];

    /// <summary>One standard deviation of a parameter; NaN where it did not move.</summary>
    private double Sigma(int parameter) =>
        _workspace.Fixed[parameter] ? double.NaN : Math.Sqrt(Covariance(parameter, parameter));

    private double Form(int row, ReadOnlySpan<double> left, int column, ReadOnlySpan<double> right, int count)
    {
        double sum = 0.0;
        for (int i = 0; i < count; i++)
        {
            for (int j = 0; j < count; j++)
            {
                sum += left[i] * Covariance(row + i, column + j) * right[j];
            }
        }

        return sum;
    }
}
