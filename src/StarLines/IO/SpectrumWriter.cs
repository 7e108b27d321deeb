using System;
using System.Collections.Generic;
using System.IO;
using StarLines.Continuum;
using StarLines.Fits;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>Writes spectra, with all digits, NaN for missing pixels, and the metadata that <see cref="SpectrumReader"/> understands again.</summary>
public static class SpectrumWriter
{
    /// <summary>Writes a spectrum.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="stream">Receives the bytes; left open. To replace a file safely, write beside it and rename.</param>
    /// <param name="format">The format.</param>
    /// <param name="history">Lines for HISTORY cards, or for the entry <c>history</c> of other formats; null for none.</param>
    /// <exception cref="ArgumentException">The format is <see cref="SpectrumFormat.FitsImage"/> and the steps are not equal.</exception>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    public static void Write(
        Spectrum spectrum, Stream stream, SpectrumFormat format = SpectrumFormat.FitsTable, IReadOnlyList<string>? history = null)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(stream);
        if (format == SpectrumFormat.FitsImage)
        {
            WriteImage(spectrum, stream, history);
            return;
        }

        WriteTable(SpectrumTables.ToTable(spectrum), stream, format, history);
    }

    /// <summary>Writes several spectra into one FITS file, a table each.</summary>
    /// <param name="spectra">The spectra, at least one.</param>
    /// <param name="stream">Receives the bytes; left open.</param>
    /// <param name="history">Lines for HISTORY cards; null for none.</param>
    /// <exception cref="ArgumentException">There is no spectrum.</exception>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    public static void WriteFits(IReadOnlyList<Spectrum> spectra, Stream stream, IReadOnlyList<string>? history = null)
    {
        ArgumentNullException.ThrowIfNull(spectra);
        ArgumentNullException.ThrowIfNull(stream);
        var tables = new List<Table>(spectra.Count);
        foreach (Spectrum spectrum in spectra)
        {
            tables.Add(SpectrumTables.ToTable(spectrum));
        }

        FitsTableMapping.Write(tables, stream, history);
    }

    /// <summary>Writes a spectrum with its continuum and the normalized flux; columns as <see cref="SpectrumTables.ToNormalizedTable"/> says.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="stream">Receives the bytes; left open.</param>
    /// <param name="format">The format, not <see cref="SpectrumFormat.FitsImage"/>.</param>
    /// <param name="history">Lines for HISTORY cards, or for the entry <c>history</c> of other formats; null for none.</param>
    /// <exception cref="ArgumentException">The lengths differ, or the format is an image.</exception>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    public static void WriteNormalized(
        Spectrum spectrum,
        ContinuumFit continuum,
        Stream stream,
        SpectrumFormat format = SpectrumFormat.FitsTable,
        IReadOnlyList<string>? history = null)
    {
        ArgumentNullException.ThrowIfNull(stream);
        WriteTable(SpectrumTables.ToNormalizedTable(spectrum, continuum), stream, format, history);
    }

    private static void WriteTable(Table table, Stream stream, SpectrumFormat format, IReadOnlyList<string>? history)
    {
        if (format == SpectrumFormat.FitsTable)
        {
            FitsTableMapping.Write(table, stream, history);
            return;
        }

        if (history is { Count: > 0 })
        {
            table.Metadata["history"] = MetadataValue.FromTexts(history);
        }

        TableWriter.Write(table, stream, format switch
        {
            SpectrumFormat.Ecsv => TableFormat.Ecsv,
            SpectrumFormat.Csv => TableFormat.Csv,
            SpectrumFormat.VoTable => TableFormat.VoTable,
            SpectrumFormat.Json => TableFormat.Json,
            SpectrumFormat.Parquet => TableFormat.Parquet,
            _ => throw new ArgumentException($"A table cannot be written as {format}.", nameof(format)),
        });
    }

    private static void WriteImage(Spectrum spectrum, Stream stream, IReadOnlyList<string>? history)
    {
        var writer = new FitsWriter(stream);
        long[] axes = [spectrum.Count];
        writer.WriteImage(SpectrumTables.WithoutMissing(spectrum), axes, -64, ImageHeader(spectrum, history));
        if (spectrum.HasSigma)
        {
            writer.WriteImage(SpectrumTables.Uncertainties(spectrum), axes, -64, AxisHeader(spectrum), "ERR");
        }

        var mask = new long[spectrum.Count];
        for (int i = 0; i < mask.Length; i++)
        {
            mask[i] = (long)spectrum.Faults[i];
        }

        writer.WriteImage(mask, axes, 8, AxisHeader(spectrum), "MASK");
    }

    private static FitsHeaderBuilder ImageHeader(Spectrum spectrum, IReadOnlyList<string>? history)
    {
        FitsHeaderBuilder header = AxisHeader(spectrum);
        if (spectrum.FluxUnit.Length != 0)
        {
            header.Add("BUNIT", spectrum.FluxUnit, "unit of the flux");
        }

        foreach ((string keyword, MetadataValue value, string comment) in SpectrumKeywords.Of(spectrum))
        {
            _ = value.Kind == MetadataKind.Real ? header.Add(keyword, value.ToReal(), comment) : header.Add(keyword, value.Text, comment);
        }

        foreach (string line in history ?? [])
        {
            header.AddHistory(line);
        }

        return header;
    }

    /// <summary>The axis by the FITS standard, section 8: WAVE or AWAV, linear or with -LOG, whose step at the first pixel is λ × step of ln λ.</summary>
    private static FitsHeaderBuilder AxisHeader(Spectrum spectrum)
    {
        WavelengthScale scale = spectrum.Scale;
        if (scale.Sampling == WavelengthSampling.Tabulated)
        {
            throw new ArgumentException("An image needs wavelengths of equal steps; write this spectrum as a table.");
        }

        double first = scale.WavelengthsAngstrom[0];
        bool log = scale.Sampling == WavelengthSampling.LogLinear;

        // The standard reads WAVE as vacuum; where the medium is not known an older word leaves it open.
        string type = scale.Medium switch
        {
            Medium.Air => "AWAV",
            Medium.Vacuum => "WAVE",
            _ => log ? "LOG" : "LINEAR",
        };
        bool standard = scale.Medium != Medium.Unknown;
        double step = log
            ? standard ? first * scale.Step : scale.Step / Math.Log(10.0)
            : scale.Step;
        FitsHeaderBuilder header = new FitsHeaderBuilder()
            .Add("CTYPE1", log && standard ? type + "-LOG" : type, "spectral axis")
            .Add("CUNIT1", log && !standard ? "log10(Angstrom)" : "Angstrom")
            .Add("CRPIX1", 1.0)
            .Add("CRVAL1", log && !standard ? Math.Log10(first) : first)
            .Add("CDELT1", step);
        return header;
    }
}
