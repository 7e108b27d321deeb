using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using StarLines.Fits;
using StarLines.IO;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.IO.Reference;

/// <summary>
/// Real spectra of archives, surveys and amateurs with their published facts (index.csv of the reference folder): each opens without an
/// option, or is refused in one sentence; range, number of pixels, medium and frame are those of the index.
/// </summary>
public sealed class RealSpectraTests(ITestOutputHelper output)
{
    /// <summary>Files whose header does not say vacuum, so that the custom of the ground (air) is assumed and reported; the index knows from elsewhere.</summary>
    private static readonly string[] VacuumUnstated = ["templates_mdwarf/"];

    [Fact]
    public void Every_spectrum_of_the_index_reads_as_the_index_says()
    {
        string folder = Path.GetDirectoryName(ReferenceData.Require("spectra", "index.csv"))!;
        var failures = new List<string>();
        int read = 0;
        int refused = 0;
        foreach (Dictionary<string, string> row in Rows(Path.Combine(folder, "index.csv")))
        {
            IReadOnlyList<Spectrum>? spectra = TryRead(Path.Combine(folder, row["file"]), out string problem);
            bool isSpectrum = row["wave_min"].Length != 0 && !row["wave_unit"].StartsWith("pixel", StringComparison.Ordinal);
            if (spectra is null)
            {
                refused++;
                output.WriteLine($"refused: {problem.Replace(folder + "/", "", StringComparison.Ordinal)}");
                if (isSpectrum)
                {
                    failures.Add($"{row["file"]}: refused: {problem}");
                }

                continue;
            }

            read++;
            if (isSpectrum && Differences(row, spectra[0]) is { Length: > 0 } differences)
            {
                failures.Add($"{row["file"]}: {differences}");
            }
            else if (!isSpectrum)
            {
                output.WriteLine($"read, though the index names no range: {row["file"]}: {Describe(spectra[0])}");
            }
        }

        output.WriteLine($"read {read}, refused {refused}, wrong {failures.Count}");
        Assert.True(failures.Count == 0, string.Join("\n", failures.Take(60)));
    }

    private static string Differences(Dictionary<string, string> row, Spectrum spectrum)
    {
        var differences = new List<string>();
        double factor = row["wave_unit"].StartsWith("nm", StringComparison.Ordinal) ? 10.0 : 1.0;
        double first = spectrum.Scale.Range.MinimumAngstrom;
        double last = spectrum.Scale.Range.MaximumAngstrom;

        // The index rounds to one decimal at the coarsest, some to whole Å; a wrong unit or axis is off by far more.
        double tolerance = row["wave_min"].Contains('.', StringComparison.Ordinal) ? 0.1 * factor : 1.0 * factor;
        if (Math.Abs(first - (Number(row["wave_min"]) * factor)) > tolerance || Math.Abs(last - (Number(row["wave_max"]) * factor)) > tolerance)
        {
            differences.Add(string.Create(CultureInfo.InvariantCulture, $"range {first:F2} to {last:F2}, not {row["wave_min"]} to {row["wave_max"]} {row["wave_unit"]}"));
        }

        if (row["n_points"].Length != 0 && spectrum.Count != (int)Number(row["n_points"]))
        {
            differences.Add($"{spectrum.Count} pixels, not {row["n_points"]}");
        }

        Medium medium = row["air_or_vacuum"].StartsWith("vacuum", StringComparison.Ordinal) ? Medium.Vacuum
            : row["air_or_vacuum"].StartsWith("air", StringComparison.Ordinal) ? Medium.Air
            : Medium.Unknown;
        bool assumed = spectrum.Metadata.Remarks.Any(remark => remark.Word == "medium-assumed");
        bool excused = assumed && VacuumUnstated.Any(folder => row["file"].StartsWith(folder, StringComparison.Ordinal));
        if (medium != Medium.Unknown && spectrum.Scale.Medium != medium && !excused)
        {
            differences.Add($"{spectrum.Scale.Medium}, not {row["air_or_vacuum"]}");
        }

        if (FrameOf(row["wave_frame"]) is VelocityFrame frame && spectrum.Scale.Frame != frame && spectrum.Scale.Frame != VelocityFrame.Unknown)
        {
            differences.Add($"frame {spectrum.Scale.Frame}, not {row["wave_frame"]}");
        }

        // Surveys mark many pixels for information only; a bright star keeps most of its pixels.
        double good = spectrum.Faults.Count(PixelFaults.None) / (double)spectrum.Count;
        if (row["file"].StartsWith("survey_", StringComparison.Ordinal) && good < 0.8)
        {
            differences.Add(string.Create(CultureInfo.InvariantCulture, $"only {good:P0} of the pixels are good"));
        }

        return string.Join("; ", differences);
    }

    private static VelocityFrame? FrameOf(string text) =>
        text.StartsWith("barycentric", StringComparison.Ordinal) ? VelocityFrame.Barycentric
        : text.StartsWith("heliocentric", StringComparison.Ordinal) ? VelocityFrame.Heliocentric
        : text.StartsWith("topocentric", StringComparison.Ordinal) ? VelocityFrame.Topocentric
        : text.StartsWith("rest", StringComparison.Ordinal) ? VelocityFrame.Rest
        : null;

    private static IReadOnlyList<Spectrum>? TryRead(string path, out string problem)
    {
        problem = "";
        try
        {
            return SpectrumReader.Read(path);
        }
        catch (Exception refused) when (refused is SpectrumFormatException or FitsFormatException)
        {
            problem = refused.Message;
            return null;
        }
    }

    private static string Describe(Spectrum spectrum) => string.Create(
        CultureInfo.InvariantCulture,
        $"{spectrum.Count} pixels, {spectrum.Scale.Range.MinimumAngstrom:F2} to {spectrum.Scale.Range.MaximumAngstrom:F2} Å");

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static List<Dictionary<string, string>> Rows(string path)
    {
        string[] lines = File.ReadAllLines(path);
        string[] names = GoldenCsv.Split(lines[0]);
        return [.. lines.Skip(1).Select(line =>
        {
            string[] cells = GoldenCsv.Split(line);
            return names.Select((name, i) => (name, cell: i < cells.Length ? cells[i] : "")).ToDictionary(pair => pair.name, pair => pair.cell);
        })];
    }
}
