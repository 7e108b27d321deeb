using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Plotting.Text;
using StarLines.Velocities;

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

    /// <summary>The peak of a second star, km/s; none where there is one star.</summary>
    public Measured SecondPeakKmPerS { get; init; } = Measured.None;

    /// <summary>The curve that was fitted to the peak, a value for each velocity; or none.</summary>
    public IReadOnlyList<double> FittedPeak { get; init; } = [];

    /// <summary>Lines of text beside the peak, such as the barycentric velocity.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];

    /// <summary>Velocities, km/s.</summary>
    public ReadOnlySpan<double> VelocitiesKmPerS => _velocities;

    /// <summary>The correlation.</summary>
    public ReadOnlySpan<double> Correlation => _correlation;

    /// <summary>The curve of a measured velocity, or null where nothing was correlated.</summary>
    /// <param name="result">A velocity by one template.</param>
    public static CorrelationCurve? FromResult(VelocityResult result)
    {
        ArgumentNullException.ThrowIfNull(result);
        if (result.VelocitiesKmPerS.Length < 2)
        {
            return null;
        }

        bool found = result.PeakKmPerS.HasValue
            && result.Measurement.Status is VelocityStatus.Measured or VelocityStatus.Topocentric;
        return new CorrelationCurve(result.TemplateName, result.VelocitiesKmPerS, result.Correlation)
        {
            PeakKmPerS = found ? result.PeakKmPerS : Measured.None,
            PeakFwhmKmPerS = result.Measurement.PeakFwhmKmPerS,
            SecondPeakKmPerS = found && result.Second is { } second ? second.PeakKmPerS : Measured.None,
            FittedPeak = found ? FitOf(result) : [],
            Notes = found ? NotesOf(result) : [],
        };
    }

    private static double[] FitOf(VelocityResult result)
    {
        var fit = new double[result.VelocitiesKmPerS.Length];
        for (int i = 0; i < fit.Length; i++)
        {
            fit[i] = result.FittedPeak(result.VelocitiesKmPerS[i]);
        }

        return fit;
    }

    private static List<string> NotesOf(VelocityResult result)
    {
        var notes = new List<string>();
        VelocityMeasurement measurement = result.Measurement;
        if (measurement.Status == VelocityStatus.Measured)
        {
            notes.Add($"barycentric {LineText.WithUncertainty(measurement.VelocityKmPerS)} km s⁻¹");
        }

        if (double.IsFinite(result.Significance))
        {
            notes.Add(string.Create(CultureInfo.InvariantCulture, $"{result.Significance:F0}σ above noise"));
        }

        return notes;
    }
}
