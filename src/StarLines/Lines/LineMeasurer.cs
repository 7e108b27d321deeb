using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Profiles;
using StarLines.Velocities;

namespace StarLines.Lines;

/// <summary>Measures the lines of a list in a spectrum: profile fits, equivalent widths, limits.</summary>
public static class LineMeasurer
{
    /// <summary>Passes over all lines: the second knows the widths, the neighbours and the lines hidden between them.</summary>
    private const int Passes = 2;

    /// <summary>Passes at most, where widths still changed so much in the second that their windows were wrong.</summary>
    private const int MostPasses = 4;

    /// <summary>
    /// Measures every line of a list. Lines that touch are fitted together by least squares with the local continuum, whose
    /// prior is the global one; each is also summed directly. What is not there becomes a limit of three standard deviations
    /// at the expected width: of the list, else of the strong lines of the same spectrum, else of the instrument.
    /// </summary>
    /// <param name="spectrum">The spectrum, with uncertainties.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="list">Lines at rest; converted to the spectrum's medium.</param>
    /// <param name="options">How.</param>
    /// <returns>One measurement a line of the list.</returns>
    /// <exception cref="ArgumentException">The spectrum has no uncertainties, the continuum is of another length, or an option is out of range.</exception>
    public static LineMeasurementSet Measure(
        Spectrum spectrum, ContinuumFit continuum, LineList list, LineMeasureOptions options)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(list);
        ArgumentNullException.ThrowIfNull(options);
        Check(spectrum, continuum, options);
        using var pixels = new NormalizedPixels(spectrum, continuum);
        ILineProfile profile = ProfileOf(options.Profile);
        double resolvingPower = options.ResolvingPower ?? spectrum.Metadata.ResolvingPower ?? double.NaN;
        LineTask[] tasks = Prepare(pixels, list, options);
        var finder = new LineFinder(pixels, options, resolvingPower);
        var fitter = new BlendFitter(pixels, options, profile);
        var groups = new LineGroups(tasks.Length);
        finder.Start(tasks);
        for (int pass = 0; pass < Passes || (pass < MostPasses && !AreSettled(tasks)); pass++)
        {
            FitGroups(tasks, groups, pixels, fitter, options, pass);
            fitter.Rebuild(tasks);
            if (pass == 0)
            {
                finder.LookAgain(tasks);
            }
        }

        foreach (LineTask task in tasks)
        {
            if (task.Usable)
            {
                finder.SetLimit(task);
                DirectSummation.Sum(pixels, fitter, task);
            }
        }

        return LineResults.Collect(tasks, pixels, list, options, profile.Name);
    }

    private static void Check(Spectrum spectrum, ContinuumFit continuum, LineMeasureOptions options)
    {
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        if (!spectrum.HasSigma)
        {
            throw new ArgumentException(
                "The spectrum has no uncertainties; estimate them from the flux before measuring lines.", nameof(spectrum));
        }

        Guard.Between(Math.Abs(options.VelocityKmPerS), 0.0, 0.99 * PhysicalConstants.SpeedOfLightKmPerS, nameof(options), "km/s");
        Guard.Positive(options.DetectionSignificance, nameof(options), "standard deviations");
        Guard.Positive(options.SearchFwhm, nameof(options), "full widths at half maximum");
        Guard.Between(options.WindowHalfWidthFwhm, 1.0, 20.0, nameof(options), "full widths at half maximum");
        if (options.ResolvingPower is double resolvingPower)
        {
            Guard.Positive(resolvingPower, nameof(options), "(resolving power)");
        }
    }

    private static ILineProfile ProfileOf(ProfileShape shape) => shape switch
    {
        ProfileShape.Gaussian => new GaussianProfile(),
        ProfileShape.Lorentzian => new LorentzianProfile(),
        _ => throw new ArgumentOutOfRangeException(nameof(shape), shape, "This profile is not known."),
    };

    private static LineTask[] Prepare(NormalizedPixels pixels, LineList list, LineMeasureOptions options)
    {
        Medium medium = pixels.Spectrum.Scale.Medium;
        double factor = Doppler.Factor(options.VelocityKmPerS);
        IReadOnlyList<RestLine> lines = list.Lines;
        var tasks = new LineTask[lines.Count];
        for (int i = 0; i < tasks.Length; i++)
        {
            double predicted = LineWavelengths.Predict(lines[i].WavelengthAngstrom, list.Medium, medium, factor);
            tasks[i] = new LineTask(lines[i], predicted);
            Place(tasks[i], pixels, medium);
        }

        return tasks;
    }

    private static void Place(LineTask task, NormalizedPixels pixels, Medium medium)
    {
        task.Pixel = pixels.NearestPixel(task.Predicted);
        if (task.Pixel < 0)
        {
            task.Status = LineStatus.OffSpectrum;
            return;
        }

        task.PixelWidth = pixels.PixelWidth(task.Pixel);
        ContinuumFit continuum = pixels.Continuum;
        double level = continuum.Level[task.Pixel];
        task.ContinuumSigma = level > 0.0 ? continuum.Sigma[task.Pixel] / level : 0.0;
        task.Warnings |= continuum.Trusted[task.Pixel] ? LineWarnings.None : LineWarnings.Continuum;
        task.Warnings |= medium == Medium.Unknown ? LineWarnings.MediumAssumed : LineWarnings.None;
        if (!(level > 0.0))
        {
            task.Status = LineStatus.Failed;
            task.Warnings |= LineWarnings.Continuum;
        }
    }

    private static void FitGroups(
        LineTask[] tasks, LineGroups groups, NormalizedPixels pixels, BlendFitter fitter, LineMeasureOptions options, int pass)
    {
        groups.Build(tasks, pixels);
        int blends = 0;
        for (int group = 0; group < groups.Count; group++)
        {
            ReadOnlySpan<int> members = groups.Members(group);
            (int first, int last) = groups.Window(tasks, pixels, group, options.WindowHalfWidthFwhm);
            if (NeedsFit(tasks, pixels, members, first, last, pass))
            {
                fitter.Fit(tasks, members, first, last);
            }

            NumberBlend(tasks, members, ref blends);
        }
    }

    private static bool AreSettled(LineTask[] tasks)
    {
        foreach (LineTask task in tasks)
        {
            if (task.Status == LineStatus.Measured && !task.IsSettled)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>A line alone in its window, which the first pass already had nearly right, is finished; after the second pass so is every settled line.</summary>
    private static bool NeedsFit(
        LineTask[] tasks, NormalizedPixels pixels, ReadOnlySpan<int> members, int first, int last, int pass)
    {
        LineTask task = tasks[members[0]];
        bool measured = true;
        bool settled = true;
        foreach (int member in members)
        {
            measured &= tasks[member].Status == LineStatus.Measured;
            settled &= tasks[member].IsSettled;
        }

        if (pass >= Passes)
        {
            return !settled;
        }

        if (pass == 0 || members.Length > 1 || !measured || task.Blend != 0)
        {
            return true;
        }

        int tolerance = 1 + ((last - first) / 8);
        if (Math.Abs(first - task.First) > tolerance || Math.Abs(last - task.Last) > tolerance)
        {
            return true;
        }

        // At the ends of the window a line alone has left the model at 1.
        const double Touched = 1e-4;
        return Math.Abs(pixels.Model[first] - 1.0) > Touched || Math.Abs(pixels.Model[last] - 1.0) > Touched;
    }

    private static void NumberBlend(LineTask[] tasks, ReadOnlySpan<int> members, ref int blends)
    {
        int fitted = 0;
        foreach (int member in members)
        {
            fitted += tasks[member].Fitted ? 1 : 0;
        }

        blends += fitted > 1 ? 1 : 0;
        foreach (int member in members)
        {
            tasks[member].Blend = fitted > 1 && tasks[member].Fitted ? blends : 0;
            tasks[member].Warnings |= members.Length > 1 ? LineWarnings.Blended : LineWarnings.None;
        }
    }
}
