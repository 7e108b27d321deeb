namespace StarLines.LineLists;

/// <summary>One line of a line list; a missing fact is NaN or an empty string. The medium is that of the list.</summary>
public sealed record RestLine
{
    /// <summary>A name such as <c>H-alpha</c>, or the species and wavelength.</summary>
    public required string Name { get; init; }

    /// <summary>The atom or ion, such as <c>Fe I</c>.</summary>
    public required string Species { get; init; }

    /// <summary>Rest wavelength, Å, in the list's medium.</summary>
    public required double WavelengthAngstrom { get; init; }

    /// <summary>Excitation energy of the lower level, eV.</summary>
    public double LowerEnergyEv { get; init; } = double.NaN;

    /// <summary>Decimal logarithm of the weighted oscillator strength g f.</summary>
    public double LogGf { get; init; } = double.NaN;

    /// <summary>Einstein coefficient of spontaneous emission, 1/s.</summary>
    public double EinsteinAPerS { get; init; } = double.NaN;

    /// <summary>Relative intensity in emission, arbitrary unit.</summary>
    public double Intensity { get; init; } = double.NaN;

    /// <summary>Central depth of a template line in units of the continuum.</summary>
    public double Depth { get; init; } = double.NaN;

    /// <summary>Full width at half maximum of a template line, Å.</summary>
    public double FwhmAngstrom { get; init; } = double.NaN;

    /// <summary>Where the numbers come from.</summary>
    public string Source { get; init; } = "";
}
