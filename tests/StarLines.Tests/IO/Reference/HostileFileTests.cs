using System;
using System.Collections.Generic;
using System.Linq;
using StarLines.Fits;
using StarLines.IO;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Tests.IO.Reference;

/// <summary>Damaged and odd files, each with the outcome that tests/Data/golden/hostile.csv requires.</summary>
public sealed class HostileFileTests
{
    /// <summary>Remarks that any file may have; they warn of nothing in particular.</summary>
    private static readonly string[] Usual = ["medium-assumed", "frame-assumed", "frame-unknown", "unit-guessed"];

    public static TheoryData<string, string> Files()
    {
        var data = new TheoryData<string, string>();
        foreach (Dictionary<string, string> row in GoldenCsv.Rows("hostile.csv"))
        {
            data.Add(row["file"], row["required_outcome"]);
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void The_outcome_is_the_required_one(string file, string required)
    {
        IReadOnlyList<Spectrum>? spectra = null;
        string error = "";
        try
        {
            spectra = SpectrumReader.Read(ReferenceData.DataFile("golden", "hostile", file));
        }
        catch (Exception refused) when (refused is SpectrumFormatException or FitsFormatException)
        {
            error = refused.Message;
        }

        if (spectra is null)
        {
            Assert.Contains(file, error, StringComparison.Ordinal);
            Assert.True(
                required.Contains("error", StringComparison.Ordinal) || required is "no-crash" or "readable-or-limit",
                $"must be {required}, but was refused: {error}");
            return;
        }

        bool warned = spectra.Any(spectrum => spectrum.Metadata.Remarks.Any(remark => !Usual.Contains(remark.Word)));
        bool flagged = spectra.Any(spectrum => spectrum.Faults.IndexOfAnyExcept(PixelFaults.None) >= 0);
        switch (required)
        {
            case "error" or "error-or-empty" or "error-or-pixels" or "error-or-velocity":
                Assert.Fail($"must be refused, but gave {spectra[0].Count} pixels from {spectra[0].Scale.Range.MinimumAngstrom} Å");
                break;
            case "error-or-partial":
                // Lost pixels of an image are flagged; lost rows of a table are not there.
                Assert.True(warned && (flagged || spectra[0].Count < 400), "a part was given without a warning or without flags");
                break;
            case "error-or-mask":
                Assert.True(flagged, "was neither refused nor masked");
                break;
            case "warn-readable" or "warn-or-error":
                Assert.True(warned, "was read without a warning");
                break;
            default:
                break;
        }

        foreach (Spectrum spectrum in spectra)
        {
            Assert.All(spectrum.Flux.ToArray(), value => Assert.True(double.IsFinite(value)));
        }
    }
}
