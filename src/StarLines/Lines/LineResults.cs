using System;
using StarLines.LineLists;

namespace StarLines.Lines;

/// <summary>Turns finished tasks into measurements.</summary>
internal static class LineResults
{
    /// <summary>mÅ in one Å.</summary>
    private const double MilliangstromPerAngstrom = 1000.0;

    /// <summary>A centre farther than this many full widths from its prediction is called shifted.</summary>
    private const double ShiftedFwhm = 0.5;

    /// <summary>Lines narrower than this many pixels are called undersampled.</summary>
    private const double UndersampledPixels = 2.0;

    /// <summary>Depth from which a line may be saturated; the core must also come within two standard deviations of zero.</summary>
    private const double SaturatedDepth = 0.9;

    /// <summary>A pixel mean may be this much shallower than the narrowest profile; noise comes on top.</summary>
    private const double DeepestOverData = 2.5;

    internal static LineMeasurementSet Collect(
        LineTask[] tasks, NormalizedPixels pixels, LineList list, LineMeasureOptions options, string profile)
    {
        var lines = new LineMeasurement[tasks.Length];
        var windows = new LineWindow[tasks.Length];
        for (int i = 0; i < tasks.Length; i++)
        {
            LineTask task = tasks[i];
            RefuseDegenerate(task, pixels);
            Warn(task, pixels, options);
            lines[i] = ToMeasurement(task, pixels, list.Medium, profile);
            windows[i] = task.Usable ? new LineWindow(task.First, task.Last, task.Continuum) : LineWindow.None;
        }

        return new LineMeasurementSet(lines, windows, pixels.Model);
    }

    private static void Warn(LineTask task, NormalizedPixels pixels, LineMeasureOptions options)
    {
        if (!task.Usable)
        {
            return;
        }

        LineWarnings added = options.NoiseFromFlux ? LineWarnings.NoiseFromFlux : LineWarnings.None;
        if (task.Status == LineStatus.Measured)
        {
            double shift = Math.Abs(task.Centre - task.Predicted);
            added |= shift > ShiftedFwhm * task.Fwhm ? LineWarnings.Shifted : LineWarnings.None;
            added |= task.Fwhm < UndersampledPixels * task.PixelWidth ? LineWarnings.Undersampled : LineWarnings.None;
            added |= IsSaturated(task, pixels) ? LineWarnings.Saturated : LineWarnings.None;
            added |= Disagrees(task) ? LineWarnings.MethodsDisagree : LineWarnings.None;
        }

        task.Warnings |= added;
    }

    private static void RefuseDegenerate(LineTask task, NormalizedPixels pixels)
    {
        if (task.Status != LineStatus.Measured || task.Blend == 0 || (task.Warnings & LineWarnings.Edge) != 0)
        {
            return;
        }

        double largest = 0.0;
        double noise = 0.0;
        for (int i = Math.Max(0, task.First); i <= Math.Min(task.Last, pixels.Count - 1); i++)
        {
            if (pixels.IsUsed(i) && Math.Abs(1.0 - pixels.Flux[i]) > largest)
            {
                largest = Math.Abs(1.0 - pixels.Flux[i]);
                noise = 1.0 / pixels.Weight[i];
            }
        }

        if (Math.Abs(task.Depth) > DeepestOverData * (largest + (3.0 * noise)))
        {
            task.Status = LineStatus.Failed;
            task.Warnings |= LineWarnings.Degenerate;
        }
    }

    private static bool IsSaturated(LineTask task, NormalizedPixels pixels)
    {
        int core = pixels.NearestPixel(task.Centre);
        return task.Depth > SaturatedDepth && core >= 0 && pixels.IsUsed(core)
            && pixels.Model[core] * pixels.Weight[core] < 2.0;
    }

    /// <summary>
    /// The summation contains the noise of the fit and more, so the difference scatters by what it has more; half a per cent
    /// is allowed for what lies outside the summed window.
    /// </summary>
    private static bool Disagrees(LineTask task)
    {
        double scatter = task.DirectNoise;
        double allowed = (3.0 * scatter) + (0.005 * Math.Abs(task.EquivalentWidth));
        return Math.Abs(task.Direct.Value - task.EquivalentWidth) > allowed;
    }

    private static LineMeasurement ToMeasurement(LineTask task, NormalizedPixels pixels, Medium listMedium, string profile)
    {
        Medium medium = pixels.Spectrum.Scale.Medium;
        double rest = LineWavelengths.Predict(task.Rest.WavelengthAngstrom, listMedium, medium, 1.0);
        var measurement = new LineMeasurement
        {
            Line = task.Rest.Name,
            Species = task.Rest.Species,
            RestWavelengthAngstrom = rest,
            Medium = medium,
            Status = task.Status,
            Profile = profile,
            Warnings = task.Warnings,
            Blend = task.Blend,
        };
        if (!task.Usable)
        {
            return measurement;
        }

        measurement = measurement with
        {
            SignalToNoise = ContinuumSignalToNoise(task, pixels),
            DirectEquivalentWidthMilliangstrom = Scale(task.Direct, MilliangstromPerAngstrom),
            Pixels = task.Pixels,
        };
        if (task.Status == LineStatus.Limit)
        {
            return measurement with
            {
                LimitMilliangstrom = MilliangstromPerAngstrom * task.Limit,
                FwhmAngstrom = new Measured(task.ExpectedFwhm, double.NaN),
            };
        }

        var centre = new Measured(task.Centre, task.CentreSigma);
        double continuumPart = Math.Sqrt(Math.Max(0.0, (task.TotalSigma * task.TotalSigma) - (task.NoiseSigma * task.NoiseSigma)));
        return measurement with
        {
            CentreAngstrom = centre,
            VelocityKmPerS = LineWavelengths.Velocity(centre, task.Rest.WavelengthAngstrom, listMedium, medium),
            EquivalentWidthMilliangstrom = Scale(new Measured(task.EquivalentWidth, task.TotalSigma), MilliangstromPerAngstrom),
            EquivalentWidthNoiseMilliangstrom = MilliangstromPerAngstrom * task.NoiseSigma,
            EquivalentWidthContinuumMilliangstrom = MilliangstromPerAngstrom * continuumPart,
            Depth = new Measured(task.Depth, task.DepthSigma),
            FwhmAngstrom = new Measured(task.Fwhm, task.FwhmSigma),
            Flux = FluxOf(task, pixels),
            ReducedChiSquare = task.ReducedChiSquare,
        };
    }

    private static Measured FluxOf(LineTask task, NormalizedPixels pixels)
    {
        if (pixels.Spectrum.FluxUnit.Length == 0)
        {
            return Measured.None;
        }

        double level = pixels.Continuum.Level[task.Pixel];
        return new Measured(-task.EquivalentWidth * task.Continuum * level, task.FluxSigma * level);
    }

    /// <summary>Continuum over noise a pixel, at the ends of the window, so that the noise of a deep core does not count.</summary>
    private static double ContinuumSignalToNoise(LineTask task, NormalizedPixels pixels)
    {
        double best = 0.0;
        int edge = 0;
        foreach (int index in (ReadOnlySpan<int>)[task.First, task.Last])
        {
            if (index >= 0 && pixels.IsUsed(index))
            {
                best += pixels.Weight[index];
                edge++;
            }
        }

        return edge > 0 ? best / edge : pixels.Weight[task.Pixel];
    }

    private static Measured Scale(Measured measured, double factor) =>
        new(measured.Value * factor, measured.Uncertainty * factor);
}
