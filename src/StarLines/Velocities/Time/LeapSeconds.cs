using System;
using System.Globalization;

namespace StarLines.Velocities.Time;

/// <summary>TAI − UTC.</summary>
/// <remarks>
/// Source: IERS Bulletin C, all leap seconds since 1972; before, the rates and steps of UTC by the Bureau International de l'Heure.
/// After 2017-01-01 none was announced. UTC is not defined before 1960.
/// </remarks>
public static class LeapSeconds
{
    /// <summary>
    /// Julian Date (UTC) from which a leap second unknown to this table is possible, 2028-01-01: one is announced half a year ahead,
    /// and UT1 − UTC, near 0.1 s in 2025 (from memory) and drifting by 0.1 s a year or less, is far from the 0.9 s that call for one.
    /// </summary>
    public const double AssumedFromJdUtc = 2_461_771.5;

    /// <summary>Julian Date (UTC) with which UTC begins, 1960-01-01.</summary>
    public const double FirstJdUtc = 2_436_934.5;

    // Year, month, TAI − UTC in seconds from the first of that month on.
    private static readonly (int Year, int Month, double Seconds)[] Steps =
    [
        (1972, 1, 10), (1972, 7, 11), (1973, 1, 12), (1974, 1, 13), (1975, 1, 14), (1976, 1, 15), (1977, 1, 16),
        (1978, 1, 17), (1979, 1, 18), (1980, 1, 19), (1981, 7, 20), (1982, 7, 21), (1983, 7, 22), (1985, 7, 23),
        (1988, 1, 24), (1990, 1, 25), (1991, 1, 26), (1992, 7, 27), (1993, 7, 28), (1994, 7, 29), (1996, 1, 30),
        (1997, 7, 31), (1999, 1, 32), (2006, 1, 33), (2009, 1, 34), (2012, 7, 35), (2015, 7, 36), (2017, 1, 37),
    ];

    // Before 1972: year, month, offset in seconds at a Modified Julian Date, and growth in seconds a day since that date.
    private static readonly (int Year, int Month, double Seconds, double SinceMjd, double PerDay)[] Rates =
    [
        (1960, 1, 1.4178180, 37300, 0.001296), (1961, 1, 1.4228180, 37300, 0.001296), (1961, 8, 1.3728180, 37300, 0.001296),
        (1962, 1, 1.8458580, 37665, 0.0011232), (1963, 11, 1.9458580, 37665, 0.0011232), (1964, 1, 3.2401300, 38761, 0.001296),
        (1964, 4, 3.3401300, 38761, 0.001296), (1964, 9, 3.4401300, 38761, 0.001296), (1965, 1, 3.5401300, 38761, 0.001296),
        (1965, 3, 3.6401300, 38761, 0.001296), (1965, 7, 3.7401300, 38761, 0.001296), (1965, 9, 3.8401300, 38761, 0.001296),
        (1966, 1, 4.3131700, 39126, 0.002592), (1968, 2, 4.2131700, 39126, 0.002592),
    ];

    private static readonly double[] StepJd = Array.ConvertAll(Steps, s => UtcTime.MidnightJd(s.Year, s.Month, 1));

    private static readonly double[] RateJd = Array.ConvertAll(Rates, s => UtcTime.MidnightJd(s.Year, s.Month, 1));

    /// <summary>TAI − UTC, seconds.</summary>
    /// <param name="utc">The time; from 1960 on.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time lies before 1960.</exception>
    public static double TaiMinusUtcSeconds(JulianDate utc)
    {
        (double midnight, double fraction) = UtcTime.Split(utc);
        if (!(midnight >= FirstJdUtc))
        {
            throw new ArgumentOutOfRangeException(nameof(utc), string.Create(
                CultureInfo.InvariantCulture, $"JD {utc.Value} lies before 1960, when UTC began."));
        }

        return TaiMinusUtcSeconds(midnight, fraction);
    }

    /// <summary>Length of a day in UTC, seconds: 86 401 where it ends in a leap second, else 86 400.</summary>
    /// <param name="midnightJdUtc">Julian Date of the midnight with which the day begins; ends in .5.</param>
    public static double DayLengthSeconds(double midnightJdUtc)
    {
        // Found only where the next day is one with which a new offset begins; the first entry set the whole seconds, it was no leap second.
        int index = Array.BinarySearch(StepJd, midnightJdUtc + 1.0);
        return index > 0 ? 86_401.0 : 86_400.0;
    }

    /// <summary>TAI − UTC for a midnight and a fraction of its day; the first offset before 1960.</summary>
    internal static double TaiMinusUtcSeconds(double midnightJdUtc, double fraction)
    {
        int step = LastAtOrBefore(StepJd, midnightJdUtc);
        if (step >= 0)
        {
            return Steps[step].Seconds;
        }

        (_, _, double seconds, double sinceMjd, double perDay) = Rates[Math.Max(LastAtOrBefore(RateJd, midnightJdUtc), 0)];
        return seconds + ((midnightJdUtc - UtcTime.ModifiedZero + fraction - sinceMjd) * perDay);
    }

    private static int LastAtOrBefore(double[] starts, double jd)
    {
        int found = Array.BinarySearch(starts, jd);
        return found >= 0 ? found : ~found - 1;
    }
}
