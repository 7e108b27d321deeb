namespace StarLines.Velocities;

/// <summary>One row of the table of velocities: the spectrum and what was measured on it.</summary>
/// <param name="File">The spectrum as the user names it.</param>
/// <param name="Target">The target, or an empty string.</param>
/// <param name="Measurement">What was measured.</param>
public sealed record VelocityRow(string File, string Target, VelocityMeasurement Measurement);
