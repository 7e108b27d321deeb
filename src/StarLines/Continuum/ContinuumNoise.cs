using System;

namespace StarLines.Continuum;

/// <summary>What is learned of the residuals: one scale for the quoted noise, and a mixture for each block of pixels.</summary>
internal sealed class ContinuumNoise
{
    // Blocks follow how crowded a spectrum is; this many pixels fix a mixture.
    private const int BlockPixels = 2000;
    private const int MostBlocks = 16;

    private readonly int _pixels;
    private readonly ContinuumMixture[] _mixtures;
    private readonly ContinuumMixture _whole = new();
    private readonly double[] _counted;
    private readonly double[] _core;
    private readonly double[] _below;
    private double _scaleSum;
    private double _scaleWeight;

    private double _lost;

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

        _counted = new double[Blocks];
        _core = new double[Blocks];
        _below = new double[Blocks];
    }

    /// <summary>Number of blocks.</summary>
    internal int Blocks { get; }

    /// <summary>The number of blocks that so many pixels can feed.</summary>
    internal static int BlocksFor(int pixels) => Math.Clamp(pixels / BlockPixels, 1, MostBlocks);

    /// <summary>What was learned, for another sampling of the same spectrum.</summary>
    /// <param name="pixels">Its number of pixels.</param>
    internal ContinuumNoise ForPixels(int pixels)
    {
        var other = new ContinuumNoise(pixels, Blocks, Scale);
        _mixtures.CopyTo(other._mixtures, 0);
        return other;
    }

    /// <summary>Scatter of the continuum pixels in units of the quoted noise.</summary>
    internal double Scale { get; set; }

    /// <summary>Information a pixel of the core carries against one that is surely continuum, 0 to 1 (Louis 1982).</summary>
    internal double Information { get; private set; } = 1.0;

    /// <summary>The mixture of a block.</summary>
    internal ContinuumMixture Mixture(int block) => _mixtures[block];

    /// <summary>First pixel of a block, and the one after its last.</summary>
    internal (int Start, int End) PixelsOf(int block) =>
        ((int)((long)_pixels * block / Blocks), (int)((long)_pixels * (block + 1) / Blocks));

    internal void BeginStep()
    {
        Array.Clear(_counted);
        Array.Clear(_core);
        Array.Clear(_below);
        _scaleSum = 0.0;
        _scaleWeight = 0.0;
        _lost = 0.0;
    }

    /// <summary>Counts one pixel within the reach of the mixture.</summary>
    internal void Count(int block, double shift, double r, double p, double absorbed)
    {
        _counted[block] += 1.0;
        _core[block] += p;
        _below[block] += absorbed;
        double shifted = r + shift;
        _lost += p * (1.0 - p) * shifted * shifted;
        if (r > 0.0)
        {
            // Absorption leaves this side alone.
            _scaleSum += p * r * r;
            _scaleWeight += p;
        }
    }

    /// <summary>Learns from what was counted.</summary>
    internal void EndStep(double leastScale, double largestScale)
    {
        double counted = 0.0;
        double core = 0.0;
        double below = 0.0;
        for (int b = 0; b < Blocks; b++)
        {
            counted += _counted[b];
            core += _core[b];
            below += _below[b];
        }

        _whole.Learn(counted, core, below, null);
        for (int b = 0; b < Blocks; b++)
        {
            _mixtures[b].Learn(_counted[b], _core[b], _below[b], _whole);
        }

        Information = core > 0.0 ? Math.Clamp(1.0 - (_lost / core), 0.1, 1.0) : 1.0;
        if (_scaleWeight > 10.0)
        {
            Scale = Math.Clamp(Scale * Math.Sqrt(_scaleSum / _scaleWeight), leastScale, largestScale);
        }
    }
}
