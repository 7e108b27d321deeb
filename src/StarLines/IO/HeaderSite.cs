using System;
using System.Globalization;
using StarLines.Velocities.Barycentre;

namespace StarLines.IO;

/// <summary>Where the telescope stood, from coordinates in the header or from the names of observatories and telescopes.</summary>
internal static class HeaderSite
{
    private static readonly (string Latitude, string Longitude, string[] Height)[] Geodetic =
    [
        ("OBSGEO-B", "OBSGEO-L", ["OBSGEO-H"]),
        ("ESO TEL GEOLAT", "ESO TEL GEOLON", ["ESO TEL GEOELEV"]),
        ("ESO TEL1 GEOLAT", "ESO TEL1 GEOLON", ["ESO TEL1 GEOELEV"]),
        ("ESO TEL3 GEOLAT", "ESO TEL3 GEOLON", ["ESO TEL3 GEOELEV"]),
        ("GEOLAT", "GEOLON", ["GEOELEV", "GEOALT"]),
        ("GEOLAT", "GEOLONG", ["GEOELEV", "GEOALT"]),
        ("GEO_LAT", "GEO_LONG", ["GEO_ELEV", "GEO_ALT"]),
        ("SITELAT", "SITELONG", ["SITEALT", "SITEELEV", "SITEHGT"]),
        ("SITELAT", "SITELON", ["SITEALT", "SITEELEV", "SITEHGT"]),
        ("LAT-OBS", "LONG-OBS", ["ALT-OBS"]),
        ("OBS-LAT", "OBS-LONG", ["OBS-ELEV", "OBS-ALT", "OBS-HGT"]),
        ("OBS-LAT", "OBS-LON", ["OBS-ELEV", "OBS-ALT", "OBS-HGT"]),
        ("OBS_LAT", "OBS_LONG", ["OBS_ELEV", "OBS_ALT"]),
        ("OBS_LAT", "OBS_LON", ["OBS_ELEV", "OBS_ALT"]),
        ("OBSLAT", "OBSLONG", ["OBSALT", "OBSELEV"]),
        ("BSS_LAT", "BSS_LONG", ["BSS_ELEV"]),
        ("TELLAT", "TELLONG", ["TELALT", "TELELEV"]),
        ("LATITUDE", "LONGITUD", ["ALTITUDE", "HEIGHT", "ELEVATIO", "ELEVATION"]),
        ("LATITUDE", "LONGITUDE", ["ALTITUDE", "HEIGHT", "ELEVATIO", "ELEVATION"]),
    ];

    private static readonly string[] Names = ["OBSERVAT", "SITENAME", "BSS_SITE", "SITE", "OBSERVATORY", "TELESCOP"];

    /// <summary>Further from the listed place than this, degrees, the coordinates of a header are doubted.</summary>
    private const double NameToleranceDegrees = 1.0;

    /// <summary>Reads the site; null where the header names none.</summary>
    internal static ObservingSite? Read(HeaderKeywords header, ReadContext context)
    {
        ObservingSite? listed = Listed(header, out string name);
        ObservingSite? site = Geocentric(header, name) ?? FromCoordinates(header, name, listed, context);
        if (site is null)
        {
            return listed;
        }

        return listed is null ? site : Agreeing(site, listed, context);
    }

    private static ObservingSite? Listed(HeaderKeywords header, out string name)
    {
        name = header.FirstText(Names);
        foreach (string key in Names)
        {
            string text = header.Text(key);
            if (text.Length != 0 && Lookup(text) is ObservingSite site)
            {
                name = text;
                return site;
            }
        }

        return null;
    }

    private static ObservingSite? Geocentric(HeaderKeywords header, string name)
    {
        if (!header.TryNumber("OBSGEO-X", out double x) || !header.TryNumber("OBSGEO-Y", out double y) || !header.TryNumber("OBSGEO-Z", out double z))
        {
            return null;
        }

        double radius = Math.Sqrt((x * x) + (y * y) + (z * z));
        // A place within 100 km of the surface; anything else is a spacecraft or a mistake.
        if (radius is not (> 6.3e6 and < 6.48e6))
        {
            return null;
        }

        (double latitude, double longitude, double height) = Geodesy.ToGeodetic(new Vector3(x, y, z));
        return new ObservingSite(name, latitude, longitude, height);
    }

    private static ObservingSite? FromCoordinates(HeaderKeywords header, string name, ObservingSite? listed, ReadContext context)
    {
        foreach ((string latitudeKey, string longitudeKey, string[] heightKeys) in Geodetic)
        {
            if (!header.Has(latitudeKey) || !header.Has(longitudeKey)
                || !Sexagesimal.TryParseGeographic(header.Text(latitudeKey), out double latitude)
                || !Sexagesimal.TryParseGeographic(header.Text(longitudeKey), out double longitude)
                || latitude is < -90.0 or > 90.0 || longitude is < -360.0 or > 360.0
                || (latitude == 0.0 && longitude == 0.0))
            {
                continue;
            }

            if (SaysWest(header.Comment(longitudeKey)))
            {
                longitude = -longitude;
            }

            longitude = longitude > 180.0 ? longitude - 360.0 : longitude <= -180.0 ? longitude + 360.0 : longitude;
            if (!header.TryFirstNumber(heightKeys, out double height, out _) || height is < -500.0 or > 9000.0)
            {
                height = listed?.HeightMetres ?? 0.0;
                if (listed is null)
                {
                    context.Note("site-height-assumed", $"The header gives {latitudeKey} and {longitudeKey} without a height; sea level is taken (1 km of height changes a velocity by less than 0.1 m/s).");
                }
            }

            return new ObservingSite(name, latitude, longitude, height);
        }

        return null;
    }

    /// <summary>Longitudes were once counted to the west; a site that is known shows the sign.</summary>
    private static ObservingSite Agreeing(ObservingSite site, ObservingSite listed, ReadContext context)
    {
        bool latitude = Math.Abs(site.LatitudeDegrees - listed.LatitudeDegrees) < NameToleranceDegrees;
        if (latitude && Apart(site.LongitudeDegrees, listed.LongitudeDegrees) < NameToleranceDegrees)
        {
            return site;
        }

        if (latitude && Apart(-site.LongitudeDegrees, listed.LongitudeDegrees) < NameToleranceDegrees)
        {
            context.Note("longitude-west", string.Create(
                CultureInfo.InvariantCulture,
                $"The longitude {site.LongitudeDegrees}° is counted to the west, as the place of {listed.Name} shows; its sign was changed."));
            return new ObservingSite(site.Name, site.LatitudeDegrees, -site.LongitudeDegrees, site.HeightMetres);
        }

        context.Note("site-disagrees", string.Create(
            CultureInfo.InvariantCulture,
            $"The coordinates {site.LatitudeDegrees:0.###}°, {site.LongitudeDegrees:0.###}° are not those of {listed.Name}, which the header also names; the coordinates are used. Give --site if that is wrong."));
        return site;
    }

    private static double Apart(double a, double b) => Math.Abs(Math.IEEERemainder(a - b, 360.0));

    private static ObservingSite? Lookup(string name) => ObservingSites.TryFind(name, out ObservingSite? site) ? site : null;

    private static bool SaysWest(string comment) =>
        comment.Contains("west", StringComparison.OrdinalIgnoreCase)
        && !comment.Contains("east", StringComparison.OrdinalIgnoreCase)
        && !comment.Contains("west negative", StringComparison.OrdinalIgnoreCase)
        && !comment.Contains("-west", StringComparison.OrdinalIgnoreCase)
        && !comment.Contains("-=west", StringComparison.OrdinalIgnoreCase);
}
