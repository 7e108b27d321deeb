using System.Collections.Generic;
using System.Linq;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>Something drawn in a panel. It holds its data, so that what a figure shows can be asked without drawing it.</summary>
internal abstract class PanelItem(string name)
{
    /// <summary>Its words in the legend, or an empty string for none.</summary>
    internal string Name { get; } = name;

    /// <summary>The sample in the legend.</summary>
    internal virtual LegendSample? Sample => null;

    /// <summary>Whether the item draws in the band above the data too; what shows data does not.</summary>
    internal virtual bool UsesBand => false;

    /// <summary>Height above the data that the item wants for itself, units of the figure.</summary>
    /// <param name="x">The range of the axis.</param>
    /// <param name="frame">The frame of the panel.</param>
    /// <param name="textSize">Size of the text.</param>
    internal virtual float BandHeight(DataRange x, SKRect frame, float textSize) => 0f;

    internal abstract void Draw(PanelCanvas panel);
}

/// <summary>What stands beside the words of a legend.</summary>
internal sealed record LegendSample(Pen? Line = null, Ink? Fill = null, bool Point = false)
{
    /// <summary>Measured things come first, then lines, areas, and last what is not used.</summary>
    internal int Rank =>
        Point || Line is { Ink: Ink.Data } ? 0
        : Fill == Ink.Shade ? 4
        : Fill is not null ? 2
        : Line is { Dash: Dash.Solid } ? 1 : 3;
}

/// <summary>One entry of a legend.</summary>
internal sealed record LegendEntry(string Name, LegendSample Sample)
{
    /// <summary>The entries of some items, each once, in order.</summary>
    internal static List<LegendEntry> Of(IEnumerable<PanelItem> items)
    {
        var entries = new List<LegendEntry>();
        foreach (PanelItem item in items)
        {
            if (item.Name.Length != 0 && item.Sample is { } sample && !entries.Exists(entry => entry.Name == item.Name))
            {
                entries.Add(new LegendEntry(item.Name, sample));
            }
        }

        return [.. entries.OrderBy(entry => entry.Sample.Rank)];
    }
}
