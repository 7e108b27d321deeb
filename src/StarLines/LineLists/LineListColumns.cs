using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Tables;

namespace StarLines.LineLists;

/// <summary>The columns of a line list, found by name, with their numbers in the units of <see cref="RestLine"/>.</summary>
internal sealed class LineListColumns
{
    /// <summary>eV of 1 cm⁻¹: h c/e, CODATA 2018, exact to the digits given.</summary>
    private const double EvPerWavenumber = 1.239841984332e-4;

    private static readonly string[] s_names =
        ["line", "species", "wavelength", "medium", "lower_energy", "log_gf", "a_ki", "intensity", "depth", "fwhm", "source"];

    private readonly Dictionary<string, TableColumn> _columns = new(StringComparer.OrdinalIgnoreCase);
    private readonly Dictionary<string, double> _factors = new(StringComparer.Ordinal);
    private readonly Table _table;
    private readonly string _source;

    /// <summary>Finds the columns of a table.</summary>
    /// <exception cref="LineListFormatException">A needed column is missing, a name is mistyped or a unit is unknown.</exception>
    internal LineListColumns(Table table, string source)
    {
        _table = table;
        _source = source;
        foreach (TableColumn column in table.Columns)
        {
            _columns.TryAdd(column.Name.Trim(), column);
        }

        CheckSpelling();
        Require("wavelength");
        Require("species");
        _factors["wavelength"] = LengthFactor("wavelength");
        _factors["fwhm"] = LengthFactor("fwhm");
        _factors["lower_energy"] = EnergyFactor("lower_energy");
    }

    /// <summary>A number in the unit of <see cref="RestLine"/>; NaN where the column or the value is missing.</summary>
    internal double Number(string name, int row)
    {
        if (!_columns.TryGetValue(name, out TableColumn? column) || column.IsMissing(row))
        {
            return double.NaN;
        }

        double factor = _factors.GetValueOrDefault(name, 1.0);
        return column.Type switch
        {
            ColumnType.Double => column.Doubles[row] * factor,
            ColumnType.Long => column.Longs[row]!.Value * factor,
            _ => ParseNumber(column, name, row) * factor,
        };
    }

    /// <summary>A text, trimmed; empty where the column or the value is missing.</summary>
    internal string Text(string name, int row) =>
        _columns.TryGetValue(name, out TableColumn? column) ? (column.TextAt(row) ?? "").Trim() : "";

    /// <summary>What is wrong with a cell.</summary>
    internal LineListFormatException Fault(int row, string column, string found, string expected)
    {
        int line = _table.LineNumberOf(row);
        string place = line > 0
            ? string.Create(CultureInfo.InvariantCulture, $"line {line}")
            : string.Create(CultureInfo.InvariantCulture, $"row {row + 1}");
        return new LineListFormatException($"{_source}, {place}, column {column}: found {found}, expected {expected}.");
    }

    private double ParseNumber(TableColumn column, string name, int row)
    {
        // One bad cell makes a whole column of text: say which.
        string text = column.TextAt(row)!;
        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value)
            ? value
            : throw Fault(row, name, $"\"{text}\"", "a number, or nothing where it is not known");
    }

    private void Require(string name)
    {
        if (!_columns.ContainsKey(name))
        {
            throw new LineListFormatException(
                $"{_source}: there is no column {name}; its columns are {string.Join(", ", _columns.Keys)}. Name one of them {name}, or add a header row with the names.");
        }
    }

    private void CheckSpelling()
    {
        foreach (string name in _columns.Keys)
        {
            if (Array.Exists(s_names, known => known.Equals(name, StringComparison.OrdinalIgnoreCase)))
            {
                continue;
            }

            string? meant = NearestName.Of(name, s_names);
            if (meant is not null && !_columns.ContainsKey(meant))
            {
                throw new LineListFormatException($"{_source}: the column {name} is not known; the nearest right name is {meant}. Rename the column.");
            }
        }
    }

    private double LengthFactor(string name) => UnitOf(name) switch
    {
        "" or "Angstrom" or "angstrom" or "AA" or "Å" or "0.1nm" or "0.1 nm" => 1.0,
        "nm" => 10.0,
        "um" or "micron" or "µm" or "μm" => 1.0e4,
        string unit => throw Unknown(name, unit, "Angstrom, nm or um"),
    };

    private double EnergyFactor(string name) => UnitOf(name) switch
    {
        "" or "eV" => 1.0,
        "1/cm" or "1 / cm" or "cm-1" or "cm**-1" or "cm^-1" => EvPerWavenumber,
        string unit => throw Unknown(name, unit, "eV or 1/cm"),
    };

    private string UnitOf(string name) => _columns.TryGetValue(name, out TableColumn? column) ? column.Unit.Trim() : "";

    private LineListFormatException Unknown(string name, string unit, string known) =>
        new($"{_source}: the column {name} has the unit {unit}; convert it to {known}.");
}
