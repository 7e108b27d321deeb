using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>A spectrum in a table of text or another format than FITS: one pixel a row.</summary>
internal static class TableSpectra
{
    /// <summary>A third column without a name is an error only where it is usually smaller than the flux by this factor.</summary>
    private const double LargestRelativeError = 1.0;

    /// <summary>Reads the spectrum.</summary>
    internal static List<Spectrum> Read(Table table, InputName name, SpectrumReadOptions options)
    {
        if (name.Hdu.Length != 0)
        {
            throw new SpectrumFormatException($"{name.Path}: The file has no HDUs; leave #{name.Hdu} away.");
        }

        var context = new ReadContext(name.Path, "", options);
        ColumnPlan plan = Plan(table, context) ?? throw context.Error(Reason(table));
        return [ReadOne(table, plan, context)];
    }

    /// <summary>The columns of a spectrum, or null where the table holds none.</summary>
    internal static ColumnPlan? Plan(Table table, ReadContext context)
    {
        var facts = new ColumnFacts[table.Columns.Count];
        bool named = false;
        for (int i = 0; i < facts.Length; i++)
        {
            TableColumn column = table.Columns[i];
            named |= column.Name != string.Create(CultureInfo.InvariantCulture, $"col{i + 1}");
            facts[i] = new ColumnFacts(i + 1, column.IsNumeric || column.Type == ColumnType.Bool ? column.Name : "", column.Unit, column.Ucd, "", column.Description);
        }

        return ColumnPlan.Choose(facts, context) ?? (named ? null : ByPosition(table, context));
    }

    /// <summary>Why a table is no spectrum.</summary>
    internal static string Reason(Table table)
    {
        var names = new List<string>();
        foreach (TableColumn column in table.Columns)
        {
            names.Add(column.Name);
        }

        return $"The table has no wavelength and flux columns that are known by name ({string.Join(", ", names)}); name them by --columns wave=…,flux=….";
    }

    /// <summary>Columns without names: wavelength, flux and, where its size fits, the error of the flux.</summary>
    private static ColumnPlan? ByPosition(Table table, ReadContext context)
    {
        ColumnSelection? asked = context.Options.Columns;
        if (table.Columns.Count < 2 || !table.Columns[0].IsNumeric || !table.Columns[1].IsNumeric
            || !string.IsNullOrEmpty(asked?.Wavelength) || !string.IsNullOrEmpty(asked?.Flux))
        {
            return null;
        }

        int noise = 0;
        if (table.Columns.Count > 2 && table.Columns[2].IsNumeric)
        {
            bool error = LooksLikeError(table.Columns[1].ToDoubles(), table.Columns[2].ToDoubles());
            noise = error ? 3 : 0;
            context.Note("column-guessed", error
                ? "The third column has no name; it is taken for the error of the flux. Name the columns by --columns wave=1,flux=2,error=3."
                : "The third column has no name and is too large for an error of the flux; it is not used.");
        }

        return new ColumnPlan { Wavelength = 1, Flux = 2, Noise = noise };
    }

    private static bool LooksLikeError(double[] flux, double[] other)
    {
        int smaller = 0;
        foreach (double value in other)
        {
            if (value < 0.0)
            {
                return false;
            }
        }

        for (int i = 0; i < flux.Length; i++)
        {
            smaller += other[i] <= LargestRelativeError * Math.Abs(flux[i]) ? 1 : 0;
        }

        return smaller > flux.Length / 2;
    }

    private static Spectrum ReadOne(Table table, ColumnPlan plan, ReadContext context)
    {
        TableColumn wave = table.Columns[plan.Wavelength - 1];
        TableColumn flux = table.Columns[plan.Flux - 1];
        if (table.RowCount == 0)
        {
            throw context.Error("The table has no rows.");
        }

        var pixels = new PixelColumns { WavelengthsAngstrom = Numbers(wave, context), Flux = Numbers(flux, context) };
        if (plan.Noise != 0)
        {
            pixels.Sigma = Noise.ToSigmaInPlace(Numbers(table.Columns[plan.Noise - 1], context), plan.NoiseForm);
        }

        if (plan.Mask != 0)
        {
            pixels.Faults = Noise.ToFaults(Numbers(table.Columns[plan.Mask - 1], context));
        }

        string unit = wave.Unit.Length != 0 ? wave.Unit : InParentheses(wave.Name);
        WavelengthColumn.ToAngstromInPlace(pixels.WavelengthsAngstrom, unit, plan.WavelengthIsLog10, wave.Name, context);
        pixels.PutInOrder(context);
        pixels.DropEmptySigma(context);
        var header = new TextKeywords(table.Metadata);
        string words = $"{wave.Name.Replace('_', ' ')} {wave.Description}";
        SpectrumMetadata metadata = HeaderMetadata.Read(
            header, plan.Medium, words, pixels.WavelengthsAngstrom[0], pixels.WavelengthsAngstrom[^1], context.SourceName(), context,
            out Medium medium, out VelocityFrame frame);
        return new Spectrum(
            WavelengthScale.FromOwned(pixels.WavelengthsAngstrom, medium, frame),
            pixels.Flux,
            pixels.Sigma,
            pixels.Faults,
            flux.Unit.Length != 0 ? flux.Unit : HeaderMetadata.FluxUnit(header),
            metadata,
            takeOwnership: true);
    }

    private static double[] Numbers(TableColumn column, ReadContext context)
    {
        if (column.IsNumeric)
        {
            return column.ToDoubles();
        }

        if (column.Type != ColumnType.Bool)
        {
            throw context.Error($"Column {column.Name} holds text, not numbers; name the right column by --columns.");
        }

        var values = new double[column.Count];
        ReadOnlySpan<bool?> bools = column.Bools;
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = bools[i] is bool value ? (value ? 1.0 : 0.0) : double.NaN;
        }

        return values;
    }

    private static string InParentheses(string name)
    {
        int open = name.IndexOfAny(['(', '[']);
        int close = name.IndexOfAny([')', ']']);
        return open >= 0 && close > open ? name[(open + 1)..close] : "";
    }
}
