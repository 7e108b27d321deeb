using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Continuum;
using StarLines.Lines;
using StarLines.Plotting.Text;

namespace StarLines.Plotting;

public sealed partial class LinePanel
{
    /// <summary>Pixels shown beyond each end of the window of the fit, as a share of the window.</summary>
    private const double Surroundings = 0.25;

    /// <summary>Panels for the lines that were measured in a spectrum, in the order of the list.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum, of the same number of pixels.</param>
    /// <param name="measured">What was measured in it.</param>
    /// <param name="strongest">
    /// The largest number of panels; the lines with the largest equivalent width over its uncertainty are kept. Null for all.
    /// </param>
    /// <param name="withLimits">Whether lines that were not detected are shown too.</param>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static IReadOnlyList<LinePanel> FromMeasurements(
        Spectrum spectrum, ContinuumFit continuum, LineMeasurementSet measured, int? strongest = null, bool withLimits = false)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(measured);
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        Guard.SameLength(measured.Model.Length, spectrum.Count, nameof(measured));
        var panels = new List<LinePanel>();
        foreach (int index in Chosen(measured, strongest ?? int.MaxValue, withLimits))
        {
            panels.Add(FromLine(spectrum, continuum, measured, index));
        }

        return panels;
    }

    private static List<int> Chosen(LineMeasurementSet measured, int most, bool withLimits)
    {
        var chosen = new List<int>();
        for (int i = 0; i < measured.Lines.Count; i++)
        {
            LineStatus status = measured.Lines[i].Status;
            bool wanted = status == LineStatus.Measured || (withLimits && status == LineStatus.Limit);
            if (wanted && measured.Windows[i].PixelCount > 0)
            {
                chosen.Add(i);
            }
        }

        if (chosen.Count > most)
        {
            chosen.Sort((a, b) =>
            {
                int bySignificance = Significance(measured.Lines[b]).CompareTo(Significance(measured.Lines[a]));
                return bySignificance != 0 ? bySignificance : a.CompareTo(b);
            });
            chosen.RemoveRange(most, chosen.Count - most);
            chosen.Sort();
        }

        return chosen;
    }

    private static double Significance(LineMeasurement line)
    {
        Measured width = line.EquivalentWidthMilliangstrom;
        double significance = Math.Abs(width.Value) / width.Uncertainty;
        return double.IsFinite(significance) ? significance : 0.0;
    }

    private static LinePanel FromLine(Spectrum spectrum, ContinuumFit continuum, LineMeasurementSet measured, int index)
    {
        LineWindow window = measured.Windows[index];
        LineMeasurement line = measured.Lines[index];
        int around = Math.Max(2, (int)(Surroundings * window.PixelCount));
        int start = Math.Max(0, window.FirstPixel - around);
        int count = Math.Min(spectrum.Count, window.LastPixel + 1 + around) - start;
        var flux = new double[count];
        var sigma = new double[spectrum.HasSigma ? count : 0];
        var model = new double[count];
        var used = new bool[count];
        for (int i = 0; i < count; i++)
        {
            int pixel = start + i;
            double level = continuum.Level[pixel];
            bool inside = pixel >= window.FirstPixel && pixel <= window.LastPixel;
            bool usable = level > 0 && (spectrum.Faults[pixel] & PixelFaults.Missing) == 0;
            flux[i] = usable ? spectrum.Flux[pixel] / level : double.NaN;
            model[i] = inside ? measured.Model[pixel] * window.LocalContinuum : double.NaN;
            used[i] = inside && usable && spectrum.IsGood(pixel);
            if (sigma.Length != 0)
            {
                sigma[i] = usable ? spectrum.Sigma[pixel] / level : 0.0;
            }
        }

        int middle = (window.FirstPixel + window.LastPixel) / 2;
        return new LinePanel(
            LineText.Name(line.Line), spectrum.Scale.WavelengthsAngstrom.Slice(start, count), flux, sigma, model, used)
        {
            CentreAngstrom = line.CentreAngstrom.Value,
            LocalContinuum = window.LocalContinuum,
            ContinuumSigma = continuum.Level[middle] > 0 ? continuum.Sigma[middle] / continuum.Level[middle] : 0.0,
            NeighboursAngstrom = Neighbours(measured, index, spectrum.Scale, start, count),
            Notes = NotesOf(line),
        };
    }

    private static List<double> Neighbours(LineMeasurementSet measured, int index, WavelengthScale scale, int start, int count)
    {
        var centres = new List<double>();
        int blend = measured.Lines[index].Blend;
        var shown = new WavelengthRange(scale.WavelengthsAngstrom[start], scale.WavelengthsAngstrom[start + count - 1]);
        for (int i = 0; i < measured.Lines.Count && blend != 0; i++)
        {
            LineMeasurement other = measured.Lines[i];
            if (i != index && other.Blend == blend && shown.Contains(other.CentreAngstrom.Value))
            {
                centres.Add(other.CentreAngstrom.Value);
            }
        }

        return centres;
    }

    private static List<string> NotesOf(LineMeasurement line)
    {
        var notes = new List<string>
        {
            line.Status == LineStatus.Limit
                ? LineText.Signed(string.Create(CultureInfo.InvariantCulture, $"|EW| < {line.LimitMilliangstrom:G3} mÅ (3σ)"))
                : $"EW = {LineText.WithUncertainty(line.EquivalentWidthMilliangstrom)} mÅ",
        };
        if (double.IsFinite(line.ReducedChiSquare))
        {
            notes.Add(string.Create(CultureInfo.InvariantCulture, $"χ²/ν = {line.ReducedChiSquare:F2}"));
        }

        return notes;
    }
}
