using System;

namespace StarLines.IO;

/// <summary>Everything a header tells of an exposure besides its pixels.</summary>
internal static class HeaderMetadata
{
    private static readonly string[] Targets = ["OBJECT", "OBJNAME", "TARGET", "TARGNAME", "TARGETID", "TARGET_NAME", "STARNAME", "STAR", "TARG_NAME", "DESIG"];

    private static readonly string[] Powers = ["SPEC_RP", "SPEC_RES", "RESPOWER", "RESOLPOW", "RESOLVIN", "RESOLUTN", "BSS_ESRP", "BSS_ITRP", "RESOLUTION", "SPECRES", "R"];

    /// <summary>No stellar spectrograph has a resolving power outside these limits.</summary>
    private const double MinimumPower = 20.0, MaximumPower = 2_000_000.0;

    /// <summary>Reads the metadata and decides medium and frame.</summary>
    /// <param name="header">The header.</param>
    /// <param name="stated">What the axis or column itself says of its medium.</param>
    /// <param name="words">Comments and names that belong to the axis or column.</param>
    /// <param name="firstAngstrom">Shortest wavelength, Å.</param>
    /// <param name="lastAngstrom">Longest wavelength, Å.</param>
    /// <param name="source">The name of the part of the file.</param>
    /// <param name="context">Carries what the user says, and the remarks.</param>
    /// <param name="medium">Receives the medium.</param>
    /// <param name="frame">Receives the frame.</param>
    internal static SpectrumMetadata Read(
        HeaderKeywords header,
        Medium stated,
        string words,
        double firstAngstrom,
        double lastAngstrom,
        string source,
        ReadContext context,
        out Medium medium,
        out VelocityFrame frame)
    {
        SpectrumReadOptions options = context.Options;
        medium = HeaderMedium.Decide(header, stated, words, firstAngstrom, lastAngstrom, context);
        double? exposure = HeaderTime.Exposure(header);
        string timeFrom = "--time";
        JulianDate? mid = options.MidExposureUtc ?? HeaderTime.MidExposure(header, exposure, out timeFrom, context);
        frame = HeaderFrame.Read(header, mid is not null || header.Has("DATE-OBS"), context, out double? applied);
        (double RaDegrees, double DecDegrees)? position = options.RightAscensionDegrees is double ra && options.DeclinationDegrees is double dec
            ? (ra, dec)
            : HeaderPosition.Read(header, context);
        return new SpectrumMetadata
        {
            Source = source,
            Target = options.Target.Length != 0 ? options.Target : Target(header),
            RightAscensionDegrees = options.RightAscensionDegrees ?? position?.RaDegrees,
            DeclinationDegrees = options.DeclinationDegrees ?? position?.DecDegrees,
            Site = options.Site ?? HeaderSite.Read(header, context),
            MidExposureUtc = mid,
            MidExposureFrom = mid is null ? "" : timeFrom,
            ExposureSeconds = exposure,
            ResolvingPower = options.ResolvingPower ?? ResolvingPower(header, firstAngstrom, lastAngstrom),
            Telescope = header.Text("TELESCOP"),
            Instrument = header.Text("INSTRUME"),
            AppliedCorrectionKmPerS = applied,
            Remarks = [.. context.Remarks],
        };
    }

    /// <summary>The target; some pipelines write the kind of product into OBJECT and keep the target elsewhere.</summary>
    private static string Target(HeaderKeywords header)
    {
        string target = header.FirstText(Targets);
        string observed = header.Text("ESO OBS TARG NAME");
        return observed.Length != 0 && target == header.Text("ESO PRO CATG") ? observed : target;
    }

    private static double? ResolvingPower(HeaderKeywords header, double firstAngstrom, double lastAngstrom)
    {
        foreach (string key in Powers)
        {
            if (header.TryNumber(key, out double value) && value is >= MinimumPower and <= MaximumPower)
            {
                return value;
            }
        }

        // A width in Å gives the power in the middle of the range.
        return header.TryNumber("FWHM", out double width) && width > 0.0
            && header.Comment("FWHM").Contains("resolution", StringComparison.OrdinalIgnoreCase)
            && header.Comment("FWHM").Contains("ngstrom", StringComparison.OrdinalIgnoreCase)
            ? Math.Round(0.5 * (firstAngstrom + lastAngstrom) / width, 1)
            : null;
    }

    /// <summary>The unit of the flux.</summary>
    internal static string FluxUnit(HeaderKeywords header) => header.FirstText(["BUNIT", "FLUXUNIT", "FLUX_UNITS"]);
}
