using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Finds the spectra of a FITS file.</summary>
internal static class FitsSpectra
{
    /// <summary>The coadded spectrum of a survey file; the exposures it was made of follow it and are read by name only.</summary>
    private const string CoaddName = "COADD";

    /// <summary>Reads the spectra of an open file.</summary>
    internal static List<Spectrum> Read(FitsFile file, InputName name, SpectrumReadOptions options)
    {
        if (name.Hdu.Length != 0)
        {
            FitsHdu chosen = Find(file, name);
            return ReadHdu(file, chosen, name.Row, Context(file, chosen, options), required: true)!;
        }

        var spectra = new List<Spectrum>();
        var failures = new List<(FitsHdu Hdu, string Message)>();
        foreach (FitsHdu hdu in file.Hdus)
        {
            try
            {
                if (ReadHdu(file, hdu, 0, Context(file, hdu, options), required: false) is List<Spectrum> found)
                {
                    spectra.AddRange(found);
                }
            }
            catch (Exception failure) when (failure is SpectrumFormatException or FitsFormatException)
            {
                failures.Add((hdu, failure.Message));
                if (HoldsOneData(file))
                {
                    throw;
                }
            }

            if (spectra.Count != 0 && hdu.Name.Equals(CoaddName, StringComparison.OrdinalIgnoreCase))
            {
                break;
            }
        }

        return spectra.Count != 0 ? Named(spectra, file, failures) : throw Nothing(file, failures);
    }

    /// <summary>Reads one HDU; null where it holds no spectrum of its own and none is required of it.</summary>
    internal static List<Spectrum>? ReadHdu(FitsFile file, FitsHdu hdu, int row, ReadContext context, bool required)
    {
        if (hdu.Damage is FitsFormatException damage)
        {
            throw damage;
        }

        List<Spectrum>? spectra = null;
        if (hdu.Table is not null)
        {
            ColumnPlan? plan = FitsTableSpectra.Plan(hdu, context);
            spectra = plan is null ? null : FitsTableSpectra.Read(file, hdu, plan, row, context);
        }
        else if (hdu.Image is FitsImage image && image.PixelCount > 0 && (required || IsOwnFlux(file, hdu)))
        {
            spectra = FitsImageSpectra.Read(file, hdu, Companions.Of(file, hdu), row, context);
        }

        if (spectra is null)
        {
            return required ? throw context.Error(Reason(hdu)) : null;
        }

        return WithWarnings(file, hdu, spectra);
    }

    internal static ReadContext Context(FitsFile file, FitsHdu hdu, SpectrumReadOptions options) =>
        new(file.Name, hdu.Number.ToString(CultureInfo.InvariantCulture), options);

    /// <summary>Why an HDU is no spectrum.</summary>
    internal static string Reason(FitsHdu hdu) => hdu switch
    {
        { Table: FitsTable table } => table.Columns.Count == 0
            ? "The table has no columns."
            : $"The table has no wavelength and flux columns that are known by unit, descriptor or name ({Names(table)}); name them by --columns wave=…,flux=….",
        { Image: FitsImage image } when image.PixelCount > 0 => $"The image ({string.Join(" × ", image.Axes)}) is no spectrum.",
        { Kind: FitsHduKind.RandomGroups } => "Random groups hold no spectrum that can be read.",
        _ => "There are no data.",
    };

    private static string Names(FitsTable table)
    {
        var names = new List<string>();
        foreach (FitsColumn column in table.Columns)
        {
            if (names.Count == 12)
            {
                names.Add("…");
                break;
            }

            names.Add(column.Name.Length != 0 ? column.Name : string.Create(CultureInfo.InvariantCulture, $"{column.Number}"));
        }

        return string.Join(", ", names);
    }

    /// <summary>An image of flux that has an axis of its own or wavelengths beside it; pictures among other data are passed over.</summary>
    private static bool IsOwnFlux(FitsFile file, FitsHdu hdu)
    {
        if (ExtensionRole.Of(hdu, out _) is not (ColumnRole.Flux or ColumnRole.None))
        {
            return false;
        }

        return hdu.Name.Length == 0 || ExtensionRole.Of(hdu, out _) == ColumnRole.Flux || hdu.Number == 0 || HoldsOneData(file);
    }

    private static FitsHdu Find(FitsFile file, InputName name)
    {
        if (int.TryParse(name.Hdu, NumberStyles.None, CultureInfo.InvariantCulture, out int number))
        {
            return number < file.Hdus.Count
                ? file.Hdus[number]
                : throw new SpectrumFormatException(string.Create(
                    CultureInfo.InvariantCulture, $"{file.Name}: There is no HDU {number}; the file has 0 to {file.Hdus.Count - 1}."));
        }

        FitsHdu? found = file.FindHdu(name.Hdu);
        if (found is not null)
        {
            return found;
        }

        var names = new List<string>();
        foreach (FitsHdu hdu in file.Hdus)
        {
            if (hdu.Name.Length != 0)
            {
                names.Add(hdu.Name);
            }
        }

        throw new SpectrumFormatException(
            $"{file.Name}: There is no HDU named {name.Hdu}; {(names.Count == 0 ? "no HDU has a name" : "the names are " + string.Join(", ", names))}.");
    }

    private static bool HoldsOneData(FitsFile file)
    {
        int count = 0;
        foreach (FitsHdu hdu in file.Hdus)
        {
            count += hdu.Kind is FitsHduKind.Empty ? 0 : 1;
        }

        return count == 1;
    }

    /// <summary>Names a lone spectrum by its file alone, and reports the parts that could not be read.</summary>
    private static List<Spectrum> Named(List<Spectrum> spectra, FitsFile file, List<(FitsHdu Hdu, string Message)> failures)
    {
        for (int i = 0; i < spectra.Count; i++)
        {
            SpectrumMetadata metadata = spectra[i].Metadata;
            List<Remark> remarks = [.. metadata.Remarks];
            if (i == 0)
            {
                foreach ((FitsHdu hdu, string message) in failures)
                {
                    // A picture or a foreign table beside the spectrum is nothing odd; a damaged HDU is.
                    if (hdu.Kind == FitsHduKind.Damaged)
                    {
                        remarks.Add(new Remark("hdu-damaged", message));
                    }
                }
            }

            if (spectra.Count == 1 || remarks.Count != metadata.Remarks.Count)
            {
                spectra[i] = spectra[i].WithMetadata(metadata with
                {
                    Source = spectra.Count == 1 ? file.Name : metadata.Source,
                    Remarks = remarks,
                });
            }
        }

        return spectra;
    }

    private static SpectrumFormatException Nothing(FitsFile file, List<(FitsHdu Hdu, string Message)> failures)
    {
        if (failures.Count != 0)
        {
            string more = failures.Count == 1 ? "" : string.Create(CultureInfo.InvariantCulture, $" ({failures.Count - 1} more HDUs could not be read either)");
            return new SpectrumFormatException(failures[0].Message + more);
        }

        foreach (FitsHdu hdu in file.Hdus)
        {
            if (hdu.Kind != FitsHduKind.Empty)
            {
                return Context(file, hdu, SpectrumReadOptions.Default).Error(Reason(hdu));
            }
        }

        return new SpectrumFormatException($"{file.Name}: The file has headers only and holds no data.");
    }

    private static List<Spectrum> WithWarnings(FitsFile file, FitsHdu hdu, List<Spectrum> spectra)
    {
        int primary = hdu.Number == 0 ? 0 : file.Hdus[0].Warnings.Count;
        if (primary + hdu.Warnings.Count == 0)
        {
            return spectra;
        }

        for (int i = 0; i < spectra.Count; i++)
        {
            List<Remark> remarks = [.. spectra[i].Metadata.Remarks];
            if (primary != 0)
            {
                Add(remarks, file.Hdus[0].Warnings);
            }

            Add(remarks, hdu.Warnings);
            spectra[i] = spectra[i].WithMetadata(spectra[i].Metadata with { Remarks = remarks });
        }

        return spectra;
    }

    private static void Add(List<Remark> remarks, IReadOnlyList<FitsWarning> warnings)
    {
        foreach (FitsWarning warning in warnings)
        {
            remarks.Add(new Remark(
                warning.Word,
                string.Create(CultureInfo.InvariantCulture, $"HDU {warning.HduNumber}{(warning.Keyword.Length == 0 ? "" : ", " + warning.Keyword)}: {warning.Sentence}")));
        }
    }
}
