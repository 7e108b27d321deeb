using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.IO;
using StarLines.Plotting;
using StarLines.Profiles;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;
using static StarLines.Runs.Plans.PlanSetting;

namespace StarLines.Runs.Plans;

/// <summary>All settings of a plan, in the order of its file.</summary>
internal static class PlanSettings
{
    private const string Reading = "reading";
    private const string Continuum = "continuum";
    private const string Velocity = "velocity";
    private const string Lines = "lines";
    private const string Figures = "figures";

    private static readonly (string, RunSteps)[] StepWords =
    [
        ("continuum", RunSteps.Continuum), ("velocity", RunSteps.Velocity), ("lines", RunSteps.Lines), ("figures", RunSteps.Figures),
    ];

    private static readonly (string, RunTableFormat)[] FormatWords =
    [
        ("ecsv", RunTableFormat.Ecsv), ("csv", RunTableFormat.Csv), ("json", RunTableFormat.Json),
        ("fits", RunTableFormat.Fits), ("votable", RunTableFormat.VoTable), ("parquet", RunTableFormat.Parquet),
    ];

    private static readonly (string, Medium)[] MediumWords = [("air", Medium.Air), ("vacuum", Medium.Vacuum)];

    private static readonly (string, VelocityFrame)[] FrameWords =
        [("topocentric", VelocityFrame.Topocentric), ("barycentric", VelocityFrame.Barycentric)];

    private static readonly (string, ProfileShape)[] ProfileWords =
        [("gaussian", ProfileShape.Gaussian), ("lorentzian", ProfileShape.Lorentzian)];

    private static readonly (string, PixelSampling)[] SamplingWords =
        [("integrated", PixelSampling.Integrated), ("point", PixelSampling.Point)];

    private static readonly (string, FigureFormat)[] FigureWords = [("png", FigureFormat.Png), ("svg", FigureFormat.Svg)];

    internal static IReadOnlyList<PlanSetting> All { get; } =
    [
        new("", "inputs", "files, folders, patterns, manifests", p => Toml(p.Inputs), (p, v) => p with { Inputs = v.Texts() }),
        new("", "steps", "of continuum, velocity, lines, figures", p => Toml(Names(p.Steps)), (p, v) => p with { Steps = Steps(v) }),
        new("", "format", "of the tables", p => Toml(Word(FormatWords, p.Format)), (p, v) => p with { Format = Choice(v, FormatWords) }),
        new("", "times_in_table", "seconds in spectra.*; no two runs are then the same", p => Toml(p.TimesInTable), (p, v) => p with { TimesInTable = v.Truth() }),
        new(Reading, "medium", "air or vacuum, where files do not say or say it wrongly", p => Toml(Word(MediumWords, p.Reading.Medium)), (p, v) => p with { Reading = p.Reading with { Medium = Choice(v, MediumWords) } }),
        new(Reading, "frame", "topocentric or barycentric", p => Toml(Word(FrameWords, p.Reading.Frame)), (p, v) => p with { Reading = p.Reading with { Frame = Choice(v, FrameWords) } }),
        new(Reading, "axis_unit", "unit of the spectral axis", p => Toml(p.Reading.AxisUnit), (p, v) => p with { Reading = p.Reading with { AxisUnit = v.Text() } }),
        new(Reading, "columns", "wave=NAME,flux=NAME,error=NAME", p => Toml(ColumnText(p.Reading.Columns)), (p, v) => p with { Reading = p.Reading with { Columns = Of(v, ColumnSelection.Parse) } }),
        new(Reading, "ranges", "A:B, Angstrom", p => Toml(Texts(p.Reading.Ranges)), (p, v) => p with { Reading = p.Reading with { Ranges = Ranges(v) } }),
        new(Reading, "target", "name", p => Toml(p.Reading.Target), (p, v) => p with { Reading = p.Reading with { Target = v.Text() } }),
        new(Reading, "ra", "ICRS, degrees", p => Toml(p.Reading.RightAscensionDegrees), (p, v) => p with { Reading = p.Reading with { RightAscensionDegrees = v.Number() } }),
        new(Reading, "dec", "ICRS, degrees", p => Toml(p.Reading.DeclinationDegrees), (p, v) => p with { Reading = p.Reading with { DeclinationDegrees = v.Number() } }),
        new(Reading, "site", "name or LAT,LON,HEIGHT", p => Toml(SiteText(p.Reading.Site)), (p, v) => p with { Reading = p.Reading with { Site = Of(v, ObservingSites.Parse) } }),
        new(Reading, "time", "mid-exposure, UTC", p => Toml(p.Reading.MidExposureUtc is { } utc ? UtcTime.ToIso(utc, 6) : ""), (p, v) => p with { Reading = p.Reading with { MidExposureUtc = Of<JulianDate>(v, UtcTime.Parse) } }),
        new(Reading, "resolving_power", "wavelength/FWHM", p => Toml(p.Reading.ResolvingPower), (p, v) => p with { Reading = p.Reading with { ResolvingPower = v.Number() } }),
        new(Continuum, "exclude", "A:B, Angstrom", p => Toml(Texts(p.Exclude)), (p, v) => p with { Exclude = Ranges(v) }),
        new(Continuum, "outliers", "whether cosmic-ray hits and dead pixels are left out", p => Toml(p.FindOutliers), (p, v) => p with { FindOutliers = v.Truth() }),
        new(Continuum, "stiffness", "Angstrom; else the data choose", p => Toml(p.StiffnessAngstrom), (p, v) => p with { StiffnessAngstrom = v.Number() }),
        new(Velocity, "templates", "balmer, metal, both, or line lists", p => Toml(p.Templates), (p, v) => p with { Templates = v.Texts() }),
        new(Velocity, "search", "km/s, both ways", p => Toml(p.SearchHalfRangeKmPerS), (p, v) => p with { SearchHalfRangeKmPerS = v.Number() }),
        new(Lines, "lists", "names or paths", p => Toml(p.LineLists), (p, v) => p with { LineLists = v.Texts() }),
        new(Lines, "velocity", "km/s; else the measured one", p => Toml(p.LineVelocityKmPerS), (p, v) => p with { LineVelocityKmPerS = v.Number() }),
        new(Lines, "profile", "gaussian or lorentzian", p => Toml(Word(ProfileWords, p.Profile)), (p, v) => p with { Profile = Choice(v, ProfileWords) }),
        new(Lines, "sampling", "integrated or point", p => Toml(Word(SamplingWords, p.Sampling)), (p, v) => p with { Sampling = Choice(v, SamplingWords) }),
        new(Figures, "format", "png or svg", p => Toml(Word(FigureWords, p.FigureFormat)), (p, v) => p with { FigureFormat = Choice(v, FigureWords) }),
        new(Figures, "line_panels", "most lines a spectrum that get a panel; 0 for all", p => Toml(p.LinePanels), (p, v) => p with { LinePanels = v.Count() }),
    ];

    private static string Word<T>((string Word, T Value)[] words, T value)
        where T : struct => Array.Find(words, pair => pair.Value.Equals(value)).Word ?? "";

    private static T Choice<T>(PlanValue value, (string Word, T Value)[] words) => Choice(value, value.Text(), words);

    private static T Choice<T>(PlanValue value, string text, (string Word, T Value)[] words)
    {
        foreach ((string word, T meaning) in words)
        {
            if (word.Equals(text, StringComparison.OrdinalIgnoreCase))
            {
                return meaning;
            }
        }

        throw value.Wrong($"one of {string.Join(", ", Array.ConvertAll(words, static pair => pair.Word))}; '{text}' is none of them");
    }

    private static List<string> Names(RunSteps steps)
    {
        var names = new List<string>();
        foreach ((string word, RunSteps step) in StepWords)
        {
            if (steps.HasFlag(step))
            {
                names.Add(word);
            }
        }

        return names;
    }

    private static RunSteps Steps(PlanValue value)
    {
        RunSteps steps = RunSteps.None;
        foreach (string text in value.Texts())
        {
            steps |= Choice(value, text, StepWords);
        }

        return steps;
    }

    private static List<string> Texts(IReadOnlyList<WavelengthRange> ranges)
    {
        var texts = new List<string>(ranges.Count);
        foreach (WavelengthRange range in ranges)
        {
            texts.Add(string.Create(CultureInfo.InvariantCulture, $"{range.MinimumAngstrom:R}:{range.MaximumAngstrom:R}"));
        }

        return texts;
    }

    private static List<WavelengthRange> Ranges(PlanValue value)
    {
        var ranges = new List<WavelengthRange>();
        foreach (string text in value.Texts())
        {
            string[] ends = text.Split(':');
            if (ends.Length != 2
                || !double.TryParse(ends[0], NumberStyles.Float, CultureInfo.InvariantCulture, out double from)
                || !double.TryParse(ends[1], NumberStyles.Float, CultureInfo.InvariantCulture, out double to)
                || !(from < to))
            {
                throw value.Wrong($"ranges such as \"5000:5100\" (Angstrom, the lower end first); '{text}' is none");
            }

            ranges.Add(new WavelengthRange(from, to));
        }

        return ranges;
    }

    private static T Of<T>(PlanValue value, Func<string, T> parse)
    {
        string text = value.Text();
        try
        {
            return parse(text);
        }
        catch (Exception problem) when (problem is FormatException or ArgumentException)
        {
            throw value.Wrong($"something else: {problem.Message}");
        }
    }

    private static string SiteText(ObservingSite? site) => site is null ? ""
        : ObservingSites.TryFind(site.Name, out ObservingSite? known) && known == site ? site.Name
        : string.Create(CultureInfo.InvariantCulture, $"{site.LatitudeDegrees:R},{site.LongitudeDegrees:R},{site.HeightMetres:R}");

    private static string ColumnText(ColumnSelection? columns)
    {
        if (columns is null)
        {
            return "";
        }

        (string Role, string Name)[] roles =
        [
            ("wave", columns.Wavelength), ("flux", columns.Flux), ("error", columns.Error),
            ("ivar", columns.InverseVariance), ("var", columns.Variance), ("mask", columns.Mask),
        ];
        return string.Join(',', Array.ConvertAll(
            Array.FindAll(roles, static r => r.Name.Length != 0), static r => $"{r.Role}={r.Name}"));
    }
}
