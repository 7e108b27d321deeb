using System;
using System.Collections.Generic;
using StarLines.Plotting.Drawing;
using StarLines.Plotting.Text;
using StarLines.Velocities;

namespace StarLines.Plotting;

/// <summary>
/// Correlation functions, a row each: on the left the whole range searched, on the right the surroundings of the peak with
/// the velocity and its uncertainty.
/// </summary>
public static class CorrelationFigure
{
    private const int MostCurves = 12;

    /// <summary>With more points around the peak only the line is drawn.</summary>
    private const int MostPoints = 80;

    /// <summary>Half of the range around the peak, in widths of the peak.</summary>
    private const double ZoomWidths = 2.5;

    /// <summary>Half of the range around the peak, at least, in points of the curve.</summary>
    private const int LeastZoomPoints = 8;

    /// <summary>Makes the figure of the velocities measured in a spectrum; null where nothing was correlated.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="results">Its velocities, one a template; the first 12 are shown.</param>
    public static Figure? FromResults(Spectrum spectrum, IReadOnlyList<VelocityResult> results)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(results);
        var curves = new List<CorrelationCurve>();
        foreach (VelocityResult result in results)
        {
            if (curves.Count < MostCurves && CorrelationCurve.FromResult(result) is { } curve)
            {
                curves.Add(curve);
            }
        }

        return curves.Count == 0
            ? null
            : Create(curves, TitleText.Of(spectrum.Metadata), UnitText.VelocityLabel(spectrum.Scale.Frame));
    }

    /// <summary>Makes the figure.</summary>
    /// <param name="curves">The curves, from the top; 1 to 12.</param>
    /// <param name="title">The heading.</param>
    /// <param name="velocityLabel">Label of the velocity axis.</param>
    /// <exception cref="ArgumentException">There is no curve, or there are more than 12.</exception>
    public static Figure Create(
        IReadOnlyList<CorrelationCurve> curves, string title = "", string velocityLabel = "Velocity (km s⁻¹)")
    {
        ArgumentNullException.ThrowIfNull(curves);
        ArgumentNullException.ThrowIfNull(title);
        ArgumentNullException.ThrowIfNull(velocityLabel);
        if (curves.Count is 0 or > MostCurves)
        {
            throw new ArgumentException($"A figure shows 1 to {MostCurves} correlation functions, not {curves.Count}.", nameof(curves));
        }

        var cells = new List<Cell>();
        for (int i = 0; i < curves.Count; i++)
        {
            string label = i == curves.Count - 1 ? velocityLabel : "";
            DataRange zoom = Zoom(curves[i]);
            cells.Add(new Cell(WholePanel(curves[i], zoom, label)));
            cells.Add(new Cell(PeakPanel(curves[i], zoom, label)));
        }

        return new Figure(new FigureContent
        {
            Title = title,
            Columns = 2,
            ColumnWeights = [1.55f, 1f],
            Cells = cells,
            HeightToWidth = curves.Count == 1 ? 0.45 : 0.08 + (0.26 * curves.Count),
        });
    }

    private static Panel WholePanel(CorrelationCurve curve, DataRange zoom, string label)
    {
        double[] x = curve.VelocitiesKmPerS.ToArray();
        double[] y = curve.Correlation.ToArray();
        var items = new List<PanelItem>();
        if (curve.PeakKmPerS.HasValue)
        {
            items.Add(new MaskedRanges("", [zoom]));
        }

        items.Add(new Rule("", vertical: false, 0.0, Pens.Guide));
        items.Add(new Trace("", x, y, Pens.Data with { Width = 0.9f }, style: TraceStyle.Line));
        items.Add(new Note(Corner.TopLeft, [curve.Template]));
        return new Panel
        {
            X = new DataRange(x[0], x[^1]),
            Y = Extent(y).Including(0.0).Padded(0.06, 0.06),
            XLabel = label,
            YLabel = "Correlation",
            YPitch = 2.4f,
            Items = items,
        };
    }

    private static Panel PeakPanel(CorrelationCurve curve, DataRange zoom, string label)
    {
        double[] x = curve.VelocitiesKmPerS.ToArray();
        double[] y = curve.Correlation.ToArray();
        int first = Math.Max(0, Trace.LowerBound(x, zoom.Minimum));
        int end = Math.Max(first + 1, Math.Min(x.Length, Trace.LowerBound(x, zoom.Maximum)));
        var items = new List<PanelItem>();
        var notes = new List<string>();
        if (curve.PeakKmPerS.HasValue)
        {
            if (curve.FittedPeak.Count == x.Length)
            {
                items.Add(new Trace("fit", x, [.. curve.FittedPeak], Pens.Model with { Dash = Dash.Dashed }, style: TraceStyle.Smooth));
            }

            items.Add(new Rule("peak ±1σ", vertical: true, curve.PeakKmPerS.Value, Pens.Peak, curve.PeakKmPerS.Uncertainty));
            notes.Add($"peak {LineText.WithUncertainty(curve.PeakKmPerS)} km s⁻¹");
        }
        else
        {
            notes.Add("no peak");
        }

        if (curve.SecondPeakKmPerS.HasValue)
        {
            items.Add(new Rule("second star", vertical: true, curve.SecondPeakKmPerS.Value, Pens.SecondPeak, curve.SecondPeakKmPerS.Uncertainty));
        }

        notes.AddRange(curve.Notes);
        items.Add(new Trace("", x, y, Pens.Data with { Width = 1f }, style: TraceStyle.Line));
        if (end - first <= MostPoints)
        {
            items.Add(new ErrorPoints("", x, y, [], []));
        }

        items.Add(new Note(Corner.TopLeft, notes));
        return new Panel
        {
            X = zoom,
            Y = Extent(y.AsSpan(first, end - first)).Padded(0.06, 0.08),
            XLabel = label,
            YPitch = 2.4f,
            Items = items,
        };
    }

    private static DataRange Zoom(CorrelationCurve curve)
    {
        ReadOnlySpan<double> x = curve.VelocitiesKmPerS;
        if (!curve.PeakKmPerS.HasValue)
        {
            return new DataRange(x[0], x[^1]);
        }

        double step = (x[^1] - x[0]) / (x.Length - 1);
        double half = Math.Max(LeastZoomPoints * step, double.IsFinite(curve.PeakFwhmKmPerS) ? ZoomWidths * curve.PeakFwhmKmPerS : 0.0);
        half = Math.Min(half, 0.5 * (x[^1] - x[0]));
        double centre = Math.Clamp(curve.PeakKmPerS.Value, x[0] + half, x[^1] - half);
        var zoom = new DataRange(centre - half, centre + half);
        if (curve.SecondPeakKmPerS.HasValue)
        {
            zoom = zoom.Including(curve.SecondPeakKmPerS.Value - (0.5 * half)).Including(curve.SecondPeakKmPerS.Value + (0.5 * half));
        }

        return new DataRange(Math.Max(x[0], zoom.Minimum), Math.Min(x[^1], zoom.Maximum));
    }

    private static DataRange Extent(ReadOnlySpan<double> values)
    {
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        foreach (double value in values)
        {
            low = double.IsFinite(value) ? Math.Min(low, value) : low;
            high = double.IsFinite(value) ? Math.Max(high, value) : high;
        }

        return new DataRange(low, high);
    }
}
