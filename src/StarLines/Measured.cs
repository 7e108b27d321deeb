namespace StarLines;

/// <summary>A value with its uncertainty of one standard deviation, both in the unit that the holder states.</summary>
/// <param name="Value">The value; NaN where it was not measured.</param>
/// <param name="Uncertainty">One standard deviation; NaN where unknown.</param>
public readonly record struct Measured(double Value, double Uncertainty)
{
    /// <summary>A value that was not measured.</summary>
    public static Measured None { get; } = new(double.NaN, double.NaN);

    /// <summary>Whether there is a value.</summary>
    public bool HasValue => double.IsFinite(Value);
}
