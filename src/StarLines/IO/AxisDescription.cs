using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>The keywords that describe one axis of an image.</summary>
internal sealed record AxisDescription
{
    internal string Type { get; init; } = "";

    internal string TypeComment { get; init; } = "";

    internal string Unit { get; init; } = "";

    internal double? ReferenceValue { get; init; }

    internal string ReferenceComment { get; init; } = "";

    /// <summary>Increment a pixel; null where the header has none.</summary>
    internal double? Increment { get; init; }

    /// <summary>Reference pixel, counted from 1; null where the header has none.</summary>
    internal double? ReferencePixel { get; init; }

    internal int Count { get; init; }

    internal double? RestFrequencyHertz { get; init; }

    internal double? RestWavelengthMetres { get; init; }

    /// <summary>PVi_m by m.</summary>
    internal IReadOnlyDictionary<int, double> Parameters { get; init; } = new Dictionary<int, double>();

    /// <summary>PSi_m by m.</summary>
    internal IReadOnlyDictionary<int, string> Texts { get; init; } = new Dictionary<int, string>();

    /// <summary>Axis number, from 1.</summary>
    internal int Number { get; init; } = 1;

    /// <summary>The value of the linear part at a pixel, counted from 0: CRVAL + CDELT × (pixel + 1 − CRPIX).</summary>
    internal double OffsetOf(int index) => ((index + 1) - (ReferencePixel ?? 0.0)) * Increment!.Value;

    /// <summary>Reads the keywords of an axis.</summary>
    /// <param name="header">The header of the image.</param>
    /// <param name="axis">Axis number, from 1.</param>
    /// <param name="count">Number of pixels along it.</param>
    /// <param name="alternate">Letter of an alternate description; empty for the primary one.</param>
    /// <param name="context">Names the place of an error.</param>
    internal static AxisDescription Read(HeaderKeywords header, int axis, int count, string alternate, ReadContext context)
    {
        string number = axis.ToString(CultureInfo.InvariantCulture);
        string suffix = number + alternate;
        return new AxisDescription
        {
            Number = axis,
            Count = count,
            Type = header.Text("CTYPE" + suffix),
            TypeComment = header.Comment("CTYPE" + suffix),
            Unit = header.Text("CUNIT" + suffix),
            ReferenceValue = ReadNumber("CRVAL" + suffix, header, context),
            ReferenceComment = header.Comment("CRVAL" + suffix),
            ReferencePixel = ReadNumber("CRPIX" + suffix, header, context),
            Increment = ReadIncrement(header, number, alternate, context),
            RestFrequencyHertz = ReadNumber("RESTFRQ" + alternate, header, context) ?? ReadNumber("RESTFREQ" + alternate, header, context),
            RestWavelengthMetres = ReadNumber("RESTWAV" + alternate, header, context),
            Parameters = ReadParameters(header, number, alternate, context),
            Texts = ReadTexts(header, number, alternate),
        };
    }

    private static double? ReadIncrement(HeaderKeywords header, string number, string alternate, ReadContext context)
    {
        string pair = number + "_" + number + alternate;
        double? cd = ReadNumber("CD" + pair, header, context);
        double? cdelt = ReadNumber("CDELT" + number + alternate, header, context);
        double? pc = ReadNumber("PC" + pair, header, context);
        if (cd is double matrix)
        {
            // Both are common in older headers; the standard lets CD win, and a file that contradicts itself is reported.
            if (cdelt is double other && Math.Abs(other - matrix) > 1e-6 * Math.Abs(matrix) && pc is null && other != 1.0)
            {
                context.Note("axis-contradicts", string.Create(
                    CultureInfo.InvariantCulture, $"CD{pair} = {matrix} and CDELT{number} = {other} disagree; CD{pair} is used."));
            }

            return matrix;
        }

        return cdelt is double step ? step * (pc ?? 1.0) : pc;
    }

    private static double? ReadNumber(string keyword, HeaderKeywords header, ReadContext context)
    {
        if (!header.Has(keyword))
        {
            return null;
        }

        return header.TryNumber(keyword, out double value)
            ? value
            : throw context.Error($"{keyword} = {header.Text(keyword)} is no number; correct the header.");
    }

    private static Dictionary<int, double> ReadParameters(HeaderKeywords header, string number, string alternate, ReadContext context)
    {
        var parameters = new Dictionary<int, double>();
        for (int m = 0; m <= 9; m++)
        {
            if (ReadNumber(string.Create(CultureInfo.InvariantCulture, $"PV{number}_{m}{alternate}"), header, context) is double value)
            {
                parameters[m] = value;
            }
        }

        return parameters;
    }

    private static Dictionary<int, string> ReadTexts(HeaderKeywords header, string number, string alternate)
    {
        var texts = new Dictionary<int, string>();
        for (int m = 0; m <= 2; m++)
        {
            string text = header.Text(string.Create(CultureInfo.InvariantCulture, $"PS{number}_{m}{alternate}"));
            if (text.Length != 0)
            {
                texts[m] = text;
            }
        }

        return texts;
    }
}
