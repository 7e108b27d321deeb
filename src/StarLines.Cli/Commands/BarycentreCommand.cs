using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines barycentre</c>: the velocity and time correction alone.</summary>
internal static class BarycentreCommand
{
    private const string Example =
        "starlines barycentre --ra 141.0718 --dec +44.2369 --site 46.2083,12.3417,1180 --time 2025-03-14T20:22:30";

    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var place = new PlaceOptions(severalTimes: true);
        var table = new TableOutput();
        Option<string?> target = Make.One<string?>("--target", "NAME", "Name of the target.", static text => text);
        Option<string?> times = Make.One<string?>(
            "--times", "FILE", "A file with one UTC time a line (text after # is ignored); - for standard input.", static text => text);
        Option<double?> pmRa = Number("--pm-ra", "MAS_YR", "Proper motion in right ascension, times cos(dec), mas/yr.");
        Option<double?> pmDec = Number("--pm-dec", "MAS_YR", "Proper motion in declination, mas/yr.");
        Option<double?> parallax = Number("--parallax", "MAS", "Parallax, mas.");
        Option<double?> velocity = Number("--rv", "KM_S", "Radial velocity of the star, km/s; matters only for near stars that move fast.");
        var command = new VerbCommand(
            "barycentre",
            "The correction of velocity and time to the barycentre of the solar system.",
            Example)
        {
            target, times, pmRa, pmDec, parallax, velocity,
        };
        place.AddTo(command);
        table.AddTo(command);
        command.SetAction(parsed =>
        {
            TableSink sink = table.Open(parsed, terminal);
            var star = new StarAstrometry(
                place.RightAscensionDegrees(parsed) ?? throw Missing("--ra"),
                place.DeclinationDegrees(parsed) ?? throw Missing("--dec"))
            {
                ProperMotionRightAscensionMasPerYear = parsed.GetValue(pmRa) ?? 0.0,
                ProperMotionDeclinationMasPerYear = parsed.GetValue(pmDec) ?? 0.0,
                ParallaxMas = parsed.GetValue(parallax) ?? 0.0,
                RadialVelocityKmPerS = parsed.GetValue(velocity) ?? 0.0,
            };
            ObservingSite site = place.Site(parsed) ?? throw Missing("--site");
            var results = new List<BarycentricResult>();
            foreach (JulianDate utc in Times(parsed, place, times, terminal))
            {
                BarycentricResult result = BarycentricCorrection.At(utc, site, star, target: parsed.GetValue(target) ?? "");
                results.Add(result);
                foreach (Remark remark in result.Warnings)
                {
                    terminal.SayRemark($"{UtcTime.ToIso(utc)}: {remark.Sentence}");
                }
            }

            sink.Write(BarycentreTable.Create(results), provenance);
            return ExitCode.Done;
        });
        return command;
    }

    private static List<JulianDate> Times(ParseResult parsed, PlaceOptions place, Option<string?> file, Terminal terminal)
    {
        List<JulianDate> times = [.. place.Times(parsed)];
        if (parsed.GetValue(file) is { } name)
        {
            times.AddRange(ReadTimes(name, terminal));
        }

        return times.Count > 0 ? times : throw Missing("--time");
    }

    private static List<JulianDate> ReadTimes(string name, Terminal terminal)
    {
        using TextReader reader = name == InputLoop.StandardInput ? new StreamReader(terminal.In) : OpenText(name);
        var times = new List<JulianDate>();
        int number = 0;
        while (reader.ReadLine() is { } line)
        {
            number++;
            string text = line.Split('#')[0].Trim();
            if (text.Length == 0)
            {
                continue;
            }

            if (!UtcTime.TryParse(text, out JulianDate utc, out string? problem))
            {
                throw new UsageException(FormattableString.Invariant($"{name}, line {number}: {problem}"));
            }

            times.Add(utc);
        }

        return times;
    }

    private static StreamReader OpenText(string name) => File.Exists(name)
        ? new StreamReader(name)
        : throw new UsageException($"--times: there is no file {name}; check the path.");

    private static Option<double?> Number(string name, string unit, string description) =>
        Make.One<double?>(name, unit, description, static text => Values.Number(text));

    private static UsageException Missing(string option) =>
        new($"A barycentric correction needs {option}. See 'starlines barycentre --help'.");
}
