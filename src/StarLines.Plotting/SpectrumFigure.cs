using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Plotting.Drawing;
using StarLines.Plotting.Text;

namespace StarLines.Plotting;

/// <summary>
/// A spectrum as it was observed: flux against wavelength, the pixels that are not used, and the continuum with its
/// uncertainty of one standard deviation, dashed where it is not to be trusted.
/// </summary>
public static class SpectrumFigure
{
    /// <summary>Makes the figure.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum, of the same number of pixels, or null for none.</param>
    /// <param name="view">Which part is shown.</param>
    /// <exception cref="ArgumentException">The continuum has another length, or the range lies outside the spectrum.</exception>
    public static Figure Create(Spectrum spectrum, ContinuumFit? continuum = null, SpectrumView? view = null)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        if (continuum is not null)
        {
            Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        }

        List<DataRange> strips = (view ?? new SpectrumView()).Cut(spectrum);
        var cells = new List<Cell>();
        foreach (DataRange strip in strips)
        {
            string xLabel = cells.Count == strips.Count - 1 ? UnitText.WavelengthLabel(spectrum.Scale) : "";
            cells.Add(new Cell(MakePanel(spectrum, continuum, strip, xLabel)));
        }

        return new Figure(new FigureContent
        {
            Title = TitleText.Of(spectrum.Metadata),
            Columns = 1,
            Cells = cells,
            HeightToWidth = StripLayout.HeightToWidth(strips.Count),
        });
    }

    private static Panel MakePanel(Spectrum spectrum, ContinuumFit? continuum, DataRange range, string xLabel)
    {
        var slice = new PixelSlice(spectrum, range);
        var items = new List<PanelItem>
        {
            new MaskedRanges("masked", slice.FaultRanges()),
            new Trace("", slice.Wavelengths, slice.Flux, Pens.Masked, PixelSlice.WithNeighbours(slice.Masked, slice.Good)),
            new Trace("flux", slice.Wavelengths, slice.Flux, Pens.Data, slice.Good),
        };
        DataRange y = PlotRange.Robust(slice.Flux, slice.Sigma, slice.Good);
        if (continuum is not null)
        {
            y = AddContinuum(items, slice, continuum, y);
        }

        y = y.Padded(0.05, 0.07);
        int exponent = PlotRange.Exponent(y);
        return new Panel
        {
            X = range,
            Y = y,
            YExponent = exponent,
            XLabel = xLabel,
            YPitch = StripLayout.YPitch,
            YLabel = UnitText.FluxLabel(spectrum.FluxUnit, exponent),
            Items = MaskedRanges.OmitEmpty(items),
        };
    }

    private static DataRange AddContinuum(List<PanelItem> items, PixelSlice slice, ContinuumFit continuum, DataRange y)
    {
        double[] level = continuum.Level.Slice(slice.Start, slice.Count).ToArray();
        ReadOnlySpan<double> sigma = continuum.Sigma.Slice(slice.Start, slice.Count);
        bool[] trusted = continuum.Trusted.Slice(slice.Start, slice.Count).ToArray();
        var low = new double[level.Length];
        var high = new double[level.Length];
        for (int i = 0; i < level.Length; i++)
        {
            low[i] = level[i] - sigma[i];
            high[i] = level[i] + sigma[i];
        }

        ContinuumItems.Add(items, slice.Wavelengths, level, low, high, trusted);
        DataRange levels = PlotRange.Robust(level, [], trusted);
        return y.Including(Math.Min(levels.Maximum, y.Maximum + (0.5 * y.Length)));
    }
}
