using System;
using StarLines.Noise;

namespace StarLines.Continuum;

/// <summary>Finds the continuum of a spectrum.</summary>
/// <remarks>
/// A penalized cubic spline, fitted by maximum likelihood to a mixture in which a pixel is continuum with Gaussian noise, or
/// pulled down (or, more rarely, up) by any amount; each pixel weighs by its probability of being continuum, and the shallow
/// absorption that no weight can tell from continuum is allowed for, so that the level is neither set high by asymmetric
/// clipping nor low by a symmetric fit. The cost is linear in the number of pixels.
/// </remarks>
public static class ContinuumFitter
{
    // Stiffer by this factor from one candidate to the next.
    private const double StiffnessRatio = 1.8;
    private const double ShortestKmPerS = 6000.0;
    private const double ShortestPixels = 100.0;
    private const double ShortestFraction = 1.0 / 30.0;

    // One order of an echelle may bend as much as its blaze function does.
    private const double OrderFraction = 0.3;

    // Three times the range leaves a parabola.
    private const double LongestFraction = 3.0;

    // Residual structure of a real spectrum is correlated over a resolution element of about this many pixels.
    private const double CorrelatedPixels = 4.0;

    // Twice the log likelihood that a further free shape must gain: 2 is the criterion of Akaike (1974, IEEE Trans. Autom.
    // Control 19, 716); somewhat more, since leaving a bend in costs less than following a broad line.
    private const double FreedomCost = 3.0;

    // While the stiffness is chosen this many pixels are enough.
    private const int SearchPixels = 1600;
    private const int FirstSteps = 9;
    private const int PlainSteps = 3;
    private const int StepsPerCandidate = 2;
    private const int MostFinalSteps = 5;

    // The level has settled when a step moves it by less than this part of its own uncertainty.
    private const double Settled = 0.05;

    /// <summary>Fits the continuum.</summary>
    /// <param name="spectrum">The spectrum; N pixels. Without uncertainties the noise is taken from the flux.</param>
    /// <param name="options">Settings.</param>
    /// <param name="lineModel">N values of already fitted lines in units of the continuum, divided out first; or none.</param>
    /// <returns>
    /// N levels; their uncertainty covers noise and the doubt which pixels are continuum. All NaN where the spectrum has no
    /// positive level to fit.
    /// </returns>
    /// <exception cref="ArgumentException">A setting is out of range, or the lengths differ.</exception>
    public static ContinuumFit Fit(
        Spectrum spectrum, ContinuumOptions? options = null, ReadOnlySpan<double> lineModel = default)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        options ??= ContinuumOptions.Default;
        if (options.StiffnessAngstrom is double given)
        {
            Guard.Positive(given, nameof(options), "Å");
        }

        if (!lineModel.IsEmpty)
        {
            Guard.SameLength(lineModel.Length, spectrum.Count, nameof(lineModel));
        }

        ContinuumData? data = Data(spectrum, lineModel);
        return data is null ? Nothing(spectrum.Count) : FitData(spectrum, data, options);
    }

    /// <summary>Fits the continuum again, once lines have been fitted, beginning from what was found before.</summary>
    /// <param name="spectrum">The spectrum; N pixels.</param>
    /// <param name="previous">The continuum on which the lines were fitted.</param>
    /// <param name="lineModel">N values of the fitted lines in units of that continuum, divided out first.</param>
    /// <returns>A continuum of the same stiffness.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static ContinuumFit Refine(Spectrum spectrum, ContinuumFit previous, ReadOnlySpan<double> lineModel)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(previous);
        Guard.SameLength(previous.Count, spectrum.Count, nameof(previous));
        Guard.SameLength(lineModel.Length, spectrum.Count, nameof(lineModel));
        ContinuumData? data = Data(spectrum, lineModel);
        if (data is null || !(previous.StiffnessAngstrom > 0.0))
        {
            return previous;
        }

        data.SetLevel(previous, spectrum.Scale);
        ContinuumNoise noise = previous.Noise?.ForPixels(data.Count)
            ?? new ContinuumNoise(data.Count, ContinuumNoise.BlocksFor(data.Count), 1.0);
        ContinuumIteration final = Finish(data, noise, previous.StiffnessAngstrom);
        return ContinuumResult.Make(spectrum, data, noise, final.Spline, previous.StiffnessAngstrom);
    }

    private static ContinuumData? Data(Spectrum spectrum, ReadOnlySpan<double> lineModel)
    {
        ReadOnlySpan<double> sigma = spectrum.HasSigma ? spectrum.Sigma : NoiseEstimator.EstimatePerPixel(spectrum);
        ContinuumData? data = ContinuumData.From(spectrum, sigma, lineModel);
        return data is { Count: > 1 } ? data : null;
    }

    private static ContinuumFit FitData(Spectrum spectrum, ContinuumData data, ContinuumOptions options)
    {
        double range = Math.Max(data.X[^1] - data.X[0], data.X[0] * 1e-9);
        double longest = LongestFraction * range;
        if (options.ExcludeBroadBalmerWings)
        {
            BalmerWings.Exclude(data, spectrum.Scale.Medium, options.VelocityKmPerS);
        }

        ContinuumData thin = data.Thinned(Math.Max(1, data.Count / SearchPixels));
        double shortest = options.StiffnessAngstrom ?? options.ShortestStiffnessAngstrom ?? Shortest(data, range);
        ContinuumNoise noise = Start(thin, ContinuumNoise.BlocksFor(data.Count), shortest);
        double stiffness = options.StiffnessAngstrom ?? ChooseStiffness(thin, noise, shortest, longest);
        ContinuumIteration rough = Iterate(thin, noise, stiffness, StepsPerCandidate, learn: true);
        rough.Spline.Evaluate(data.X, rough.Spline.IntervalEnds(data.X), data.Level);

        ContinuumNoise fullNoise = noise.ForPixels(data.Count);
        ContinuumIteration final = Finish(data, fullNoise, stiffness);
        return ContinuumResult.Make(spectrum, data, fullNoise, final.Spline, stiffness);
    }

    // The most flexible spline finds the continuum everywhere, and its noise, before a stiffer one may be judged.
    private static ContinuumNoise Start(ContinuumData data, int blocks, double stiffness)
    {
        bool hump = ContinuumStart.SetUpperLevel(data);
        var noise = new ContinuumNoise(data.Count, blocks, ContinuumStart.NoiseScale(data));
        ContinuumIteration upper = Iterate(data, noise, stiffness, FirstSteps, learn: true);
        if (!hump)
        {
            return noise;
        }

        double[] level = data.Level.AsSpan().ToArray();
        double evidence = upper.Evidence();
        ContinuumStart.SetLowerLevel(data);
        var other = new ContinuumNoise(data.Count, blocks, ContinuumStart.NoiseScale(data));
        if (Iterate(data, other, stiffness, FirstSteps, learn: true).Evidence() > evidence)
        {
            return other;
        }

        level.CopyTo(data.Level.AsSpan());
        return noise;
    }

    private static double Shortest(ContinuumData data, double range)
    {
        double middle = data.X[data.Count / 2];
        double pixel = range / Math.Max(1, data.Count - 1);
        double byVelocity = middle * ShortestKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
        double shortest = Math.Max(Math.Max(byVelocity, ShortestPixels * pixel), range * ShortestFraction);
        return Math.Min(shortest, range * OrderFraction);
    }

    private static double ChooseStiffness(ContinuumData data, ContinuumNoise noise, double shortest, double longest)
    {
        // All are judged by the noise that the most flexible one left.
        int candidates = Math.Max(1, (int)Math.Floor(Math.Log(longest / shortest) / Math.Log(StiffnessRatio)) + 1);
        var levels = new double[candidates][];
        var iterations = new ContinuumIteration[candidates];
        iterations[0] = Iterate(data, noise, shortest, StepsPerCandidate, learn: true);
        levels[0] = data.Level.AsSpan().ToArray();
        for (int k = 1; k < candidates; k++)
        {
            levels[0].CopyTo(data.Level.AsSpan());
            iterations[k] = Iterate(data, noise, StiffnessOf(k, shortest), StepsPerCandidate, learn: false);
            levels[k] = data.Level.AsSpan().ToArray();
        }

        int best = Best(data, iterations, levels);
        levels[best].CopyTo(data.Level.AsSpan());
        return StiffnessOf(best, shortest);
    }

    private static double StiffnessOf(int candidate, double shortest) => shortest * Math.Pow(StiffnessRatio, candidate);

    private static int Best(ContinuumData data, ContinuumIteration[] iterations, double[][] levels)
    {
        int best = 0;
        double least = double.PositiveInfinity;
        double independent = data.Stride / CorrelatedPixels;
        for (int k = 0; k < iterations.Length; k++)
        {
            levels[k].CopyTo(data.Level.AsSpan());
            double criterion = (-2.0 * independent * iterations[k].LogLikelihood())
                + (iterations[k].Freedom * FreedomCost);
            if (criterion < least)
            {
                least = criterion;
                best = k;
            }
        }

        return best;
    }

    private static ContinuumIteration Iterate(ContinuumData data, ContinuumNoise noise, double stiffness, int steps, bool learn)
    {
        var iteration = new ContinuumIteration(data, noise, stiffness);
        for (int step = 0; step < steps; step++)
        {
            iteration.Step(learn, relax: learn && step >= PlainSteps && step < steps - 1);
        }

        return iteration;
    }

    private static ContinuumIteration Finish(ContinuumData data, ContinuumNoise noise, double stiffness)
    {
        var iteration = new ContinuumIteration(data, noise, stiffness);
        var before = new double[data.Count];
        var scratch = new double[iteration.Spline.Coefficients.Length];
        for (int step = 0; step < MostFinalSteps; step++)
        {
            iteration.Step(learn: true, relax: true);
            data.Level.CopyTo(before, 0);
            iteration.Step(learn: true);
            double middle = data.X[data.Count / 2];
            double uncertainty = Math.Sqrt(Math.Max(0.0, iteration.Spline.Variance(middle, scratch)));
            if (LargestMove(before, data.Level) < Settled * uncertainty)
            {
                break;
            }
        }

        return iteration;
    }

    private static double LargestMove(double[] before, double[] after)
    {
        double largest = 0.0;
        for (int i = 0; i < before.Length; i += 16)
        {
            largest = Math.Max(largest, Math.Abs(after[i] - before[i]));
        }

        return largest;
    }

    private static ContinuumFit Nothing(int count)
    {
        var none = new double[count];
        Array.Fill(none, double.NaN);
        return new ContinuumFit(none, none, new bool[count], double.NaN);
    }
}
