using System;
using System.Globalization;

namespace StarLines;

/// <summary>A closed range of wavelengths, both ends included.</summary>
public readonly record struct WavelengthRange
{
    /// <summary>Makes a range.</summary>
    /// <param name="minimumAngstrom">Lower end, Å; finite.</param>
    /// <param name="maximumAngstrom">Upper end, Å; finite and not below the lower.</param>
    /// <exception cref="ArgumentException">An end is not finite, or the ends are the wrong way round.</exception>
    public WavelengthRange(double minimumAngstrom, double maximumAngstrom)
    {
        Guard.Finite(minimumAngstrom, nameof(minimumAngstrom), "Å");
        Guard.Finite(maximumAngstrom, nameof(maximumAngstrom), "Å");
        if (maximumAngstrom < minimumAngstrom)
        {
            throw new ArgumentException(string.Create(
                CultureInfo.InvariantCulture,
                $"The range {minimumAngstrom}:{maximumAngstrom} Å runs backwards; give the smaller wavelength first."));
        }

        MinimumAngstrom = minimumAngstrom;
        MaximumAngstrom = maximumAngstrom;
    }

    /// <summary>Lower end, Å.</summary>
    public double MinimumAngstrom { get; }

    /// <summary>Upper end, Å.</summary>
    public double MaximumAngstrom { get; }

    /// <summary>Length, Å.</summary>
    public double LengthAngstrom => MaximumAngstrom - MinimumAngstrom;

    /// <summary>Whether a wavelength lies in the range, the ends included.</summary>
    /// <param name="wavelengthAngstrom">Wavelength, Å.</param>
    public bool Contains(double wavelengthAngstrom) =>
        wavelengthAngstrom >= MinimumAngstrom && wavelengthAngstrom <= MaximumAngstrom;
}
