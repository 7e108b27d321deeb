using System;
using System.Globalization;

namespace StarLines.Plotting.Text;

/// <summary>Names of lines and numbers with their uncertainty, as a paper writes them.</summary>
internal static class LineText
{
    private static readonly (string Word, string Letter)[] Greek =
    [
        ("alpha", "α"), ("beta", "β"), ("gamma", "γ"), ("delta", "δ"), ("epsilon", "ε"), ("zeta", "ζ"), ("eta", "η"), ("theta", "θ"),
    ];

    /// <summary>The name with its Greek letter: <c>H-alpha</c> becomes <c>Hα</c>, <c>Pa-delta</c> becomes <c>Paδ</c>.</summary>
    internal static string Name(string name)
    {
        foreach ((string word, string letter) in Greek)
        {
            if (name.EndsWith("-" + word, StringComparison.OrdinalIgnoreCase))
            {
                return name[..^(word.Length + 1)] + letter;
            }
        }

        return name;
    }

    /// <summary>A value with its uncertainty, both to two figures of the uncertainty: <c>−12.34 ± 0.56</c>.</summary>
    internal static string WithUncertainty(Measured measured)
    {
        if (!measured.HasValue)
        {
            return "—";
        }

        if (!(measured.Uncertainty > 0) || !double.IsFinite(measured.Uncertainty))
        {
            return Signed(measured.Value.ToString("G5", CultureInfo.InvariantCulture));
        }

        int decimals = Math.Clamp(1 - (int)Math.Floor(Math.Log10(measured.Uncertainty)), 0, 9);
        string format = "F" + decimals.ToString(CultureInfo.InvariantCulture);
        return Signed(measured.Value.ToString(format, CultureInfo.InvariantCulture))
            + " ± " + measured.Uncertainty.ToString(format, CultureInfo.InvariantCulture);
    }

    /// <summary>The text with a true minus sign.</summary>
    internal static string Signed(string number) => number.Replace('-', '−');
}
