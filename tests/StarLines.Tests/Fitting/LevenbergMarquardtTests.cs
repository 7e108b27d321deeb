using System;
using StarLines.Fitting;
using Xunit;

namespace StarLines.Tests.Fitting;

public sealed class LevenbergMarquardtTests
{
    private static readonly double[] Abscissae = [0.0, 1.0, 2.0, 3.0, 4.0];
    private static readonly double[] Ordinates = [1.1, 2.9, 5.2, 7.1, 8.8];

    [Fact]
    public void Straight_line_has_the_textbook_solution_and_covariance()
    {
        var workspace = new FitWorkspace();
        double[] parameters = [0.0, 0.0];
        FitOutcome outcome = Minimize(parameters, double.PositiveInfinity, workspace);
        Assert.True(outcome.Converged);

        // Slope = Sxy/Sxx and intercept = mean(y) − slope mean(x), with Sxx = 10 and unit weights.
        Assert.Equal(1.96, parameters[1], 1e-6);
        Assert.Equal(1.10, parameters[0], 1e-6);
        Assert.True(LevenbergMarquardt.TryCovariance(workspace, 2));
        Assert.Equal(0.1, workspace.Covariance[3], 1e-12);
        Assert.Equal((1.0 / 5.0) + (4.0 / 10.0), workspace.Covariance[0], 1e-12);
        Assert.Equal(-0.2, workspace.Covariance[1], 1e-12);
    }

    [Fact]
    public void Parameter_stays_at_its_bound_and_the_other_is_optimal_there()
    {
        var workspace = new FitWorkspace();
        double[] parameters = [0.0, 0.0];
        Minimize(parameters, 1.5, workspace);
        Assert.Equal(1.5, parameters[1]);
        Assert.Equal(5.02 - (1.5 * 2.0), parameters[0], 1e-5);
        Assert.True(workspace.Fixed[1]);
        Assert.True(LevenbergMarquardt.TryCovariance(workspace, 2));
        Assert.Equal(0.2, workspace.Covariance[0], 1e-12);
        Assert.Equal(0.0, workspace.Covariance[3]);
    }

    [Fact]
    public void Undetermined_parameters_have_no_covariance()
    {
        var workspace = new FitWorkspace();
        workspace.Prepare(2);
        ((ReadOnlySpan<double>)[1.0, 1.0, 1.0, 1.0]).CopyTo(workspace.Matrix);
        workspace.Fixed.Clear();
        Assert.False(LevenbergMarquardt.TryCovariance(workspace, 2));
    }

    private static FitOutcome Minimize(double[] parameters, double greatestSlope, FitWorkspace workspace) =>
        LevenbergMarquardt.Minimize(
            new StraightLine(),
            parameters,
            [double.NegativeInfinity, double.NegativeInfinity],
            [double.PositiveInfinity, greatestSlope],
            [false, false],
            workspace);

    private sealed class StraightLine : INormalEquations
    {
        public int ParameterCount => 2;

        public double Linearize(ReadOnlySpan<double> parameters, Span<double> matrix, Span<double> gradient)
        {
            matrix.Clear();
            gradient.Clear();
            double sum = 0.0;
            for (int i = 0; i < Abscissae.Length; i++)
            {
                double residual = Ordinates[i] - parameters[0] - (parameters[1] * Abscissae[i]);
                matrix[0] += 1.0;
                matrix[2] += Abscissae[i];
                matrix[3] += Abscissae[i] * Abscissae[i];
                gradient[0] += residual;
                gradient[1] += residual * Abscissae[i];
                sum += residual * residual;
            }

            return sum;
        }
    }
}
