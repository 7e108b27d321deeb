namespace StarLines.Templates;

/// <summary>A run of pixels with one line of a template, or with several that overlap.</summary>
/// <param name="Start">First pixel.</param>
/// <param name="End">One past the last pixel.</param>
/// <param name="Name">Name of the strongest line, or the range.</param>
internal readonly record struct TemplateWindow(int Start, int End, string Name)
{
    /// <summary>Number of pixels.</summary>
    internal int Length => End - Start;
}
