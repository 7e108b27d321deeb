using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Plotting.Drawing;

namespace StarLines.Plotting;

/// <summary>Which part of a spectrum a figure shows.</summary>
public sealed record SpectrumView
{
    private const int MostStrips = 20;

    /// <summary>The range to be shown, in the medium and frame of the spectrum; null for all of it.</summary>
    public WavelengthRange? Range { get; init; }

    /// <summary>Panels one under another into which the range is cut, 1 to 20.</summary>
    public int Strips { get; init; } = 1;

    /// <summary>The ranges of the strips, from short to long wavelengths.</summary>
    internal List<DataRange> Cut(Spectrum spectrum)
    {
        if (Strips is < 1 or > MostStrips)
        {
            throw new ArgumentException($"Strips is {Strips}; it must be 1 to {MostStrips}.");
        }

        WavelengthRange all = spectrum.Scale.Range;
        WavelengthRange wanted = Range ?? all;
        if (wanted.MaximumAngstrom < all.MinimumAngstrom || wanted.MinimumAngstrom > all.MaximumAngstrom)
        {
            throw new ArgumentException(string.Create(
                CultureInfo.InvariantCulture,
                $"The range {wanted.MinimumAngstrom}:{wanted.MaximumAngstrom} Å holds no pixel of the spectrum, which covers {all.MinimumAngstrom:F2}:{all.MaximumAngstrom:F2} Å."));
        }

        var whole = new DataRange(wanted.MinimumAngstrom, wanted.MaximumAngstrom);
        double step = whole.Length / Strips;
        var strips = new List<DataRange>();
        for (int i = 0; i < Strips; i++)
        {
            strips.Add(new DataRange(whole.Minimum + (i * step), whole.Minimum + ((i + 1) * step)));
        }

        return strips;
    }
}
