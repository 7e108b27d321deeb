using System;
using System.Collections.Generic;
using StarLines.Velocities;

namespace StarLines.LineLists;

/// <summary>Lines in order of wavelength, all in one medium.</summary>
public sealed class LineList
{
    private readonly RestLine[] _lines;

    /// <summary>Makes a list; the lines are copied and sorted by wavelength.</summary>
    /// <param name="name">Name of the list.</param>
    /// <param name="medium">What the wavelengths are.</param>
    /// <param name="lines">The lines.</param>
    /// <param name="sha256">Hexadecimal SHA-256 of the source, or an empty string.</param>
    /// <exception cref="ArgumentException">A wavelength is not finite and positive.</exception>
    public LineList(string name, Medium medium, IReadOnlyCollection<RestLine> lines, string sha256 = "")
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(lines);
        ArgumentNullException.ThrowIfNull(sha256);
        Name = name;
        Medium = medium;
        Sha256 = sha256;
        _lines = [.. lines];
        foreach (RestLine line in _lines)
        {
            Guard.Positive(line.WavelengthAngstrom, nameof(lines), "Å");
        }

        Array.Sort(_lines, static (a, b) => a.WavelengthAngstrom.CompareTo(b.WavelengthAngstrom));
    }

    /// <summary>Name of the list.</summary>
    public string Name { get; }

    /// <summary>Medium of every wavelength in the list.</summary>
    public Medium Medium { get; }

    /// <summary>Hexadecimal SHA-256 of the file the list was read from, or an empty string.</summary>
    public string Sha256 { get; }

    /// <summary>One sentence on what the list holds; may be empty.</summary>
    public string Title { get; init; } = "";

    /// <summary>Where the numbers come from; may be empty.</summary>
    public string Source { get; init; } = "";

    /// <summary>What to cite; may be empty.</summary>
    public string Citation { get; init; } = "";

    /// <summary>The lines in order of wavelength.</summary>
    public IReadOnlyList<RestLine> Lines => _lines;

    /// <summary>The same lines with their wavelengths in another medium.</summary>
    /// <param name="medium">Air or vacuum.</param>
    /// <returns>This list where it is in that medium already, else a new one under the same name and SHA-256.</returns>
    /// <exception cref="ArgumentException">A medium is unknown, or a wavelength is out of range of <see cref="AirVacuum"/>.</exception>
    /// <remarks>Names of lines stay as they are, and widths of template lines too: they change by 3 parts in 10 000.</remarks>
    public LineList ToMedium(Medium medium)
    {
        if (medium == Medium && medium != Medium.Unknown)
        {
            return this;
        }

        RestLine[] converted = Array.ConvertAll(_lines, line => line with
        {
            WavelengthAngstrom = AirVacuum.ConvertAngstrom(line.WavelengthAngstrom, Medium, medium),
        });
        return With(converted, medium);
    }

    /// <summary>The lines of some species in some ranges.</summary>
    /// <param name="species">Names such as <c>Fe I</c>, <c>fe1</c>, or <c>Fe</c> for every stage; empty for all.</param>
    /// <param name="ranges">Ranges in the list's medium, Å; empty for all wavelengths.</param>
    /// <returns>A list of those lines under the same name and SHA-256; may be empty.</returns>
    public LineList Search(IReadOnlyCollection<string> species, IReadOnlyCollection<WavelengthRange> ranges)
    {
        ArgumentNullException.ThrowIfNull(species);
        ArgumentNullException.ThrowIfNull(ranges);
        var names = new List<string>(species.Count);
        foreach (string name in species)
        {
            names.Add(SpeciesName.Normalize(name));
        }

        return With(Array.FindAll(_lines, line => SpeciesName.Matches(line.Species, names) && IsWithin(line, ranges)), Medium);
    }

    private static bool IsWithin(RestLine line, IReadOnlyCollection<WavelengthRange> ranges)
    {
        foreach (WavelengthRange range in ranges)
        {
            if (range.Contains(line.WavelengthAngstrom))
            {
                return true;
            }
        }

        return ranges.Count == 0;
    }

    private LineList With(RestLine[] lines, Medium medium) =>
        new(Name, medium, lines, Sha256) { Title = Title, Source = Source, Citation = Citation };
}
