using System;
using System.Globalization;

namespace StarLines.IO;

/// <summary>The velocity frame of the wavelengths and the correction that was already applied.</summary>
internal static class HeaderFrame
{
    /// <summary>Reads the frame.</summary>
    /// <param name="header">The header.</param>
    /// <param name="hasTime">Whether the time of the exposure is known.</param>
    /// <param name="context">Carries what the user says, and the remarks.</param>
    /// <param name="appliedKmPerS">The velocity already added, km/s; null where unknown or none.</param>
    internal static VelocityFrame Read(HeaderKeywords header, bool hasTime, ReadContext context, out double? appliedKmPerS)
    {
        VelocityFrame said = FromHeader(header, out appliedKmPerS);
        VelocityFrame asked = context.Options.Frame;
        if (asked != VelocityFrame.Unknown)
        {
            if (said != VelocityFrame.Unknown && said != asked)
            {
                context.Note("frame-contradicts", $"The file says its wavelengths are {Word(said)}; {Word(asked)} is taken as asked.");
                appliedKmPerS = null;
            }

            return asked;
        }

        return said != VelocityFrame.Unknown ? said : Assume(header, hasTime, context);
    }

    private static VelocityFrame FromHeader(HeaderKeywords header, out double? appliedKmPerS)
    {
        appliedKmPerS = null;
        string system = header.FirstText(["SPECSYS", "FRAME"]).ToUpperInvariant();
        if (system.Length >= 4)
        {
            VelocityFrame frame = FromWord(system);
            if (frame is VelocityFrame.Barycentric or VelocityFrame.Heliocentric && header.TryNumber("VELOSYS", out double metres))
            {
                appliedKmPerS = metres / 1000.0;
            }

            if (frame != VelocityFrame.Unknown)
            {
                return frame;
            }
        }

        return Pipeline(header, ref appliedKmPerS) ?? Corrections(header, ref appliedKmPerS);
    }

    private static VelocityFrame FromWord(string word) => word[..4] switch
    {
        "TOPO" => VelocityFrame.Topocentric,
        "GEOC" => VelocityFrame.Geocentric,
        "HELI" => VelocityFrame.Heliocentric,
        "BARY" => VelocityFrame.Barycentric,
        "SOUR" or "REST" => VelocityFrame.Rest,
        _ => VelocityFrame.Unknown,
    };

    /// <summary>
    /// Merged one-dimensional products of fibre echelle pipelines are resampled in the frame of the barycentre and keep the correction
    /// (BERV) in the header; a calibration lamp in the second fibre is not shifted. Common practice of those archives.
    /// </summary>
    private static VelocityFrame? Pipeline(HeaderKeywords header, ref double? appliedKmPerS)
    {
        foreach (string key in (string[])["ESO DRS BERV", "TNG DRS BERV", "OHP DRS BERV", "ESO QC BERV"])
        {
            if (!header.TryNumber(key, out double berv))
            {
                continue;
            }

            bool merged = header.Text("CTYPE1").Equals("Angstrom", StringComparison.OrdinalIgnoreCase)
                || header.Text("ESO PRO CATG").Contains("S1D", StringComparison.OrdinalIgnoreCase);
            string exposure = header.FirstText(["ESO DPR TYPE", "TNG DPR TYPE", "OHP DPR TYPE"]);
            string[] fibres = exposure.Split(',');
            bool second = header.FirstText(["ESO DRS CAL LOC FILE", "TNG DRS CAL LOC FILE", "OHP DRS CAL LOC FILE"]).Contains("_B.", StringComparison.Ordinal);
            bool lamp = fibres.Length > 1 && (second ? fibres[1] : fibres[0]) is "WAVE" or "THAR" or "FP" or "LAMP" or "DARK";
            if (merged && !lamp)
            {
                appliedKmPerS = berv;
                return VelocityFrame.Barycentric;
            }

            return VelocityFrame.Topocentric;
        }

        return null;
    }

    private static VelocityFrame Corrections(HeaderKeywords header, ref double? appliedKmPerS)
    {
        if (header.Flag("HELIO") == false)
        {
            return VelocityFrame.Topocentric;
        }

        if (header.TryNumber("HELIO_RV", out double helio))
        {
            appliedKmPerS = helio;
            return VelocityFrame.Heliocentric;
        }

        if (header.Flag("HELIO") == true)
        {
            return VelocityFrame.Heliocentric;
        }

        if (header.TryNumber("BSS_VHEL", out double applied))
        {
            appliedKmPerS = applied == 0.0 ? null : applied;
            return applied == 0.0 ? VelocityFrame.Topocentric : VelocityFrame.Heliocentric;
        }

        return VelocityFrame.Unknown;
    }

    private static VelocityFrame Assume(HeaderKeywords header, bool hasTime, ReadContext context)
    {
        string bookkeeping = "";
        foreach (string key in (string[])["VHELIO", "RADVEL", "DOPCOR01", "DOPCOR", "VLSR", "BARYCORR", "HELIOVEL", "HELIOV", "HELCORR"])
        {
            if (header.Has(key))
            {
                bookkeeping = key;
                break;
            }
        }

        if (bookkeeping.Length != 0)
        {
            context.Note("frame-unknown", $"The header has {bookkeeping} but does not say whether the wavelengths were shifted by it; name the frame by --frame.");
            return VelocityFrame.Unknown;
        }

        if (hasTime)
        {
            context.Note("frame-assumed", "The file does not say in which frame its wavelengths are; topocentric is assumed. Name it by --frame.");
            return VelocityFrame.Topocentric;
        }

        context.Note("frame-unknown", "The file does not say in which frame its wavelengths are; name it by --frame.");
        return VelocityFrame.Unknown;
    }

    private static string Word(VelocityFrame frame) => frame.ToString().ToLower(CultureInfo.InvariantCulture);
}
