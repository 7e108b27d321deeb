using System;

namespace StarLines.Fitting;

/// <summary>A least-squares problem, seen by the solver through its normal equations alone.</summary>
internal interface INormalEquations
{
    /// <summary>Number of parameters N.</summary>
    int ParameterCount { get; }

    /// <summary>Evaluates the problem at given parameters.</summary>
    /// <param name="parameters">N parameters.</param>
    /// <param name="matrix">Receives JᵀJ of the weighted residuals, N × N by rows; the lower triangle is enough.</param>
    /// <param name="gradient">Receives Jᵀr, N values, where J is the derivative of the model and r = data − model, both weighted.</param>
    /// <returns>χ², the sum of squared weighted residuals.</returns>
    double Linearize(ReadOnlySpan<double> parameters, Span<double> matrix, Span<double> gradient);
}
