namespace StarLines.Plotting.Drawing;

/// <summary>The lines of our figures.</summary>
internal static class Pens
{
    internal static Pen Data { get; } = new(Ink.Data, 0.75f);

    internal static Pen Masked { get; } = new(Ink.Faded, 0.75f);

    internal static Pen Continuum { get; } = new(Ink.Continuum, 1.4f);

    internal static Pen BandEdge { get; } = new(Ink.Continuum, 0.5f);

    internal static Pen DoubtfulContinuum { get; } = new(Ink.Continuum, 1.4f, Dash.Dashed);

    internal static Pen Model { get; } = new(Ink.Model, 1.5f);

    internal static Pen Guide { get; } = new(Ink.Guide, 0.8f, Dash.Dashed);

    internal static Pen Centre { get; } = new(Ink.Guide, 0.8f, Dash.Dotted);

    internal static Pen SecondPeak { get; } = new(Ink.Second, 1.3f);

    internal static Pen Peak { get; } = new(Ink.Continuum, 1.3f);
}
