using System.Collections.Generic;
using StarLines.LineLists;
using StarLines.Tables;

namespace StarLines.Cli.Output;

/// <summary>The columns of <c>starlines lines</c>: those of a line list, and the list.</summary>
internal static class FoundLines
{
    /// <summary>A table of some lines of a list; all lists give the same columns, so that the tables can be joined.</summary>
    public static Table ToTable(LineList list, IReadOnlyList<RestLine> lines)
    {
        string medium = list.Medium switch
        {
            Medium.Air => "air",
            Medium.Vacuum => "vacuum",
            _ => "unknown",
        };
        return new TableMap<RestLine>()
            .Text("list", _ => list.Name, "The line list", "meta.id")
            .Text("line", static l => l.Name, "Name of the line", "meta.id;em.line")
            .Text("species", static l => l.Species, "Atom or ion", "phys.atmol.element")
            .Double("wavelength", static l => l.WavelengthAngstrom, "Angstrom", "Rest wavelength", "em.wl", decimals: 4)
            .Text("medium", _ => medium, "Medium of the wavelength")
            .Double("lower_energy", static l => l.LowerEnergyEv, "eV", "Excitation energy of the lower level", "phys.energy", decimals: 4)
            .Double("log_gf", static l => l.LogGf, "", "Decimal logarithm of the weighted oscillator strength g f", "phys.atmol.wOscStrength", decimals: 3)
            .Double("a_ki", static l => l.EinsteinAPerS, "1/s", "Einstein coefficient of spontaneous emission", "phys.atmol.transProb", significantDigits: 4)
            .Double("intensity", static l => l.Intensity, "", "Relative intensity in emission, by the source", "phys.luminosity", significantDigits: 6)
            .Text("source", static l => l.Source, "Where the numbers come from", "meta.bib")
            .ToTable(lines, name: "lines");
    }
}
