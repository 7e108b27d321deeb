using System;
using StarLines.Velocities.Barycentre;

namespace StarLines.Velocities;

/// <summary>A velocity by one template with the correlation function behind it.</summary>
public sealed class VelocityResult
{
    private readonly double[] _velocities;
    private readonly double[] _correlation;

    internal VelocityResult(VelocityMeasurement measurement, double[] velocitiesKmPerS, double[] correlation)
    {
        Measurement = measurement;
        _velocities = velocitiesKmPerS;
        _correlation = correlation;
    }

    /// <summary>What was measured.</summary>
    public VelocityMeasurement Measurement { get; }

    /// <summary>Name of the template.</summary>
    public string TemplateName => Measurement.Template;

    /// <summary>Velocities of the correlation function in the frame of the spectrum, km/s, increasing; none where nothing was correlated.</summary>
    public ReadOnlySpan<double> VelocitiesKmPerS => _velocities;

    /// <summary>The weighted correlation coefficient at these velocities, −1 to 1.</summary>
    public ReadOnlySpan<double> Correlation => _correlation;

    /// <summary>The frame of the spectrum.</summary>
    public VelocityFrame Frame { get; internal init; }

    /// <summary>The velocity in the frame of the spectrum, km/s, before any reduction; its uncertainty covers noise and scatter of the lines.</summary>
    public Measured ObservedKmPerS { get; internal init; } = Measured.None;

    /// <summary>Place of the correlation peak, km/s, with the error of Zucker (2003), MNRAS 342, 1291.</summary>
    public Measured PeakKmPerS { get; internal init; } = Measured.None;

    /// <summary>Error (3/8) w/(1 + r) of the correlation peak after Tonry and Davis (1979), km/s.</summary>
    public double TonryDavisErrorKmPerS { get; internal init; } = double.NaN;

    /// <summary>Height of the peak in standard deviations of what noise gives.</summary>
    public double Significance { get; internal init; } = double.NaN;

    /// <summary>Scatter of the velocities of single lines beyond their noise, km/s; 0 where noise explains it.</summary>
    public double LineScatterKmPerS { get; internal init; } = double.NaN;

    /// <summary>χ² of the fitted template over the number of pixels.</summary>
    public double ReducedChiSquare { get; internal init; } = double.NaN;

    /// <summary>Mean depth of the lines in units of the template's.</summary>
    public double Depth { get; internal init; } = double.NaN;

    /// <summary>Full width at half maximum of the Gaussian by which the template was widened, km/s.</summary>
    public double BroadeningFwhmKmPerS { get; internal init; } = double.NaN;

    /// <summary>Number of lines, or groups of lines that overlap, that the velocity rests on.</summary>
    public int LinesUsed { get; internal init; }

    /// <summary>Number of them left out: masked, in emission, or too far off.</summary>
    public int LinesLeftOut { get; internal init; }

    /// <summary>A second star, where there is one.</summary>
    public VelocityResult? Second { get; internal init; }

    /// <summary>A Gaussian with the place, height and width of the peak, for drawing; NaN where there is no peak.</summary>
    /// <param name="velocityKmPerS">Velocity in the frame of the spectrum, km/s.</param>
    public double FittedPeak(double velocityKmPerS)
    {
        double u = (velocityKmPerS - PeakKmPerS.Value) / Measurement.PeakFwhmKmPerS;
        return Measurement.PeakHeight * Math.Exp(-4.0 * Math.Log(2.0) * u * u);
    }

    /// <summary>
    /// The result reduced to the barycentre of the solar system: factors 1 + z multiply, and the uncertainty stays. A spectrum
    /// whose wavelengths were reduced before keeps its velocity; only the time is set.
    /// </summary>
    /// <param name="correction">The correction for the target, the site and the middle of the exposure.</param>
    public VelocityResult Reduced(BarycentricResult correction)
    {
        ArgumentNullException.ThrowIfNull(correction);
        bool moved = Frame is not (VelocityFrame.Topocentric or VelocityFrame.Unknown);
        VelocityMeasurement reduced = Measurement with { BarycentricJdTdb = correction.BarycentricJdTdb };
        if (!moved && ObservedKmPerS.HasValue)
        {
            reduced = reduced with
            {
                Status = VelocityStatus.Measured,
                VelocityKmPerS = ObservedKmPerS with { Value = correction.ApplyKmPerS(ObservedKmPerS.Value) },
                BarycentricCorrectionKmPerS = correction.CorrectionKmPerS,
            };
        }

        return With(reduced, Second?.Reduced(correction));
    }

    /// <summary>The same result with the velocity of several templates.</summary>
    internal VelocityResult Combined(VelocityMeasurement measurement, Measured observed, int linesUsed, int linesLeftOut) =>
        Copy(measurement, Second, observed, linesUsed, linesLeftOut);

    /// <summary>The same result with another measurement: reduced, or with more warnings.</summary>
    internal VelocityResult With(VelocityMeasurement measurement) => With(measurement, Second);

    /// <summary>The same result with another measurement and another second star.</summary>
    internal VelocityResult With(VelocityMeasurement measurement, VelocityResult? second) =>
        Copy(measurement, second, ObservedKmPerS, LinesUsed, LinesLeftOut);

    private VelocityResult Copy(
        VelocityMeasurement measurement, VelocityResult? second, Measured observed, int linesUsed, int linesLeftOut) =>
        new(measurement, _velocities, _correlation)
        {
            Frame = Frame,
            ObservedKmPerS = observed,
            PeakKmPerS = PeakKmPerS,
            TonryDavisErrorKmPerS = TonryDavisErrorKmPerS,
            Significance = Significance,
            LineScatterKmPerS = LineScatterKmPerS,
            ReducedChiSquare = ReducedChiSquare,
            Depth = Depth,
            BroadeningFwhmKmPerS = BroadeningFwhmKmPerS,
            LinesUsed = linesUsed,
            LinesLeftOut = linesLeftOut,
            Second = second,
        };
}
