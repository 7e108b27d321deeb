using System;
using System.Globalization;
using StarLines.Velocities.Time;

namespace StarLines.IO;

/// <summary>The middle of an exposure and its length, from the many keywords that tell them.</summary>
internal static class HeaderTime
{
    private static readonly string[] MidDates = ["DATE-AVG", "DATE-MID", "DATEMID", "DATE_MID", "MIDTIME", "MID-TIME", "MIDPOINT"];
    private static readonly string[] MidMjds = ["MJD-AVG", "MJD-MID", "MJDMID", "MJD_MID", "TMID"];
    private static readonly string[] MidJds = ["JD-MID", "JDMID", "JD_MID", "MID-JD", "JD-AVG"];
    private static readonly string[] MidTimes = ["UTMIDDLE", "UT-MID", "UTMID", "UT_MID", "UTC-MID"];
    private static readonly string[] StartDates = ["DATE-BEG", "DATE-OBS", "DATE_OBS", "DATEOBS", "UT-DATE", "UTDATE", "UTC-DATE", "DATE-STA"];
    private static readonly string[] StartTimes =
        ["UT-TIME", "UTSTART", "UT-START", "UTC-OBS", "UT-OBS", "TIME-OBS", "TIME_OBS", "TIMEOBS", "UTC-BEG", "UTC", "UT", "TIME-BEG", "TIME"];
    private static readonly string[] StartMjds = ["MJD-BEG", "MJD-OBS", "MJD_OBS", "MJD"];
    private static readonly string[] StartJds = ["JD-OBS", "JD", "JULDATE", "JUL-DATE"];
    private static readonly string[] EndDates = ["DATE-END", "DATE_END"];
    private static readonly string[] EndMjds = ["MJD-END", "MJDEND"];
    private static readonly string[] EndTimes = ["UT-END", "UTEND", "UTC-END", "TIME-END", "UTSTOP"];
    private static readonly string[] Exposures = ["EXPTIME", "EXPOSURE", "XPOSURE", "TEXPTIME", "EXP_TIME", "ITIME", "INTTIME", "EXPOSED"];

    private const double SecondsADay = 86_400.0;

    /// <summary>Two statements of one time that differ by more are reported, seconds.</summary>
    private const double DisagreementSeconds = 60.0;

    /// <summary>An end this much later than start plus exposure belongs to something else, seconds.</summary>
    private const double LongestOverheadSeconds = 6.0 * 3600.0;

    /// <summary>The length of the exposure, seconds; null where unknown.</summary>
    internal static double? Exposure(HeaderKeywords header)
    {
        foreach (string key in Exposures)
        {
            if (header.TryNumber(key, out double value) && value > 0.0)
            {
                string comment = header.Comment(key);
                return comment.Contains("[min", StringComparison.OrdinalIgnoreCase) || comment.Contains("minutes", StringComparison.OrdinalIgnoreCase)
                    ? value * 60.0
                    : value;
            }
        }

        return null;
    }

    /// <summary>The middle of the exposure, UTC; null where the header does not tell it. The keywords used are named in <paramref name="from"/>.</summary>
    internal static JulianDate? MidExposure(HeaderKeywords header, double? exposureSeconds, out string from, ReadContext context)
    {
        from = "";
        JulianDate? mid = StatedMiddle(header, ref from) ?? Middle(header, exposureSeconds, ref from, context);
        return mid is JulianDate date ? ToUtc(date, header, context) : null;
    }

    private static JulianDate? StatedMiddle(HeaderKeywords header, ref string from)
    {
        foreach (string key in MidDates)
        {
            if (FullDate(header, key) is JulianDate date)
            {
                from = key;
                return date;
            }
        }

        JulianDate? mid = FromNumber(header, MidMjds, CalendarDate.MjdZero, ref from) ?? FromNumber(header, MidJds, 0.0, ref from);
        if (mid is not null)
        {
            return mid;
        }

        foreach (string key in StartDates)
        {
            if (IsMiddle(header.Comment(key)) && FullDate(header, key) is JulianDate date)
            {
                from = key + " (middle of the exposure, as its comment says)";
                return date;
            }
        }

        string timeKey = "";
        return DateOnly(header) is double midnight && TimeOfDay(header, MidTimes, ref timeKey) is double seconds && seconds != 0.0
            ? Named(ref from, "DATE-OBS + " + timeKey, UtcTime.FromSecondsOfDay(midnight, seconds))
            : null;
    }

    private static JulianDate? Middle(HeaderKeywords header, double? exposureSeconds, ref string from, ReadContext context)
    {
        JulianDate? start = Start(header, exposureSeconds, ref from, context);
        if (start is not JulianDate begin)
        {
            return null;
        }

        string endKey = "";
        if (End(header, begin, ref endKey) is JulianDate end)
        {
            double elapsed = SecondsBetween(begin, end);
            double exposure = exposureSeconds ?? 0.0;
            if (elapsed > 0.0 && elapsed > 0.9 * exposure && elapsed < exposure + LongestOverheadSeconds)
            {
                from += " and " + endKey;
                return UtcTime.AddSeconds(begin, 0.5 * elapsed);
            }
        }

        if (exposureSeconds is double seconds)
        {
            from += " + half the exposure";
            return UtcTime.AddSeconds(begin, 0.5 * seconds);
        }

        context.Note("time-is-start", $"No exposure time is given; the time of {from} is used as it is. Give the middle of the exposure by --time.");
        return start;
    }

    private static JulianDate? Start(HeaderKeywords header, double? exposureSeconds, ref string from, ReadContext context)
    {
        JulianDate? start = StartOfDates(header, exposureSeconds, ref from);
        string mjdKey = "";
        JulianDate? number = FromNumber(header, StartMjds, CalendarDate.MjdZero, ref mjdKey) ?? FromNumber(header, StartJds, 0.0, ref mjdKey);
        if (start is JulianDate date && number is JulianDate other
            && Math.Abs(SecondsBetween(date, other)) > Math.Max(DisagreementSeconds, exposureSeconds ?? 0.0))
        {
            context.Note("time-disagrees", string.Create(
                CultureInfo.InvariantCulture,
                $"{from} and {mjdKey} lie {Math.Abs(SecondsBetween(date, other)):F0} s apart; {from} is used. Give the middle of the exposure by --time if that is wrong."));
        }

        if (start is null && number is not null)
        {
            from = mjdKey;
            return number;
        }

        start ??= AtomicSeconds(header, ref from, context);

        if (start is null && DateOnly(header) is not null)
        {
            context.Note("time-of-day-missing", "The header gives the date of the observation but not the time of day; give the middle of the exposure by --time.");
        }

        return start;
    }

    /// <summary>Seconds since MJD 0 in atomic time, as one survey writes it; of use where all exposures are of one night.</summary>
    private static JulianDate? AtomicSeconds(HeaderKeywords header, ref string from, ReadContext context)
    {
        if (!header.TryNumber("TAI", out double seconds) || seconds is < 4.0e9 or > 6.5e9)
        {
            return null;
        }

        if (header.Text("MJDLIST").Contains(' ', StringComparison.Ordinal))
        {
            context.Note("time-of-many-nights", "The spectrum was added up from exposures of several nights; give the mean time by --time.");
            return null;
        }

        from = "TAI";
        double day = Math.Floor(seconds / SecondsADay);
        return new JulianDate(day + CalendarDate.MjdZero, (seconds / SecondsADay) - day);
    }

    private static JulianDate? StartOfDates(HeaderKeywords header, double? exposureSeconds, ref string from)
    {
        foreach (string key in StartDates)
        {
            if (FullDate(header, key) is JulianDate full)
            {
                from = key;
                return full;
            }
        }

        string timeKey = "";
        if (DateOnly(header) is double midnight && TimeOfDay(header, StartTimes, ref timeKey) is double seconds)
        {
            // Midnight sharp without a real exposure is a placeholder.
            bool placeholder = seconds == 0.0 && exposureSeconds is null or <= 1.0;
            if (!placeholder || seconds != 0.0)
            {
                from = "DATE-OBS + " + timeKey;
                return UtcTime.FromSecondsOfDay(midnight, seconds);
            }
        }

        return null;
    }

    private static JulianDate? End(HeaderKeywords header, JulianDate start, ref string from)
    {
        foreach (string key in EndDates)
        {
            if (FullDate(header, key) is JulianDate full)
            {
                from = key;
                return full;
            }
        }

        if (FromNumber(header, EndMjds, CalendarDate.MjdZero, ref from) is JulianDate number)
        {
            return number;
        }

        if (TimeOfDay(header, EndTimes, ref from) is double seconds)
        {
            double day = Math.Floor(start.Value - 0.5) + 0.5;
            var end = UtcTime.FromSecondsOfDay(day, seconds);
            return SecondsBetween(start, end) < 0.0 ? end.AddDays(1.0) : end;
        }

        return null;
    }

    private static JulianDate? FullDate(HeaderKeywords header, string key) =>
        header.TryGet(key, out string? text, out string comment)
        && !comment.Contains("local", StringComparison.OrdinalIgnoreCase)
        && CalendarDate.TryParse(text, out double midnight, out double seconds) && !double.IsNaN(seconds)
            ? UtcTime.FromSecondsOfDay(midnight, seconds)
            : null;

    private static double? DateOnly(HeaderKeywords header)
    {
        foreach (string key in StartDates)
        {
            if (header.TryGet(key, out string? text, out string comment)
                && !comment.Contains("local", StringComparison.OrdinalIgnoreCase)
                && CalendarDate.TryParse(text, out double midnight, out _))
            {
                return midnight;
            }
        }

        return null;
    }

    private static double? TimeOfDay(HeaderKeywords header, string[] keys, ref string found)
    {
        foreach (string key in keys)
        {
            if (!header.TryGet(key, out string? text, out string comment) || comment.Contains("local", StringComparison.OrdinalIgnoreCase))
            {
                continue;
            }

            if (CalendarDate.TryParseTime(text, out double seconds) || CalendarDate.TryParse(text, out _, out seconds) && !double.IsNaN(seconds))
            {
                found = key;
                return seconds;
            }

            // A plain number is in seconds where it must be or says so, else in hours.
            if (header.TryNumber(key, out double number) && number is >= 0.0 and <= SecondsADay)
            {
                found = key;
                return number > 24.0 || comment.Contains("(sec", StringComparison.OrdinalIgnoreCase) || comment.Contains("[s]", StringComparison.OrdinalIgnoreCase)
                    ? number
                    : number * 3600.0;
            }
        }

        return null;
    }

    private static JulianDate? FromNumber(HeaderKeywords header, string[] keys, double zero, ref string found)
    {
        foreach (string key in keys)
        {
            // A whole number is a night, not a time.
            if (header.TryNumber(key, out double value) && value != Math.Floor(value) && (zero == 0.0 ? value is > 2_415_000.0 and < 2_524_000.0 : value is > 15_000.0 and < 124_000.0))
            {
                found = key;
                double day = Math.Floor(value);
                return new JulianDate(day + zero, value - day);
            }
        }

        return null;
    }

    /// <summary>Brings a time of another scale (TIMESYS) to UTC; what is not a scale of atomic clocks is taken for UTC.</summary>
    private static JulianDate ToUtc(JulianDate date, HeaderKeywords header, ReadContext context)
    {
        string scale = header.Text("TIMESYS").ToUpperInvariant();
        double? minusTaiSeconds = scale switch
        {
            "TAI" or "IAT" => 0.0,
            "TT" or "TDT" or "ET" or "TDB" => TimeScales.TtMinusTaiSeconds,
            "GPS" => -19.0,
            _ => null,
        };
        if (minusTaiSeconds is not double offset)
        {
            return date;
        }

        context.Note("time-scale", $"TIMESYS = {scale}; the time was brought to UTC.");
        return TimeScales.UtcFromTai(date.AddDays(-offset / SecondsADay));
    }

    private static bool IsMiddle(string comment) =>
        comment.Contains("mid", StringComparison.OrdinalIgnoreCase)
        || comment.Contains("median", StringComparison.OrdinalIgnoreCase)
        || comment.Contains("mean", StringComparison.OrdinalIgnoreCase);

    private static double SecondsBetween(JulianDate first, JulianDate second) =>
        ((second.Day - first.Day) + (second.Fraction - first.Fraction)) * SecondsADay;

    private static JulianDate Named(ref string from, string name, JulianDate value)
    {
        from = name;
        return value;
    }
}
