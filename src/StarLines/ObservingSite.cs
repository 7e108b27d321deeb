using System;

namespace StarLines;

/// <summary>A place on the Earth, on the WGS 84 ellipsoid.</summary>
public sealed record ObservingSite
{
    /// <summary>Makes a site.</summary>
    /// <param name="name">Its name, or an empty string.</param>
    /// <param name="latitudeDegrees">Geodetic latitude, degrees, −90 to 90.</param>
    /// <param name="longitudeDegrees">Longitude, degrees, positive east, −360 to 360.</param>
    /// <param name="heightMetres">Height above the ellipsoid, metres, −1000 to 100 000.</param>
    /// <exception cref="ArgumentException">A coordinate is out of range.</exception>
    public ObservingSite(string name, double latitudeDegrees, double longitudeDegrees, double heightMetres)
    {
        ArgumentNullException.ThrowIfNull(name);
        Guard.Between(latitudeDegrees, -90.0, 90.0, nameof(latitudeDegrees), "degrees");
        Guard.Between(longitudeDegrees, -360.0, 360.0, nameof(longitudeDegrees), "degrees");
        Guard.Between(heightMetres, -1000.0, 100_000.0, nameof(heightMetres), "m");
        Name = name;
        LatitudeDegrees = latitudeDegrees;
        LongitudeDegrees = longitudeDegrees;
        HeightMetres = heightMetres;
    }

    /// <summary>The name, or an empty string.</summary>
    public string Name { get; }

    /// <summary>Geodetic latitude, degrees.</summary>
    public double LatitudeDegrees { get; }

    /// <summary>Longitude, degrees, positive east.</summary>
    public double LongitudeDegrees { get; }

    /// <summary>Height above the ellipsoid, metres.</summary>
    public double HeightMetres { get; }
}
