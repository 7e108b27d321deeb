namespace StarLines.Plotting;

/// <summary>Dark ink on white, or light ink on a dark ground.</summary>
public enum FigureTheme
{
    /// <summary>For paper.</summary>
    Light,

    /// <summary>For screens and slides.</summary>
    Dark,
}
