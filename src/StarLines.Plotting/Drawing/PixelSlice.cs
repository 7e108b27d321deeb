using System;
using System.Collections.Generic;

namespace StarLines.Plotting.Drawing;

/// <summary>The pixels of a spectrum that a panel shows, with one more at each end so that lines reach the frame.</summary>
internal sealed class PixelSlice
{
    private readonly Spectrum _spectrum;

    internal PixelSlice(Spectrum spectrum, DataRange range)
    {
        _spectrum = spectrum;
        Start = Math.Max(0, spectrum.Scale.FirstIndexAtOrAbove(range.Minimum) - 1);
        int end = Math.Min(spectrum.Count, spectrum.Scale.FirstIndexAtOrAbove(range.Maximum) + 1);
        Count = Math.Max(0, end - Start);
        Wavelengths = spectrum.Scale.WavelengthsAngstrom.Slice(Start, Count).ToArray();
        Flux = spectrum.Flux.Slice(Start, Count).ToArray();
        Sigma = spectrum.HasSigma ? spectrum.Sigma.Slice(Start, Count).ToArray() : [];
        Good = new bool[Count];
        Masked = new bool[Count];
        ReadOnlySpan<PixelFaults> faults = spectrum.Faults.Slice(Start, Count);
        for (int i = 0; i < Count; i++)
        {
            Good[i] = faults[i] == PixelFaults.None;
            Masked[i] = !Good[i] && (faults[i] & PixelFaults.Missing) == 0;
        }
    }

    internal int Start { get; }

    internal int Count { get; }

    internal double[] Wavelengths { get; }

    internal double[] Flux { get; }

    internal double[] Sigma { get; }

    internal bool[] Good { get; }

    /// <summary>Pixels that have a flux and are not used.</summary>
    internal bool[] Masked { get; }

    /// <summary>Flags with the neighbours of those set, so that a line of a few pixels joins what lies around it.</summary>
    internal static bool[] WithNeighbours(bool[] flags, bool[] allowed)
    {
        var wider = new bool[flags.Length];
        for (int i = 0; i < flags.Length; i++)
        {
            bool near = flags[i] || (i > 0 && flags[i - 1]) || (i + 1 < flags.Length && flags[i + 1]);
            wider[i] = near && (flags[i] || allowed[i]);
        }

        return wider;
    }

    /// <summary>The runs of pixels that are not used, from edge to edge.</summary>
    internal List<DataRange> FaultRanges()
    {
        var ranges = new List<DataRange>();
        int i = 0;
        while (i < Count)
        {
            if (Good[i])
            {
                i++;
                continue;
            }

            int first = i;
            while (i < Count && !Good[i])
            {
                i++;
            }

            ranges.Add(new DataRange(
                _spectrum.Scale.EdgeAngstrom(Start + first), _spectrum.Scale.EdgeAngstrom(Start + i)));
        }

        return ranges;
    }
}
