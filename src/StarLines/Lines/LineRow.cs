namespace StarLines.Lines;

/// <summary>One row of the table of lines: a measurement and the spectrum it was made in.</summary>
/// <param name="File">The spectrum as the user names it.</param>
/// <param name="Target">The target's name, or an empty string.</param>
/// <param name="Measurement">What was measured.</param>
public sealed record LineRow(string File, string Target, LineMeasurement Measurement);
