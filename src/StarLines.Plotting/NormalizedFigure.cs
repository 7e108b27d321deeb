using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Plotting.Drawing;
using StarLines.Plotting.Text;

namespace StarLines.Plotting;

/// <summary>
/// A spectrum divided by its continuum, with the lines that were identified named in a band above the data: the strongest
/// where there is no room for all, never two on one place.
/// </summary>
public static class NormalizedFigure
{
    /// <summary>Makes the figure.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum, of the same number of pixels.</param>
    /// <param name="lines">The lines to be named, in the medium and frame of the spectrum, in any order; or null for none.</param>
    /// <param name="view">Which part is shown.</param>
    /// <exception cref="ArgumentException">The continuum has another length, or the range lies outside the spectrum.</exception>
    public static Figure Create(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<LineMark>? lines = null, SpectrumView? view = null)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        List<DataRange> strips = (view ?? new SpectrumView()).Cut(spectrum);
        var cells = new List<Cell>();
        foreach (DataRange strip in strips)
        {
            string xLabel = cells.Count == strips.Count - 1 ? UnitText.WavelengthLabel(spectrum.Scale) : "";
            cells.Add(new Cell(MakePanel(spectrum, continuum, lines ?? [], strip, xLabel)));
        }

        return new Figure(new FigureContent
        {
            Title = TitleText.Of(spectrum.Metadata),
            Columns = 1,
            Cells = cells,
            HeightToWidth = StripLayout.HeightToWidth(strips.Count),
        });
    }

    private static Panel MakePanel(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<LineMark> lines, DataRange range, string xLabel)
    {
        var slice = new PixelSlice(spectrum, range);
        ReadOnlySpan<double> level = continuum.Level.Slice(slice.Start, slice.Count);
        ReadOnlySpan<double> levelSigma = continuum.Sigma.Slice(slice.Start, slice.Count);
        double[] flux = Divided(slice.Flux, level);
        double[] sigma = Divided(slice.Sigma, level);
        double[] doubt = Divided(levelSigma, level);
        var items = new List<PanelItem>
        {
            new MaskedRanges("masked", slice.FaultRanges()),
            new Trace("", slice.Wavelengths, flux, Pens.Masked, PixelSlice.WithNeighbours(slice.Masked, slice.Good)),
            new Trace("normalized flux", slice.Wavelengths, flux, Pens.Data, slice.Good),
        };
        var ones = new double[slice.Count];
        Array.Fill(ones, 1.0);
        ContinuumItems.Add(
            items,
            slice.Wavelengths,
            ones,
            Array.ConvertAll(doubt, static s => 1 - s),
            Array.ConvertAll(doubt, static s => 1 + s),
            continuum.Trusted.Slice(slice.Start, slice.Count).ToArray());
        var marks = new List<LineMark>();
        foreach (LineMark line in lines)
        {
            if (range.Contains(line.WavelengthAngstrom))
            {
                marks.Add(line);
            }
        }

        items.Add(new LineLabels(marks));
        return new Panel
        {
            X = range,
            Y = PlotRange.Robust(flux, sigma, slice.Good).Including(1.0).Padded(0.05, 0.05),
            XLabel = xLabel,
            YPitch = StripLayout.YPitch,
            YLabel = "Normalized flux",
            Items = MaskedRanges.OmitEmpty(items),
        };
    }

    /// <summary>The values over the level; NaN where the level is not above 0.</summary>
    private static double[] Divided(ReadOnlySpan<double> values, ReadOnlySpan<double> level)
    {
        var divided = new double[values.Length];
        for (int i = 0; i < values.Length; i++)
        {
            divided[i] = level[i] > 0 ? values[i] / level[i] : double.NaN;
        }

        return divided;
    }
}
