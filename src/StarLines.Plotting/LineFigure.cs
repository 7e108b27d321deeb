using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Lines;
using StarLines.Plotting.Drawing;
using StarLines.Plotting.Text;

namespace StarLines.Plotting;

/// <summary>
/// Fitted lines, a panel each: the pixels with their errors, the model, the continuum, and below them the residuals in
/// standard deviations.
/// </summary>
public static class LineFigure
{
    /// <summary>Panels on a page unless another number is asked for.</summary>
    public const int DefaultPanelsPerPage = 12;

    private const int MostPanelsPerPage = 60;
    private const double LeastResidualRange = 4.2;
    private const double LargestResidualRange = 8.4;

    /// <summary>Up to this range the numbers beside the residuals stand at 3, beyond at 5.</summary>
    private const double LargestFineRange = 5.0;

    /// <summary>Makes one figure of up to 60 panels.</summary>
    /// <param name="panels">The panels, in order; at least one.</param>
    /// <param name="title">The heading.</param>
    /// <param name="wavelengthLabel">Label of the wavelength axis.</param>
    /// <exception cref="ArgumentException">There is no panel, or there are more than 60.</exception>
    public static Figure Create(IReadOnlyList<LinePanel> panels, string title = "", string wavelengthLabel = "Wavelength (Å)")
    {
        ArgumentNullException.ThrowIfNull(panels);
        ArgumentNullException.ThrowIfNull(title);
        ArgumentNullException.ThrowIfNull(wavelengthLabel);
        if (panels.Count is 0 or > MostPanelsPerPage)
        {
            throw new ArgumentException($"A figure shows 1 to {MostPanelsPerPage} lines, not {panels.Count}; make several pages.", nameof(panels));
        }

        int columns = Columns(panels.Count);
        var cells = new List<Cell>();
        for (int i = 0; i < panels.Count; i++)
        {
            bool lowest = i + columns >= panels.Count;
            cells.Add(MakeCell(panels[i], lowest ? wavelengthLabel : "", i % columns == 0));
        }

        int rows = (panels.Count + columns - 1) / columns;
        return new Figure(new FigureContent
        {
            Title = title,
            Columns = columns,
            Cells = cells,
            HeightToWidth = columns == 1 ? 0.7 : 0.07 + (rows * 0.95 / columns),
        });
    }

    /// <summary>Makes as many figures as the panels fill.</summary>
    /// <param name="panels">The panels, in order.</param>
    /// <param name="title">The heading; the number of the page follows where there are several.</param>
    /// <param name="wavelengthLabel">Label of the wavelength axis.</param>
    /// <param name="panelsPerPage">1 to 60.</param>
    /// <returns>The pages; none where there is no panel.</returns>
    public static IReadOnlyList<Figure> Pages(
        IReadOnlyList<LinePanel> panels,
        string title = "",
        string wavelengthLabel = "Wavelength (Å)",
        int panelsPerPage = DefaultPanelsPerPage)
    {
        ArgumentNullException.ThrowIfNull(panels);
        ArgumentOutOfRangeException.ThrowIfLessThan(panelsPerPage, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(panelsPerPage, MostPanelsPerPage);
        int pages = (panels.Count + panelsPerPage - 1) / panelsPerPage;
        var figures = new List<Figure>();
        for (int page = 0; page < pages; page++)
        {
            var own = new List<LinePanel>();
            for (int i = page * panelsPerPage; i < Math.Min(panels.Count, (page + 1) * panelsPerPage); i++)
            {
                own.Add(panels[i]);
            }

            string heading = pages == 1 ? title : $"{title}  ({page + 1} of {pages})".TrimStart();
            figures.Add(Create(own, heading, wavelengthLabel));
        }

        return figures;
    }

    /// <summary>Makes the pages of the lines measured in a spectrum.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum, of the same number of pixels.</param>
    /// <param name="measured">What was measured in it.</param>
    /// <param name="strongest">The largest number of lines, the most significant; null for all that were measured.</param>
    /// <param name="panelsPerPage">1 to 60.</param>
    /// <returns>The pages; none where no line was measured.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static IReadOnlyList<Figure> FromMeasurements(
        Spectrum spectrum,
        ContinuumFit continuum,
        LineMeasurementSet measured,
        int? strongest = null,
        int panelsPerPage = DefaultPanelsPerPage) => Pages(
            LinePanel.FromMeasurements(spectrum, continuum, measured, strongest),
            TitleText.Of(spectrum.Metadata),
            UnitText.WavelengthLabel(spectrum.Scale),
            panelsPerPage);

    private static int Columns(int panels) => panels switch
    {
        1 => 1,
        2 or 4 => 2,
        <= 9 => 3,
        _ => 4,
    };

    private static Cell MakeCell(LinePanel line, string wavelengthLabel, bool first)
    {
        double[] x = line.WavelengthsAngstrom.ToArray();
        double half = x.Length > 1 ? 0.5 * (x[1] - x[0]) : 0.5;
        var range = new DataRange(x[0] - half, x[^1] + half);
        Panel data = DataPanel(line, x, range, first);
        return line.Model.Length == 0
            ? new Cell(data.WithXLabel(wavelengthLabel))
            : new Cell(data, ResidualPanel(line, x, range, first, wavelengthLabel));
    }

    private static Panel DataPanel(LinePanel line, double[] x, DataRange range, bool first)
    {
        var items = new List<PanelItem>();
        if (double.IsFinite(line.CentreAngstrom))
        {
            items.Add(new Rule("", vertical: true, line.CentreAngstrom, Pens.Centre));
        }

        foreach (double neighbour in line.NeighboursAngstrom)
        {
            items.Add(new Rule("", vertical: true, neighbour, Pens.Centre with { Ink = Ink.Faded }));
        }

        items.Add(new Rule(
            "continuum", vertical: false, line.LocalContinuum, Pens.DoubtfulContinuum with { Width = 1f }, line.ContinuumSigma));
        items.Add(new ErrorPoints("data", x, line.Flux.ToArray(), line.Sigma.ToArray(), line.Used.ToArray(), joined: true));
        DataRange y = PlotRange.Robust(line.Flux, line.Sigma, line.Used).Including(line.LocalContinuum);
        if (line.Model.Length != 0)
        {
            items.Add(new Trace("model", x, line.Model.ToArray(), Pens.Model, style: TraceStyle.Smooth));
            y = Including(y, line.Model);
        }

        items.Add(new Note(Corner.TopLeft, [line.Title, .. line.Notes]));
        return new Panel
        {
            X = range,
            Y = y.Padded(0.08, 0.06),
            YLabel = first ? "Normalized flux" : "",
            Items = items,
            Weight = 2.6f,
            YPitch = 1.9f,
        };
    }

    private static Panel ResidualPanel(LinePanel line, double[] x, DataRange range, bool first, string wavelengthLabel)
    {
        var residuals = new double[x.Length];
        double largest = LeastResidualRange;
        for (int i = 0; i < x.Length; i++)
        {
            bool known = line.Sigma.Length != 0 && line.Sigma[i] > 0;
            residuals[i] = known ? (line.Flux[i] - line.Model[i]) / line.Sigma[i] : double.NaN;
            bool counts = double.IsFinite(residuals[i]) && (line.Used.Length == 0 || line.Used[i]);
            largest = Math.Max(largest, counts ? 1.1 * Math.Abs(residuals[i]) : 0.0);
        }

        largest = Math.Min(largest, LargestResidualRange);
        return new Panel
        {
            X = range,
            Y = new DataRange(-largest, largest),
            YStep = largest > LargestFineRange ? 5.0 : 3.0,
            YStepDivisions = largest > LargestFineRange ? 5 : 3,
            XLabel = wavelengthLabel,
            YLabel = first ? "(O − C)/σ" : "",
            Items =
            [
                new Rule("", vertical: false, 0.0, Pens.Guide, sigma: 1.0),
                new ErrorPoints("", x, residuals, [], line.Used.ToArray()),
            ],
        };
    }

    private static DataRange Including(DataRange range, ReadOnlySpan<double> values)
    {
        foreach (double value in values)
        {
            range = double.IsFinite(value) ? range.Including(value) : range;
        }

        return range;
    }
}
