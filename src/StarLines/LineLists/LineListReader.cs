using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Security.Cryptography;
using StarLines.Tables;
using StarLines.Velocities;

namespace StarLines.LineLists;

/// <summary>Reads line lists from ECSV, CSV and the other formats of tables.</summary>
/// <remarks>
/// Columns: <c>species</c> and <c>wavelength</c> are needed; <c>line</c>, <c>medium</c>, <c>lower_energy</c>, <c>log_gf</c>, <c>a_ki</c>,
/// <c>intensity</c>, <c>depth</c>, <c>fwhm</c> and <c>source</c> are read where they are there, in any order and case; others are passed over.
/// Units of the columns are heeded: wavelengths and widths in Å, nm or µm, energies in eV or 1/cm; without a unit Å and eV.
/// </remarks>
public static class LineListReader
{
    /// <summary>Reads a file.</summary>
    /// <param name="path">The file; may be gzipped.</param>
    /// <param name="medium">What the wavelengths are where the file does not say.</param>
    /// <returns>The list, named after the file.</returns>
    /// <exception cref="LineListFormatException">The file is not a line list.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static LineList ReadFile(string path, Medium medium = Medium.Unknown)
    {
        ArgumentNullException.ThrowIfNull(path);
        return Read(File.ReadAllBytes(path), path, Path.GetFileNameWithoutExtension(path), medium);
    }

    /// <summary>Reads a stream.</summary>
    /// <param name="stream">The bytes from here to the end; left open.</param>
    /// <param name="name">Name of the list, also for messages.</param>
    /// <param name="medium">What the wavelengths are where the stream does not say.</param>
    /// <returns>The list.</returns>
    /// <exception cref="LineListFormatException">The stream is not a line list.</exception>
    /// <exception cref="IOException">The stream does not give its bytes.</exception>
    public static LineList Read(Stream stream, string name, Medium medium = Medium.Unknown)
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentNullException.ThrowIfNull(name);
        using var memory = new MemoryStream();
        stream.CopyTo(memory);
        return Read(memory.ToArray(), name, name, medium);
    }

    private static LineList Read(byte[] bytes, string source, string name, Medium medium)
    {
        string sha256 = Convert.ToHexStringLower(SHA256.HashData(bytes));
        try
        {
            Table table = TableReader.Read(new MemoryStream(bytes), TableFormat.Auto, source);
            return FromTable(table, source, name, medium, sha256);
        }
        catch (TableFormatException exception)
        {
            throw new LineListFormatException(exception.Message, exception);
        }
    }

    private static LineList FromTable(Table table, string source, string name, Medium given, string sha256)
    {
        var columns = new LineListColumns(table, source);
        Medium[] media = MediaOf(columns, table, source, given);
        Medium medium = media.Length > 0 ? media[0] : given;
        var lines = new List<RestLine>(table.RowCount);
        for (int r = 0; r < table.RowCount; r++)
        {
            RestLine line = ReadLine(columns, r);
            lines.Add(media[r] == medium ? line : line with
            {
                WavelengthAngstrom = AirVacuum.ConvertAngstrom(line.WavelengthAngstrom, media[r], medium),
            });
        }

        return new LineList(name, medium, lines, sha256)
        {
            Title = table.Metadata.TextOf("title"),
            Source = table.Metadata.TextOf("source"),
            Citation = table.Metadata.TextOf("citation"),
        };
    }

    private static RestLine ReadLine(LineListColumns columns, int row)
    {
        double wavelength = columns.Number("wavelength", row);
        if (!(wavelength >= AirVacuum.MinimumAngstrom && wavelength <= AirVacuum.MaximumAngstrom))
        {
            string found = double.IsNaN(wavelength) ? "nothing" : string.Create(CultureInfo.InvariantCulture, $"{wavelength} Å");
            throw columns.Fault(row, "wavelength", found, string.Create(
                CultureInfo.InvariantCulture, $"a wavelength from {AirVacuum.MinimumAngstrom} to {AirVacuum.MaximumAngstrom} Å; state the unit of the column if it is not Å"));
        }

        string written = columns.Text("species", row);
        if (written.Length == 0)
        {
            throw columns.Fault(row, "species", "nothing", "an atom or ion such as Fe I");
        }

        string species = SpeciesName.Normalize(written);
        string name = columns.Text("line", row);
        return new RestLine
        {
            Name = name.Length > 0 ? name : string.Create(CultureInfo.InvariantCulture, $"{species} {wavelength:F2}"),
            Species = species,
            WavelengthAngstrom = wavelength,
            LowerEnergyEv = columns.Number("lower_energy", row),
            LogGf = columns.Number("log_gf", row),
            EinsteinAPerS = columns.Number("a_ki", row),
            Intensity = columns.Number("intensity", row),
            Depth = columns.Number("depth", row),
            FwhmAngstrom = columns.Number("fwhm", row),
            Source = columns.Text("source", row),
        };
    }

    /// <summary>The medium of each row: by its column, else by the metadata, else as the caller says.</summary>
    private static Medium[] MediaOf(LineListColumns columns, Table table, string source, Medium given)
    {
        string described = table.Metadata.TextOf("medium");
        Medium common = described.Length > 0 ? Parse(described) : given;
        if (described.Length > 0 && common == Medium.Unknown)
        {
            throw new LineListFormatException($"{source}: the metadata name the medium \"{described}\"; write air or vacuum.");
        }

        var media = new Medium[table.RowCount];
        for (int r = 0; r < media.Length; r++)
        {
            string text = columns.Text("medium", r);
            media[r] = text.Length > 0 ? Parse(text) : common;
            if (media[r] == Medium.Unknown)
            {
                throw text.Length > 0
                    ? columns.Fault(r, "medium", $"\"{text}\"", "air or vacuum")
                    : new LineListFormatException(
                        $"{source}: nothing says whether the wavelengths are in air or in vacuum; add a column medium, a comment \"# medium: air\", or give --medium.");
            }
        }

        return media;
    }

    private static Medium Parse(string text) => text.Trim().ToUpperInvariant() switch
    {
        "AIR" => Medium.Air,
        "VACUUM" or "VAC" => Medium.Vacuum,
        _ => Medium.Unknown,
    };
}
