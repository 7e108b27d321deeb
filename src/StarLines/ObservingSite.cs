using System;
using StarLines.Velocities.Barycentre;

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

    /// <summary>Makes a site of geocentric coordinates fixed to the Earth, as the FITS keywords OBSGEO-X, -Y, -Z give them.</summary>
    /// <param name="name">Its name, or an empty string.</param>
    /// <param name="xMetres">Towards longitude 0 on the equator, metres.</param>
    /// <param name="yMetres">Towards longitude 90° east on the equator, metres.</param>
    /// <param name="zMetres">Towards the north pole, metres.</param>
    /// <exception cref="ArgumentException">The place is more than 1 km below or 100 km above the surface.</exception>
    public static ObservingSite FromGeocentric(string name, double xMetres, double yMetres, double zMetres)
    {
        (double latitude, double longitude, double height) = Geodesy.ToGeodetic(new Vector3(xMetres, yMetres, zMetres));
        return new ObservingSite(name, latitude, longitude, height);
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
