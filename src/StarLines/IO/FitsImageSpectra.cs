using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Spectra in FITS images: one row, several orders, or one spectrum whose rows are flux, noise and mask.</summary>
internal static class FitsImageSpectra
{
    /// <summary>An image of more rows than this is a picture, not a set of orders.</summary>
    private const int MaximumOrders = 1000;

    /// <summary>Reads the spectra of an image HDU.</summary>
    /// <param name="file">The file.</param>
    /// <param name="hdu">The HDU of the flux.</param>
    /// <param name="companions">HDUs of noise, mask and wavelengths that belong to it.</param>
    /// <param name="row">The row wanted, from 1; 0 for all.</param>
    /// <param name="context">Carries what the user says, and the remarks.</param>
    internal static List<Spectrum> Read(FitsFile file, FitsHdu hdu, Companions companions, int row, ReadContext context)
    {
        var header = new FitsKeywords(hdu.Header);
        FitsImage image = hdu.Image!;
        ImageShape shape = ImageShape.Of(image, header)
            ?? throw context.Error("The image holds no pixels.");
        AxisSolution axis = SolveAxis(file, hdu, header, shape, companions, context)
            ?? throw context.Error($"The image ({Size(image)}) has no spectral axis: no CTYPE{shape.Axis}, CRVAL{shape.Axis} and CDELT{shape.Axis} of wavelengths. Calibrate it first, or give the wavelengths in a table.");
        if (!shape.Regular || shape.Rows > MaximumOrders)
        {
            throw context.Error($"The image ({Size(image)}) is a picture or cube, not an extracted spectrum; extract a spectrum first.");
        }

        return ReadRows(file, hdu, image, shape, axis, companions, row, context);
    }

    private static List<Spectrum> ReadRows(
        FitsFile file, FitsHdu hdu, FitsImage image, ImageShape shape, AxisSolution axis, Companions companions, int row, ReadContext context)
    {
        var header = new FitsKeywords(hdu.Header);
        ImageRows? labels = shape.Planes > 1 ? ImageRows.Read(header, shape.Planes)
            : shape.Rows > 1 ? ImageRows.Read(header, shape.Rows)
            : null;
        bool rowsAreParts = labels is not null && shape.Planes == 1;
        int orders = rowsAreParts ? 1 : shape.Rows;
        bool named = row > 0;
        if (orders > 1 && !named && labels is null && !SaysSpectrum(header, shape))
        {
            throw context.Error($"The image ({Size(image)}) has several rows and an axis that does not say it is spectral (CTYPE{shape.Axis}); name the row that is a spectrum as FILE#HDU:ROW.");
        }

        if (row > orders)
        {
            throw context.Error(string.Create(CultureInfo.InvariantCulture, $"There is no row {row}; the image holds {orders}."));
        }

        bool all = HasOrders(header) || orders == 1;
        if (!named && !all)
        {
            context.Note("rows-ignored", string.Create(
                CultureInfo.InvariantCulture,
                $"The image has {orders} rows and does not say what they are; the first is read. Name another as {context.FileName}#{context.HduLabel}:ROW."));
        }

        var spectra = new List<Spectrum>();
        int first = named ? row - 1 : 0;
        int end = named ? row : all ? orders : 1;
        long plane = (long)shape.Count * shape.Rows;
        for (int order = first; order < end; order++)
        {
            long stride = rowsAreParts ? shape.Count : plane;
            long start = (long)order * shape.Count;
            ReadContext own = context.Fork();
            PixelColumns pixels = Pixels(image, labels, start, stride, shape.Count, companions, order, own);
            string source = context.SourceName(orders > 1 ? order + 1 : 0);
            spectra.Add(Finish(file, hdu, pixels, axis, source, own));
        }

        return spectra;
    }

    private static PixelColumns Pixels(
        FitsImage image, ImageRows? labels, long start, long stride, int count, Companions companions, int order, ReadContext context)
    {
        var pixels = new PixelColumns
        {
            WavelengthsAngstrom = [],
            Flux = ReadRow(image, start + ((labels?.Flux ?? 0) * stride), count),
        };
        if (labels is not null)
        {
            (int noise, NoiseForm form) = labels.Noise;
            if (noise >= 0)
            {
                pixels.Sigma = Noise.ToSigmaInPlace(ReadRow(image, start + (noise * stride), count), form);
            }

            if (labels.Mask >= 0)
            {
                double[] mask = ReadRow(image, start + (labels.Mask * stride), count);
                pixels.Faults = labels.MaskIsOfSurvey ? Noise.ToSurveyFaults(mask) : Noise.ToFaults(mask);
            }
        }

        companions.AddTo(pixels, (long)order * count, count);
        pixels.DropEmptySigma(context);
        return pixels;
    }

    private static Spectrum Finish(
        FitsFile file, FitsHdu hdu, PixelColumns pixels, AxisSolution axis, string source, ReadContext context)
    {
        if (axis.Reversed)
        {
            pixels.ReverseValues();
        }

        var header = new FitsKeywords(hdu.Header, file.Hdus[0].Header);
        string words = AxisWords(header);
        SpectrumMetadata metadata = HeaderMetadata.Read(
            header, axis.Medium, words, axis.FirstAngstrom, axis.LastAngstrom, source, context, out Medium medium, out VelocityFrame frame);
        return new Spectrum(
            axis.ToScale(medium, frame), pixels.Flux, pixels.Sigma, pixels.Faults, HeaderMetadata.FluxUnit(header), metadata, takeOwnership: true);
    }

    private static AxisSolution? SolveAxis(
        FitsFile file, FitsHdu hdu, HeaderKeywords header, ImageShape shape, Companions companions, ReadContext context)
    {
        if (companions.Wavelengths(shape.Count, context) is double[] wavelengths)
        {
            return SpectralAxis.Sorted(wavelengths, Medium.Unknown, context);
        }

        AxisDescription axis = AxisDescription.Read(header, shape.Axis, shape.Count, "", context);
        return SpectralAxis.TrySplitType(axis.Type, out string type, out string algorithm) && algorithm == "TAB"
            ? TabularAxis.Solve(file, axis, type, context)
            : AxisInterpreter.Interpret(header, axis, context);
    }

    private static double[] ReadRow(FitsImage image, long first, int count)
    {
        double[] values = GC.AllocateUninitializedArray<double>(count);
        image.ReadDoubles(first, values);
        return values;
    }

    /// <summary>Whether the header describes its rows as the orders or apertures of one exposure.</summary>
    private static bool HasOrders(HeaderKeywords header) =>
        header.Has("APNUM2") || header.Text("CTYPE1").StartsWith("MULTI", StringComparison.OrdinalIgnoreCase);

    /// <summary>Whether the axis has a type or a unit; a picture without either has numbers that mean nothing here.</summary>
    private static bool SaysSpectrum(HeaderKeywords header, ImageShape shape) =>
        header.Has(string.Create(CultureInfo.InvariantCulture, $"CTYPE{shape.Axis}"))
        || header.Has(string.Create(CultureInfo.InvariantCulture, $"CUNIT{shape.Axis}"))
        || header.Has("COEFF0");

    private static string AxisWords(HeaderKeywords header) =>
        $"{header.Text("CTYPE1")} {header.Comment("CTYPE1")} {header.Comment("CRVAL1")} {header.Comment("CUNIT1")} {header.Text("WAT1_001")}";

    private static string Size(FitsImage image) => string.Join(" × ", image.Axes);
}
