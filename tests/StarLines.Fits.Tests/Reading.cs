using System.Collections.Generic;
using System.IO;

namespace StarLines.Fits.Tests;

/// <summary>The outcome of reading everything that a file holds.</summary>
internal sealed record Reading(FitsFormatException? Error, IReadOnlyList<FitsWarning> Warnings)
{
    /// <summary>The headers' numbers that every reader of a spectrum asks for.</summary>
    private static readonly string[] Numbers = ["CRVAL1", "CRPIX1", "CDELT1", "CD1_1", "BSCALE", "BZERO", "EXPTIME"];

    internal static Reading Of(string path)
    {
        using FileStream stream = File.OpenRead(path);
        return Of(stream, path);
    }

    internal static Reading Of(Stream stream, string name)
    {
        try
        {
            using FitsFile file = FitsFile.Open(stream, name);
            FitsFormatException? error = null;
            foreach (FitsHdu hdu in file.Hdus)
            {
                error ??= hdu.Damage ?? Try(() => ReadAll(hdu));
            }

            return new Reading(error, file.Warnings);
        }
        catch (FitsFormatException error)
        {
            return new Reading(error, []);
        }
    }

    private static FitsFormatException? Try(System.Action action)
    {
        try
        {
            action();
            return null;
        }
        catch (FitsFormatException error)
        {
            return error;
        }
    }

    private static void ReadAll(FitsHdu hdu)
    {
        foreach (string keyword in Numbers)
        {
            _ = hdu.Header.TryGetDouble(keyword, out _);
        }

        foreach (FitsCard card in hdu.Header.EnumerateCards())
        {
            _ = hdu.Header.Contains(card.Keyword);
        }

        _ = hdu.VerifyChecksum();
        _ = hdu.Image?.ReadDoubles();
        if (hdu.Image is { BitPix: > 0, Scale: 1.0, Zero: 0.0 } image)
        {
            _ = image.ReadIntegers();
        }

        foreach (FitsColumn column in hdu.Table?.Columns ?? [])
        {
            if (column.IsText)
            {
                _ = column.ReadStrings();
            }
            else
            {
                _ = column.ReadDoubles();
            }

            for (long row = 0; row < hdu.Table!.RowCount && row < 20; row++)
            {
                _ = column.IsText ? column.ReadStrings(row).Length : column.ReadDoubles(row).Length;
            }
        }
    }
}
