using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text.RegularExpressions;

namespace StarLines.Plotting.Drawing;

/// <summary>The last touch to an SVG document.</summary>
internal static partial class SvgText
{
    /// <summary>
    /// Names fonts to fall back to, with letters about as wide, where the document is seen without ours, and numbers the clips
    /// anew: the drawing library counts them through all documents of a process.
    /// </summary>
    internal static string Finish(string svg)
    {
        string family = FigureFonts.Family;
        string text = NumberClips(TrailingComma().Replace(svg, "\""));
        return family.Length == 0
            ? text
            : text.Replace($"font-family=\"{family}\"", $"font-family=\"{family}, Verdana, sans-serif\"", StringComparison.Ordinal);
    }

    private static string NumberClips(string svg)
    {
        var numbers = new Dictionary<string, int>(StringComparer.Ordinal);
        return Clip().Replace(svg, match =>
        {
            if (!numbers.TryGetValue(match.Groups[2].Value, out int number))
            {
                number = numbers.Count;
                numbers.Add(match.Groups[2].Value, number);
            }

            return match.Groups[1].Value + "clip" + number.ToString(CultureInfo.InvariantCulture);
        });
    }

    /// <summary>The name of a clip where it is made or used.</summary>
    [GeneratedRegex("(id=\"|url\\(#)(cl_[0-9a-f]+)")]
    private static partial Regex Clip();

    /// <summary>The end of a list of positions, which must not be a comma (SVG 1.1, 4.2, list of lengths).</summary>
    [GeneratedRegex("(?<=<text [^>]*), \"")]
    private static partial Regex TrailingComma();
}
