using System;
using System.Globalization;

namespace StarLines.Plotting;

/// <summary>How a figure is drawn.</summary>
public sealed record FigureOptions
{
    /// <summary>Width of the image, pixels; 200 to 20,000.</summary>
    public int WidthPixels { get; init; } = 1600;

    /// <summary>Height of the image, pixels; 150 to 20,000. Null leaves it to the figure: the more panels, the higher.</summary>
    public int? HeightPixels { get; init; }

    /// <summary>
    /// Pixels an inch; 48 to 1200. Text and lines have sizes in points, so that a higher number makes them larger in pixels
    /// and leaves the printed figure alone. An SVG has the printed size that the pixels and this number give.
    /// </summary>
    public int DotsPerInch { get; init; } = 200;

    /// <summary>Size of the text, points; 4 to 40.</summary>
    public double TextSizePoints { get; init; } = 9.0;

    /// <summary>Light or dark.</summary>
    public FigureTheme Theme { get; init; } = FigureTheme.Light;

    /// <summary>The heading at the top left: null for that of the figure, an empty string for none.</summary>
    public string? Title { get; init; }

    internal FigureOptions Checked()
    {
        Check(WidthPixels, 200, 20_000, nameof(WidthPixels), "pixels");
        Check(HeightPixels ?? 900, 150, 20_000, nameof(HeightPixels), "pixels");
        Check(DotsPerInch, 48, 1200, nameof(DotsPerInch), "dots an inch");
        Check(TextSizePoints, 4, 40, nameof(TextSizePoints), "points");
        return this;
    }

    private static void Check(double value, int minimum, int maximum, string name, string unit)
    {
        if (!(value >= minimum && value <= maximum))
        {
            throw new ArgumentOutOfRangeException(name, string.Create(
                CultureInfo.InvariantCulture, $"{name} is {value} {unit}; it must be {minimum} to {maximum}."));
        }
    }
}
