using System;
using System.Numerics.Tensors;

namespace StarLines.Lines;

/// <content>The model of all fitted lines.</content>
internal sealed partial class BlendFitter
{
    /// <summary>A profile without end is followed to this many full widths, where a Lorentzian is down to 1/10 000.</summary>
    private const double ModelReachFwhm = 50.0;

    /// <summary>Sets the model of the whole spectrum to the lines as they stand.</summary>
    internal void Rebuild(LineTask[] tasks)
    {
        _pixels.Model.AsSpan().Fill(1.0);
        foreach (LineTask task in tasks)
        {
            if (task.Fitted && task.Usable)
            {
                (int first, int last) = Footprint(task);
                Span<double> target = _pixels.Model.AsSpan(first, last - first + 1);
                Span<double> own = EvaluateOn(task, first, last);
                TensorPrimitives.Subtract(target, own, target);
            }
        }
    }

    /// <summary>Depth times profile of a line on a run of pixels; valid until the next call.</summary>
    internal Span<double> EvaluateOn(LineTask task, int first, int last)
    {
        int count = last - first + 1;
        _model.Prepare(count);
        _pixels.CopyPixels(first, task.Predicted, _model.Centres, _model.Edges);
        if (_own.Length < count)
        {
            _own = new double[count];
        }

        EvaluateOwn(task, task.Predicted, _own);
        return _own.AsSpan(0, count);
    }

    /// <summary>Pixel edges of the run last evaluated, Å from the predicted centre of its line.</summary>
    internal ReadOnlySpan<double> Edges => _model.Edges;

    /// <summary>Pixel edges of a run, Å from the predicted centre of a line; valid until the next call.</summary>
    internal ReadOnlySpan<double> EdgesOf(LineTask task, int first, int last)
    {
        _model.Prepare(last - first + 1);
        _pixels.CopyPixels(first, task.Predicted, _model.Centres, _model.Edges);
        return _model.Edges;
    }

    private (int First, int Last) Footprint(LineTask task)
    {
        Span<double> widths = stackalloc double[2];
        widths[0] = task.Width;
        widths[1] = task.SecondWidth;
        double reach = Math.Min(_profile.Reach(widths[.._profile.WidthCount]), ModelReachFwhm * task.Fwhm);
        return _pixels.Window(task.Pixel, task.Centre - reach, task.Centre + reach);
    }
}
