using System;

namespace StarLines.Profiles;

/// <summary>The pixels on which a profile is evaluated, in Å from some reference wavelength.</summary>
internal readonly ref struct PixelGrid
{
    /// <summary>Makes a grid of N pixels.</summary>
    /// <param name="edges">N + 1 pixel edges, increasing.</param>
    /// <param name="centres">N pixel centres.</param>
    /// <param name="sampling">What the flux of a pixel stands for.</param>
    internal PixelGrid(ReadOnlySpan<double> edges, ReadOnlySpan<double> centres, PixelSampling sampling)
    {
        Edges = edges;
        Centres = centres;
        Sampling = sampling;
    }

    /// <summary>Pixel edges; one more than the pixels.</summary>
    internal ReadOnlySpan<double> Edges { get; }

    /// <summary>Pixel centres.</summary>
    internal ReadOnlySpan<double> Centres { get; }

    /// <summary>What the flux of a pixel stands for.</summary>
    internal PixelSampling Sampling { get; }

    /// <summary>Number of pixels.</summary>
    internal int Count => Centres.Length;

    /// <summary>A run of the pixels.</summary>
    internal PixelGrid Slice(int start, int count) =>
        new(Edges.Slice(start, count + 1), Centres.Slice(start, count), Sampling);
}
