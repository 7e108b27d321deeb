using System;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>The extensions that belong to the flux of one image: its noise, its mask, its wavelengths.</summary>
internal sealed class Companions
{
    private FitsImage? _noise;
    private NoiseForm _form;
    private FitsImage? _mask;
    private FitsHdu? _wavelengths;

    /// <summary>Finds the companions of an image: extensions of the same size, those behind it up to the next flux, else those before it.</summary>
    internal static Companions Of(FitsFile file, FitsHdu flux)
    {
        var companions = new Companions();
        for (int i = flux.Number + 1; i < file.Hdus.Count && !IsFlux(file.Hdus[i], flux); i++)
        {
            companions.Take(file.Hdus[i], flux);
        }

        for (int i = flux.Number - 1; i >= 0 && !IsFlux(file.Hdus[i], flux); i--)
        {
            companions.Take(file.Hdus[i], flux);
        }

        return companions;
    }

    /// <summary>Adds noise and mask to the pixels of a row.</summary>
    internal void AddTo(PixelColumns pixels, long first, int count)
    {
        if (_noise is not null && pixels.Sigma.Length == 0)
        {
            pixels.Sigma = Noise.ToSigmaInPlace(ReadRow(_noise, first, count), _form);
        }

        if (_mask is not null && pixels.Faults.Length == 0)
        {
            pixels.Faults = Noise.ToFaults(ReadRow(_mask, first, count));
        }
    }

    /// <summary>The wavelengths of a companion, Å; null where there is none of that length.</summary>
    internal double[]? Wavelengths(int count, ReadContext context)
    {
        if (_wavelengths?.Image is not FitsImage image || image.PixelCount != count)
        {
            return null;
        }

        double[] values = image.ReadDoubles();
        string unit = new FitsKeywords(_wavelengths.Header).FirstText(["BUNIT", "CUNIT1"]);
        bool log10 = ColumnRoles.OfName(_wavelengths.Name).Role == ColumnRole.LogWavelength;
        WavelengthColumn.ToAngstromInPlace(values, unit, log10, _wavelengths.Name, context);
        return values;
    }

    private static bool IsFlux(FitsHdu hdu, FitsHdu flux) =>
        hdu.Image is FitsImage image && image.PixelCount == flux.Image!.PixelCount && ExtensionRole.Of(hdu, out _) == ColumnRole.Flux;

    private void Take(FitsHdu hdu, FitsHdu flux)
    {
        if (hdu.Image is not FitsImage image)
        {
            return;
        }

        ColumnRole role = ExtensionRole.Of(hdu, out NoiseForm form);
        if (role is ColumnRole.Wavelength or ColumnRole.LogWavelength)
        {
            _wavelengths ??= hdu;
        }

        if (image.PixelCount != flux.Image!.PixelCount)
        {
            return;
        }

        if (role is ColumnRole.Sigma or ColumnRole.Variance or ColumnRole.InverseVariance && _noise is null)
        {
            _noise = image;
            _form = form;
        }
        else if (role == ColumnRole.Mask)
        {
            _mask ??= image;
        }
    }

    private static double[] ReadRow(FitsImage image, long first, int count)
    {
        double[] values = GC.AllocateUninitializedArray<double>(count);
        image.ReadDoubles(first, values);
        return values;
    }
}
