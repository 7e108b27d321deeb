using System;

namespace StarLines.Lines;

/// <summary>
/// Equivalent width by summation, W = Σ (1 − f/c) Δλ over the window of a line, the models of its neighbours taken out and
/// pixels that cannot be used filled by its own model.
/// </summary>
internal static class DirectSummation
{
    /// <summary>Half of the summed window in units of the full width: 4.7 σ, beyond which a Gaussian holds 3e-6 of its area.</summary>
    internal const double HalfWindowFwhm = 2.0;

    /// <summary>Sums a line. A line that is not fitted is summed over its expected width.</summary>
    internal static void Sum(NormalizedPixels pixels, BlendFitter fitter, LineTask task)
    {
        double half = Math.Max(HalfWindowFwhm * task.Fwhm, task.PixelWidth);
        double from = task.Centre - half;
        double to = task.Centre + half;
        (int first, int last) = pixels.Window(task.Pixel, from, to);
        if (!task.Fitted)
        {
            task.First = first;
            task.Last = last;
        }

        int count = last - first + 1;
        Span<double> own = task.Fitted ? fitter.EvaluateOn(task, first, last) : [];
        ReadOnlySpan<double> edges = task.Fitted ? fitter.Edges : fitter.EdgesOf(task, first, last);
        double sum = 0.0;
        double variance = 0.0;
        double length = 0.0;
        bool masked = false;
        double level = 1.0 / task.Continuum;
        for (int i = 0; i < count; i++)
        {
            double width = edges[i + 1] - edges[i];
            double mine = task.Fitted ? own[i] : 0.0;
            if (!pixels.IsUsed(first + i))
            {
                masked = true;
                sum += mine * width;
                continue;
            }

            double others = pixels.Model[first + i] + mine;
            double sigma = level * width / pixels.Weight[first + i];
            sum += (others - (pixels.Flux[first + i] * level)) * width;
            variance += sigma * sigma;
            length += width;
        }

        task.Warnings |= masked ? LineWarnings.MaskedPixels : LineWarnings.None;
        double posterior = double.IsNaN(task.ContinuumPosterior) ? task.ContinuumSigma : task.ContinuumPosterior;
        double placement = (length - sum) * posterior;

        // What was taken out for the neighbours is as uncertain as the fit that parted them.
        double parting = task.Blend > 0 ? task.NoiseSigma : 0.0;
        variance += parting * parting;
        task.DirectNoise = Math.Sqrt(variance);
        task.Direct = new Measured(sum, Math.Sqrt(variance + (placement * placement)));
        NoteEdge(task, from, to, edges);
    }

    /// <summary>Says where the window is cut by the end of the spectrum or a gap: more than half a pixel is missing of the part that holds the line.</summary>
    private static void NoteEdge(LineTask task, double from, double to, ReadOnlySpan<double> edges)
    {
        double slack = task.PixelWidth;
        if (task.Predicted + edges[0] > from + slack || task.Predicted + edges[^1] < to - slack)
        {
            task.Warnings |= LineWarnings.Edge;
        }
    }
}
