using System.Collections.Generic;
using StarLines.Tables;
using StarLines.Velocities.Time;

namespace StarLines.IO;

/// <summary>What is known of a spectrum as keywords, the same in every format, which the reader understands again.</summary>
internal static class SpectrumKeywords
{
    /// <summary>Keywords, values and comments, in the order in which they are written.</summary>
    internal static List<(string Keyword, MetadataValue Value, string Comment)> Of(Spectrum spectrum)
    {
        SpectrumMetadata m = spectrum.Metadata;
        var list = new List<(string Keyword, MetadataValue Value, string Comment)>();
        AddText(list, "OBJECT", m.Target, "target");
        AddNumber(list, "RA", m.RightAscensionDegrees, "[deg] right ascension");
        AddNumber(list, "DEC", m.DeclinationDegrees, "[deg] declination");
        if (m.RightAscensionDegrees is not null)
        {
            list.Add(("RADESYS", "ICRS", "frame of RA and DEC"));
        }

        AddText(list, "TELESCOP", m.Telescope, "telescope");
        AddText(list, "INSTRUME", m.Instrument, "instrument");
        if (m.Site is ObservingSite site)
        {
            AddText(list, "SITENAME", site.Name, "observing site");
            list.Add(("OBSGEO-B", site.LatitudeDegrees, "[deg] geodetic latitude"));
            list.Add(("OBSGEO-L", site.LongitudeDegrees, "[deg] longitude, east positive"));
            list.Add(("OBSGEO-H", site.HeightMetres, "[m] height above the ellipsoid"));
        }

        if (m.MidExposureUtc is JulianDate mid)
        {
            list.Add(("TIMESYS", "UTC", "time scale"));
            list.Add(("DATE-AVG", UtcTime.ToIso(mid, 6), "middle of the exposure"));
        }

        AddNumber(list, "EXPTIME", m.ExposureSeconds, "[s] exposure time");
        AddText(list, "SPECSYS", FrameWord(spectrum.Scale.Frame), "velocity frame of the wavelengths");
        AddNumber(list, "VELOSYS", m.AppliedCorrectionKmPerS * 1000.0, "[m/s] velocity already added");
        AddNumber(list, "SPEC_RP", m.ResolvingPower, "resolving power");
        AddText(list, "AIRORVAC", spectrum.Scale.Medium switch { Medium.Air => "air", Medium.Vacuum => "vac", _ => "" }, "wavelengths in standard air or in vacuum");
        return list;
    }

    private static string FrameWord(VelocityFrame frame) => frame switch
    {
        VelocityFrame.Topocentric => "TOPOCENT",
        VelocityFrame.Geocentric => "GEOCENTR",
        VelocityFrame.Heliocentric => "HELIOCEN",
        VelocityFrame.Barycentric => "BARYCENT",
        VelocityFrame.Rest => "SOURCE",
        _ => "",
    };

    private static void AddText(List<(string Keyword, MetadataValue Value, string Comment)> list, string keyword, string text, string comment)
    {
        if (text.Length != 0)
        {
            list.Add((keyword, text, comment));
        }
    }

    private static void AddNumber(List<(string Keyword, MetadataValue Value, string Comment)> list, string keyword, double? value, string comment)
    {
        if (value is double number)
        {
            list.Add((keyword, number, comment));
        }
    }
}
