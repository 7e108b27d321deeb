using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace StarLines.Velocities.Time;

/// <summary>Calendar dates and clock times in UTC to Julian Dates and back, leap seconds included.</summary>
/// <remarks>A day that ends in a leap second is 86 401 s long, and the fraction of its Julian Date counts in that day.</remarks>
public static class UtcTime
{
    /// <summary>Julian Date of the epoch of Modified Julian Dates (IAU 1997 resolution B1).</summary>
    internal const double ModifiedZero = 2_400_000.5;

    private const int FirstYear = 1583;
    private const int LastYear = 9999;

    /// <summary>Reads an ISO 8601 time such as <c>2012-06-30T23:59:60.25</c>.</summary>
    /// <param name="text">
    /// Date and time of day joined by <c>T</c> or a space; seconds and their fraction may be absent; an ending <c>Z</c> is allowed,
    /// another zone is not. A date alone is refused, since midnight would be a guess.
    /// </param>
    /// <param name="utc">The time, or a zero date.</param>
    /// <param name="problem">What is wrong with the text and the cure, one sentence; null when it was read.</param>
    /// <returns>Whether it was read.</returns>
    public static bool TryParse(string? text, out JulianDate utc, [NotNullWhen(false)] out string? problem)
    {
        utc = default;
        string whole = (text ?? "").Trim();
        int split = whole.IndexOfAny(['T', 't', ' ']);
        if (split < 0)
        {
            problem = TryParseDate(whole, out _)
                ? $"'{whole}' has no time of day; write it as 2024-05-01T21:30:00 (UTC)."
                : Malformed(whole);
            return false;
        }

        string clock = whole[(split + 1)..].TrimStart();
        if (clock.EndsWith('Z') || clock.EndsWith('z'))
        {
            clock = clock[..^1];
        }

        if (!TryParseDate(whole[..split], out double midnight) || !TryParseClock(clock, out int minutes, out double seconds))
        {
            problem = Malformed(whole);
            return false;
        }

        double length = LeapSeconds.DayLengthSeconds(midnight);
        double limit = minutes == (24 * 60) - 1 ? 60.0 + (length - 86_400.0) : 60.0;
        if (seconds >= limit)
        {
            problem = seconds >= 60.0 && seconds < 61.0
                ? $"'{whole}' names second 60, but no leap second was inserted then."
                : Malformed(whole);
            return false;
        }

        utc = new JulianDate(midnight, ((minutes * 60.0) + seconds) / length);
        problem = null;
        return true;
    }

    /// <summary>Reads an ISO 8601 time; see <see cref="TryParse"/>.</summary>
    /// <param name="text">The time.</param>
    /// <exception cref="FormatException">The text is not such a time; the message says why.</exception>
    public static JulianDate Parse(string text) =>
        TryParse(text, out JulianDate utc, out string? problem) ? utc : throw new FormatException(problem);

    /// <summary>Reads a calendar date <c>YYYY-MM-DD</c>.</summary>
    /// <param name="text">The date.</param>
    /// <param name="midnightJdUtc">Julian Date of the midnight with which the day begins; ends in .5.</param>
    public static bool TryParseDate(string? text, out double midnightJdUtc)
    {
        midnightJdUtc = 0.0;
        string[] parts = (text ?? "").Trim().Split('-');
        if (parts.Length != 3 || parts[0].Length != 4
            || !TryDigits(parts[0], FirstYear, LastYear, out int year)
            || !TryDigits(parts[1], 1, 12, out int month)
            || !TryDigits(parts[2], 1, DateTime.DaysInMonth(year, month), out int day))
        {
            return false;
        }

        midnightJdUtc = MidnightJd(year, month, day);
        return true;
    }

    /// <summary>The time of a date, hour, minute and second.</summary>
    /// <param name="midnightJdUtc">Julian Date of midnight, ends in .5.</param>
    /// <param name="elapsedSeconds">Seconds since midnight, leap second counted.</param>
    public static JulianDate FromSecondsOfDay(double midnightJdUtc, double elapsedSeconds) =>
        new(midnightJdUtc, elapsedSeconds / LeapSeconds.DayLengthSeconds(midnightJdUtc));

    /// <summary>The time of a Modified Julian Date in UTC.</summary>
    /// <param name="mjdUtc">Modified Julian Date, days.</param>
    public static JulianDate FromModified(double mjdUtc)
    {
        Guard.Finite(mjdUtc, nameof(mjdUtc), "d");
        double day = Math.Floor(mjdUtc);
        return new JulianDate(ModifiedZero + day, mjdUtc - day);
    }

    /// <summary>A time some seconds later, leap seconds counted.</summary>
    /// <param name="utc">The time.</param>
    /// <param name="seconds">Seconds to add; may be negative.</param>
    public static JulianDate AddSeconds(JulianDate utc, double seconds) =>
        TimeScales.UtcFromTai(TimeScales.TaiFromUtc(utc).AddDays(seconds / 86_400.0));

    /// <summary>Julian Date of the midnight with which a day of the Gregorian calendar begins.</summary>
    /// <param name="year">1583 to 9999.</param>
    /// <param name="month">1 to 12.</param>
    /// <param name="day">1 to the length of the month.</param>
    public static double MidnightJd(int year, int month, int day)
    {
        DateOnly date = new(year, month, day);

        // Day number 0 of the framework is 0001-01-01 of the proleptic Gregorian calendar, JD 1 721 425.5.
        return 1_721_425.5 + date.DayNumber;
    }

    /// <summary>The time as ISO 8601 text, such as <c>2024-05-01T21:30:00.000</c>.</summary>
    /// <param name="utc">The time, in the years 1 to 9999.</param>
    /// <param name="decimals">Decimals of the seconds, 0 to 9.</param>
    public static string ToIso(JulianDate utc, int decimals = 3)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(decimals);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(decimals, 9);
        (double midnight, double fraction) = Split(utc);
        double length = LeapSeconds.DayLengthSeconds(midnight);
        double unit = Math.Pow(10.0, decimals);
        double ticks = Math.Round(fraction * length * unit);
        if (ticks >= length * unit)
        {
            ticks -= length * unit;
            midnight += 1.0;
            length = LeapSeconds.DayLengthSeconds(midnight);
        }

        DateOnly date = DateOnly.FromDayNumber((int)(midnight - 1_721_425.5));

        // The leap second is second 60 of the last minute.
        int minute = (int)Math.Min(Math.Floor(ticks / (60.0 * unit)), (24 * 60) - 1);
        double seconds = (ticks - (minute * 60.0 * unit)) / unit;
        string secondsFormat = decimals == 0 ? "00" : "00." + new string('0', decimals);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{date:yyyy-MM-dd}T{minute / 60:00}:{minute % 60:00}:{seconds.ToString(secondsFormat, CultureInfo.InvariantCulture)}");
    }

    /// <summary>A date as its midnight (ends in .5) and a fraction of the day from 0 to below 1.</summary>
    internal static (double MidnightJd, double Fraction) Split(JulianDate date)
    {
        double midnight = Math.Floor(date.Day - 0.5) + 0.5;
        double fraction = (date.Day - midnight) + date.Fraction;
        double whole = Math.Floor(fraction);
        return (midnight + whole, fraction - whole);
    }

    private static bool TryParseClock(string clock, out int minutes, out double seconds)
    {
        minutes = 0;
        seconds = 0.0;
        string[] parts = clock.Split(':');
        if (parts.Length is not (2 or 3)
            || !TryDigits(parts[0], 0, 23, out int hour)
            || !TryDigits(parts[1], 0, 59, out int minute))
        {
            return false;
        }

        minutes = (60 * hour) + minute;
        return parts.Length == 2 || (parts[2].Length >= 1 && double.TryParse(
            parts[2], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out seconds));
    }

    private static bool TryDigits(string text, int minimum, int maximum, out int value) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out value) && value >= minimum && value <= maximum;

    private static string Malformed(string text) =>
        $"'{text}' is not a time; write it as 2024-05-01T21:30:00 (UTC).";
}
