using System;
using System.Collections.Generic;
using System.IO;
using StarLines.Cli.Output;
using StarLines.Continuum;
using StarLines.IO;
using StarLines.LineLists;
using StarLines.Templates;
using StarLines.Velocities;

namespace StarLines.Cli.Options;

/// <summary>Line lists and templates by name or path; what is wrong with them is a wrong command line.</summary>
internal static class NamedLists
{
    /// <summary>One list.</summary>
    public static LineList Find(string nameOrPath)
    {
        try
        {
            return LineListCatalog.Find(nameOrPath);
        }
        catch (Exception problem) when (problem is IOException or LineListFormatException or UnauthorizedAccessException)
        {
            throw new UsageException(problem.Message);
        }
    }

    /// <summary>Several lists in one, in the medium of the first; null for none.</summary>
    public static LineList? Join(IReadOnlyList<string> names)
    {
        if (names.Count == 0)
        {
            return null;
        }

        LineList first = Find(names[0]);
        if (names.Count == 1)
        {
            return first;
        }

        var lines = new List<RestLine>(first.Lines);
        string name = first.Name;
        string sha256 = first.Sha256;
        for (int i = 1; i < names.Count; i++)
        {
            LineList next = Find(names[i]);
            name += "+" + next.Name;
            sha256 += "+" + next.Sha256;
            foreach (RestLine line in next.Lines)
            {
                lines.Add(next.Medium == first.Medium ? line : line with
                {
                    WavelengthAngstrom = AirVacuum.ConvertAngstrom(line.WavelengthAngstrom, next.Medium, first.Medium),
                });
            }
        }

        return new LineList(name, first.Medium, lines, sha256);
    }

    /// <summary>A template: a line list by name or path, or a spectrum, which is taken to be at rest where its frame says so or no velocity can be measured.</summary>
    public static LineTemplate Template(string nameOrPath, Provenance provenance)
    {
        bool isSpectrum = File.Exists(nameOrPath.Split('#')[0]) && !IsTable(nameOrPath);
        if (!isSpectrum)
        {
            LineList list = Find(nameOrPath);
            provenance.AddList(list);
            return LineTemplate.FromLineList(list);
        }

        try
        {
            Spectrum spectrum = SpectrumReader.Read(nameOrPath)[0];
            ContinuumFit continuum = ContinuumFitter.Fit(spectrum);
            double velocity = spectrum.Scale.Frame == VelocityFrame.Rest ? 0.0 : OwnVelocity(spectrum, continuum);
            provenance.AddInput(nameOrPath);
            return LineTemplate.FromSpectrum(spectrum, continuum, velocity, Path.GetFileName(nameOrPath));
        }
        catch (Exception problem) when (problem is not UsageException)
        {
            throw new UsageException(ErrorSentence.Of(problem, nameOrPath));
        }
    }

    private static double OwnVelocity(Spectrum spectrum, ContinuumFit continuum)
    {
        Measured velocity = new StellarTemplates().Measure(spectrum, continuum, [StellarTemplates.BothName])[0].ObservedKmPerS;
        return velocity.HasValue ? velocity.Value : 0.0;
    }

    // A text table is a line list; a FITS file is a spectrum.
    private static bool IsTable(string path) =>
        Path.GetExtension(path).ToUpperInvariant() is ".ECSV" or ".CSV" or ".TXT" or ".LIST";
}
