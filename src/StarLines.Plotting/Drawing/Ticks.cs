using System;
using System.Collections.Generic;
using System.Globalization;
using ScottPlot;
using SkiaSharp;
using StarLines.Plotting.Text;

namespace StarLines.Plotting.Drawing;

/// <summary>
/// Ticks at 1, 2 or 5 times a power of ten. The numbers have as many decimals as the step needs, a true minus sign and no
/// thousands separators; a power of ten may be taken out of them.
/// </summary>
internal sealed class Ticks : ITickGenerator
{
    /// <summary>The room beside a number, text heights.</summary>
    private const float Room = 1.6f;

    /// <summary>Numbers on an axis, at most.</summary>
    private const int MostNumbers = 12;

    private readonly int _exponent;
    private readonly string _format;

    /// <param name="range">The range of the axis.</param>
    /// <param name="step">The step between two numbers.</param>
    /// <param name="divisions">The parts into which smaller ticks cut the step.</param>
    /// <param name="exponent">The power of ten taken out of the numbers.</param>
    /// <param name="labelled">Whether numbers are written.</param>
    internal Ticks(DataRange range, double step, int divisions, int exponent = 0, bool labelled = true)
    {
        _exponent = exponent;
        int decimals = Math.Clamp(-(int)Math.Floor(Math.Log10(step * 1.000001) - exponent), 0, 12);
        _format = "F" + decimals.ToString(CultureInfo.InvariantCulture);
        double minor = step / divisions;
        var first = (long)Math.Ceiling((range.Minimum / minor) - 1e-6);
        var last = (long)Math.Floor((range.Maximum / minor) + 1e-6);
        var ticks = new List<Tick>();
        for (long i = first; i <= last; i++)
        {
            bool major = i % divisions == 0;
            ticks.Add(major ? Tick.Major(i / divisions * step, labelled ? Number(i / divisions * step) : "") : Tick.Minor(i * minor));
        }

        All = [.. ticks];
    }

    private Ticks(Ticks other, Tick[] all)
    {
        _exponent = other._exponent;
        _format = other._format;
        All = all;
    }

    /// <inheritdoc/>
    Tick[] ITickGenerator.Ticks => All;

    /// <inheritdoc/>
    public int MaxTickCount { get; set; } = 1000;

    internal Tick[] All { get; }

    /// <summary>Ticks of a horizontal axis, as close as the width of their numbers lets them be.</summary>
    /// <param name="range">The range of the axis.</param>
    /// <param name="length">Its length, units of the figure.</param>
    /// <param name="textSize">Size of the numbers.</param>
    /// <param name="labelled">Whether numbers are written.</param>
    internal static Ticks Across(DataRange range, float length, float textSize, bool labelled)
    {
        using SKFont font = FigureText.Font(textSize);
        double least = range.Length / MostNumbers;
        while (true)
        {
            (double step, int divisions) = NiceStep(least);
            var ticks = new Ticks(range, step, divisions);
            double room = length * step / range.Length;
            if (ticks.Widest(font) + (Room * textSize) <= room || step > range.Length)
            {
                return labelled ? ticks : new Ticks(range, step, divisions, labelled: false);
            }

            least = step * 1.01;
        }
    }

    /// <summary>Ticks of a vertical axis.</summary>
    /// <param name="range">The range of the axis.</param>
    /// <param name="length">Its length, units of the figure.</param>
    /// <param name="pitch">Distance between two numbers, at least, units of the figure.</param>
    /// <param name="exponent">The power of ten taken out of the numbers.</param>
    internal static Ticks Upwards(DataRange range, float length, float pitch, int exponent)
    {
        (double step, int divisions) = NiceStep(range.Length * pitch / length);
        return new Ticks(range, step, divisions, exponent);
    }

    /// <summary>The ticks that do not lie above a value.</summary>
    internal Ticks Below(double limit) => new(this, Array.FindAll(All, tick => tick.Position <= limit));

    /// <summary>The same ticks; those below a value have no number.</summary>
    internal Ticks WithoutNumbersBelow(double limit) => new(
        this, Array.ConvertAll(All, tick => tick.IsMajor && tick.Position < limit ? Tick.Major(tick.Position, "") : tick));

    /// <summary>Does nothing: the ticks were made for the range that is drawn.</summary>
    public void Regenerate(CoordinateRange range, Edge edge, PixelLength size, Paint paint, LabelStyle labelStyle)
    {
    }

    /// <summary>The smallest of 1, 2 and 5 times a power of ten that is not below a number, and into how many parts it is cut.</summary>
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

    private float Widest(SKFont font)
    {
        float widest = 0f;
        foreach (Tick tick in All)
        {
            widest = Math.Max(widest, font.MeasureText(tick.Label));
        }

        return widest;
    }

    private string Number(double value)
    {
        string text = (value / Math.Pow(10, _exponent)).ToString(_format, CultureInfo.InvariantCulture);
        bool zero = text.AsSpan().Trim("-0.").Length == 0;
        return zero ? text.TrimStart('-') : LineText.Signed(text);
    }
}
