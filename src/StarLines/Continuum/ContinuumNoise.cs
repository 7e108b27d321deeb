using System;

namespace StarLines.Continuum;

/// <summary>What is learned of the residuals: one scale for the quoted noise, and a mixture for each block of pixels.</summary>
internal sealed class ContinuumNoise
{
    // Blocks follow how crowded a spectrum is; this many pixels fix a mixture.
    private const int BlockPixels = 2000;
    private const int MostBlocks = 16;

    // Fewer pixels than this above the level say nothing of the noise.
    private const double LeastWeight = 10.0;

    private readonly int _pixels;
    private readonly ContinuumMixture[] _mixtures;
    private readonly ContinuumMixture _whole = new();
    private readonly MixtureCounts[] _counts;

    internal ContinuumNoise(int pixels, int blocks, double scale)
    {
        _pixels = pixels;
        Scale = scale;
        Blocks = blocks;
        _mixtures = new ContinuumMixture[Blocks];
        for (int b = 0; b < Blocks; b++)
        {
            _mixtures[b] = new ContinuumMixture();
        }

        _counts = new MixtureCounts[Blocks];
    }

    /// <summary>Number of blocks.</summary>
    internal int Blocks { get; }

    /// <summary>Scatter of the continuum pixels in units of the quoted noise.</summary>
    internal double Scale { get; private set; }

    /// <summary>Information a pixel of the core carries against one that is surely continuum, 0.1 to 1 (Louis 1982).</summary>
    internal double Information { get; private set; } = 1.0;

    /// <summary>The number of blocks that so many pixels can feed.</summary>
    internal static int BlocksFor(int pixels) => Math.Clamp(pixels / BlockPixels, 1, MostBlocks);

    /// <summary>What was learned, for another sampling of the same spectrum.</summary>
    /// <param name="pixels">Its number of pixels.</param>
    internal ContinuumNoise ForPixels(int pixels)
    {
        var other = new ContinuumNoise(pixels, Blocks, Scale);
        for (int b = 0; b < Blocks; b++)
        {
            other._mixtures[b] = _mixtures[b].Copy();
        }

        return other;
    }

    /// <summary>The mixture of a block.</summary>
    internal ContinuumMixture Mixture(int block) => _mixtures[block];

    /// <summary>First pixel of a block, and the one after its last.</summary>
    internal (int Start, int End) PixelsOf(int block) =>
        ((int)((long)_pixels * block / Blocks), (int)((long)_pixels * (block + 1) / Blocks));

    /// <summary>Forgets the counts of the last step.</summary>
    internal void BeginStep() => Array.Clear(_counts);

    /// <summary>Adds the counts of some pixels of a block.</summary>
    internal void Count(int block, in MixtureCounts counts) => Add(ref _counts[block], counts);

    /// <summary>Learns from what was counted.</summary>
    internal void EndStep(double leastScale, double largestScale)
    {
        var whole = default(MixtureCounts);
        foreach (MixtureCounts counts in _counts)
        {
            Add(ref whole, counts);
        }

        _whole.Learn(whole, null);
        for (int b = 0; b < Blocks; b++)
        {
            _mixtures[b].Learn(_counts[b], _whole);
        }

        Information = whole.Core > 0.0 ? Math.Clamp(1.0 - (whole.Lost / whole.Core), 0.1, 1.0) : 1.0;
        if (whole.Weight > LeastWeight)
        {
            Scale = Math.Clamp(Scale * Math.Sqrt(whole.Squares / whole.Weight), leastScale, largestScale);
        }
    }

    private static void Add(ref MixtureCounts sum, in MixtureCounts counts)
    {
        sum.Pixels += counts.Pixels;
        sum.Core += counts.Core;
        sum.Below += counts.Below;
        sum.Lost += counts.Lost;
        sum.Squares += counts.Squares;
        sum.Weight += counts.Weight;
    }
}
