using System;
using System.Globalization;
using System.Text;
using StarLines.Analysis;
using StarLines.IO;
using StarLines.Velocities.Time;

namespace StarLines.Cli.Output;

/// <summary>One spectrum in a few lines for people.</summary>
internal static class SpectrumSheet
{
    private const int LabelWidth = 14;

    /// <summary>Uncertainties this many times larger or smaller than the scatter of the flux are pointed at.</summary>
    private const double SuspiciousRatio = 2.0;

    /// <summary>Writes what a file holds: its name, its HDUs where there are several or none gives a spectrum, its spectra.</summary>
    public static string Write(SpectrumFileInspection file)
    {
        var sheet = new StringBuilder();
        sheet.Append(file.Name).Append('\n');
        if (file.Hdus.Count > 1 || file.Spectra.Count == 0)
        {
            foreach (HduInspection hdu in file.Hdus)
            {
                Add(sheet, Text($"HDU {hdu.Number}"), Describe(hdu));
            }
        }

        foreach (Spectrum spectrum in file.Spectra)
        {
            if (file.Spectra.Count > 1)
            {
                sheet.Append(' ').Append(spectrum.Metadata.Source).Append('\n');
            }

            Write(sheet, SpectrumSummary.Of(spectrum));
        }

        return sheet.ToString();
    }

    private static void Write(StringBuilder sheet, SpectrumSummary summary)
    {
        SpectrumMetadata about = summary.Metadata;
        Add(sheet, "target", about.Target.Length == 0 ? "not given" : about.Target);
        Add(sheet, "position", Position(about));
        Add(sheet, "site", Site(about.Site));
        Add(sheet, "mid-exposure", Time(about));
        Add(sheet, "instrument", string.Join(", ", Array.FindAll([about.Telescope, about.Instrument], static s => s.Length > 0)));
        Add(sheet, "wavelengths", Wavelengths(summary));
        Add(sheet, "medium", summary.Medium == Medium.Unknown ? "not given: air or vacuum? say --medium" : SpectrumSummaryTable.Word(summary.Medium));
        Add(sheet, "frame", summary.Frame == VelocityFrame.Unknown ? "not given: say --frame" : SpectrumSummaryTable.Word(summary.Frame));
        Add(sheet, "resolution", about.ResolvingPower is { } power ? Text($"R = {power:0}") : "not given");
        Add(sheet, "flux", (summary.FluxUnit.Length == 0 ? "no unit" : summary.FluxUnit) + (summary.HasSigma ? ", with uncertainties" : ", without uncertainties"));
        Add(sheet, "S/N", SignalToNoise(summary));
        Add(sheet, "pixels", Pixels(summary));
        Add(sheet, "correction", Correction(summary));
        foreach (Remark remark in about.Remarks)
        {
            Add(sheet, "note", remark.Sentence);
        }
    }

    private static string Describe(HduInspection hdu)
    {
        string[] parts = [hdu.Kind, hdu.Name, hdu.Size, hdu.Use.Length > 0 ? "taken for " + hdu.Use : ""];
        return string.Join(", ", Array.FindAll(parts, static part => part.Length > 0));
    }

    private static void Add(StringBuilder sheet, string label, string text)
    {
        if (text.Length > 0)
        {
            sheet.Append("  ").Append(label.PadRight(LabelWidth)).Append(text).Append('\n');
        }
    }

    private static string Position(SpectrumMetadata about) =>
        about is { RightAscensionDegrees: { } ra, DeclinationDegrees: { } dec }
            ? Text($"RA {ra:0.00000}°, Dec {dec:+0.00000;-0.00000}° (ICRS)")
            : "not given";

    private static string Site(ObservingSite? site) => site is null
        ? "not given"
        : Text($"{(site.Name.Length == 0 ? "" : site.Name + ": ")}latitude {site.LatitudeDegrees:0.0000}°, longitude {site.LongitudeDegrees:0.0000}° east, {site.HeightMetres:0} m");

    private static string Time(SpectrumMetadata about) => about.MidExposureUtc is { } utc
        ? UtcTime.ToIso(utc, 1) + " UTC" + (about.ExposureSeconds is { } seconds ? Text($", exposed {seconds:0.###} s") : "")
        : "not given";

    private static string Wavelengths(SpectrumSummary summary) => Text(
        $"{summary.Range.MinimumAngstrom:0.00} to {summary.Range.MaximumAngstrom:0.00} Å, {summary.Pixels} pixels, {SpectrumSummaryTable.Word(summary.Sampling)}, step {summary.StepAngstrom:0.####} Å");

    private static string SignalToNoise(SpectrumSummary summary)
    {
        double given = summary.SignalToNoise;
        double found = summary.SignalToNoiseFromFlux;
        if (double.IsNaN(given))
        {
            return double.IsNaN(found) ? "not known" : Text($"{found:0.#} a pixel, from the scatter of the flux");
        }

        string text = Text($"{given:0.#} a pixel by the uncertainties, {found:0.#} by the scatter of the flux");
        bool isSuspicious = found > given * SuspiciousRatio || given > found * SuspiciousRatio;
        return isSuspicious ? text + "; they disagree, so check the uncertainties" : text;
    }

    private static string Pixels(SpectrumSummary summary)
    {
        int bad = summary.Pixels - summary.GoodPixels;
        return bad == 0 ? "all good" : Text($"{bad} of {summary.Pixels} bad ({100.0 * bad / summary.Pixels:0.##} %)");
    }

    private static string Correction(SpectrumSummary summary)
    {
        if (summary.Barycentre is not { } result)
        {
            return "none, for want of " + string.Join(", ", Missing(summary.Metadata));
        }

        string text = Text($"{result.CorrectionKmPerS:+0.0000;-0.0000} km/s to the barycentre, BJD {result.BarycentricJdTdb.Value:0.00000} TDB");
        return summary.Frame is VelocityFrame.Barycentric or VelocityFrame.Heliocentric
            ? text + "; the file says it is applied already"
            : text;
    }

    private static string[] Missing(SpectrumMetadata about)
    {
        string[] missing =
        [
            about.RightAscensionDegrees is null || about.DeclinationDegrees is null ? "a position (--ra, --dec)" : "",
            about.Site is null ? "a site (--site)" : "",
            about.MidExposureUtc is null ? "a time (--time)" : "",
        ];
        string[] found = Array.FindAll(missing, static part => part.Length > 0);
        return found.Length > 0 ? found : ["a time between 1960 and 2059"];
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
