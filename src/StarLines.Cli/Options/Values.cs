using System;
using System.Globalization;

namespace StarLines.Cli.Options;

/// <summary>Reads the values of options; each throws <see cref="FormatException"/> with a sentence that shows what to write.</summary>
internal static class Values
{
    /// <summary>A number.</summary>
    public static double Number(string text) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && double.IsFinite(value)
            ? value
            : throw new FormatException($"'{text}' is no number; write it with a point, such as 12.5.");

    /// <summary>A number above 0.</summary>
    public static double Positive(string text) =>
        Number(text) is > 0.0 and double value ? value : throw new FormatException($"{text} is not above 0.");

    /// <summary>A whole number not below a limit.</summary>
    public static int Whole(string text, int minimum) =>
        int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int value) && value >= minimum
            ? value
            : throw new FormatException(string.Create(
                CultureInfo.InvariantCulture, $"'{text}' is no whole number from {minimum} up."));

    /// <summary>A range of wavelengths, <c>A:B</c> in Å.</summary>
    public static WavelengthRange Range(string text)
    {
        string[] ends = text.Split(':');
        if (ends.Length != 2)
        {
            throw new FormatException($"'{text}' is no range; write two wavelengths in Å, such as 5880:5900.");
        }

        double from = Number(ends[0]);
        double to = Number(ends[1]);
        return from < to
            ? new WavelengthRange(from, to)
            : throw new FormatException($"'{text}' runs backwards or is empty; give the smaller wavelength first.");
    }

    /// <summary>A right ascension in degrees, or in hours where it is sexagesimal or marked <c>h</c>.</summary>
    public static double RightAscensionDegrees(string text)
    {
        (double value, bool sexagesimal) = Angle(text, "a right ascension", "154.9919 (degrees) or 10:19:58.06 (hours)");
        double degrees = sexagesimal ? 15.0 * value : value;
        return degrees is >= 0.0 and < 360.0
            ? degrees
            : throw new FormatException($"The right ascension '{text}' is not within 0 to 360 degrees (0 to 24 hours).");
    }

    /// <summary>A declination in degrees, decimal or sexagesimal.</summary>
    public static double DeclinationDegrees(string text)
    {
        (double value, _) = Angle(text, "a declination", "-16.7161 or -16:42:58.0 (degrees)");
        return value is >= -90.0 and <= 90.0
            ? value
            : throw new FormatException($"The declination '{text}' is not within -90 to 90 degrees.");
    }

    /// <summary>One of a few words, told apart without case.</summary>
    public static T Word<T>(string text, params (string Word, T Value)[] words)
    {
        foreach ((string word, T value) in words)
        {
            if (word.Equals(text, StringComparison.OrdinalIgnoreCase))
            {
                return value;
            }
        }

        string[] right = Array.ConvertAll(words, static pair => pair.Word);
        throw new FormatException($"'{text}' is not one of the words here{UsageProblem.Hint(text, right)}");
    }

    private static (double Value, bool Sexagesimal) Angle(string text, string what, string example)
    {
        string plain = text.Trim().Replace('\u2212', '-');
        bool negative = plain.StartsWith('-');
        string[] parts = plain.TrimStart('-', '+').Split(
            [':', ' ', 'h', 'd', 'm', 's', '\'', '"', '\u00B0'], StringSplitOptions.RemoveEmptyEntries);
        double value = 0.0;
        double unit = 1.0;
        for (int i = 0; i < parts.Length; i++)
        {
            bool isNumber = double.TryParse(parts[i], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out double part);
            if (!isNumber || i > 2 || (i > 0 && part >= 60.0))
            {
                throw new FormatException($"'{text}' is not {what}; write it as {example}.");
            }

            value += part * unit;
            unit /= 60.0;
        }

        bool marked = plain.Contains('h', StringComparison.Ordinal);
        return parts.Length > 0
            ? (negative ? -value : value, parts.Length > 1 || marked)
            : throw new FormatException($"'{text}' is not {what}; write it as {example}.");
    }
}
