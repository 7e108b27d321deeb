using System;
using System.Collections.Generic;

namespace StarLines.Plotting.Drawing;

/// <summary>The continuum of a panel: a full line, dashed where it is not to be trusted.</summary>
internal static class ContinuumItems
{
    internal static void Add(List<PanelItem> items, double[] wavelengths, double[] level, bool[] trusted)
    {
        items.Add(new Trace("continuum", wavelengths, level, Pens.Continuum, trusted, TraceStyle.Line));
        if (Array.IndexOf(trusted, false) >= 0)
        {
            bool[] doubtful = Array.ConvertAll(trusted, static flag => !flag);
            items.Add(new Trace(
                "not trusted", wavelengths, level, Pens.DoubtfulContinuum, PixelSlice.WithNeighbours(doubtful, trusted), TraceStyle.Line));
        }
    }
}
