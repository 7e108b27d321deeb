using System;
using System.Collections.Generic;

namespace StarLines.Plotting;

/// <summary>A correlation function and the peak that was found in it: one row of <see cref="CorrelationFigure"/>.</summary>
public sealed class CorrelationCurve
{
    private readonly double[] _velocities;
    private readonly double[] _correlation;

    /// <summary>Makes a curve; the arrays are copied.</summary>
    /// <param name="template">Name of the template.</param>
    /// <param name="velocitiesKmPerS">N velocities, km/s, increasing; at least 2.</param>
    /// <param name="correlation">N values of the correlation.</param>
    /// <exception cref="ArgumentException">There are fewer than two points, or the lengths differ.</exception>
    public CorrelationCurve(string template, ReadOnlySpan<double> velocitiesKmPerS, ReadOnlySpan<double> correlation)
    {
        ArgumentNullException.ThrowIfNull(template);
        if (velocitiesKmPerS.Length < 2)
        {
            throw new ArgumentException("A correlation function needs at least two points.", nameof(velocitiesKmPerS));
        }

        Guard.SameLength(correlation.Length, velocitiesKmPerS.Length, nameof(correlation));
        Template = template;
        _velocities = velocitiesKmPerS.ToArray();
        _correlation = correlation.ToArray();
    }

    /// <summary>Name of the template.</summary>
    public string Template { get; }

    /// <summary>The peak on the axis of the curve, km/s; none where none was found.</summary>
    public Measured PeakKmPerS { get; init; } = Measured.None;

    /// <summary>Full width at half maximum of the peak, km/s; NaN where unknown.</summary>
    public double PeakFwhmKmPerS { get; init; } = double.NaN;

    /// <summary>Lines of text beside the peak, such as the barycentric velocity.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];

    /// <summary>Velocities, km/s.</summary>
    public ReadOnlySpan<double> VelocitiesKmPerS => _velocities;

    /// <summary>The correlation.</summary>
    public ReadOnlySpan<double> Correlation => _correlation;
}
