using System;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>How the points of a trace are joined.</summary>
internal enum TraceStyle
{
    /// <summary>Straight lines, or steps where a pixel is wide enough to be seen.</summary>
    Pixels,

    /// <summary>Straight lines.</summary>
    Line,

    /// <summary>A smooth curve through points that are far enough apart to be seen.</summary>
    Smooth,
}

/// <summary>
/// A line through points in order of x. Where points lie closer than the pixels of the device, each column shows its
/// first, lowest, highest and last point, so that no spike is lost and the cost does not grow with the figure.
/// </summary>
internal sealed class Trace : PanelItem
{
    /// <summary>Pixels at least this wide, in units of the figure, are drawn as steps.</summary>
    private const double StepWidth = 4.0;

    /// <summary>Straight pieces between two points of a smooth curve.</summary>
    private const int SmoothParts = 8;

    private readonly bool[] _shown;

    /// <summary>Makes a trace of N points.</summary>
    /// <param name="name">Its words in the legend.</param>
    /// <param name="x">N values, increasing.</param>
    /// <param name="y">N values; those that are not finite leave a gap.</param>
    /// <param name="pen">How it is drawn.</param>
    /// <param name="shown">N flags, or none for all; the others leave a gap.</param>
    /// <param name="style">How the points are joined.</param>
    internal Trace(string name, double[] x, double[] y, Pen pen, bool[]? shown = null, TraceStyle style = TraceStyle.Pixels)
        : base(name)
    {
        X = x;
        Y = y;
        Pen = pen;
        _shown = shown ?? [];
        Style = style;
    }

    internal double[] X { get; }

    internal double[] Y { get; }

    internal Pen Pen { get; }

    internal TraceStyle Style { get; }

    internal override LegendSample? Sample => new(Pen);

    internal bool IsShown(int index) => (_shown.Length == 0 || _shown[index]) && double.IsFinite(Y[index]);

    internal override void Draw(PanelCanvas panel)
    {
        int first = Math.Max(0, LowerBound(X, panel.XRange.Minimum) - 1);
        int end = Math.Min(X.Length, LowerBound(X, panel.XRange.Maximum) + 1);
        if (first >= end)
        {
            return;
        }

        using SKPaint paint = Pen.Paint(panel.Palette);
        using var path = new ChunkedPath(panel.Canvas, paint);
        double width = Math.Abs(panel.X(X[end - 1]) - panel.X(X[first])) / Math.Max(1, end - first - 1);
        if (Style == TraceStyle.Pixels && width >= StepWidth)
        {
            AddSteps(path, panel, first, end);
        }
        else if (Style == TraceStyle.Smooth && width >= StepWidth)
        {
            AddSmooth(path, panel, first, end);
        }
        else
        {
            AddLine(path, panel, first, end);
        }

    }

    /// <summary>The first index whose value is not below the limit.</summary>
    internal static int LowerBound(double[] values, double limit)
    {
        int found = Array.BinarySearch(values, limit);
        return found >= 0 ? found : ~found;
    }

    private void AddSteps(ChunkedPath path, PanelCanvas panel, int first, int end)
    {
        bool open = false;
        for (int i = first; i < end; i++)
        {
            if (!IsShown(i))
            {
                open = false;
                continue;
            }

            float left = panel.X(i > 0 ? 0.5 * (X[i - 1] + X[i]) : X[i] - (0.5 * (X[Math.Min(1, X.Length - 1)] - X[0])));
            float right = panel.X(i + 1 < X.Length ? 0.5 * (X[i] + X[i + 1]) : X[i] + (0.5 * (X[i] - X[Math.Max(0, i - 1)])));
            float y = panel.Y(Y[i]);
            if (open)
            {
                path.LineTo(left, y);
            }
            else
            {
                path.MoveTo(left, y);
            }

            path.LineTo(right, y);
            open = true;
        }
    }

    /// <summary>The monotone cubic through the points (Fritsch and Butland 1984, SIAM J. Sci. Stat. Comput. 5, 300).</summary>
    private void AddSmooth(ChunkedPath path, PanelCanvas panel, int first, int end)
    {
        bool open = false;
        for (int i = first; i < end; i++)
        {
            if (!IsShown(i))
            {
                open = false;
                continue;
            }

            if (!open)
            {
                path.MoveTo(panel.X(X[i]), panel.Y(Y[i]));
                open = true;
                continue;
            }

            double width = X[i] - X[i - 1];
            double start = Slope(i - 1) * width;
            double stop = Slope(i) * width;
            for (int k = 1; k <= SmoothParts; k++)
            {
                double t = (double)k / SmoothParts;
                double u = 1 - t;
                double y = (u * u * (1 + (2 * t)) * Y[i - 1]) + (u * u * t * start) + (t * t * (3 - (2 * t)) * Y[i]) - (t * t * u * stop);
                path.LineTo(panel.X(X[i - 1] + (t * width)), panel.Y(y));
            }
        }
    }

    /// <summary>0 at an extreme, so that the curve does not leave the range of the points, else the harmonic mean of both sides.</summary>
    private double Slope(int i)
    {
        if (i == 0 || i == X.Length - 1 || !IsShown(i - 1) || !IsShown(i + 1))
        {
            return 0.0;
        }

        double before = (Y[i] - Y[i - 1]) / (X[i] - X[i - 1]);
        double after = (Y[i + 1] - Y[i]) / (X[i + 1] - X[i]);
        return before * after <= 0.0 ? 0.0 : 2.0 * before * after / (before + after);
    }

    private void AddLine(ChunkedPath path, PanelCanvas panel, int first, int end)
    {
        var column = new Column(path, panel.DeviceScale);
        for (int i = first; i < end; i++)
        {
            if (IsShown(i))
            {
                column.Add(panel.X(X[i]), panel.Y(Y[i]));
            }
            else
            {
                column.Break();
            }
        }

        column.Break();
    }

    /// <summary>Gathers the points of one column of device pixels and hands on at most four of them.</summary>
    private struct Column(ChunkedPath path, float deviceScale)
    {
        private bool _open;
        private int _count;
        private int _column;
        private SKPoint _first;
        private SKPoint _lowest;
        private SKPoint _highest;
        private SKPoint _last;

        internal void Add(float x, float y)
        {
            int column = (int)MathF.Floor(x * deviceScale);
            var point = new SKPoint(x, y);
            if (_count > 0 && column == _column)
            {
                _count++;
                _last = point;
                _lowest = y < _lowest.Y ? point : _lowest;
                _highest = y > _highest.Y ? point : _highest;
                return;
            }

            Flush();
            _column = column;
            _count = 1;
            _first = _lowest = _highest = _last = point;
        }

        internal void Break()
        {
            Flush();
            _open = false;
        }

        private void Flush()
        {
            if (_count == 0)
            {
                return;
            }

            Emit(_first);
            if (_count > 1)
            {
                bool lowestFirst = _lowest.X <= _highest.X;
                EmitInner(lowestFirst ? _lowest : _highest);
                EmitInner(lowestFirst ? _highest : _lowest);
                Emit(_last);
            }

            _count = 0;
        }

        private void EmitInner(SKPoint point)
        {
            if (point != _first && point != _last)
            {
                Emit(point);
            }
        }

        private void Emit(SKPoint point)
        {
            if (_open)
            {
                path.LineTo(point.X, point.Y);
            }
            else
            {
                path.MoveTo(point.X, point.Y);
                _open = true;
            }
        }
    }
}
