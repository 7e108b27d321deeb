using System.Collections.Generic;
using System.CommandLine;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.IO;
using StarLines.Velocities;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines convert</c>: any input format to any output format.</summary>
internal static class ConvertCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var reading = new ReadingOptions();
        var output = new SpectrumOutput("");
        Option<Medium> medium = Make.One(
            "--as",
            "MEDIUM",
            "Convert the wavelengths to air or vacuum; else they stay in the file's own medium.",
            static text => Values.Word(text, ("air", Medium.Air), ("vacuum", Medium.Vacuum)),
            "air", "vacuum");
        var command = new VerbCommand(
            "convert",
            "Writes spectra in another format: wavelength (Å), flux, error and mask with all digits.",
            "starlines convert examples/night/wren-47.fits --as vacuum --out wren-47.ecsv");
        reading.AddTo(command);
        command.Add(medium);
        output.AddTo(command);
        command.SetAction(parsed =>
        {
            if (!output.IsGiven(parsed))
            {
                throw new UsageException("Say where to write: --out with a file or a folder, or --out - for standard output.");
            }

            var written = new HashSet<string>();
            return new InputLoop(terminal, reading.Files(parsed), reading.From(parsed)).ForEachSpectrum("converting", spectrum =>
            {
                string source = spectrum.Metadata.Source;
                Spectrum converted = InMedium(spectrum, parsed.GetValue(medium));
                IReadOnlyList<string> history = provenance.History(source);
                output.Write(
                    parsed, source, terminal, (stream, format) => SpectrumWriter.Write(converted, stream, format, history), written);
            });
        });
        return command;
    }

    private static Spectrum InMedium(Spectrum spectrum, Medium medium)
    {
        if (medium == Medium.Unknown)
        {
            return spectrum;
        }

        return spectrum.Scale.Medium == Medium.Unknown
            ? throw new UsageException($"{spectrum.Metadata.Source} does not say whether its wavelengths are in air or vacuum; say it by --medium.")
            : spectrum.WithScale(AirVacuum.Convert(spectrum.Scale, medium));
    }
}
