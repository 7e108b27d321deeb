namespace StarLines.Plotting.Drawing;

/// <summary>Shapes of figures of several panels.</summary>
internal static class StripLayout
{
    /// <summary>Distance between two numbers of a vertical axis, in text heights.</summary>
    internal const float YPitch = 2.6f;

    /// <summary>Height for the width of a figure of strips one under another.</summary>
    internal static double HeightToWidth(int strips) => strips == 1 ? 0.5625 : 0.1 + (0.27 * strips);
}
