using System;
using System.Collections.Generic;

namespace StarLines.Lines;

/// <summary>The words of the <c>status</c> and <c>warnings</c> columns.</summary>
public static class LineWords
{
    private static readonly (LineWarnings Flag, string Word)[] Warnings =
    [
        (LineWarnings.Edge, "edge"),
        (LineWarnings.MaskedPixels, "masked-pixels"),
        (LineWarnings.Blended, "blended"),
        (LineWarnings.Unresolved, "unresolved"),
        (LineWarnings.PoorFit, "poor-fit"),
        (LineWarnings.Continuum, "continuum"),
        (LineWarnings.Shifted, "shifted"),
        (LineWarnings.Undersampled, "undersampled"),
        (LineWarnings.Saturated, "saturated"),
        (LineWarnings.MethodsDisagree, "methods-disagree"),
        (LineWarnings.AtBound, "at-bound"),
        (LineWarnings.NoConvergence, "no-convergence"),
        (LineWarnings.Degenerate, "degenerate"),
        (LineWarnings.NoiseFromFlux, "noise-from-flux"),
        (LineWarnings.MediumAssumed, "medium-assumed"),
    ];

    /// <summary>The word of a status, such as <c>off-spectrum</c>.</summary>
    /// <param name="status">The status.</param>
    public static string Of(LineStatus status) => status switch
    {
        LineStatus.Measured => "measured",
        LineStatus.Limit => "limit",
        LineStatus.OffSpectrum => "off-spectrum",
        LineStatus.Masked => "masked",
        LineStatus.Failed => "failed",
        _ => throw new ArgumentOutOfRangeException(nameof(status), status, "This status is not known."),
    };

    /// <summary>The words of warnings, joined by semicolons; an empty string for none.</summary>
    /// <param name="warnings">The warnings.</param>
    public static string Of(LineWarnings warnings)
    {
        var words = new List<string>();
        foreach ((LineWarnings flag, string word) in Warnings)
        {
            if ((warnings & flag) != 0)
            {
                words.Add(word);
            }
        }

        return string.Join(';', words);
    }
}
