using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace StarLines.Plotting.Text;

/// <summary>Units as a paper writes them.</summary>
internal static partial class UnitText
{
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    /// <summary>Units that files write in other ways.</summary>
    private static readonly Dictionary<string, string> Known = new(StringComparer.OrdinalIgnoreCase)
    {
        ["a"] = "Å",
        ["ang"] = "Å",
        ["angstrom"] = "Å",
        ["angstroms"] = "Å",
        ["å"] = "Å",
        ["erg"] = "erg",
        ["ergs"] = "erg",
        ["s"] = "s",
        ["sec"] = "s",
        ["second"] = "s",
        ["cm"] = "cm",
        ["m"] = "m",
        ["nm"] = "nm",
        ["um"] = "µm",
        ["micron"] = "µm",
        ["w"] = "W",
        ["j"] = "J",
        ["jy"] = "Jy",
        ["hz"] = "Hz",
        ["adu"] = "ADU",
        ["ct"] = "counts",
        ["count"] = "counts",
        ["counts"] = "counts",
        ["electron"] = "electrons",
        ["electrons"] = "electrons",
        ["photon"] = "photons",
        ["ph"] = "photons",
    };

    /// <summary>
    /// A compound unit with powers as superscripts, its factor apart: <c>10**(-17)erg/cm2/s/Angstrom</c> becomes
    /// <c>erg cm⁻² s⁻¹ Å⁻¹</c> and −17. A unit that is not understood is left as it is.
    /// </summary>
    internal static (string Unit, int Exponent) Pretty(string unit)
    {
        string rest = unit.Trim();
        int exponent = 0;
        Match factor = FactorPattern().Match(rest);
        if (factor.Success)
        {
            string digits = factor.Groups["power"].Value;
            exponent = int.Parse(digits, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
            rest = rest[factor.Length..];
        }

        var text = new StringBuilder();
        bool divide = false;
        int at = 0;
        while (at < rest.Length)
        {
            Match token = TokenPattern().Match(rest, at);
            if (!token.Success || token.Index != at || !Known.TryGetValue(token.Groups["name"].Value, out string? symbol))
            {
                return (unit.Trim(), 0);
            }

            divide = token.Groups["divide"].Success;
            string power = token.Groups["power"].Value;
            int value = power.Length == 0 ? 1 : int.Parse(power, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
            text.Append(text.Length == 0 ? "" : " ").Append(symbol);
            value = divide ? -value : value;
            text.Append(value == 1 ? "" : Superscript(value));
            at = token.Index + token.Length;
        }

        return (text.ToString(), exponent);
    }

    /// <summary>A whole number in superscript digits.</summary>
    internal static string Superscript(int value)
    {
        var text = new StringBuilder(value < 0 ? "⁻" : "");
        foreach (char digit in Math.Abs((long)value).ToString(CultureInfo.InvariantCulture))
        {
            text.Append(Superscripts[digit - '0']);
        }

        return text.ToString();
    }

    /// <summary>The label of the flux axis.</summary>
    /// <param name="fluxUnit">As the spectrum has it.</param>
    /// <param name="axisExponent">The power of ten taken out of the numbers on the axis.</param>
    internal static string FluxLabel(string fluxUnit, int axisExponent)
    {
        (string unit, int exponent) = Pretty(fluxUnit);
        exponent += axisExponent;
        string power = exponent == 0 ? "" : "10" + Superscript(exponent);
        if (unit.Contains("flux", StringComparison.OrdinalIgnoreCase))
        {
            string words = char.ToUpperInvariant(unit[0]) + unit[1..].ToLowerInvariant();
            return power.Length == 0 ? words : $"{words} ({power})";
        }

        return unit.Length == 0
            ? (exponent == 0 ? "Flux (arbitrary unit)" : $"Flux ({power} arbitrary units)")
            : $"Flux ({(power.Length == 0 ? "" : power + " ")}{unit})";
    }

    /// <summary>The label of the wavelength axis: what the wavelengths are, as far as it is known.</summary>
    internal static string WavelengthLabel(WavelengthScale scale)
    {
        string medium = scale.Medium switch
        {
            Medium.Air => " in air",
            Medium.Vacuum => " in vacuum",
            _ => "",
        };
        string word = FrameWord(scale.Frame);
        string frame = word.Length == 0 ? "" : ", " + word;
        string noun = scale.Frame == VelocityFrame.Rest ? "Rest wavelength" : "Wavelength";
        return $"{noun}{medium}{frame} (Å)";
    }

    /// <summary>The label of a velocity axis in the frame of a spectrum.</summary>
    internal static string VelocityLabel(VelocityFrame frame)
    {
        string word = FrameWord(frame);
        return word.Length == 0 ? "Velocity (km s⁻¹)" : $"Velocity, {word} (km s⁻¹)";
    }

    private static string FrameWord(VelocityFrame frame) => frame switch
    {
        VelocityFrame.Topocentric => "topocentric",
        VelocityFrame.Geocentric => "geocentric",
        VelocityFrame.Heliocentric => "heliocentric",
        VelocityFrame.Barycentric => "barycentric",
        _ => "",
    };

    [GeneratedRegex(@"^(?:10(?:\*\*|\^)?\(?|1[eE])(?<power>[+-]?\d{1,3})\)?[\s*.]*")]
    private static partial Regex FactorPattern();

    [GeneratedRegex(@"[\s*.]*(?<divide>/)?\s*(?<name>[A-Za-zÅå]+)(?:\*\*|\^)?\(?(?<power>[+-]?\d{1,2})?\)?\s*")]
    private static partial Regex TokenPattern();
}
