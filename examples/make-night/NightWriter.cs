using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.Fits;
using StarLines.LineLists;
using StarLines.Tables;
using StarLines.Velocities;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;

namespace StarLines.Examples.MakeNight;

/// <summary>Observes the stars of the plan with an invented telescope and writes spectra and truth.</summary>
internal sealed class NightWriter(string folder, LineList metals, LineList balmer)
{
    private const double FirstAngstrom = 4825.0;
    private const double StepAngstrom = 0.2;
    private const int PixelCount = 9050;
    private const double ResolvingPower = 11000.0;

    /// <summary>Steps over which the light of one pixel is averaged.</summary>
    private const int StepsPerPixel = 10;

    /// <summary>A line is written into the truth where its width, mÅ, lies between these and nothing disturbs it.</summary>
    private const double WeakestTruthMilliangstrom = 20.0;
    private const double StrongestTruthMilliangstrom = 200.0;

    /// <summary>Lines nearer than this disturb each other, Å: four times the resolution.</summary>
    private const double IsolationAngstrom = 2.2;

    private static readonly ObservingSite Site = new("Larkfell Observatory", 46.2083, 12.3417, 1180.0);
    private static readonly JulianDate Evening = UtcTime.Parse("2025-03-14T18:00:00");

    private readonly List<(Exposure Exposure, StarLight Star, int Component, double Correction)> _stars = [];
    private readonly List<(Exposure Exposure, RestLine Line, double Width)> _lines = [];

    /// <summary>Writes everything.</summary>
    public void Write(IReadOnlyList<Exposure> exposures)
    {
        Directory.CreateDirectory(folder);
        foreach (Exposure exposure in exposures)
        {
            Observe(exposure);
        }

        WriteTable("stars.ecsv", StarTable());
        WriteTable("lines.ecsv", LineTable());
    }

    private void Observe(Exposure exposure)
    {
        JulianDate start = UtcTime.AddSeconds(Evening, 60.0 * exposure.StartMinutes);
        JulianDate middle = UtcTime.AddSeconds(start, 0.5 * exposure.ExposureSeconds);
        BarycentricResult correction = BarycentricCorrection.At(
            middle, Site, new StarAstrometry(exposure.RightAscensionDegrees, exposure.DeclinationDegrees));
        var flux = new double[PixelCount];
        for (int s = 0; s < exposure.Stars.Count; s++)
        {
            StarLight star = exposure.Stars[s];

            // 1 + z_measured = (1 + z_true)/(1 + z_B): the correction in reverse.
            double factor = Doppler.Factor(star.VelocityKmPerS) / (1.0 + correction.BarycentricRedshift);
            AddLight(flux, star, factor);
            _stars.Add((exposure, star, s + 1, correction.CorrectionKmPerS));
        }

        // In bands and in the light of two stars the width of one line has no meaning of its own.
        if (exposure.Stars is [{ Bands: 0.0 }])
        {
            AddTruthLines(exposure);
        }

        double[] sigma = Expose(flux, exposure);
        using FileStream stream = File.Create(Path.Combine(folder, exposure.Name + ".fits"));
        var writer = new FitsWriter(stream);
        writer.WriteImage(flux, [PixelCount], -32, Header(exposure, start, middle, correction));
        writer.WriteImage(sigma, [PixelCount], -32, new FitsHeaderBuilder().Add("BUNIT", "adu", "one standard deviation"), "ERROR");
    }

    private void AddLight(double[] flux, StarLight star, double factor)
    {
        double lastAngstrom = FirstAngstrom + (PixelCount * StepAngstrom);
        var range = new WavelengthRange((FirstAngstrom - 5.0) / factor, (lastAngstrom + 5.0) / factor);
        StellarSpectrum lines = StellarSpectrum.Draw(star, metals, balmer, range, ResolvingPower);
        for (int i = 0; i < flux.Length; i++)
        {
            double sum = 0.0;
            for (int k = 0; k < StepsPerPixel; k++)
            {
                double air = FirstAngstrom + ((i - 0.5 + ((k + 0.5) / StepsPerPixel)) * StepAngstrom);
                sum += lines.FluxAt(AirVacuum.ToVacuumAngstrom(air) / factor);
            }

            double middle = FirstAngstrom + (i * StepAngstrom);
            flux[i] += star.Share * Planck(middle, star.TemperatureKelvin) * sum / StepsPerPixel;
        }
    }

    /// <summary>Shape of the continuum, 1 at 5700 Å (Planck's law).</summary>
    private static double Planck(double angstrom, double temperatureKelvin)
    {
        // hc/k = 1.438777e8 Å K.
        double x = 1.438777e8 / temperatureKelvin;
        return Math.Pow(5700.0 / angstrom, 5) * (Math.Exp(x / 5700.0) - 1.0) / (Math.Exp(x / angstrom) - 1.0);
    }

    /// <summary>Turns light into counts with the sensitivity of the instrument, photon noise and read noise.</summary>
    private static double[] Expose(double[] flux, Exposure exposure)
    {
        const double readNoise = 6.0;
        double peak = 0.0;
        for (int i = 0; i < flux.Length; i++)
        {
            double x = (i - (0.55 * PixelCount)) / PixelCount;
            flux[i] *= 1.0 - (1.3 * x * x);
            peak = Math.Max(peak, flux[i]);
        }

        // S/N = N/√(N + r²) solved for the counts N of the brightest pixel.
        double ratio = exposure.SignalToNoise;
        double counts = 0.5 * ((ratio * ratio) + Math.Sqrt(Math.Pow(ratio, 4) + (4.0 * ratio * ratio * readNoise * readNoise)));
        var normal = new NormalNumbers(exposure.Seed);
        var sigma = new double[flux.Length];
        for (int i = 0; i < flux.Length; i++)
        {
            double light = counts * flux[i] / peak;
            sigma[i] = Math.Sqrt(light + (readNoise * readNoise));
            flux[i] = light + (sigma[i] * normal.Next());
        }

        return sigma;
    }

    private static FitsHeaderBuilder Header(Exposure exposure, JulianDate start, JulianDate middle, BarycentricResult correction) =>
        new FitsHeaderBuilder()
            .Add("OBJECT", exposure.Target, "name of the target")
            .Add("RA", exposure.RightAscensionDegrees, "[deg] right ascension")
            .Add("DEC", exposure.DeclinationDegrees, "[deg] declination")
            .Add("RADESYS", "ICRS", "frame of RA and DEC")
            .Add("EQUINOX", 2000.0)
            .Add("TIMESYS", "UTC", "time scale")
            .Add("DATE-OBS", UtcTime.ToIso(start), "beginning of the exposure")
            .Add("DATE-AVG", UtcTime.ToIso(middle), "middle of the exposure")
            .Add("EXPTIME", exposure.ExposureSeconds, "[s] exposure time")
            .Add("OBSERVAT", Site.Name, "the observatory is invented")
            .Add("SITELAT", Site.LatitudeDegrees, "[deg] latitude")
            .Add("SITELONG", Site.LongitudeDegrees, "[deg] longitude, positive east")
            .Add("SITEELEV", Site.HeightMetres, "[m] height")
            .Add("TELESCOP", "Larkfell 0.8 m")
            .Add("INSTRUME", "Plover spectrograph")
            .Add("OBSERVER", "I. Fenwick")
            .Add("AIRMASS", Math.Round(correction.Airmass, 3), "at mid-exposure")
            .Add("SPEC_RES", ResolvingPower, "resolving power")
            .Add("CTYPE1", "AWAV", "wavelength in air")
            .Add("CUNIT1", "Angstrom")
            .Add("CRPIX1", 1.0)
            .Add("CRVAL1", FirstAngstrom, "[Angstrom] wavelength of the first pixel")
            .Add("CDELT1", StepAngstrom, "[Angstrom] step")
            .Add("SPECSYS", "TOPOCENT", "wavelengths as observed")
            .Add("SSYSOBS", "TOPOCENT")
            .Add("BUNIT", "adu", "unit of the flux")
            .AddComment("An invented star, drawn by examples/make-night of StarLines.");

    private void AddTruthLines(Exposure exposure)
    {
        StarLight star = exposure.Stars[0];
        for (int i = 0; i < metals.Lines.Count; i++)
        {
            RestLine line = metals.Lines[i];
            bool isInside = line.WavelengthAngstrom > FirstAngstrom + 15.0
                && line.WavelengthAngstrom < FirstAngstrom + (PixelCount * StepAngstrom) - 15.0;
            double width = isInside ? StellarSpectrum.EquivalentWidthMilliangstrom(star, line) : 0.0;
            if (width is > WeakestTruthMilliangstrom and < StrongestTruthMilliangstrom && IsIsolated(star, line))
            {
                _lines.Add((exposure, line, width));
            }
        }
    }

    private bool IsIsolated(StarLight star, RestLine line)
    {
        foreach (RestLine other in balmer.Lines)
        {
            if (Math.Abs(other.WavelengthAngstrom - line.WavelengthAngstrom) < 40.0)
            {
                return false;
            }
        }

        foreach (RestLine other in metals.Lines)
        {
            bool isNear = Math.Abs(other.WavelengthAngstrom - line.WavelengthAngstrom) < IsolationAngstrom;
            if (!ReferenceEquals(other, line) && isNear && StellarSpectrum.EquivalentWidthMilliangstrom(star, other) > 1.0)
            {
                return false;
            }
        }

        return true;
    }

    private Table StarTable() => new TableMap<(Exposure Exposure, StarLight Star, int Component, double Correction)>()
        .Text("file", static s => s.Exposure.Name + ".fits", "The spectrum")
        .Text("target", static s => s.Exposure.Target, "Name of the target")
        .Text("spectral_type", static s => s.Exposure.SpectralType, "What was invented")
        .Long("component", static s => s.Component, description: "Which star of a binary")
        .Double("rv", static s => s.Star.VelocityKmPerS, "km/s", "Barycentric radial velocity", decimals: 3)
        .Double("barycentric_correction", static s => s.Correction, "km/s", "Correction to the barycentre", decimals: 4)
        .Double("vsini", static s => s.Star.RotationKmPerS, "km/s", "Projected rotational velocity", decimals: 1)
        .Double("teff", static s => s.Star.TemperatureKelvin, "K", "Effective temperature", decimals: 0)
        .Double("share", static s => s.Star.Share, "", "Share of the light", decimals: 2)
        .Double("snr", static s => s.Exposure.SignalToNoise, "", "Signal-to-noise ratio of the brightest pixel", decimals: 0)
        .ToTable(_stars, Metadata("What the stars of the invented night are"), "truth");

    private Table LineTable() => new TableMap<(Exposure Exposure, RestLine Line, double Width)>()
        .Text("file", static l => l.Exposure.Name + ".fits", "The spectrum")
        .Text("line", static l => l.Line.Name, "The line, as the list metals-fgk names it")
        .Double("rest_wavelength", static l => l.Line.WavelengthAngstrom, "Angstrom", "Rest wavelength in air", decimals: 4)
        .Double("ew", static l => l.Width, "0.1 pm", "Equivalent width", decimals: 2)
        .ToTable(_lines, Metadata("Equivalent widths of the lines that stand alone"), "truth-lines");

    private static TableMetadata Metadata(string title) => new()
    {
        ["title"] = title,
        ["source"] = "invented; written by examples/make-night",
    };

    private void WriteTable(string name, Table table)
    {
        // Beside the folder of spectra, so that the folder holds nothing else.
        string truth = Path.TrimEndingDirectorySeparator(folder) + "-truth";
        Directory.CreateDirectory(truth);
        using FileStream stream = File.Create(Path.Combine(truth, name));
        TableWriter.Write(table, stream, TableFormat.Ecsv);
        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{name}: {table.RowCount} rows"));
    }
}
