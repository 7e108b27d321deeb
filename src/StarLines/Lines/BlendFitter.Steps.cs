using System;
using System.Numerics.Tensors;
using StarLines.Fitting;

namespace StarLines.Lines;

/// <content>The steps of one fit: start, bounds, what is dropped.</content>
internal sealed partial class BlendFitter
{
    /// <summary>Copies the pixels of the window; the lines fitted elsewhere become the base.</summary>
    private void Load(LineTask[] tasks, ReadOnlySpan<int> members, int first, int last, double origin)
    {
        int count = last - first + 1;
        _model.Prepare(count);
        _pixels.Flux.Slice(first, count).CopyTo(_model.Flux);
        _pixels.Weight.Slice(first, count).CopyTo(_model.Weight);
        _pixels.CopyPixels(first, origin, _model.Centres, _model.Edges);
        Span<double> rest = _model.Base;
        _pixels.Model.AsSpan(first, count).CopyTo(rest);
        if (_own.Length < count)
        {
            _own = new double[count];
        }

        foreach (int member in members)
        {
            if (tasks[member].Width > 0.0)
            {
                EvaluateOwn(tasks[member], origin, _own);
                TensorPrimitives.Add(rest, _own.AsSpan(0, count), rest);
            }
        }
    }

    /// <summary>Depth times profile of a line on the loaded pixels.</summary>
    private void EvaluateOwn(LineTask task, double origin, Span<double> destination)
    {
        Span<double> line = stackalloc double[4];
        line[0] = task.Depth;
        line[1] = task.Centre - origin;
        line[2] = task.Width;
        line[3] = task.SecondWidth;
        _model.EvaluateLine(line[.._model.Stride], destination);
    }

    private int Collect(LineTask[] tasks, ReadOnlySpan<int> members)
    {
        _count = 0;
        foreach (int member in members)
        {
            if (tasks[member].Fitted)
            {
                _fitted[_count++] = member;
            }
        }

        return _count;
    }

    private void SetStart(LineTask[] tasks, double origin)
    {
        _parameters[0] = 1.0;
        _lower[0] = 1.0 / GreatestContinuumFactor;
        _upper[0] = GreatestContinuumFactor;
        _held[0] = false;
        for (int i = 0; i < _count; i++)
        {
            LineTask task = tasks[_fitted[i]];
            int at = 1 + (i * _model.Stride);
            _held.AsSpan(at, _model.Stride).Clear();
            _parameters[at] = task.Depth;
            _lower[at] = -GreatestHeight;
            _upper[at] = GreatestDepth;
            double search = Search(tasks, i);
            _parameters[at + 1] = task.Centre - origin;
            _lower[at + 1] = task.Predicted - search - origin;
            _upper[at + 1] = task.Predicted + search - origin;
            SetWidths(task, i, at + 2);
        }
    }

    private void SetWidths(LineTask task, int line, int at)
    {
        int widths = _profile.WidthCount;
        bool weak = Math.Abs(task.Significance) < WeakSignificance && !task.WidthHeld;
        _profile.Begin(task.ExpectedFwhm, _parameters.AsSpan(at, widths));
        _model.SetWidthPrior(line, _parameters[at], weak ? 1.0 / WidthPrior : 0.0);
        _profile.Begin(task.LeastFwhm, _lower.AsSpan(at, widths));
        _profile.Begin(GreatestWidthFactor * Math.Max(task.ExpectedFwhm, task.LeastFwhm), _upper.AsSpan(at, widths));
        if (task.Width > 0.0 && !task.WidthHeld)
        {
            _parameters[at] = task.Width;
            _parameters[at + widths - 1] = widths == 1 ? task.Width : task.SecondWidth;
            return;
        }

        _held.AsSpan(at, widths).Fill(task.WidthHeld);
    }

    /// <summary>How far a centre may move: as the options say, but never past the middle between it and a line fitted with it.</summary>
    private double Search(LineTask[] tasks, int i)
    {
        LineTask task = tasks[_fitted[i]];
        double search = Math.Max(_options.SearchFwhm * task.ExpectedFwhm, 1.5 * task.PixelWidth);
        if (i > 0)
        {
            search = Math.Min(search, HalfWay(tasks[_fitted[i - 1]], task));
        }

        if (i < _count - 1)
        {
            search = Math.Min(search, HalfWay(task, tasks[_fitted[i + 1]]));
        }

        return search;
    }

    private static double HalfWay(LineTask left, LineTask right) =>
        Math.Max(0.5 * (right.Predicted - left.Predicted), 0.01 * right.PixelWidth);

    private FitOutcome Minimize()
    {
        int size = _model.ParameterCount;
        Span<double> parameters = _parameters.AsSpan(0, size);
        ReadOnlySpan<double> lower = _lower.AsSpan(0, size);
        ReadOnlySpan<double> upper = _upper.AsSpan(0, size);
        if (_count > 1)
        {
            // Depths first: a nearly linear problem, from which the shapes then start well.
            Span<bool> shapes = stackalloc bool[size];
            for (int i = 1; i < size; i++)
            {
                shapes[i] = (i - 1) % _model.Stride != 0;
            }

            LevenbergMarquardt.Minimize(_model, parameters, lower, upper, shapes, _workspace);
        }

        return LevenbergMarquardt.Minimize(_model, parameters, lower, upper, _held.AsSpan(0, size), _workspace);
    }

    /// <summary>
    /// A strong line that runs into its greatest width starts again wider; any other width at a bound is not determined by the
    /// data, and the expected one is held instead.
    /// </summary>
    private bool ChangeWidthsAtBound(LineTask[] tasks)
    {
        bool any = false;
        for (int i = 0; i < _count; i++)
        {
            LineTask task = tasks[_fitted[i]];
            int at = 3 + (i * _model.Stride);
            if (task.WidthHeld || !_workspace.Fixed[at])
            {
                continue;
            }

            any = true;
            task.Width = 0.0;
            if (_parameters[at] >= _upper[at] && task.Widenings < MostWidenings && AmplitudeSignificance(i) > WideningSignificance)
            {
                task.Widenings++;
                task.ExpectedFwhm *= 0.75 * GreatestWidthFactor;
            }
            else
            {
                task.WidthHeld = true;
                task.Warnings |= LineWarnings.AtBound;
            }
        }

        return any;
    }

    /// <summary>Takes the least significant line out of the fit, where it is below the threshold or the fit is undetermined with several lines.</summary>
    private bool DropWeakest(LineTask[] tasks, bool determined)
    {
        int weakest = -1;
        double least = determined ? _options.DetectionSignificance : double.PositiveInfinity;
        for (int i = 0; i < _count; i++)
        {
            double significance = determined ? AmplitudeSignificance(i) : Math.Abs(tasks[_fitted[i]].Significance);
            if (significance < least)
            {
                least = significance;
                weakest = i;
            }
        }

        if (weakest < 0 || (!determined && _count == 1))
        {
            return false;
        }

        Forget(tasks[_fitted[weakest]]);
        return true;
    }

    /// <summary>Depth over its standard deviation with all centres and widths known, the depths and the continuum free.</summary>
    private double AmplitudeSignificance(int line)
    {
        int size = _model.ParameterCount;
        int reduced = _count + 1;
        Span<double> matrix = _amplitudes.AsSpan(0, reduced * reduced);
        for (int i = 0; i < reduced; i++)
        {
            int row = i == 0 ? 0 : 1 + ((i - 1) * _model.Stride);
            for (int j = 0; j <= i; j++)
            {
                int column = j == 0 ? 0 : 1 + ((j - 1) * _model.Stride);
                matrix[(i * reduced) + j] = _workspace.Matrix[(row * size) + column];
            }
        }

        if (!SymmetricMatrix.TryFactorInPlace(matrix, reduced))
        {
            return 0.0;
        }

        Span<double> unit = _amplitudes.AsSpan(reduced * reduced, reduced);
        unit.Clear();
        unit[line + 1] = 1.0;
        SymmetricMatrix.SolveInPlace(matrix, reduced, unit);
        return Math.Abs(_parameters[1 + (line * _model.Stride)]) / Math.Sqrt(unit[line + 1]);
    }

    /// <summary>
    /// Drops the pixel without which χ² falls most, where that is most of the excess: a cosmic hit that nobody flagged.
    /// Without pixel i the χ² of a linear fit falls by r²/(1 − h), h being its leverage.
    /// </summary>
    private bool DropOutlier(FitOutcome outcome)
    {
        ReadOnlySpan<double> residual = _model.Residual;
        double excess = outcome.ChiSquare - (UsedPixels() - _model.ParameterCount + 1);
        if (excess < OutlierSigma * OutlierSigma)
        {
            return false;
        }

        int worst = 0;
        double most = 0.0;
        for (int i = 0; i < residual.Length; i++)
        {
            double leverage = Math.Min(_model.Leverage(i, _workspace.Covariance), MostLeverage);
            double fall = residual[i] * residual[i] / (1.0 - leverage);
            if (fall > most)
            {
                most = fall;
                worst = i;
            }
        }

        if (most < OutlierSigma * OutlierSigma || most < OutlierShare * excess)
        {
            return false;
        }

        _model.Weight[worst] = 0.0;
        _dropped[_outliers++] = worst;
        return true;
    }

    private int UsedPixels()
    {
        int used = 0;
        foreach (double weight in _model.Weight)
        {
            used += weight > 0.0 ? 1 : 0;
        }

        return used;
    }

    private static void Forget(LineTask task)
    {
        task.Fitted = false;
        task.Status = LineStatus.Limit;
        task.Depth = 0.0;
        task.Width = 0.0;
        task.Centre = task.Predicted;
        task.WidthHeld = false;
        task.Warnings &= ~LineWarnings.AtBound;
    }

    private void Fail(LineTask[] tasks, LineWarnings why)
    {
        for (int i = 0; i < _count; i++)
        {
            Forget(tasks[_fitted[i]]);
            tasks[_fitted[i]].Status = LineStatus.Failed;
            tasks[_fitted[i]].Warnings |= why;
        }
    }

    private void Grow(int lines)
    {
        int size = 1 + (lines * _model.Stride);
        if (_parameters.Length < size)
        {
            _parameters = new double[size];
            _lower = new double[size];
            _upper = new double[size];
            _held = new bool[size];
            _amplitudes = new double[(lines + 1) * (lines + 2)];
            _fitted = new int[lines];
        }
    }
}
