using System.Collections.Generic;

namespace StarLines.Plotting.Drawing;

/// <summary>A frame with two axes and what is drawn in it.</summary>
internal sealed class Panel
{
    internal required DataRange X { get; init; }

    /// <summary>Range of the data; bands that items ask for come on top of it.</summary>
    internal required DataRange Y { get; init; }

    internal string XLabel { get; init; } = "";

    internal string YLabel { get; init; } = "";

    /// <summary>The power of ten taken out of the numbers of the vertical axis.</summary>
    internal int YExponent { get; init; }

    /// <summary>Its share of the height of its cell.</summary>
    internal float Weight { get; init; } = 1f;

    /// <summary>Distance between two numbers of the vertical axis, in text heights.</summary>
    internal float YPitch { get; init; } = 3f;

    /// <summary>The step between the numbers of the vertical axis, or 0 to find one.</summary>
    internal double YStep { get; init; }

    /// <summary>The parts into which ticks cut <see cref="YStep"/>.</summary>
    internal int YStepDivisions { get; init; } = 1;

    internal required IReadOnlyList<PanelItem> Items { get; init; }

    internal Panel WithXLabel(string label) => new()
    {
        X = X,
        Y = Y,
        XLabel = label,
        YLabel = YLabel,
        YExponent = YExponent,
        Weight = Weight,
        YPitch = YPitch,
        YStep = YStep,
        YStepDivisions = YStepDivisions,
        Items = Items,
    };
}

/// <summary>Panels one above the other that share the horizontal axis.</summary>
internal sealed class Cell(params Panel[] panels)
{
    internal IReadOnlyList<Panel> Panels { get; } = panels;
}

/// <summary>What a figure shows: cells in rows and columns under a heading.</summary>
internal sealed class FigureContent
{
    internal string Title { get; init; } = "";

    internal required int Columns { get; init; }

    /// <summary>The cells, row by row.</summary>
    internal required IReadOnlyList<Cell> Cells { get; init; }

    /// <summary>The share of the width of each column, or empty for equal ones.</summary>
    internal IReadOnlyList<float> ColumnWeights { get; init; } = [];

    /// <summary>Height of the figure for its width where none is asked for.</summary>
    internal double HeightToWidth { get; init; } = 0.5625;

    internal int Rows => (Cells.Count + Columns - 1) / Columns;
}
