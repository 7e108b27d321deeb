using System;
using System.Collections.Generic;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// The continuum of a panel: a full line, dashed where it is not to be trusted, and its uncertainty, an area behind the data
/// whose edges lie over them.
/// </summary>
internal static class ContinuumItems
{
    internal static void Add(
        List<PanelItem> items, double[] wavelengths, double[] level, double[] low, double[] high, bool[] trusted)
    {
        items.Insert(0, new Band("±1σ", wavelengths, low, high, Ink.Continuum));
        items.Add(new BandEdges(wavelengths, low, high));
        items.Add(new Trace("continuum", wavelengths, level, Pens.Continuum, trusted, TraceStyle.Line));
        if (Array.IndexOf(trusted, false) >= 0)
        {
            bool[] doubtful = Array.ConvertAll(trusted, static flag => !flag);
            items.Add(new Trace(
                "uncertain", wavelengths, level, Pens.DoubtfulContinuum, PixelSlice.WithNeighbours(doubtful, trusted), TraceStyle.Line));
        }
    }
}
