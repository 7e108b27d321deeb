using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>Spectra as tables of one row a pixel.</summary>
public static class SpectrumTables
{
    /// <summary>Columns <c>wavelength</c> (Å, in the spectrum's medium), <c>flux</c>, where known <c>error</c>, and <c>mask</c> (the bits of <see cref="PixelFaults"/>).</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <returns>A table of all pixels; flux and error are NaN where missing.</returns>
    public static Table ToTable(Spectrum spectrum)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        var columns = new List<TableColumn> { Wavelength(spectrum), Flux(spectrum) };
        if (spectrum.HasSigma)
        {
            columns.Add(Error(spectrum, "error"));
        }

        columns.Add(Mask(spectrum));
        return new Table(columns, Metadata(spectrum), "SPECTRUM");
    }

    /// <summary>Columns <c>wavelength</c>, <c>flux</c>, <c>uncertainty</c>, <c>continuum</c>, <c>continuum_uncertainty</c>, <c>normalized_flux</c>, <c>normalized_uncertainty</c> (noise alone) and <c>mask</c>.</summary>
    /// <param name="spectrum">The spectrum of N pixels.</param>
    /// <param name="continuum">Its continuum, N levels.</param>
    /// <returns>A table of all pixels; values are NaN where they are missing or where the continuum is not positive.</returns>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static Table ToNormalizedTable(Spectrum spectrum, ContinuumFit continuum)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        double[] flux = WithoutMissing(spectrum);
        double[] sigma = Uncertainties(spectrum);
        var normalized = new double[spectrum.Count];
        var relative = new double[spectrum.Count];
        for (int i = 0; i < normalized.Length; i++)
        {
            double level = continuum.Level[i] > 0.0 ? continuum.Level[i] : double.NaN;
            normalized[i] = flux[i] / level;
            relative[i] = sigma[i] / level;
        }

        TableColumn[] columns =
        [
            Wavelength(spectrum),
            Flux(spectrum),
            Column("uncertainty", sigma, spectrum.FluxUnit, "One standard deviation of the flux", "stat.error;phot.flux.density;em.wl"),
            Column("continuum", continuum.Level.ToArray(), spectrum.FluxUnit, "Continuum", "phot.flux.density;spect.continuum"),
            Column("continuum_uncertainty", continuum.Sigma.ToArray(), spectrum.FluxUnit, "One standard deviation of the continuum", "stat.error;spect.continuum"),
            Column("normalized_flux", normalized, "", "Flux over continuum", "arith.ratio;phot.flux.density"),
            Column("normalized_uncertainty", relative, "", "One standard deviation of the normalized flux by noise alone", "stat.error;arith.ratio"),
            Mask(spectrum),
        ];
        return new Table(columns, Metadata(spectrum), "NORMALIZED");
    }

    private static TableMetadata Metadata(Spectrum spectrum)
    {
        var metadata = new TableMetadata();
        foreach ((string keyword, MetadataValue value, _) in SpectrumKeywords.Of(spectrum))
        {
            metadata[keyword] = value;
        }

        if (spectrum.Metadata.Source.Length != 0)
        {
            metadata["source"] = spectrum.Metadata.Source;
        }

        var remarks = new List<string>();
        foreach (Remark remark in spectrum.Metadata.Remarks)
        {
            remarks.Add($"{remark.Word}: {remark.Sentence}");
        }

        if (remarks.Count != 0)
        {
            metadata["remarks"] = MetadataValue.FromTexts(remarks);
        }

        return metadata;
    }

    private static TableColumn Wavelength(Spectrum spectrum) => Column(
        "wavelength",
        spectrum.Scale.WavelengthsAngstrom.ToArray(),
        "Angstrom",
        spectrum.Scale.Medium switch
        {
            Medium.Air => "Wavelength in standard air",
            Medium.Vacuum => "Wavelength in vacuum",
            _ => "Wavelength",
        },
        spectrum.Scale.Medium switch { Medium.Air => "em.wl;obs.atmos", Medium.Vacuum => "em.wl", _ => "" });

    private static TableColumn Flux(Spectrum spectrum) =>
        Column("flux", WithoutMissing(spectrum), spectrum.FluxUnit, "Flux", "phot.flux.density;em.wl");

    private static TableColumn Error(Spectrum spectrum, string name) =>
        Column(name, Uncertainties(spectrum), spectrum.FluxUnit, "One standard deviation of the flux", "stat.error;phot.flux.density;em.wl");

    private static TableColumn Mask(Spectrum spectrum)
    {
        var mask = new long[spectrum.Count];
        for (int i = 0; i < mask.Length; i++)
        {
            mask[i] = (long)spectrum.Faults[i];
        }

        return new TableColumn("mask", (ReadOnlySpan<long>)mask)
        {
            Description = "0 good; sum of 1 missing, 2 flagged by the source, 4 no uncertainty, 8 excluded, 16 outlier",
            Ucd = "meta.code.qual",
        };
    }

    private static TableColumn Column(string name, double[] values, string unit, string description, string ucd) =>
        new(name, (ReadOnlySpan<double>)values) { Unit = unit, Description = description, Ucd = ucd };

    /// <summary>The flux with NaN where it is missing.</summary>
    internal static double[] WithoutMissing(Spectrum spectrum)
    {
        double[] flux = spectrum.Flux.ToArray();
        for (int i = 0; i < flux.Length; i++)
        {
            flux[i] = (spectrum.Faults[i] & PixelFaults.Missing) != 0 ? double.NaN : flux[i];
        }

        return flux;
    }

    /// <summary>The standard deviations with NaN where there is none.</summary>
    internal static double[] Uncertainties(Spectrum spectrum)
    {
        var sigma = new double[spectrum.Count];
        for (int i = 0; i < sigma.Length; i++)
        {
            sigma[i] = spectrum.HasSigma && spectrum.Sigma[i] > 0.0 ? spectrum.Sigma[i] : double.NaN;
        }

        return sigma;
    }
}
