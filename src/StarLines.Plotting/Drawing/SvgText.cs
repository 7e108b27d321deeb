using System;

namespace StarLines.Plotting.Drawing;

/// <summary>The last touch to an SVG document.</summary>
internal static class SvgText
{
    /// <summary>Names fonts to fall back to, with letters about as wide, where the document is seen without ours.</summary>
    internal static string Finish(string svg)
    {
        string family = FigureFonts.Family;
        return family.Length == 0
            ? svg
            : svg.Replace($"font-family=\"{family}\"", $"font-family=\"{family}, Verdana, sans-serif\"", StringComparison.Ordinal);
    }
}
