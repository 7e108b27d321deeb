using System;
using System.Globalization;
using System.Text.RegularExpressions;

namespace StarLines.IO;

/// <summary>Air or vacuum: what the user says, else what the file says, else what light of that kind is usually given in, reported.</summary>
internal static partial class HeaderMedium
{
    /// <summary>By convention wavelengths below 2000 Å are given in vacuum.</summary>
    private const double VacuumBelowAngstrom = 2000.0;

    private static readonly string[] SpaceTelescopes = ["HST", "IUE", "FUSE", "GALEX", "JWST", "GAIA", "COPERNICUS", "EUVE", "HUBBLE"];

    [GeneratedRegex(@"\bvacuum\b|\bvac\b", RegexOptions.IgnoreCase)]
    private static partial Regex VacuumWord();

    [GeneratedRegex(@"\b(?:in|standard)?\s*air\b(?!mass)", RegexOptions.IgnoreCase)]
    private static partial Regex AirWord();

    /// <summary>Decides the medium.</summary>
    /// <param name="header">The header.</param>
    /// <param name="stated">What the axis or column itself says.</param>
    /// <param name="words">Comments and names that belong to the axis or column.</param>
    /// <param name="firstAngstrom">Shortest wavelength, Å.</param>
    /// <param name="lastAngstrom">Longest wavelength, Å.</param>
    /// <param name="context">Carries what the user says, and the remarks.</param>
    internal static Medium Decide(
        HeaderKeywords header, Medium stated, string words, double firstAngstrom, double lastAngstrom, ReadContext context)
    {
        Medium said = FromHeader(header, words);
        if (stated != Medium.Unknown && said != Medium.Unknown && said != stated)
        {
            context.Note("medium-contradicts", $"The axis type says {Word(stated)}, another keyword says {Word(said)}; {Word(said)} is taken. Name it by --medium.");
            stated = said;
        }

        Medium known = stated != Medium.Unknown ? stated : said;
        Medium asked = context.Options.Medium;
        if (asked != Medium.Unknown)
        {
            if (known != Medium.Unknown && known != asked)
            {
                context.Note("medium-contradicts", $"The file says {Word(known)}; {Word(asked)} is taken as asked.");
            }

            return asked;
        }

        return known != Medium.Unknown ? known : Assume(header, firstAngstrom, lastAngstrom, context);
    }

    private static Medium FromHeader(HeaderKeywords header, string words)
    {
        if (header.Flag("VACUUM") is bool vacuum)
        {
            return vacuum ? Medium.Vacuum : Medium.Air;
        }

        string text = header.FirstText(["AIRORVAC", "MEDIUM", "WAVEMED", "WAVETYPE", "AIRVAC", "VACAIR"]).ToUpperInvariant();
        if (text.StartsWith("VAC", StringComparison.Ordinal))
        {
            return Medium.Vacuum;
        }

        if (text.StartsWith("AIR", StringComparison.Ordinal))
        {
            return Medium.Air;
        }

        bool saysVacuum = VacuumWord().IsMatch(words);
        bool saysAir = AirWord().IsMatch(words);
        return saysVacuum == saysAir ? Documented(header) : saysVacuum ? Medium.Vacuum : Medium.Air;
    }

    /// <summary>Collections whose descriptions say vacuum and whose files do not: HST flux standards, an integral-field survey, an infrared survey.</summary>
    private static Medium Documented(HeaderKeywords header) =>
        header.Text("DBTABLE").Equals("CRSPECTRUM", StringComparison.OrdinalIgnoreCase)
        || header.Has("IFUDESIGN")
        || header.Text("SURVEY").Contains("apogee", StringComparison.OrdinalIgnoreCase)
            ? Medium.Vacuum
            : Medium.Unknown;

    private static Medium Assume(HeaderKeywords header, double firstAngstrom, double lastAngstrom, ReadContext context)
    {
        string telescope = header.Text("TELESCOP").ToUpperInvariant();
        bool space = Array.Exists(SpaceTelescopes, name => telescope.StartsWith(name, StringComparison.Ordinal));
        double middle = 0.5 * (firstAngstrom + lastAngstrom);
        Medium medium = space || middle < VacuumBelowAngstrom ? Medium.Vacuum : Medium.Air;
        context.Note("medium-assumed", string.Create(
            CultureInfo.InvariantCulture,
            $"The file does not say whether its wavelengths are in air or in vacuum; {Word(medium)} is assumed, the custom of {(space ? "space telescopes" : medium == Medium.Air ? "ground-based spectra above 2000 Å" : "the ultraviolet below 2000 Å")}. Name it by --medium; a mistake is about 80 km/s."));
        return medium;
    }

    private static string Word(Medium medium) => medium == Medium.Air ? "air" : "vacuum";
}
