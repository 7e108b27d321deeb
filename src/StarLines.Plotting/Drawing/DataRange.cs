using System;

namespace StarLines.Plotting.Drawing;

/// <summary>A range of an axis; the length is above 0.</summary>
internal readonly record struct DataRange
{
    internal DataRange(double minimum, double maximum)
    {
        if (!double.IsFinite(minimum) || !double.IsFinite(maximum))
        {
            (minimum, maximum) = (0.0, 1.0);
        }

        double least = 1e-9 * Math.Max(Math.Abs(minimum), Math.Abs(maximum));
        if (!(maximum - minimum > least))
        {
            double half = minimum == 0.0 ? 0.5 : 0.05 * Math.Abs(minimum);
            double centre = 0.5 * (minimum + maximum);
            (minimum, maximum) = (centre - half, centre + half);
        }

        Minimum = minimum;
        Maximum = maximum;
    }

    internal double Minimum { get; }

    internal double Maximum { get; }

    internal double Length => Maximum - Minimum;

    internal bool Contains(double value) => value >= Minimum && value <= Maximum;

    /// <summary>The range with a share of its length added at each end.</summary>
    internal DataRange Padded(double below, double above) => new(Minimum - (below * Length), Maximum + (above * Length));

    internal DataRange Including(double value) => new(Math.Min(Minimum, value), Math.Max(Maximum, value));
}
