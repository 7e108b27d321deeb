using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Which columns of a table make a spectrum; numbers count from 1, 0 is none.</summary>
internal sealed record ColumnPlan
{
    internal int Wavelength { get; init; }

    internal bool WavelengthIsLog10 { get; init; }

    internal int Flux { get; init; }

    internal int Noise { get; init; }

    internal NoiseForm NoiseForm { get; init; }

    internal int Mask { get; init; }

    /// <summary>What the columns say of the medium.</summary>
    internal Medium Medium { get; init; }

    /// <summary>Chooses the columns: as the user says, else by descriptor, else by name. Null where wavelength or flux is missing.</summary>
    internal static ColumnPlan? Choose(IReadOnlyList<ColumnFacts> columns, ReadContext context)
    {
        ColumnSelection? asked = context.Options.Columns;
        var best = new Dictionary<ColumnRole, (int Number, int Rank)>();
        foreach (ColumnFacts column in columns)
        {
            ColumnRole role = ColumnRoles.OfDescriptor(column.Ucd, column.Utype);
            int rank = -1;
            if (role == ColumnRole.None)
            {
                (role, rank) = ColumnRoles.OfName(column.Name);
            }

            if (role != ColumnRole.None && (!best.TryGetValue(role, out (int Number, int Rank) known) || rank < known.Rank))
            {
                best[role] = (column.Number, rank);
            }
        }

        int wave = Asked(asked?.Wavelength, columns, context) ?? Best(best, ColumnRole.Wavelength);
        int log = wave == 0 ? Best(best, ColumnRole.LogWavelength) : 0;
        int flux = Asked(asked?.Flux, columns, context) ?? Best(best, ColumnRole.Flux);
        if (wave + log == 0 || flux == 0)
        {
            return null;
        }

        bool namedLog = wave != 0 && ColumnRoles.OfName(columns[wave - 1].Name).Role == ColumnRole.LogWavelength;
        (int noise, NoiseForm form) = ChooseNoise(asked, best, columns, context);
        return new ColumnPlan
        {
            Wavelength = wave + log,
            WavelengthIsLog10 = log != 0 || namedLog,
            Flux = flux,
            Noise = noise == flux ? 0 : noise,
            NoiseForm = form,
            Mask = Asked(asked?.Mask, columns, context) ?? Best(best, ColumnRole.Mask),
            Medium = MediumOf(columns[wave + log - 1], columns, best),
        };
    }

    private static (int Number, NoiseForm Form) ChooseNoise(
        ColumnSelection? asked, Dictionary<ColumnRole, (int Number, int Rank)> best, IReadOnlyList<ColumnFacts> columns, ReadContext context)
    {
        (string? Name, ColumnRole Role, NoiseForm Form)[] forms =
        [
            (asked?.Error, ColumnRole.Sigma, NoiseForm.Sigma),
            (asked?.InverseVariance, ColumnRole.InverseVariance, NoiseForm.InverseVariance),
            (asked?.Variance, ColumnRole.Variance, NoiseForm.Variance),
        ];
        foreach ((string? name, _, NoiseForm form) in forms)
        {
            if (Asked(name, columns, context) is int number)
            {
                return (number, form);
            }
        }

        foreach ((_, ColumnRole role, NoiseForm form) in forms)
        {
            if (best.TryGetValue(role, out (int Number, int Rank) found))
            {
                return (found.Number, form);
            }
        }

        return (0, NoiseForm.Sigma);
    }

    /// <summary>Air where the descriptor or the name says so; vacuum where the descriptor of a standard says nothing of the atmosphere, or the name says so.</summary>
    private static Medium MediumOf(ColumnFacts wave, IReadOnlyList<ColumnFacts> columns, Dictionary<ColumnRole, (int Number, int Rank)> best)
    {
        if (wave.Ucd.StartsWith("em.wl", StringComparison.OrdinalIgnoreCase))
        {
            return wave.Ucd.Contains("obs.atmos", StringComparison.OrdinalIgnoreCase) ? Medium.Air : Medium.Vacuum;
        }

        string name = wave.Name.ToUpperInvariant();
        if (name == "AWAV" || name.Contains("AIR", StringComparison.Ordinal))
        {
            return Medium.Air;
        }

        // log10 wavelengths with inverse variances is how the large fibre surveys document their vacuum spectra.
        bool survey = ColumnRoles.OfName(name).Role == ColumnRole.LogWavelength && best.ContainsKey(ColumnRole.InverseVariance);
        bool other = !survey && wave.Unit.Length != 0 && SpectralUnit.TryParse(wave.Unit, out SpectralUnit unit)
            && unit.Quantity is not SpectralQuantity.Length;
        bool sibling = false;
        foreach (ColumnFacts column in columns)
        {
            // A second wavelength column for air leaves vacuum to the first.
            sibling |= column.Number != wave.Number && column.Name.Contains("AIR", StringComparison.OrdinalIgnoreCase)
                && ColumnRoles.OfName(column.Name).Role == ColumnRole.Wavelength;
        }

        return survey || other || sibling || name.Contains("VAC", StringComparison.Ordinal) || name == "VWAV" ? Medium.Vacuum : Medium.Unknown;
    }

    private static int Best(Dictionary<ColumnRole, (int Number, int Rank)> best, ColumnRole role) =>
        best.TryGetValue(role, out (int Number, int Rank) found) ? found.Number : 0;

    private static int? Asked(string? name, IReadOnlyList<ColumnFacts> columns, ReadContext context)
    {
        if (string.IsNullOrEmpty(name))
        {
            return null;
        }

        foreach (ColumnFacts column in columns)
        {
            if (column.Name.Equals(name, StringComparison.OrdinalIgnoreCase))
            {
                return column.Number;
            }
        }

        if (int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out int number) && number >= 1 && number <= columns.Count)
        {
            return number;
        }

        var names = new List<string>(columns.Count);
        foreach (ColumnFacts column in columns)
        {
            names.Add(column.Name);
        }

        throw context.Error($"There is no column '{name}'; the columns are {string.Join(", ", names)}.");
    }
}
