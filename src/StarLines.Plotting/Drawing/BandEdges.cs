using System;

namespace StarLines.Plotting.Drawing;

/// <summary>The edges of a band, which show it where data cover it; left out where the band is too narrow for three lines.</summary>
internal sealed class BandEdges(double[] x, double[] low, double[] high) : PanelItem("")
{
    private const double LeastHeight = 5.0;

    internal override void Draw(PanelCanvas panel)
    {
        int first = Math.Max(0, Trace.LowerBound(x, panel.XRange.Minimum));
        int end = Math.Min(x.Length, Trace.LowerBound(x, panel.XRange.Maximum));
        double sum = 0.0;
        int count = 0;
        for (int i = first; i < end; i++)
        {
            if (double.IsFinite(low[i]) && double.IsFinite(high[i]))
            {
                sum += panel.Y(low[i]) - panel.Y(high[i]);
                count++;
            }
        }

        if (count != 0 && sum / count >= LeastHeight)
        {
            new Trace("", x, low, Pens.BandEdge, style: TraceStyle.Line).Draw(panel);
            new Trace("", x, high, Pens.BandEdge, style: TraceStyle.Line).Draw(panel);
        }
    }
}
