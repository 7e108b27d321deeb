namespace StarLines;

/// <summary>
/// An epoch as a Julian Date in two parts, so that microseconds survive; the holder names the time scale.
/// In UTC a day with a leap second is 86 401 s long and the fraction counts in units of that day.
/// </summary>
/// <param name="Day">The larger part, days, usually ending in .5 (midnight).</param>
/// <param name="Fraction">The rest, days.</param>
public readonly record struct JulianDate(double Day, double Fraction)
{
    /// <summary>Both parts in one number, days; resolves about 40 µs.</summary>
    public double Value => Day + Fraction;

    /// <summary>The epoch some days later, in the same time scale.</summary>
    /// <param name="days">Days to add; may be negative.</param>
    public JulianDate AddDays(double days) => new(Day, Fraction + days);
}
