using System;
using System.Collections.Generic;
using SkiaSharp;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests.Reference;

/// <summary>
/// The colours of the figures as readers with dichromatic vision and readers of a grey print see them. Dichromacy:
/// Machado, Oliveira and Fernandes (2009), IEEE TVCG 15, 1291, severity 1, matrices from memory. Contrast: WCAG 2.2, 1.4.11,
/// which asks 3:1 of graphics. CIELAB: CIE 15:2004 with the sRGB primaries of IEC 61966-2-1.
/// </summary>
public sealed class ColourVisionTests
{
    private const double LeastDifference = 20.0;

    private static readonly Dictionary<string, double[]> Visions = new(StringComparer.Ordinal)
    {
        ["normal"] = [1, 0, 0, 0, 1, 0, 0, 0, 1],
        ["protan"] = [0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998],
        ["deutan"] = [0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.011820, 0.042940, 0.968881],
        ["tritan"] = [1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.303900],
    };

    [Theory]
    [InlineData("normal", FigureTheme.Light)]
    [InlineData("protan", FigureTheme.Light)]
    [InlineData("deutan", FigureTheme.Light)]
    [InlineData("tritan", FigureTheme.Light)]
    [InlineData("normal", FigureTheme.Dark)]
    [InlineData("protan", FigureTheme.Dark)]
    [InlineData("deutan", FigureTheme.Dark)]
    [InlineData("tritan", FigureTheme.Dark)]
    public void Lines_that_meet_in_one_panel_stay_apart(string vision, FigureTheme theme)
    {
        Palette palette = Palette.Of(theme);
        (Ink, Ink)[] pairs =
        [
            (Ink.Data, Ink.Continuum), (Ink.Data, Ink.Model), (Ink.Model, Ink.Continuum), (Ink.Data, Ink.Second),
            (Ink.Continuum, Ink.Second), (Ink.Data, Ink.Faded), (Ink.Axis, Ink.Second),
        ];
        foreach ((Ink first, Ink second) in pairs)
        {
            double difference = Difference(Lab(palette[first], Visions[vision]), Lab(palette[second], Visions[vision]));
            Assert.True(difference > LeastDifference, $"{first} and {second} differ by {difference:F1} only");
        }
    }

    [Theory]
    [InlineData(FigureTheme.Light)]
    [InlineData(FigureTheme.Dark)]
    public void Lines_and_text_stand_out_from_the_ground(FigureTheme theme)
    {
        Palette palette = Palette.Of(theme);
        double ground = Luminance(palette.Background);
        foreach (Ink ink in (Ink[])[Ink.Axis, Ink.Data, Ink.Continuum, Ink.Model, Ink.Second])
        {
            double own = Luminance(palette[ink]);
            double contrast = (Math.Max(own, ground) + 0.05) / (Math.Min(own, ground) + 0.05);
            Assert.True(contrast >= (ink is Ink.Axis or Ink.Data ? 7.0 : 3.0), $"{ink} has a contrast of {contrast:F1}:1");
        }
    }

    private static double Luminance(SKColor colour)
    {
        double[] rgb = Linear(colour);
        return (0.2126 * rgb[0]) + (0.7152 * rgb[1]) + (0.0722 * rgb[2]);
    }

    private static double[] Linear(SKColor colour) =>
        Array.ConvertAll([colour.Red, colour.Green, colour.Blue], static (byte value) =>
        {
            double v = value / 255.0;
            return v <= 0.04045 ? v / 12.92 : Math.Pow((v + 0.055) / 1.055, 2.4);
        });

    private static double[] Lab(SKColor colour, double[] m)
    {
        double[] c = Linear(colour);
        double r = Seen(m, c, 0), g = Seen(m, c, 1), b = Seen(m, c, 2);
        double x = Root(((0.4124 * r) + (0.3576 * g) + (0.1805 * b)) / 0.9505);
        double y = Root((0.2126 * r) + (0.7152 * g) + (0.0722 * b));
        double z = Root(((0.0193 * r) + (0.1192 * g) + (0.9505 * b)) / 1.089);
        return [(116 * y) - 16, 500 * (x - y), 200 * (y - z)];
    }

    private static double Seen(double[] m, double[] c, int row) =>
        Math.Clamp((m[3 * row] * c[0]) + (m[(3 * row) + 1] * c[1]) + (m[(3 * row) + 2] * c[2]), 0, 1);

    private static double Root(double t) => t > 216.0 / 24389 ? Math.Cbrt(t) : ((24389.0 / 27 * t) + 16) / 116;

    private static double Difference(double[] a, double[] b) =>
        Math.Sqrt(Math.Pow(a[0] - b[0], 2) + Math.Pow(a[1] - b[1], 2) + Math.Pow(a[2] - b[2], 2));
}
