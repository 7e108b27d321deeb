using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Fits.Tests.Reference;

/// <summary>Files that observatories, surveys, amateurs and general FITS libraries wrote; the index of the collection says which open.</summary>
public sealed class RealFilesTests
{
    [Fact]
    public void Every_file_that_the_index_says_opens_is_read()
    {
        string folder = ReferenceData.Require("spectra");
        List<string> failures = [];
        int count = 0;
        foreach (string line in File.ReadLines(Path.Combine(folder, "index.csv")).Skip(1))
        {
            string name = line[..line.IndexOf(',')];
            string path = Path.Combine(folder, name);
            if (!File.Exists(path) || !IsFits(name))
            {
                continue;
            }

            count++;
            Reading reading = Reading.Of(path);
            bool opens = !line.Contains("no (by design)", StringComparison.Ordinal);
            if (opens != (reading.Error is null))
            {
                failures.Add($"{name}: {reading.Error?.Message ?? "was read"}");
            }
        }

        Assert.True(count > 100, "the index was not understood");
        Assert.True(failures.Count == 0, string.Join(Environment.NewLine, failures));
    }

    private static bool IsFits(string name) =>
        name.Contains(".fit", StringComparison.OrdinalIgnoreCase) || name.EndsWith(".fz", StringComparison.OrdinalIgnoreCase)
        || name.EndsWith(".totsky.gz", StringComparison.OrdinalIgnoreCase);
}
