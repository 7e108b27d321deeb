namespace StarLines.Templates;

/// <summary>How a template is built from a line list. Depths and widths that the list has are used as they are.</summary>
public sealed record TemplateOptions
{
    /// <summary>Name of the template; empty for the name of the list.</summary>
    public string Name { get; init; } = "";

    /// <summary>Effective temperature for the strengths of lines without a depth, K; 2500 to 50 000.</summary>
    public double TemperatureKelvin { get; init; } = 5800.0;

    /// <summary>Full width of lines without a width before rotation and instrument, km/s: thermal motion and turbulence.</summary>
    public double IntrinsicFwhmKmPerS { get; init; } = 4.0;

    /// <summary>Full width at half maximum of hydrogen lines without a width, Å.</summary>
    public double HydrogenFwhmAngstrom { get; init; } = 8.0;

    /// <summary>Lines computed to be shallower than this are left out.</summary>
    public double MinimumDepth { get; init; } = 0.02;
}
