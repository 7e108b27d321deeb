using System.Collections.Generic;

namespace StarLines;

/// <summary>What is known of an exposure besides its pixels; a missing fact is null or an empty string.</summary>
public sealed record SpectrumMetadata
{
    /// <summary>Nothing known.</summary>
    public static SpectrumMetadata Empty { get; } = new();

    /// <summary>Where the spectrum came from, as a user names it: <c>FILE</c>, <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c>.</summary>
    public string Source { get; init; } = "";

    /// <summary>The target's name.</summary>
    public string Target { get; init; } = "";

    /// <summary>Right ascension, ICRS (J2000.0), degrees.</summary>
    public double? RightAscensionDegrees { get; init; }

    /// <summary>Declination, ICRS (J2000.0), degrees.</summary>
    public double? DeclinationDegrees { get; init; }

    /// <summary>Where the telescope stood.</summary>
    public ObservingSite? Site { get; init; }

    /// <summary>The middle of the exposure, UTC.</summary>
    public JulianDate? MidExposureUtc { get; init; }

    /// <summary>What <see cref="MidExposureUtc"/> was taken from, such as <c>DATE-OBS + half the exposure</c>; empty where it is unknown.</summary>
    public string MidExposureFrom { get; init; } = "";

    /// <summary>Exposure time, seconds.</summary>
    public double? ExposureSeconds { get; init; }

    /// <summary>Resolving power λ/FWHM of the instrument.</summary>
    public double? ResolvingPower { get; init; }

    /// <summary>The telescope.</summary>
    public string Telescope { get; init; } = "";

    /// <summary>The instrument.</summary>
    public string Instrument { get; init; } = "";

    /// <summary>
    /// Velocity that the file says was already added to reduce its wavelengths to <see cref="WavelengthScale.Frame"/>, km/s.
    /// </summary>
    public double? AppliedCorrectionKmPerS { get; init; }

    /// <summary>What was guessed, assumed or odd, in the order in which it was found.</summary>
    public IReadOnlyList<Remark> Remarks { get; init; } = [];
}
