using System;
using System.Collections.Generic;
using System.Globalization;
using ScottPlot;
using StarLines.Plotting.Text;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// Ticks at 1, 2 or 5 times a power of ten. The numbers have as many decimals as the step needs, a true minus sign and no
/// thousands separators; a power of ten may be taken out of them.
/// </summary>
internal sealed class Ticks : ITickGenerator
{
    private readonly int _exponent;
    private readonly bool _labelled;

    /// <param name="range">The range of the axis.</param>
    /// <param name="length">Its length, units of the figure.</param>
    /// <param name="pitch">Distance between two numbers, at least, units of the figure.</param>
    /// <param name="exponent">The power of ten taken out of the numbers.</param>
    /// <param name="labelled">Whether numbers are written.</param>
    internal Ticks(DataRange range, float length, float pitch, int exponent = 0, bool labelled = true)
    {
        _exponent = exponent;
        _labelled = labelled;
        All = Make(range, length, pitch);
    }

    /// <inheritdoc/>
    Tick[] ITickGenerator.Ticks => All;

    /// <inheritdoc/>
    public int MaxTickCount { get; set; } = 1000;

    internal Tick[] All { get; }

    /// <summary>Does nothing: the ticks were made for the range that is drawn.</summary>
    public void Regenerate(CoordinateRange range, Edge edge, PixelLength size, Paint paint, LabelStyle labelStyle)
    {
    }

    /// <summary>The smallest of 1, 2 and 5 times a power of ten that is not below a number.</summary>
    internal static (double Step, int Divisions) NiceStep(double least)
    {
        double power = Math.Pow(10, Math.Floor(Math.Log10(least)));
        double mantissa = least / power;
        return
            mantissa <= 1.0 + 1e-9 ? (power, 5)
            : mantissa <= 2.0 + 1e-9 ? (2 * power, 4)
            : mantissa <= 5.0 + 1e-9 ? (5 * power, 5)
            : (10 * power, 5);
    }

    private Tick[] Make(DataRange range, float length, float pitch)
    {
        double numbers = Math.Max(1.0, length / pitch);
        (double step, int divisions) = NiceStep(range.Length / numbers);
        int decimals = Math.Clamp(-(int)Math.Floor(Math.Log10(step * 1.000001) - _exponent), 0, 12);
        string format = "F" + decimals.ToString(CultureInfo.InvariantCulture);
        double minor = step / divisions;
        var first = (long)Math.Ceiling((range.Minimum / minor) - 1e-6);
        var last = (long)Math.Floor((range.Maximum / minor) + 1e-6);
        var ticks = new List<Tick>();
        for (long i = first; i <= last; i++)
        {
            double position = i * minor;
            bool major = i % divisions == 0;
            ticks.Add(major ? Tick.Major(position, _labelled ? Number(i / divisions * step, format) : "") : Tick.Minor(position));
        }

        return [.. ticks];
    }

    private string Number(double value, string format)
    {
        string text = (value / Math.Pow(10, _exponent)).ToString(format, CultureInfo.InvariantCulture);
        return LineText.Signed(text.TrimStart('-').Trim('0', '.').Length == 0 ? text.TrimStart('-') : text);
    }
}
