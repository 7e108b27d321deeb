using System;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>
/// Wavelengths looked up in a table of the same file, the -TAB algorithm.
/// Source: Greisen, Calabretta, Valdes &amp; Allen (2006), A&amp;A 446, 747, section 6.
/// </summary>
internal static class TabularAxis
{
    /// <summary>Reads the coordinate array (and index vector) that PSi_0 to PSi_2 name and interpolates it at each pixel.</summary>
    internal static AxisSolution Solve(FitsFile file, AxisDescription axis, string type, ReadContext context)
    {
        FitsTable table = FindTable(file, axis, context);
        FitsColumn coordinates = FindColumn(table, axis, 1, context);
        double[] values = coordinates.ReadDoubles(0);
        double[]? index = axis.Texts.ContainsKey(2) ? FindColumn(table, axis, 2, context).ReadDoubles(0) : null;
        if (values.Length == 0 || (index is not null && index.Length != values.Length))
        {
            throw context.Error($"The table of the spectral axis has {values.Length} coordinates and {index?.Length ?? 0} indices; correct it.");
        }

        if (axis.Parameters.TryGetValue(3, out double number) && number != 1.0)
        {
            throw context.Error("The table of the spectral axis is shared with other axes, which is not supported; write the wavelengths as a column of a table.");
        }

        AxisDescription full = axis with
        {
            ReferencePixel = axis.ReferencePixel ?? 0.0,
            Increment = axis.Increment ?? 1.0,
            ReferenceValue = axis.ReferenceValue ?? 0.0,
        };
        var wavelengths = new double[full.Count];
        for (int i = 0; i < wavelengths.Length; i++)
        {
            double psi = full.ReferenceValue!.Value + full.OffsetOf(i);
            wavelengths[i] = Interpolate(values, index is null ? psi : IndexOf(index, psi, context), context);
        }

        string unit = axis.Unit.Length != 0 ? axis.Unit : coordinates.Unit;
        Medium medium = ToAngstrom(wavelengths, type, unit, axis, context);
        return SpectralAxis.Sorted(wavelengths, medium, context);
    }

    private static Medium ToAngstrom(double[] wavelengths, string type, string unit, AxisDescription axis, ReadContext context)
    {
        SpectralUnit known = new(SpectralQuantity.None, 1.0);
        if (unit.Length != 0 && !SpectralUnit.TryParse(unit, out known))
        {
            throw context.Error($"The unit '{unit}' of the spectral axis is not known; name it by --axis-unit.");
        }

        if (type is "WAVE" or "AWAV")
        {
            double factor = unit.Length == 0 ? 1e10 : known.AngstromFactor;
            System.Numerics.Tensors.TensorPrimitives.Multiply(wavelengths, factor, wavelengths);
            return type == "AWAV" ? Medium.Air : Medium.Vacuum;
        }

        double rest = axis.RestWavelengthMetres
            ?? (PhysicalConstants.SpeedOfLightKmPerS * 1000.0 / (axis.RestFrequencyHertz ?? double.NaN));
        var variable = new SpectralVariable(type, rest);
        for (int i = 0; i < wavelengths.Length; i++)
        {
            wavelengths[i] = variable.ToVacuum(wavelengths[i] * known.SiFactor) * 1e10;
        }

        return Medium.Vacuum;
    }

    private static FitsTable FindTable(FitsFile file, AxisDescription axis, ReadContext context)
    {
        if (!axis.Texts.TryGetValue(0, out string? name))
        {
            throw context.Error($"The spectral axis {axis.Type} names no table; add PS{Number(axis)}_0 and PS{Number(axis)}_1.");
        }

        double version = axis.Parameters.TryGetValue(1, out double asked) ? asked : 1.0;
        foreach (FitsHdu hdu in file.Hdus)
        {
            if (hdu.Table is FitsTable table && hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase)
                && (!hdu.Header.TryGetDouble("EXTVER", out double own) || own == version))
            {
                return table.RowCount == 0 ? throw context.Error($"The table {name} of the spectral axis has no row.") : table;
            }
        }

        throw context.Error($"The spectral axis refers to a table {name} that is not in the file; restore the extension.");
    }

    private static FitsColumn FindColumn(FitsTable table, AxisDescription axis, int parameter, ReadContext context)
    {
        string name = axis.Texts.TryGetValue(parameter, out string? text) ? text : "";
        foreach (FitsColumn column in table.Columns)
        {
            if (name.Length != 0 && column.Name.Equals(name, StringComparison.OrdinalIgnoreCase))
            {
                return column;
            }
        }

        throw context.Error($"The table of the spectral axis has no column '{name}' (PS{Number(axis)}_{parameter}); correct the header.");
    }

    /// <summary>The fractional index, from 1, at which an index vector has a value; half a step beyond its ends is allowed (section 6.1.2).</summary>
    private static double IndexOf(double[] index, double psi, ReadContext context)
    {
        if (index.Length == 1)
        {
            return 1.0;
        }

        bool rising = index[^1] > index[0];
        int k = 0;
        while (k < index.Length - 2 && (rising ? psi > index[k + 1] : psi < index[k + 1]))
        {
            k++;
        }

        double step = index[k + 1] - index[k];
        return step == 0.0 || !double.IsFinite(step)
            ? throw context.Error("The index vector of the spectral axis does not run steadily; correct it.")
            : k + 1 + ((psi - index[k]) / step);
    }

    private static double Interpolate(double[] values, double at, ReadContext context)
    {
        if (!(at >= 0.5 && at <= values.Length + 0.5))
        {
            throw context.Error(string.Create(
                CultureInfo.InvariantCulture, $"The spectral axis needs coordinate {at:G6} of a table that has 1 to {values.Length}; correct CRVAL or the table."));
        }

        if (values.Length == 1)
        {
            return values[0];
        }

        int k = Math.Clamp((int)Math.Floor(at), 1, values.Length - 1);
        return values[k - 1] + ((at - k) * (values[k] - values[k - 1]));
    }

    private static string Number(AxisDescription axis) => axis.Number.ToString(CultureInfo.InvariantCulture);
}
