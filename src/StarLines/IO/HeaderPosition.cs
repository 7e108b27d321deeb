using System;
using System.Globalization;
using System.Text.RegularExpressions;

namespace StarLines.IO;

/// <summary>Right ascension and declination from a header, brought to J2000.0.</summary>
internal static partial class HeaderPosition
{
    /// <summary>Pairs of keywords, those of the object before those of the telescope.</summary>
    private static readonly (string Ra, string Dec)[] Pairs =
    [
        ("PLUG_RA", "PLUG_DEC"), ("RA_TARG", "DEC_TARG"), ("TARG_RA", "TARG_DEC"), ("TARGRA", "TARGDEC"),
        ("RA_OBJ", "DEC_OBJ"), ("RA", "DEC"), ("OBJCTRA", "OBJCTDEC"), ("OBJRA", "OBJDEC"), ("OBJ-RA", "OBJ-DEC"),
        ("RA_DEG", "DEC_DEG"), ("RA-D", "DEC-D"), ("RADEG", "DECDEG"), ("CAT-RA", "CAT-DEC"), ("CATRA", "CATDEC"),
        ("OBSRA", "OBSDEC"), ("RA_OBS", "DEC_OBS"), ("TELRA", "TELDEC"), ("TEL-RA", "TEL-DEC"), ("RA_TEL", "DEC_TEL"),
        ("BSS_RA", "BSS_DEC"), ("s_ra", "s_dec"),
    ];

    /// <summary>Half an arcminute: the coarsest rounding of a comment that repeats a value.</summary>
    private const double CommentToleranceDegrees = 0.01;

    [GeneratedRegex(@"(?<![\d.])([+-]?\d{1,3})[:h ]\s?(\d{1,2})[:m' ]\s?(\d{1,2}(?:\.\d*)?)(?![\d])")]
    private static partial Regex SexagesimalTriple();

    /// <summary>Reads the position; null where the header has none that can be trusted.</summary>
    internal static (double RaDegrees, double DecDegrees)? Read(HeaderKeywords header, ReadContext context)
    {
        foreach ((string raKey, string decKey) in Pairs)
        {
            if (!header.Has(raKey) || !header.Has(decKey))
            {
                continue;
            }

            if (!TryAngle(header, raKey, inHours: true, out double ra) || !TryAngle(header, decKey, inHours: false, out double dec)
                || !Correct(header, raKey, decKey, ref ra, ref dec, context))
            {
                continue;
            }

            if (header.Text(raKey) == header.Text(decKey) && header.Text(raKey).Contains(':', StringComparison.Ordinal))
            {
                context.Note("position-doubtful", $"{raKey} and {decKey} hold the same text, as placeholders do; the position is not used.");
                return null;
            }

            return ToJ2000(header, ra, dec, context);
        }

        return null;
    }

    private static bool TryAngle(HeaderKeywords header, string key, bool inHours, out double degrees)
    {
        string comment = header.Comment(key);
        degrees = double.NaN;
        if (!Sexagesimal.TryParse(header.Text(key), out double value, out int parts, out bool hours))
        {
            return false;
        }

        bool saysHours = comment.Contains("hour", StringComparison.OrdinalIgnoreCase) || comment.Contains("[h]", StringComparison.OrdinalIgnoreCase);
        degrees = inHours && (hours || parts > 1 || saysHours) ? value * 15.0 : value;
        return double.IsFinite(degrees);
    }

    /// <summary>Checks the values against their range and against the sexagesimal text that some comments repeat; numbers in radians or hours show there.</summary>
    private static bool Correct(HeaderKeywords header, string raKey, string decKey, ref double ra, ref double dec, ReadContext context)
    {
        if (Repeated(header.Comment(decKey)) is double saidDec && Repeated(header.Comment(raKey)) is double saidHours)
        {
            double saidRa = saidHours * 15.0;
            if (Close(dec, saidDec) && Close(ra, saidRa))
            {
                return InRange(ra, dec);
            }

            string unit = Close(dec * 180.0 / Math.PI, saidDec) && Close(ra * 180.0 / Math.PI, saidRa) ? "radians"
                : Close(dec, saidDec) && Close(ra * 15.0, saidRa) ? "hours"
                : "";
            context.Note("position-doubtful", unit.Length != 0
                ? $"{raKey} is in {unit}, as its comment shows; the comment's value is used."
                : $"{raKey} and {decKey} disagree with the values in their comments; the position is not used.");
            ra = saidRa;
            dec = saidDec;
            return unit.Length != 0 && InRange(ra, dec);
        }

        bool good = InRange(ra, dec);
        if (!good)
        {
            context.Note("position-doubtful", $"{raKey} = {header.Text(raKey)}, {decKey} = {header.Text(decKey)} is no position; give --ra and --dec.");
        }

        return good;
    }

    private static bool InRange(double ra, double dec) => ra is >= -360.0 and <= 360.0 && dec is >= -90.0 and <= 90.0;

    private static bool Close(double a, double b) => Math.Abs(a - b) < CommentToleranceDegrees;

    private static double? Repeated(string comment)
    {
        Match match = SexagesimalTriple().Match(comment);
        if (!match.Success)
        {
            return null;
        }

        double first = double.Parse(match.Groups[1].Value, CultureInfo.InvariantCulture);
        double rest = (double.Parse(match.Groups[2].Value, CultureInfo.InvariantCulture) / 60.0)
            + (double.Parse(match.Groups[3].Value, CultureInfo.InvariantCulture) / 3600.0);
        return match.Groups[1].Value[0] == '-' ? first - rest : first + rest;
    }

    private static (double RaDegrees, double DecDegrees) ToJ2000(HeaderKeywords header, double ra, double dec, ReadContext context)
    {
        string system = header.FirstText(["RADESYS", "RADECSYS"]).ToUpperInvariant();
        double equinox = Equinox(header, system, out bool besselian, context);
        (double RaDegrees, double DecDegrees) position = (ra - (360.0 * Math.Floor(ra / 360.0)), dec);
        if (Math.Abs(equinox - 2000.0) < 1e-3 && !besselian)
        {
            return position;
        }

        position = besselian
            ? Precession.FromBesselianEquinox(ra, dec, equinox)
            : Precession.FromJulianEquinox(ra, dec, equinox);
        context.Note("position-precessed", string.Create(
            CultureInfo.InvariantCulture, $"The position is of equinox {(besselian ? 'B' : 'J')}{equinox:0.0##}; it was precessed to J2000.0."));
        return position;
    }

    private static double Equinox(HeaderKeywords header, string system, out bool besselian, ReadContext context)
    {
        string text = header.Text("EQUINOX");
        bool named = text.Length > 0 && char.ToUpperInvariant(text[0]) is 'B' or 'J';
        string digits = named ? text[1..] : text;
        if (!HeaderKeywords.TryParseNumber(digits, out double equinox) || equinox is < 1800.0 or > 2200.0)
        {
            equinox = EquinoxOfEpoch(header, system, context);
        }

        // Without RADESYS an equinox before 1984 is in FK4, one after it in FK5 (FITS 4.0, section 8.3).
        besselian = named ? char.ToUpperInvariant(text[0]) == 'B'
            : system.StartsWith("FK4", StringComparison.Ordinal) || (system.Length == 0 && equinox < 1984.0);
        return equinox;
    }

    /// <summary>EPOCH was the equinox before EQUINOX was; today it is often the date of observation.</summary>
    private static double EquinoxOfEpoch(HeaderKeywords header, string system, ReadContext context)
    {
        double byDefault = system.StartsWith("FK4", StringComparison.Ordinal) ? 1950.0 : 2000.0;
        if (!header.TryNumber("EPOCH", out double epoch) || epoch == byDefault)
        {
            return byDefault;
        }

        if (epoch is 1950.0 or 1900.0 or 1875.0 or 2000.0)
        {
            return epoch;
        }

        context.Note("equinox-assumed", string.Create(
            CultureInfo.InvariantCulture, $"EPOCH = {epoch} may be the equinox or the date of observation; the position is taken for J2000.0."));
        return 2000.0;
    }
}
