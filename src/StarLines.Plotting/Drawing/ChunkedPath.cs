using System;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// Draws a long line in pieces: the cost of a stroke grows faster than its length where it crosses itself often, as noise does.
/// </summary>
internal sealed class ChunkedPath(SKCanvas canvas, SKPaint paint) : IDisposable
{
    private const int Most = 40;

    private readonly SKPath _path = new();
    private SKPoint _last;
    private int _count;

    internal void MoveTo(float x, float y)
    {
        _path.MoveTo(x, y);
        _last = new SKPoint(x, y);
    }

    internal void LineTo(float x, float y)
    {
        _path.LineTo(x, y);
        _last = new SKPoint(x, y);
        if (++_count >= Most && paint.PathEffect is null)
        {
            canvas.DrawPath(_path, paint);
            _path.Reset();
            _path.MoveTo(_last);
            _count = 0;
        }
    }

    /// <summary>Draws what is left.</summary>
    public void Dispose()
    {
        canvas.DrawPath(_path, paint);
        _path.Dispose();
    }
}
