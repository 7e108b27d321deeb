using System;
using System.Collections.Generic;
using System.IO;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Reads spectra from FITS (images and tables), CSV, ECSV, VOTable, JSON, Parquet and plain text; all but Parquet also compressed by gzip.</summary>
public static class SpectrumReader
{
    /// <summary>Reads the spectra of a file.</summary>
    /// <param name="name">A path, or <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c> for a part of it (HDU by number, 0 for the primary, or EXTNAME; rows count from 1).</param>
    /// <param name="options">What the user says about the file; null for nothing.</param>
    /// <returns>At least one spectrum, in the order of the file.</returns>
    /// <exception cref="SpectrumFormatException">The file holds no spectrum that can be read without guessing.</exception>
    /// <exception cref="FitsFormatException">The FITS file is damaged.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static IReadOnlyList<Spectrum> Read(string name, SpectrumReadOptions? options = null)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        SpectrumReadOptions how = options ?? SpectrumReadOptions.Default;
        how.Validate();
        InputName input = InputName.Parse(name);
        using SpectrumSource source = SpectrumSource.Open(input.Path, how);
        return Read(source, input, how);
    }

    /// <summary>Reads the spectra of a stream, such as standard input.</summary>
    /// <param name="stream">The stream, at the start of the content; read to its end.</param>
    /// <param name="name">What messages call it; may end in <c>#HDU</c> or <c>#HDU:ROW</c>.</param>
    /// <param name="options">What the user says about the content; null for nothing.</param>
    /// <returns>At least one spectrum.</returns>
    /// <exception cref="SpectrumFormatException">The content holds no spectrum that can be read without guessing.</exception>
    /// <exception cref="FitsFormatException">The FITS content is damaged.</exception>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static IReadOnlyList<Spectrum> Read(Stream stream, string name, SpectrumReadOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentException.ThrowIfNullOrEmpty(name);
        SpectrumReadOptions how = options ?? SpectrumReadOptions.Default;
        how.Validate();
        InputName input = InputName.Parse(name);
        using SpectrumSource source = SpectrumSource.Open(stream, input.Path, how);
        return Read(source, input, how);
    }

    /// <summary>Says what a file holds; a file without a spectrum is described too.</summary>
    /// <param name="name">A path, or <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c>.</param>
    /// <param name="options">What the user says about the file; null for nothing.</param>
    /// <returns>The HDUs, the spectra and the problem that stands against reading one.</returns>
    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static SpectrumFileInspection Inspect(string name, SpectrumReadOptions? options = null)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        SpectrumReadOptions how = options ?? SpectrumReadOptions.Default;
        how.Validate();
        InputName input = InputName.Parse(name);
        return Inspect(name, input, how, () => SpectrumSource.Open(input.Path, how));
    }

    /// <summary>Says what a stream holds; content without a spectrum is described too.</summary>
    /// <param name="stream">The stream, at the start of the content; read to its end.</param>
    /// <param name="name">What messages call it; may end in <c>#HDU</c> or <c>#HDU:ROW</c>.</param>
    /// <param name="options">What the user says about the content; null for nothing.</param>
    /// <returns>The HDUs, the spectra and the problem that stands against reading one.</returns>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static SpectrumFileInspection Inspect(Stream stream, string name, SpectrumReadOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentException.ThrowIfNullOrEmpty(name);
        SpectrumReadOptions how = options ?? SpectrumReadOptions.Default;
        how.Validate();
        InputName input = InputName.Parse(name);
        return Inspect(name, input, how, () => SpectrumSource.Open(stream, input.Path, how));
    }

    private static SpectrumFileInspection Inspect(string name, InputName input, SpectrumReadOptions options, Func<SpectrumSource> open)
    {
        var inspection = new SpectrumFileInspection { Name = name };
        try
        {
            using SpectrumSource source = open();
            inspection = inspection with
            {
                Format = source.Format,
                Hdus = source.Fits is FitsFile file ? FitsInspection.Describe(file, options) : [],
            };
            return inspection with { Spectra = Read(source, input, options) };
        }
        catch (Exception failure) when (failure is SpectrumFormatException or FitsFormatException)
        {
            return inspection with { Problem = failure.Message };
        }
    }

    private static List<Spectrum> Read(SpectrumSource source, InputName input, SpectrumReadOptions options)
    {
        List<Spectrum> spectra = source.Fits is FitsFile file
            ? FitsSpectra.Read(file, input, options)
            : TableSpectra.Read(source.Table!, input, options);
        return RangeSelection.Apply(spectra, options);
    }
}
