using System.Collections.Generic;

namespace StarLines.Examples.MakeNight;

/// <summary>One star of light: its velocity, its atmosphere and its share of the light.</summary>
internal sealed record StarLight
{
    /// <summary>Barycentric radial velocity, km/s.</summary>
    public required double VelocityKmPerS { get; init; }

    /// <summary>Effective temperature, K.</summary>
    public required double TemperatureKelvin { get; init; }

    /// <summary>log₁₀ of the surface gravity, cm/s².</summary>
    public required double SurfaceGravityLog { get; init; }

    /// <summary>Projected rotational velocity, km/s.</summary>
    public required double RotationKmPerS { get; init; }

    /// <summary>Share of the light, 0 to 1.</summary>
    public double Share { get; init; } = 1.0;

    /// <summary>Optical depth in the wings of the Balmer lines 1 Å from their centre.</summary>
    public required double BalmerWing { get; init; }

    /// <summary>Height of the emission in Hα, continuum 1.</summary>
    public double Emission { get; init; }

    /// <summary>Strength of the bands of titanium oxide.</summary>
    public double Bands { get; init; }
}

/// <summary>One exposure of the invented night.</summary>
internal sealed record Exposure
{
    /// <summary>File name without its ending.</summary>
    public required string Name { get; init; }

    /// <summary>The target.</summary>
    public required string Target { get; init; }

    /// <summary>What the star was invented to be.</summary>
    public required string SpectralType { get; init; }

    /// <summary>Right ascension, degrees.</summary>
    public required double RightAscensionDegrees { get; init; }

    /// <summary>Declination, degrees.</summary>
    public required double DeclinationDegrees { get; init; }

    /// <summary>Beginning of the exposure, minutes after 18:00 UTC.</summary>
    public required double StartMinutes { get; init; }

    /// <summary>Exposure time, seconds.</summary>
    public required double ExposureSeconds { get; init; }

    /// <summary>Signal-to-noise ratio a pixel where the spectrum is brightest.</summary>
    public required double SignalToNoise { get; init; }

    /// <summary>Seed of the noise.</summary>
    public required int Seed { get; init; }

    /// <summary>The stars whose light falls in.</summary>
    public required IReadOnlyList<StarLight> Stars { get; init; }
}
