using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Describes the HDUs of a FITS file.</summary>
internal static class FitsInspection
{
    /// <summary>Columns listed by name; wide survey tables have hundreds.</summary>
    private const int ListedColumns = 12;

    internal static List<HduInspection> Describe(FitsFile file, SpectrumReadOptions options)
    {
        var hdus = new List<HduInspection>(file.Hdus.Count);
        foreach (FitsHdu hdu in file.Hdus)
        {
            string use = Use(file, hdu, options, out string problem);
            hdus.Add(new HduInspection(hdu.Number, hdu.Name, Kind(hdu), Size(hdu), use, problem));
        }

        return hdus;
    }

    private static string Use(FitsFile file, FitsHdu hdu, SpectrumReadOptions options, out string problem)
    {
        problem = "";
        if (hdu.Kind == FitsHduKind.Empty)
        {
            return "";
        }

        ColumnRole role = hdu.Image is null ? ColumnRole.Flux : ExtensionRole.Of(hdu, out _);
        string word = role switch
        {
            ColumnRole.Sigma or ColumnRole.Variance or ColumnRole.InverseVariance => "errors",
            ColumnRole.Mask => "mask",
            ColumnRole.Wavelength or ColumnRole.LogWavelength => "wavelengths",
            _ => "",
        };
        if (word.Length != 0)
        {
            return word;
        }

        try
        {
            FitsSpectra.ReadHdu(file, hdu, 0, FitsSpectra.Context(file, hdu, options), required: true);
            return "spectrum";
        }
        catch (Exception failure) when (failure is SpectrumFormatException or FitsFormatException)
        {
            problem = failure.Message;
            return "";
        }
    }

    private static string Kind(FitsHdu hdu) => hdu.Kind switch
    {
        FitsHduKind.Empty => "header",
        FitsHduKind.Image => "image",
        FitsHduKind.CompressedImage => "compressed image",
        FitsHduKind.BinaryTable => "table",
        FitsHduKind.AsciiTable => "ASCII table",
        FitsHduKind.RandomGroups => "random groups",
        FitsHduKind.Damaged => "damaged",
        _ => "other",
    };

    private static string Size(FitsHdu hdu)
    {
        if (hdu.Image is FitsImage image)
        {
            string type = image.BitPix < 0 ? "float" : "int";
            return string.Create(CultureInfo.InvariantCulture, $"{string.Join(" × ", image.Axes)} {type}{Math.Abs(image.BitPix)}");
        }

        if (hdu.Table is not FitsTable table)
        {
            return "";
        }

        var names = new List<string>();
        foreach (FitsColumn column in table.Columns)
        {
            if (names.Count == ListedColumns)
            {
                names.Add("…");
                break;
            }

            names.Add(column.Unit.Length == 0 ? column.Name : $"{column.Name} ({column.Unit})");
        }

        return string.Create(
            CultureInfo.InvariantCulture, $"{table.RowCount} rows, {table.Columns.Count} columns: {string.Join(", ", names)}");
    }
}
