using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>What the user says about a file; each fact given here wins over what the file says.</summary>
public sealed record SpectrumReadOptions
{
    /// <summary>Nothing said.</summary>
    public static SpectrumReadOptions Default { get; } = new();

    /// <summary>Air or vacuum; <see cref="Medium.Unknown"/> leaves it to the file.</summary>
    public Medium Medium { get; init; } = Medium.Unknown;

    /// <summary>The velocity frame of the wavelengths; <see cref="VelocityFrame.Unknown"/> leaves it to the file.</summary>
    public VelocityFrame Frame { get; init; } = VelocityFrame.Unknown;

    /// <summary>Unit of the spectral axis or column (<c>Angstrom</c>, <c>nm</c>, <c>um</c>, <c>log10(Angstrom)</c>, <c>Hz</c>, …); empty leaves it to the file.</summary>
    public string AxisUnit { get; init; } = "";

    /// <summary>Which columns hold what; null leaves it to the file.</summary>
    public ColumnSelection? Columns { get; init; }

    /// <summary>The target's name; empty leaves it to the file.</summary>
    public string Target { get; init; } = "";

    /// <summary>Right ascension, ICRS, degrees, 0 to 360.</summary>
    public double? RightAscensionDegrees { get; init; }

    /// <summary>Declination, ICRS, degrees, −90 to 90.</summary>
    public double? DeclinationDegrees { get; init; }

    /// <summary>Where the telescope stood.</summary>
    public ObservingSite? Site { get; init; }

    /// <summary>The middle of the exposure, UTC.</summary>
    public JulianDate? MidExposureUtc { get; init; }

    /// <summary>Resolving power λ/FWHM; above 0.</summary>
    public double? ResolvingPower { get; init; }

    /// <summary>Wavelengths to keep, in the file's own medium and frame; empty keeps all. Pixels between the ranges are flagged <see cref="PixelFaults.Excluded"/>.</summary>
    public IReadOnlyList<WavelengthRange> Ranges { get; init; } = [];

    /// <summary>The largest size of a compressed file once decompressed, bytes; 256 MiB by default. Larger content is refused.</summary>
    public long MaximumDecompressedBytes { get; init; } = 256L << 20;

    internal void Validate()
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(MaximumDecompressedBytes);
        if (RightAscensionDegrees is double ra)
        {
            Guard.Between(ra, 0.0, 360.0, nameof(RightAscensionDegrees), "degrees");
        }

        if (DeclinationDegrees is double dec)
        {
            Guard.Between(dec, -90.0, 90.0, nameof(DeclinationDegrees), "degrees");
        }

        if (ResolvingPower is double power)
        {
            Guard.Positive(power, nameof(ResolvingPower), "");
        }

        if (AxisUnit.Length != 0 && !SpectralUnit.TryParse(AxisUnit, out _))
        {
            throw new ArgumentException(string.Create(
                CultureInfo.InvariantCulture,
                $"The axis unit '{AxisUnit}' is not known; give one such as Angstrom, nm, um, log10(Angstrom), Hz or eV."),
                nameof(AxisUnit));
        }
    }
}
