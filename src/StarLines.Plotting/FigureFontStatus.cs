namespace StarLines.Plotting;

/// <summary>Which font the figures are drawn with.</summary>
public enum FigureFontStatus
{
    /// <summary>The font that comes with the program.</summary>
    Embedded,

    /// <summary>A font of the system: the program was built without its own.</summary>
    System,

    /// <summary>There is no font at all: figures have no text.</summary>
    None,
}
