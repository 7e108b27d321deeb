namespace StarLines.Templates;

/// <summary>One absorption line of a template; the medium of its wavelength is that of the template.</summary>
public sealed record TemplateLine
{
    /// <summary>A name such as <c>H-alpha</c>.</summary>
    public required string Name { get; init; }

    /// <summary>Rest wavelength, Å.</summary>
    public required double WavelengthAngstrom { get; init; }

    /// <summary>Central depth in units of the continuum, before the instrument; above 0.</summary>
    public required double Depth { get; init; }

    /// <summary>Full width at half maximum, Å; above 0.</summary>
    public required double FwhmAngstrom { get; init; }

    /// <summary>The shape.</summary>
    public LineShape Shape { get; init; }
}
