using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Keeps the wavelengths that the user asked for.</summary>
internal static class RangeSelection
{
    internal static List<Spectrum> Apply(List<Spectrum> spectra, SpectrumReadOptions options)
    {
        if (options.Ranges.Count == 0)
        {
            return spectra;
        }

        var kept = new List<Spectrum>(spectra.Count);
        foreach (Spectrum spectrum in spectra)
        {
            if (Cut(spectrum, options.Ranges) is Spectrum part)
            {
                kept.Add(part);
            }
        }

        return kept.Count != 0
            ? kept
            : throw new SpectrumFormatException($"{spectra[0].Metadata.Source}: No pixel lies in the range asked for; the spectrum covers {Text(spectra[0])}.");
    }

    private static Spectrum? Cut(Spectrum spectrum, IReadOnlyList<WavelengthRange> ranges)
    {
        int first = spectrum.Count;
        int end = 0;
        var outside = new PixelFaults[spectrum.Count];
        Array.Fill(outside, PixelFaults.Excluded);
        foreach (WavelengthRange range in ranges)
        {
            int from = spectrum.Scale.FirstIndexAtOrAbove(range.MinimumAngstrom);
            int to = spectrum.Scale.FirstIndexAtOrAbove(Math.BitIncrement(range.MaximumAngstrom));
            if (to > from)
            {
                Array.Clear(outside, from, to - from);
                first = Math.Min(first, from);
                end = Math.Max(end, to);
            }
        }

        return end <= first ? null : spectrum.WithFaultsAdded(outside).Slice(first, end - first);
    }

    private static string Text(Spectrum spectrum) => string.Create(
        CultureInfo.InvariantCulture,
        $"{spectrum.Scale.Range.MinimumAngstrom:0.##} to {spectrum.Scale.Range.MaximumAngstrom:0.##} Å");
}
