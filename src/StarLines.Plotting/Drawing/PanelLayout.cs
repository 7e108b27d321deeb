using System;
using System.Collections.Generic;
using SkiaSharp;

namespace StarLines.Plotting.Drawing;

/// <summary>A panel with its place on the canvas, the range its vertical axis shows and its ticks.</summary>
internal sealed record PlacedPanel(Panel Panel, SKRect Frame, DataRange YAxis, float Band, float YLabelX, Ticks XTicks, Ticks YTicks);

/// <summary>Finds the places of the panels of a figure, so that frames in a row and in a column are in line.</summary>
internal sealed class PanelLayout(FigureContent content, SKRect area, float textSize)
{
    private const float Gap = 6f;
    private const float StackGap = 0f;

    /// <summary>A number this close to the frame of the panel below would touch the numbers there, text heights.</summary>
    private const float HalfNumber = 0.6f;

    /// <summary>Room for the numbers before they have been measured, text heights.</summary>
    private const float FirstGuess = 4f;

    private readonly float _numberHeight = 1.6f * textSize;
    private readonly float _labelHeight = 1.7f * textSize;
    private readonly float[] _leftPads = new float[content.Columns];

    internal List<PlacedPanel> Place()
    {
        Array.Fill(_leftPads, FirstGuess * textSize);
        MeasureNumbers(PlaceOnce());
        return PlaceOnce();
    }

    private List<PlacedPanel> PlaceOnce()
    {
        var placed = new List<PlacedPanel>();
        float[] bottoms = new float[content.Rows];
        float labels = 0f;
        for (int row = 0; row < content.Rows; row++)
        {
            bottoms[row] = _numberHeight + (RowHasLabel(row) ? _labelHeight : 0.3f * textSize);
            labels += bottoms[row];
        }

        float frameHeight = (area.Height - labels - (Gap * (content.Rows - 1))) / content.Rows;
        float top = area.Top;
        for (int row = 0; row < content.Rows; row++)
        {
            for (int column = 0; column < content.Columns && (row * content.Columns) + column < content.Cells.Count; column++)
            {
                SKRect cell = Column(column);
                var frame = new SKRect(cell.Left + _leftPads[column], top, cell.Right, top + frameHeight);
                PlaceCell(content.Cells[(row * content.Columns) + column], frame, cell.Left + (0.5f * _labelHeight), placed);
            }

            top += frameHeight + bottoms[row] + Gap;
        }

        return placed;
    }

    private bool RowHasLabel(int row)
    {
        for (int i = row * content.Columns; i < Math.Min(content.Cells.Count, (row + 1) * content.Columns); i++)
        {
            if (content.Cells[i].Panels[^1].XLabel.Length != 0)
            {
                return true;
            }
        }

        return false;
    }

    private SKRect Column(int column)
    {
        float gap = 1.2f * textSize;
        float width = area.Width - (gap * (content.Columns - 1));
        float all = 0f;
        float before = 0f;
        for (int i = 0; i < content.Columns; i++)
        {
            before += i < column ? Weight(i) : 0f;
            all += Weight(i);
        }

        float left = area.Left + (width * before / all) + (gap * column);
        return new SKRect(left, area.Top, left + (width * Weight(column) / all), area.Bottom);
    }

    private float Weight(int column) => content.ColumnWeights.Count == 0 ? 1f : content.ColumnWeights[column];

    private void PlaceCell(Cell cell, SKRect area, float yLabelX, List<PlacedPanel> placed)
    {
        float weights = 0f;
        foreach (Panel panel in cell.Panels)
        {
            weights += panel.Weight;
        }

        float height = area.Height - (StackGap * (cell.Panels.Count - 1));
        float top = area.Top;
        for (int i = 0; i < cell.Panels.Count; i++)
        {
            Panel panel = cell.Panels[i];
            float own = height * panel.Weight / weights;
            placed.Add(PlaceFrame(panel, new SKRect(area.Left, top, area.Right, top + own), yLabelX, i == cell.Panels.Count - 1));
            top += own + StackGap;
        }
    }

    private PlacedPanel PlaceFrame(Panel panel, SKRect frame, float yLabelX, bool numbersBelow)
    {
        float band = 0f;
        foreach (PanelItem item in panel.Items)
        {
            band = Math.Max(band, item.BandHeight(panel.X, frame, textSize));
        }

        band = Math.Min(band, 0.5f * frame.Height);
        var y = new DataRange(
            panel.Y.Minimum, panel.Y.Minimum + (panel.Y.Length * frame.Height / (frame.Height - band)));
        Ticks yTicks = panel.YStep > 0
            ? new Ticks(y, panel.YStep, panel.YStepDivisions)
            : Ticks.Upwards(y, frame.Height, panel.YPitch * textSize, panel.YExponent);
        yTicks = yTicks.Below(y.Maximum - (y.Length * band / frame.Height));
        if (!numbersBelow)
        {
            yTicks = yTicks.WithoutNumbersBelow(y.Minimum + (y.Length * HalfNumber * textSize / frame.Height));
        }

        return new PlacedPanel(panel, frame, y, band, yLabelX, Ticks.Across(panel.X, frame.Width, textSize, numbersBelow), yTicks);
    }

    /// <summary>Sets the room to the left of each column to what its numbers and label need.</summary>
    private void MeasureNumbers(List<PlacedPanel> placed)
    {
        using SKFont font = FigureText.Font(textSize);
        Array.Clear(_leftPads);
        int at = 0;
        for (int i = 0; i < content.Cells.Count; i++)
        {
            int column = i % content.Columns;
            for (int k = 0; k < content.Cells[i].Panels.Count; k++, at++)
            {
                float widest = 0f;
                foreach (ScottPlot.Tick tick in placed[at].YTicks.All)
                {
                    widest = Math.Max(widest, font.MeasureText(tick.Label));
                }

                float label = placed[at].Panel.YLabel.Length == 0 ? 0f : _labelHeight;
                _leftPads[column] = Math.Max(_leftPads[column], widest + label + (0.9f * textSize));
            }
        }
    }
}
