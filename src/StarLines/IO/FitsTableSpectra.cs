using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Spectra in FITS tables: one pixel a row, or one spectrum a row with a cell of many values.</summary>
internal static class FitsTableSpectra
{
    /// <summary>The columns of a spectrum, or null where the table holds none.</summary>
    internal static ColumnPlan? Plan(FitsHdu hdu, ReadContext context)
    {
        FitsTable table = hdu.Table!;
        var facts = new ColumnFacts[table.Columns.Count];
        var header = new FitsKeywords(hdu.Header);
        for (int i = 0; i < facts.Length; i++)
        {
            FitsColumn column = table.Columns[i];
            facts[i] = new ColumnFacts(
                column.Number, column.IsText ? "" : column.Name, column.Unit, column.Ucd, column.Utype,
                header.Comment(string.Create(CultureInfo.InvariantCulture, $"TTYPE{column.Number}")));
        }

        ColumnPlan? plan = ColumnPlan.Choose(facts, context);
        return plan is null || IsVector(table.Columns[plan.Wavelength - 1]) == IsVector(table.Columns[plan.Flux - 1])
            ? plan
            : throw context.Error($"Column {table.Columns[plan.Wavelength - 1].Name} and column {table.Columns[plan.Flux - 1].Name} have cells of different length; name the right columns by --columns wave=…,flux=….");
    }

    /// <summary>Reads the spectra of a table.</summary>
    /// <param name="file">The file.</param>
    /// <param name="hdu">The HDU.</param>
    /// <param name="plan">The columns.</param>
    /// <param name="row">The row wanted, from 1; 0 for all.</param>
    /// <param name="context">Carries what the user says, and the remarks.</param>
    internal static List<Spectrum> Read(FitsFile file, FitsHdu hdu, ColumnPlan plan, int row, ReadContext context)
    {
        FitsTable table = hdu.Table!;
        if (table.RowCount == 0)
        {
            throw context.Error("The table has no rows.");
        }

        bool vectors = IsVector(table.Columns[plan.Wavelength - 1]);
        long spectra = vectors ? table.RowCount : 1;
        if (row > spectra)
        {
            throw context.Error(vectors
                ? string.Create(CultureInfo.InvariantCulture, $"There is no row {row}; the table holds {spectra}.")
                : "The table holds one spectrum, one pixel a row; leave the row away.");
        }

        var list = new List<Spectrum>();
        int first = row > 0 ? row - 1 : 0;
        long end = row > 0 ? row : spectra;
        for (int r = first; r < end; r++)
        {
            ReadContext own = context.Fork();
            string source = context.SourceName(spectra > 1 ? r + 1 : 0);
            list.Add(ReadOne(file, hdu, plan, vectors ? r : -1, source, own));
        }

        return list;
    }

    private static Spectrum ReadOne(FitsFile file, FitsHdu hdu, ColumnPlan plan, int row, string source, ReadContext context)
    {
        FitsTable table = hdu.Table!;
        FitsColumn wave = table.Columns[plan.Wavelength - 1];
        FitsColumn flux = table.Columns[plan.Flux - 1];
        var pixels = new PixelColumns
        {
            WavelengthsAngstrom = Cells(wave, row),
            Flux = Cells(flux, row),
        };
        int count = pixels.WavelengthsAngstrom.Length;
        if (count == 0 || pixels.Flux.Length != count)
        {
            throw context.Error(string.Create(
                CultureInfo.InvariantCulture, $"Column {wave.Name} has {count} values and column {flux.Name} {pixels.Flux.Length}; they must agree."));
        }

        if (flux.Unit.Equals("mag", StringComparison.OrdinalIgnoreCase))
        {
            throw context.Error($"Column {flux.Name} is in magnitudes; convert it to flux.");
        }

        AddNoiseAndMask(hdu, plan, row, pixels, context);
        WavelengthColumn.ToAngstromInPlace(pixels.WavelengthsAngstrom, wave.Unit, plan.WavelengthIsLog10, wave.Name, context);
        pixels.PutInOrder(context);
        pixels.DropEmptySigma(context);
        return Finish(file, hdu, plan, row, pixels, source, context);
    }

    private static void AddNoiseAndMask(FitsHdu hdu, ColumnPlan plan, int row, PixelColumns pixels, ReadContext context)
    {
        FitsTable table = hdu.Table!;
        int count = pixels.Flux.Length;
        if (plan.Noise != 0 && Usable(table.Columns[plan.Noise - 1], row, count, context) is double[] noise)
        {
            pixels.Sigma = Noise.ToSigmaInPlace(noise, plan.NoiseForm);
        }

        if (plan.Mask != 0 && Usable(table.Columns[plan.Mask - 1], row, count, context) is double[] mask)
        {
            string comment = new FitsKeywords(hdu.Header).Comment(string.Create(CultureInfo.InvariantCulture, $"TTYPE{plan.Mask}"));
            bool oneIsGood = comment.Contains("1=good", StringComparison.OrdinalIgnoreCase) || comment.Contains("0=bad", StringComparison.OrdinalIgnoreCase);
            pixels.Faults = plan.Noise != 0 && Noise.IsSurveyMask(table.Columns[plan.Mask - 1].Name, plan.NoiseForm)
                ? Noise.ToSurveyFaults(mask)
                : Noise.ToFaults(mask, !oneIsGood);
        }
    }

    private static double[]? Usable(FitsColumn column, int row, int count, ReadContext context)
    {
        double[] values = Cells(column, row);
        if (values.Length == count)
        {
            return values;
        }

        context.Note("column-ignored", string.Create(
            CultureInfo.InvariantCulture, $"Column {column.Name} has {values.Length} values for {count} pixels; it is not used."));
        return null;
    }

    private static Spectrum Finish(
        FitsFile file, FitsHdu hdu, ColumnPlan plan, int row, PixelColumns pixels, string source, ReadContext context)
    {
        FitsTable table = hdu.Table!;
        FitsColumn wave = table.Columns[plan.Wavelength - 1];
        var keywords = new FitsKeywords(hdu.Header, file.Hdus[0].Header);
        HeaderKeywords header = row >= 0 ? new RowKeywords(table, row, keywords) : keywords;
        string words = $"{wave.Name} {keywords.Comment(string.Create(CultureInfo.InvariantCulture, $"TTYPE{plan.Wavelength}"))}".Replace('_', ' ');
        SpectrumMetadata metadata = HeaderMetadata.Read(
            header, plan.Medium, words, pixels.WavelengthsAngstrom[0], pixels.WavelengthsAngstrom[^1], source, context,
            out Medium medium, out VelocityFrame frame);
        string unit = table.Columns[plan.Flux - 1].Unit;
        return new Spectrum(
            WavelengthScale.FromOwned(pixels.WavelengthsAngstrom, medium, frame),
            pixels.Flux,
            pixels.Sigma,
            pixels.Faults,
            unit.Length != 0 ? unit : HeaderMetadata.FluxUnit(header),
            metadata,
            takeOwnership: true);
    }

    private static double[] Cells(FitsColumn column, int row) => row < 0 ? column.ReadDoubles() : column.ReadDoubles(row);

    private static bool IsVector(FitsColumn column) => column.IsVariableLength || (column.Repeat > 1 && !column.IsText);
}
