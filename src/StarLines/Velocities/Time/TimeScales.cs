namespace StarLines.Velocities.Time;

/// <summary>UTC, International Atomic Time, Terrestrial Time and UT1; Barycentric Dynamical Time is in the barycentric correction.</summary>
/// <remarks>TT = TAI + 32.184 s (IAU 1991 resolution A4, definition).</remarks>
public static class TimeScales
{
    /// <summary>TT − TAI, seconds (definition).</summary>
    public const double TtMinusTaiSeconds = 32.184;

    private const double SecondsPerDay = 86_400.0;

    /// <summary>TAI of a time in UTC.</summary>
    /// <param name="utc">The time, Julian Date in UTC; from 1960 on.</param>
    public static JulianDate TaiFromUtc(JulianDate utc) => WithOffset(utc, 0.0);

    /// <summary>TT of a time in UTC.</summary>
    /// <param name="utc">The time, Julian Date in UTC; from 1960 on.</param>
    public static JulianDate TtFromUtc(JulianDate utc) => WithOffset(utc, TtMinusTaiSeconds);

    /// <summary>UT1 of a time in UTC.</summary>
    /// <param name="utc">The time, Julian Date in UTC; from 1960 on.</param>
    /// <param name="ut1MinusUtcSeconds">UT1 − UTC, seconds, as the IERS publishes it; under 0.9 s, and 0 where it is not known.</param>
    public static JulianDate Ut1FromUtc(JulianDate utc, double ut1MinusUtcSeconds = 0.0)
    {
        // Within a leap second UT1 runs on: count the seconds of the day, not the fraction of the long day.
        (double midnight, double fraction) = UtcTime.Split(utc);
        double seconds = (fraction * LeapSeconds.DayLengthSeconds(midnight)) + ut1MinusUtcSeconds;
        return new JulianDate(midnight, seconds / SecondsPerDay);
    }

    /// <summary>UTC of a time in TAI.</summary>
    /// <param name="tai">The time, Julian Date in TAI; from 1960 on.</param>
    public static JulianDate UtcFromTai(JulianDate tai)
    {
        (double day, double fraction) = UtcTime.Split(tai);

        // TAI leads, so UTC is on this day or the one before: take the later day that has begun.
        double seconds = (fraction * SecondsPerDay) - LeapSeconds.TaiMinusUtcSeconds(day, fraction);
        if (seconds < 0.0)
        {
            day -= 1.0;
            seconds = ((fraction + 1.0) * SecondsPerDay) - LeapSeconds.TaiMinusUtcSeconds(day, fraction);
        }

        return new JulianDate(day, seconds / LeapSeconds.DayLengthSeconds(day));
    }

    private static JulianDate WithOffset(JulianDate utc, double offsetSeconds)
    {
        (double midnight, double fraction) = UtcTime.Split(utc);
        double seconds = LeapSeconds.TaiMinusUtcSeconds(new JulianDate(midnight, fraction)) + offsetSeconds;
        return new JulianDate(midnight, ((fraction * LeapSeconds.DayLengthSeconds(midnight)) + seconds) / SecondsPerDay);
    }
}
