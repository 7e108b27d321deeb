using System;
using System.Diagnostics;

namespace StarLines.Continuum;

/// <summary>The continuum of a spectrum, pixel by pixel, with its own uncertainty.</summary>
public sealed class ContinuumFit
{
    private readonly double[] _level;
    private readonly double[] _sigma;
    private readonly bool[] _trusted;

    /// <summary>Makes a continuum of arrays that are copied.</summary>
    /// <param name="level">N continuum levels in the flux unit.</param>
    /// <param name="sigma">N standard deviations of the level, in the flux unit: placement by noise and by stiffness.</param>
    /// <param name="trusted">N flags: whether the level is supported by continuum pixels near by.</param>
    /// <param name="stiffnessAngstrom">The length over which the continuum may bend, Å.</param>
    public ContinuumFit(
        ReadOnlySpan<double> level, ReadOnlySpan<double> sigma, ReadOnlySpan<bool> trusted, double stiffnessAngstrom)
        : this(level.ToArray(), sigma.ToArray(), trusted.ToArray(), stiffnessAngstrom, takeOwnership: true)
    {
    }

    /// <summary>Makes a continuum of arrays that the caller just allocated and gives up.</summary>
    internal ContinuumFit(double[] level, double[] sigma, bool[] trusted, double stiffnessAngstrom, bool takeOwnership)
    {
        Debug.Assert(takeOwnership, "Only arrays just allocated may be handed over.");
        Guard.SameLength(sigma.Length, level.Length, nameof(sigma));
        Guard.SameLength(trusted.Length, level.Length, nameof(trusted));
        _level = level;
        _sigma = sigma;
        _trusted = trusted;
        StiffnessAngstrom = stiffnessAngstrom;
    }

    /// <summary>What the fit learned of the noise, for a refinement; null where the continuum was not fitted.</summary>
    internal ContinuumNoise? Noise { get; init; }

    /// <summary>Number of pixels.</summary>
    public int Count => _level.Length;

    /// <summary>The continuum level in the flux unit.</summary>
    public ReadOnlySpan<double> Level => _level;

    /// <summary>One standard deviation of the level, in the flux unit.</summary>
    public ReadOnlySpan<double> Sigma => _sigma;

    /// <summary>Whether the level rests on continuum pixels near by; false under broad lines, bands and gaps.</summary>
    public ReadOnlySpan<bool> Trusted => _trusted;

    /// <summary>The length over which the continuum may bend, Å.</summary>
    public double StiffnessAngstrom { get; }
}
