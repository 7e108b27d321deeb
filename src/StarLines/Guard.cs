using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace StarLines;

/// <summary>Checks at the public entry of the library; the throwing stays out of the callers.</summary>
internal static class Guard
{
    /// <summary>Throws unless the value is a finite number above zero.</summary>
    internal static void Positive(double value, string parameter, string unit)
    {
        if (!(value > 0.0) || !double.IsFinite(value))
        {
            ThrowRange(parameter, value, unit, "a finite number above 0");
        }
    }

    /// <summary>Throws unless the value is a finite number.</summary>
    internal static void Finite(double value, string parameter, string unit)
    {
        if (!double.IsFinite(value))
        {
            ThrowRange(parameter, value, unit, "a finite number");
        }
    }

    /// <summary>Throws unless the value lies between two limits, both included.</summary>
    internal static void Between(double value, double minimum, double maximum, string parameter, string unit)
    {
        if (!(value >= minimum && value <= maximum))
        {
            ThrowRange(parameter, value, unit, string.Create(CultureInfo.InvariantCulture, $"{minimum} to {maximum}"));
        }
    }

    /// <summary>Throws unless two lengths agree.</summary>
    internal static void SameLength(int actual, int expected, string parameter)
    {
        if (actual != expected)
        {
            ThrowLength(parameter, actual, expected);
        }
    }

    [DoesNotReturn]
    private static void ThrowRange(string parameter, double value, string unit, string allowed) =>
        throw new ArgumentOutOfRangeException(parameter, string.Create(
            CultureInfo.InvariantCulture, $"{parameter} is {value} {unit}; it must be {allowed}."));

    [DoesNotReturn]
    private static void ThrowLength(string parameter, int actual, int expected) =>
        throw new ArgumentException(string.Create(
            CultureInfo.InvariantCulture, $"{parameter} has {actual} values; it must have {expected}."), parameter);
}
