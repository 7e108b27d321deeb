using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>Geodetic coordinates on the WGS 84 ellipsoid and geocentric coordinates fixed to the Earth.</summary>
internal static class Geodesy
{
    // WGS 84 (NGA.STND.0036), equatorial radius in m and flattening.
    private const double EquatorialRadius = 6_378_137.0;
    private const double Flattening = 1.0 / 298.257_223_563;
    private const double EccentricitySquared = Flattening * (2.0 - Flattening);

    // Bowring's form converges to 10⁻¹⁴ rad in two or three steps anywhere near the surface; more for satellites.
    private const int Steps = 8;

    /// <summary>Geocentric coordinates of a site, m: x towards longitude 0, z towards the north pole.</summary>
    internal static Vector3 ToGeocentric(ObservingSite site)
    {
        (double sinLatitude, double cosLatitude) = Math.SinCos(site.LatitudeDegrees * (Math.PI / 180.0));
        (double sinLongitude, double cosLongitude) = Math.SinCos(site.LongitudeDegrees * (Math.PI / 180.0));
        double normal = EquatorialRadius / Math.Sqrt(1.0 - (EccentricitySquared * sinLatitude * sinLatitude));
        double equatorial = (normal + site.HeightMetres) * cosLatitude;
        double z = ((normal * (1.0 - EccentricitySquared)) + site.HeightMetres) * sinLatitude;
        return new Vector3(equatorial * cosLongitude, equatorial * sinLongitude, z);
    }

    /// <summary>The unit vector towards the zenith of the ellipsoid.</summary>
    internal static Vector3 Up(ObservingSite site)
    {
        (double sinLatitude, double cosLatitude) = Math.SinCos(site.LatitudeDegrees * (Math.PI / 180.0));
        (double sinLongitude, double cosLongitude) = Math.SinCos(site.LongitudeDegrees * (Math.PI / 180.0));
        return new Vector3(cosLatitude * cosLongitude, cosLatitude * sinLongitude, sinLatitude);
    }

    /// <summary>Geodetic latitude and longitude, degrees, and height, m, of geocentric coordinates (Bowring 1976, iterated).</summary>
    internal static (double LatitudeDegrees, double LongitudeDegrees, double HeightMetres) ToGeodetic(Vector3 place)
    {
        double equatorial = Math.Sqrt((place.X * place.X) + (place.Y * place.Y));
        double polarRadius = EquatorialRadius * (1.0 - Flattening);
        double second = EccentricitySquared / (1.0 - EccentricitySquared);
        double latitude = 0.0;
        double reduced = Math.Atan2(place.Z, equatorial * (1.0 - Flattening));
        for (int step = 0; step < Steps; step++)
        {
            (double sin, double cos) = Math.SinCos(reduced);
            latitude = Math.Atan2(
                place.Z + (second * polarRadius * sin * sin * sin),
                equatorial - (EccentricitySquared * EquatorialRadius * cos * cos * cos));
            reduced = Math.Atan((1.0 - Flattening) * Math.Tan(latitude));
        }

        (double sinLatitude, double cosLatitude) = Math.SinCos(latitude);

        // Valid everywhere, also at the poles, where equatorial/cos would divide by nothing.
        double height = (equatorial * cosLatitude) + (place.Z * sinLatitude)
            - (EquatorialRadius * Math.Sqrt(1.0 - (EccentricitySquared * sinLatitude * sinLatitude)));
        const double Degrees = 180.0 / Math.PI;
        return (latitude * Degrees, Math.Atan2(place.Y, place.X) * Degrees, height);
    }
}
