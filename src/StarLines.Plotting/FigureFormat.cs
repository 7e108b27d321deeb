using System;
using System.IO;

namespace StarLines.Plotting;

/// <summary>File formats of figures.</summary>
public enum FigureFormat
{
    /// <summary>Portable Network Graphics.</summary>
    Png,

    /// <summary>Scalable Vector Graphics.</summary>
    Svg,
}

/// <summary>Chooses the format of a figure by the name of its file.</summary>
public static class FigureFormats
{
    /// <summary>The format that a path's extension names, <c>.png</c> or <c>.svg</c>.</summary>
    /// <param name="path">A path.</param>
    /// <exception cref="ArgumentException">The extension is another, or there is none.</exception>
    public static FigureFormat FromPath(string path)
    {
        ArgumentNullException.ThrowIfNull(path);
        string extension = Path.GetExtension(path);
        return
            extension.Equals(".png", StringComparison.OrdinalIgnoreCase) ? FigureFormat.Png
            : extension.Equals(".svg", StringComparison.OrdinalIgnoreCase) ? FigureFormat.Svg
            : throw new ArgumentException(
                $"A figure can be written as .png or .svg, not as “{(extension.Length == 0 ? path : extension)}”; give a path that ends in one of them.",
                nameof(path));
    }
}
