namespace StarLines.Fitting;

/// <summary>How a least-squares fit ended.</summary>
/// <param name="ChiSquare">χ² at the solution.</param>
/// <param name="Iterations">Steps tried.</param>
/// <param name="Converged">Whether the last step was far below the uncertainties.</param>
internal readonly record struct FitOutcome(double ChiSquare, int Iterations, bool Converged);
