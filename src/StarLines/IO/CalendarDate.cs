using System;
using System.Globalization;
using StarLines.Velocities.Time;

namespace StarLines.IO;

/// <summary>Dates and times of day as headers write them.</summary>
internal static class CalendarDate
{
    /// <summary>The first spectra of stars on plates, and a year that no header means.</summary>
    private const int FirstYear = 1860, LastYear = 2200;

    /// <summary>Julian Date of MJD 0.</summary>
    internal const double MjdZero = 2_400_000.5;

    /// <summary>Reads a date with or without a time of day: <c>2012-10-04T06:29:16.153</c>, <c>2012-10-04</c>, <c>2012/10/04 06:29:16</c>, <c>04/10/12</c> (before 2000, as old FITS writes it).</summary>
    /// <param name="text">The text.</param>
    /// <param name="midnight">Julian Date of the start of that day.</param>
    /// <param name="seconds">Seconds of the day; NaN where the text has a date only.</param>
    internal static bool TryParse(string text, out double midnight, out double seconds)
    {
        midnight = double.NaN;
        seconds = double.NaN;
        string trimmed = text.Trim().TrimEnd('Z', 'z');
        int split = trimmed.IndexOfAny(['T', 't', ' ']);
        string date = split < 0 ? trimmed : trimmed[..split];
        if (!TryParseDate(date, out midnight))
        {
            return false;
        }

        return split < 0 || TryParseTime(trimmed[(split + 1)..], out seconds);
    }

    /// <summary>Reads a time of day, <c>hh:mm:ss.s</c>, as seconds.</summary>
    internal static bool TryParseTime(string text, out double seconds)
    {
        seconds = double.NaN;
        if (!Sexagesimal.TryParse(text, out double hours, out int parts, out _) || parts < 2 || hours < 0.0 || hours > 24.0 + (1.0 / 3600.0))
        {
            return false;
        }

        seconds = hours * 3600.0;
        // Sixtieths of sixtieths round; microseconds are all that headers give.
        seconds = Math.Round(seconds * 1e7) / 1e7;
        return true;
    }

    private static bool TryParseDate(string text, out double midnight)
    {
        midnight = double.NaN;
        string[] parts = text.Split('-', '/', '.');
        if (parts.Length != 3 || !Number(parts[0], out int a) || !Number(parts[1], out int month) || !Number(parts[2], out int c))
        {
            return false;
        }

        bool yearFirst = parts[0].Length == 4;
        int year = yearFirst ? a : c;
        int day = yearFirst ? c : a;
        if (!yearFirst && parts[2].Length == 2)
        {
            // FITS before 1998: DD/MM/YY of the twentieth century.
            year += 1900;
        }

        if (year is < FirstYear or > LastYear || month is < 1 or > 12 || day < 1 || day > DateTime.DaysInMonth(year, month))
        {
            return false;
        }

        midnight = UtcTime.MidnightJd(year, month, day);
        return true;
    }

    private static bool Number(string text, out int value) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out value);
}
