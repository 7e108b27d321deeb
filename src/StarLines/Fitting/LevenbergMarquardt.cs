using System;

namespace StarLines.Fitting;

/// <summary>
/// Nonlinear least squares with bounds by damped Gauss–Newton steps: Levenberg (1944), Quarterly of Applied Mathematics 2,
/// 164; Marquardt (1963), Journal of the Society for Industrial and Applied Mathematics 11, 431. A parameter at a bound
/// with the gradient pointing outwards stays there for the step. Nothing is allocated.
/// </summary>
internal static class LevenbergMarquardt
{
    /// <summary>Steps after which a fit counts as not converged; a line needs 4 to 10.</summary>
    private const int MaximumIterations = 60;

    /// <summary>
    /// Expected fall of χ² below which the solution has settled: the last step is then below a thousandth of the uncertainties.
    /// </summary>
    private const double SettledDecrement = 1e-6;

    /// <summary>The same relative to χ², where rounding hides smaller steps.</summary>
    private const double SettledRelative = 1e-12;

    private const double FirstDamping = 1e-3;
    private const double LeastDamping = 1e-9;
    private const double GreatestDamping = 1e9;
    private const double DampingFactor = 10.0;

    /// <summary>Finds the parameters of least χ² between bounds.</summary>
    /// <param name="problem">The problem of N parameters.</param>
    /// <param name="parameters">Start; receives the solution.</param>
    /// <param name="lower">N lower bounds.</param>
    /// <param name="upper">N upper bounds.</param>
    /// <param name="held">N flags of parameters that must not move.</param>
    /// <param name="workspace">Memory; holds JᵀJ and Jᵀr of the solution afterwards.</param>
    internal static FitOutcome Minimize<TProblem>(
        TProblem problem,
        Span<double> parameters,
        ReadOnlySpan<double> lower,
        ReadOnlySpan<double> upper,
        ReadOnlySpan<bool> held,
        FitWorkspace workspace)
        where TProblem : INormalEquations
    {
        int count = parameters.Length;
        workspace.Prepare(count);
        Clamp(parameters, lower, upper);
        double chiSquare = problem.Linearize(parameters, workspace.Matrix, workspace.Gradient);
        double damping = FirstDamping;
        bool settled = false;
        int iteration = 0;
        while (!settled && iteration < MaximumIterations && damping < GreatestDamping)
        {
            iteration++;
            FindFixed(parameters, lower, upper, held, workspace);
            if (!TryStep(workspace, count, damping))
            {
                damping *= DampingFactor;
                continue;
            }

            double decrement = Advance(parameters, lower, upper, workspace);
            settled = decrement < SettledDecrement + (SettledRelative * chiSquare);
            double trialChiSquare = problem.Linearize(workspace.Trial, workspace.TrialMatrix, workspace.TrialGradient);
            if (trialChiSquare <= chiSquare)
            {
                workspace.Trial.CopyTo(parameters);
                workspace.AcceptTrial();
                chiSquare = trialChiSquare;
                damping = Math.Max(damping / DampingFactor, LeastDamping);
            }
            else
            {
                damping *= DampingFactor;
            }
        }

        FindFixed(parameters, lower, upper, held, workspace);
        return new FitOutcome(chiSquare, iteration, settled);
    }

    /// <summary>
    /// Inverts JᵀJ of the solution into <see cref="FitWorkspace.Covariance"/>: the covariance of the parameters where the
    /// weights are inverse standard deviations. Parameters held or at a bound have none (0).
    /// </summary>
    /// <returns>False where the data do not determine the parameters.</returns>
    internal static bool TryCovariance(FitWorkspace workspace, int count)
    {
        if (!TryFactor(workspace, count, 0.0))
        {
            return false;
        }

        Span<double> covariance = workspace.Covariance;
        SymmetricMatrix.Invert(workspace.Factor, count, covariance);
        for (int i = 0; i < count; i++)
        {
            for (int j = 0; j < count; j++)
            {
                bool known = !workspace.Fixed[i] && !workspace.Fixed[j];
                covariance[(i * count) + j] = known
                    ? covariance[(i * count) + j] * workspace.Scale[i] * workspace.Scale[j]
                    : 0.0;
            }
        }

        return true;
    }

    private static bool TryStep(FitWorkspace workspace, int count, double damping)
    {
        if (!TryFactor(workspace, count, damping))
        {
            return false;
        }

        Span<double> step = workspace.Step;
        for (int i = 0; i < count; i++)
        {
            step[i] = workspace.Fixed[i] ? 0.0 : workspace.Gradient[i] * workspace.Scale[i];
        }

        SymmetricMatrix.SolveInPlace(workspace.Factor, count, step);
        for (int i = 0; i < count; i++)
        {
            step[i] *= workspace.Scale[i];
        }

        return true;
    }

    /// <summary>Scales JᵀJ to a unit diagonal, damps it and factors it; rows of fixed parameters become those of the unit matrix.</summary>
    private static bool TryFactor(FitWorkspace workspace, int count, double damping)
    {
        Span<double> matrix = workspace.Matrix;
        Span<double> factor = workspace.Factor;
        Span<double> scale = workspace.Scale;
        for (int i = 0; i < count; i++)
        {
            double diagonal = matrix[(i * count) + i];
            scale[i] = diagonal > 0.0 ? 1.0 / Math.Sqrt(diagonal) : 1.0;
        }

        for (int i = 0; i < count; i++)
        {
            Span<double> row = factor.Slice(i * count, count);
            for (int j = 0; j < i; j++)
            {
                bool moves = !workspace.Fixed[i] && !workspace.Fixed[j];
                row[j] = moves ? matrix[(i * count) + j] * scale[i] * scale[j] : 0.0;
            }

            row[i] = workspace.Fixed[i] ? 1.0 : (matrix[(i * count) + i] * scale[i] * scale[i]) + damping;
        }

        return SymmetricMatrix.TryFactorInPlace(factor, count);
    }

    /// <summary>Makes the trial parameters and gives the fall of χ² that the linear model expects of them.</summary>
    private static double Advance(
        ReadOnlySpan<double> parameters, ReadOnlySpan<double> lower, ReadOnlySpan<double> upper, FitWorkspace workspace)
    {
        double decrement = 0.0;
        Span<double> trial = workspace.Trial;
        for (int i = 0; i < parameters.Length; i++)
        {
            trial[i] = Math.Clamp(parameters[i] + workspace.Step[i], lower[i], upper[i]);
            decrement += workspace.Gradient[i] * (trial[i] - parameters[i]);
        }

        return decrement;
    }

    private static void FindFixed(
        ReadOnlySpan<double> parameters,
        ReadOnlySpan<double> lower,
        ReadOnlySpan<double> upper,
        ReadOnlySpan<bool> held,
        FitWorkspace workspace)
    {
        for (int i = 0; i < parameters.Length; i++)
        {
            workspace.Fixed[i] = held[i]
                || (parameters[i] <= lower[i] && workspace.Gradient[i] < 0.0)
                || (parameters[i] >= upper[i] && workspace.Gradient[i] > 0.0);
        }
    }

    private static void Clamp(Span<double> parameters, ReadOnlySpan<double> lower, ReadOnlySpan<double> upper)
    {
        for (int i = 0; i < parameters.Length; i++)
        {
            parameters[i] = Math.Clamp(parameters[i], lower[i], upper[i]);
        }
    }
}
