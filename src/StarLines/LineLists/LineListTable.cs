using System;
using System.Collections.Generic;
using StarLines.Tables;

namespace StarLines.LineLists;

/// <summary>Line lists as tables: the columns that <see cref="LineListReader"/> reads.</summary>
public static class LineListTable
{
    private static readonly string[] s_optional = ["lower_energy", "log_gf", "a_ki", "intensity", "depth", "fwhm"];

    /// <summary>Turns a list into a table of one row a line; columns of numbers that no line has are left out.</summary>
    /// <param name="list">The list; may be empty.</param>
    /// <param name="metadata">Metadata of the table; null for title, source and citation of the list.</param>
    /// <returns>The table.</returns>
    public static Table ToTable(LineList list, TableMetadata? metadata = null)
    {
        ArgumentNullException.ThrowIfNull(list);
        string medium = list.Medium switch { Medium.Air => "air", Medium.Vacuum => "vacuum", _ => "unknown" };
        Table table = Map(medium).ToTable(list.Lines, metadata ?? Described(list));
        var columns = new List<TableColumn>(table.Columns.Count);
        foreach (TableColumn column in table.Columns)
        {
            if (Array.IndexOf(s_optional, column.Name) < 0 || list.Lines.Count == 0 || HasValue(column))
            {
                columns.Add(column);
            }
        }

        return new Table(columns, table.Metadata, list.Name);
    }

    private static TableMap<RestLine> Map(string medium) => new TableMap<RestLine>()
        .Text("line", static line => line.Name, "Name of the line", "meta.id")
        .Text("species", static line => line.Species, "Atom or ion", "phys.atmol.element")
        .Double("wavelength", static line => line.WavelengthAngstrom, "Angstrom", "Rest wavelength", "em.wl", decimals: 4)
        .Text("medium", _ => medium, "Medium of the wavelength")
        .Double("lower_energy", static line => line.LowerEnergyEv, "eV", "Excitation energy of the lower level", "phys.energy;phys.atmol.initial;phys.atmol.level", decimals: 4)
        .Double("log_gf", static line => line.LogGf, "", "Decimal logarithm of the weighted oscillator strength g f", "phys.atmol.wOscStrength", decimals: 3)
        .Double("a_ki", static line => line.EinsteinAPerS, "1/s", "Einstein coefficient of spontaneous emission", "phys.atmol.transProb", significantDigits: 4)
        .Double("intensity", static line => line.Intensity, "", "Relative intensity in emission", "spect.line.intensity", significantDigits: 4)
        .Double("depth", static line => line.Depth, "", "Central depth of a template line in units of the continuum", significantDigits: 4)
        .Double("fwhm", static line => line.FwhmAngstrom, "Angstrom", "Full width at half maximum of a template line", "spect.line.width", significantDigits: 4)
        .Text("source", static line => line.Source, "Where the numbers come from", "meta.bib");

    private static TableMetadata Described(LineList list)
    {
        var metadata = new TableMetadata();
        foreach ((string key, string text) in new[] { ("title", list.Title), ("source", list.Source), ("citation", list.Citation) })
        {
            if (text.Length > 0)
            {
                metadata.Add(key, text);
            }
        }

        return metadata;
    }

    private static bool HasValue(TableColumn column)
    {
        for (int r = 0; r < column.Count; r++)
        {
            if (!column.IsMissing(r))
            {
                return true;
            }
        }

        return false;
    }
}
