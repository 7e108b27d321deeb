using System;
using System.Numerics;
using StarLines.Numerics;

namespace StarLines.Templates;

/// <summary>
/// Pixels of equal steps in ln λ on which spectra are correlated. Step, start and length are rounded to a coarse raster,
/// so that spectra of one instrument share a grid, and with it the transforms of the templates.
/// </summary>
internal sealed class CorrelationGrid
{
    /// <summary>Steps are 2^(−k/8): at most 9 % finer than asked for.</summary>
    private const double StepsPerOctave = 8.0;

    /// <summary>Start and length are multiples of about this part of the length.</summary>
    private const int RasterParts = 64;

    /// <summary>Shortest raster, in pixels.</summary>
    private const int LeastRaster = 64;

    private CorrelationGrid(int stepNumber, long first, int count, int maximumLag)
    {
        _stepNumber = stepNumber;
        First = first;
        Count = count;
        MaximumLag = maximumLag;
        LogStep = Math.Pow(2.0, stepNumber / StepsPerOctave);
        Fft = new RealFft(RealFft.GoodSize(count + (2 * maximumLag)));
        EdgesAngstrom = new double[count + 1];
        for (int m = 0; m <= count; m++)
        {
            EdgesAngstrom[m] = Math.Exp((first + m - 0.5) * LogStep);
        }
    }

    private readonly int _stepNumber;

    /// <summary>Step in ln λ.</summary>
    internal double LogStep { get; }

    /// <summary>Pixel 0 lies at ln λ = First × LogStep.</summary>
    internal long First { get; }

    /// <summary>Number of pixels.</summary>
    internal int Count { get; }

    /// <summary>Largest shift to be searched, in pixels, to either side.</summary>
    internal int MaximumLag { get; }

    /// <summary>The plan of the transform, long enough that no shift wraps around.</summary>
    internal RealFft Fft { get; }

    /// <summary>Edges of the pixels in vacuum, Å; Count + 1 values.</summary>
    internal double[] EdgesAngstrom { get; }

    /// <summary>The grid for a spectrum: the one that is kept where it fits, else a new one.</summary>
    /// <param name="kept">A grid used before, or null.</param>
    /// <param name="minimumAngstrom">Left edge of the spectrum in vacuum, Å.</param>
    /// <param name="maximumAngstrom">Right edge, Å.</param>
    /// <param name="finestLogStep">Smallest pixel of the spectrum in ln λ.</param>
    /// <param name="halfRange">Search range in ln λ to either side.</param>
    internal static CorrelationGrid For(
        CorrelationGrid? kept, double minimumAngstrom, double maximumAngstrom, double finestLogStep, double halfRange)
    {
        // A hair of tolerance: pixels that are exactly on the raster stay on it.
        int stepNumber = (int)Math.Floor((Math.Log2(finestLogStep) * StepsPerOctave) + 1e-6);
        double step = Math.Pow(2.0, stepNumber / StepsPerOctave);
        uint part = (uint)(Math.Log(maximumAngstrom / minimumAngstrom) / step / RasterParts);
        int raster = Math.Max(LeastRaster, (int)BitOperations.RoundUpToPowerOf2(Math.Max(part, 1u)));
        long first = (long)Math.Floor(((Math.Log(minimumAngstrom) / step) + 0.5) / raster) * raster;
        int count = (int)Math.Ceiling((((Math.Log(maximumAngstrom) / step) - 0.5) - first + 1.0) / raster) * raster;
        int lag = (int)Math.Ceiling(halfRange / step) + 2;
        return kept is not null && kept._stepNumber == stepNumber && kept.First == first && kept.Count == count && kept.MaximumLag == lag
            ? kept
            : new CorrelationGrid(stepNumber, first, Math.Max(count, raster), lag);
    }

    /// <summary>Whether another grid is the same.</summary>
    internal bool Matches(CorrelationGrid other) =>
        ReferenceEquals(this, other)
        || (_stepNumber == other._stepNumber && First == other.First && Count == other.Count && MaximumLag == other.MaximumLag);
}
