using System;

namespace StarLines.Lines;

/// <summary>Joins lines that touch into groups that are fitted together, each with its window.</summary>
internal sealed class LineGroups
{
    /// <summary>Two lines touch where they come nearer than this many times the sum of their full widths: 4 σ of each.</summary>
    internal const double TouchFwhm = 1.7;

    /// <summary>
    /// Lines of a group at most; longer chains are cut, and each part sees the others as fixed. The cost of a fit grows with
    /// the cube.
    /// </summary>
    private const int MostLines = 40;

    /// <summary>Half of a window at least, pixels.</summary>
    private const double LeastHalfWindow = 3.0;

    private readonly int[] _order;
    private readonly double[] _lefts;
    private readonly int[] _ends;

    internal LineGroups(int lines)
    {
        _order = new int[lines];
        _lefts = new double[lines];
        _ends = new int[lines];
    }

    /// <summary>Number of groups.</summary>
    internal int Count { get; private set; }

    /// <summary>The lines of a group, by index.</summary>
    internal ReadOnlySpan<int> Members(int group)
    {
        int start = group == 0 ? 0 : _ends[group - 1];
        return _order.AsSpan(start, _ends[group] - start);
    }

    /// <summary>Groups the lines that are fitted.</summary>
    internal void Build(LineTask[] tasks, NormalizedPixels pixels)
    {
        int count = 0;
        for (int i = 0; i < tasks.Length; i++)
        {
            if (tasks[i].Fitted && tasks[i].Usable)
            {
                _order[count] = i;
                _lefts[count++] = Left(tasks[i]);
            }
        }

        Array.Sort(_lefts, _order, 0, count);
        Count = 0;
        double reach = double.NegativeInfinity;
        int start = 0;
        for (int k = 0; k < count; k++)
        {
            bool joins = k > start && _lefts[k] < reach && k - start < MostLines
                && pixels.AreConnected(tasks[_order[k - 1]].Pixel, tasks[_order[k]].Pixel);
            if (k > start && !joins)
            {
                Close(k, start);
                start = k;
            }

            reach = k == start ? Right(tasks[_order[k]]) : Math.Max(reach, Right(tasks[_order[k]]));
        }

        if (count > 0)
        {
            Close(count, start);
        }
    }

    /// <summary>The pixels of a group: its lines with some continuum on both sides, up to where the next group begins.</summary>
    internal (int First, int Last) Window(LineTask[] tasks, NormalizedPixels pixels, int group, double halfWidthFwhm)
    {
        double from = double.PositiveInfinity;
        double to = double.NegativeInfinity;
        double left = double.PositiveInfinity;
        double right = double.NegativeInfinity;
        foreach (int member in Members(group))
        {
            LineTask task = tasks[member];
            double half = Math.Max(halfWidthFwhm * task.Fwhm, LeastHalfWindow * task.PixelWidth);
            from = Math.Min(from, task.Centre - half);
            to = Math.Max(to, task.Centre + half);
            left = Math.Min(left, Left(task));
            right = Math.Max(right, Right(task));
        }

        if (group > 0)
        {
            from = Math.Max(from, Math.Min(left, RightOf(tasks, group - 1)));
        }

        if (group < Count - 1)
        {
            to = Math.Min(to, Math.Max(right, LeftOf(tasks, group + 1)));
        }

        return pixels.Window(tasks[Members(group)[0]].Pixel, from, to);
    }

    private void Close(int end, int start)
    {
        _ends[Count++] = end;

        // Within a group lines stand in order of wavelength.
        Array.Sort(_order, start, end - start);
    }

    private double LeftOf(LineTask[] tasks, int group)
    {
        double left = double.PositiveInfinity;
        foreach (int member in Members(group))
        {
            left = Math.Min(left, Left(tasks[member]));
        }

        return left;
    }

    private double RightOf(LineTask[] tasks, int group)
    {
        double right = double.NegativeInfinity;
        foreach (int member in Members(group))
        {
            right = Math.Max(right, Right(tasks[member]));
        }

        return right;
    }

    private static double Left(LineTask task) => task.Centre - (TouchFwhm * task.Fwhm);

    private static double Right(LineTask task) => task.Centre + (TouchFwhm * task.Fwhm);
}
