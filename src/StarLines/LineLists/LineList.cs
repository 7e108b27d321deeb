using System;
using System.Collections.Generic;

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

    /// <summary>The lines in order of wavelength.</summary>
    public IReadOnlyList<RestLine> Lines => _lines;
}
