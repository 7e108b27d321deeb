using System;
using MathNet.Numerics.Integration;
using StarLines.Profiles;
using Xunit;

namespace StarLines.Tests.Profiles;

public sealed class LineProfileTests
{
    private static readonly double[] Edges = [-1.3, -0.9, -0.45, -0.1, 0.2, 0.55, 1.0, 1.4];

    [Theory]
    [InlineData(ProfileShape.Gaussian)]
    [InlineData(ProfileShape.Lorentzian)]
    public void Mean_over_a_pixel_is_the_integral_by_quadrature(ProfileShape shape)
    {
        const double Centre = 0.07;
        const double Width = 0.25;
        (double[] value, _, _) = Evaluate(shape, PixelSampling.Integrated, Centre, Width);
        for (int i = 0; i < value.Length; i++)
        {
            double mean = GaussLegendreRule.Integrate(x => Closed(shape, (x - Centre) / Width), Edges[i], Edges[i + 1], 32)
                / (Edges[i + 1] - Edges[i]);
            Assert.Equal(mean, value[i], 1e-10);
        }
    }

    [Theory]
    [InlineData(ProfileShape.Gaussian)]
    [InlineData(ProfileShape.Lorentzian)]
    public void Value_at_a_pixel_centre_is_the_closed_form(ProfileShape shape)
    {
        (double[] value, _, _) = Evaluate(shape, PixelSampling.Point, 0.07, 0.25);
        for (int i = 0; i < value.Length; i++)
        {
            double centre = 0.5 * (Edges[i] + Edges[i + 1]);
            Assert.Equal(Closed(shape, (centre - 0.07) / 0.25), value[i], 1e-14);
        }
    }

    [Theory]
    [InlineData(ProfileShape.Gaussian, PixelSampling.Integrated)]
    [InlineData(ProfileShape.Gaussian, PixelSampling.Point)]
    [InlineData(ProfileShape.Lorentzian, PixelSampling.Integrated)]
    [InlineData(ProfileShape.Lorentzian, PixelSampling.Point)]
    public void Derivatives_agree_with_central_differences(ProfileShape shape, PixelSampling sampling)
    {
        const double Step = 1e-5;
        (_, double[] byCentre, double[] byWidth) = Evaluate(shape, sampling, 0.07, 0.25);
        double[] right = Evaluate(shape, sampling, 0.07 + Step, 0.25).Value;
        double[] left = Evaluate(shape, sampling, 0.07 - Step, 0.25).Value;
        double[] wider = Evaluate(shape, sampling, 0.07, 0.25 + Step).Value;
        double[] narrower = Evaluate(shape, sampling, 0.07, 0.25 - Step).Value;
        for (int i = 0; i < byCentre.Length; i++)
        {
            Assert.Equal((right[i] - left[i]) / (2.0 * Step), byCentre[i], 1e-7);
            Assert.Equal((wider[i] - narrower[i]) / (2.0 * Step), byWidth[i], 1e-7);
        }
    }

    internal static ILineProfile Profile(ProfileShape shape) =>
        shape == ProfileShape.Gaussian ? new GaussianProfile() : new LorentzianProfile();

    private static double Closed(ProfileShape shape, double x) =>
        shape == ProfileShape.Gaussian ? Math.Exp(-0.5 * x * x) : 1.0 / (1.0 + (x * x));

    private static (double[] Value, double[] ByCentre, double[] ByWidth) Evaluate(
        ProfileShape shape, PixelSampling sampling, double centre, double width)
    {
        int count = Edges.Length - 1;
        var centres = new double[count];
        for (int i = 0; i < count; i++)
        {
            centres[i] = 0.5 * (Edges[i] + Edges[i + 1]);
        }

        var value = new double[count];
        var byCentre = new double[count];
        var byWidth = new double[count];
        Profile(shape).Evaluate(
            new PixelGrid(Edges, centres, sampling), centre, [width], value, byCentre, byWidth, new double[3 * Edges.Length]);
        return (value, byCentre, byWidth);
    }
}
