using System.Collections.Generic;

namespace StarLines.IO;

/// <summary>What a file holds, spectrum or not.</summary>
public sealed record SpectrumFileInspection
{
    /// <summary>The name as given.</summary>
    public required string Name { get; init; }

    /// <summary>The format: <c>FITS</c> or <c>table</c>.</summary>
    public string Format { get; init; } = "";

    /// <summary>The HDUs of a FITS file; none for other formats.</summary>
    public IReadOnlyList<HduInspection> Hdus { get; init; } = [];

    /// <summary>The spectra that can be read.</summary>
    public IReadOnlyList<Spectrum> Spectra { get; init; } = [];

    /// <summary>Why no spectrum can be read, in one sentence with its cure; empty where one can.</summary>
    public string Problem { get; init; } = "";
}
