using System;
using System.Text.RegularExpressions;

namespace StarLines.Plotting.Drawing;

/// <summary>The last touch to an SVG document.</summary>
internal static partial class SvgText
{
    /// <summary>Names fonts to fall back to, with letters about as wide, where the document is seen without ours.</summary>
    internal static string Finish(string svg)
    {
        string family = FigureFonts.Family;
        string text = TrailingComma().Replace(svg, "\"");
        return family.Length == 0
            ? text
            : text.Replace($"font-family=\"{family}\"", $"font-family=\"{family}, Verdana, sans-serif\"", StringComparison.Ordinal);
    }

    /// <summary>The end of a list of positions, which must not be a comma (SVG 1.1, 4.2, list of lengths).</summary>
    [GeneratedRegex("(?<=<text [^>]*), \"")]
    private static partial Regex TrailingComma();
}
