using System;
using System.Diagnostics;

namespace StarLines.Velocities.Barycentre;

/// <summary>A function of time with one or more components, as Chebyshev series over segments of equal length.</summary>
internal sealed class ChebyshevSeries
{
    private readonly double _startJd;
    private readonly double _stepDays;
    private readonly int _segments;
    private readonly int _order;
    private readonly double[] _coefficients;

    /// <summary>Makes a series.</summary>
    /// <param name="startJd">Start of the first segment, Julian Date.</param>
    /// <param name="stepDays">Length of a segment, days.</param>
    /// <param name="segments">Number of segments.</param>
    /// <param name="components">Number of components.</param>
    /// <param name="order">Coefficients a component and segment; at least 2.</param>
    /// <param name="coefficients">Segment by segment, component by component, from T₀ up; kept, not copied.</param>
    internal ChebyshevSeries(double startJd, double stepDays, int segments, int components, int order, double[] coefficients)
    {
        Debug.Assert(coefficients.Length == segments * components * order, "The coefficients fill the segments.");
        _startJd = startJd;
        _stepDays = stepDays;
        _segments = segments;
        Components = components;
        _order = order;
        _coefficients = coefficients;
    }

    internal int Components { get; }

    internal double StartJd => _startJd;

    internal double EndJd => _startJd + (_segments * _stepDays);

    /// <summary>The value at a date.</summary>
    /// <param name="date">The date; within the series, else the end segment is extended.</param>
    /// <param name="value">Receives the components.</param>
    internal void Evaluate(JulianDate date, Span<double> value)
    {
        (int offset, double u) = Locate(date);
        for (int c = 0; c < Components; c++)
        {
            value[c] = Sum(_coefficients.AsSpan(offset + (c * _order), _order), u);
        }
    }

    /// <summary>The value and its rate a day at a date.</summary>
    /// <param name="date">The date; within the series, else the end segment is extended.</param>
    /// <param name="value">Receives the components.</param>
    /// <param name="ratePerDay">Receives their rates a day.</param>
    internal void Evaluate(JulianDate date, Span<double> value, Span<double> ratePerDay)
    {
        (int offset, double u) = Locate(date);
        for (int c = 0; c < Components; c++)
        {
            ReadOnlySpan<double> series = _coefficients.AsSpan(offset + (c * _order), _order);
            (value[c], double slope) = SumWithSlope(series, u);
            ratePerDay[c] = slope * 2.0 / _stepDays;
        }
    }

    private (int Offset, double Argument) Locate(JulianDate date)
    {
        double days = (date.Day - _startJd) + date.Fraction;
        int segment = Math.Clamp((int)Math.Floor(days / _stepDays), 0, _segments - 1);

        // The whole days cancel exactly before the fraction is added.
        double within = (date.Day - (_startJd + (segment * _stepDays))) + date.Fraction;
        return (segment * Components * _order, (2.0 * within / _stepDays) - 1.0);
    }

    // Clenshaw's recurrence for Σ c_k T_k(u).
    private static double Sum(ReadOnlySpan<double> c, double u)
    {
        double b1 = 0.0;
        double b2 = 0.0;
        for (int k = c.Length - 1; k > 0; k--)
        {
            (b1, b2) = ((2.0 * u * b1) - b2 + c[k], b1);
        }

        return (u * b1) - b2 + c[0];
    }

    // The same with its derivative by u.
    private static (double Value, double Slope) SumWithSlope(ReadOnlySpan<double> c, double u)
    {
        double b1 = 0.0;
        double b2 = 0.0;
        double d1 = 0.0;
        double d2 = 0.0;
        for (int k = c.Length - 1; k > 0; k--)
        {
            (d1, d2) = ((2.0 * u * d1) - d2 + (2.0 * b1), d1);
            (b1, b2) = ((2.0 * u * b1) - b2 + c[k], b1);
        }

        return ((u * b1) - b2 + c[0], b1 + (u * d1) - d2);
    }
}
