using System;

namespace StarLines.Lines;

/// <summary>What a matched filter found.</summary>
/// <param name="Signal">Σ w² φ (b − f).</param>
/// <param name="Power">Σ w² φ².</param>
/// <param name="Level">Σ w² φ: how the depth answers to the continuum.</param>
internal readonly record struct FilterResponse(double Signal, double Power, double Level)
{
    /// <summary>Least-squares depth; 0 where no pixel is used.</summary>
    internal double Depth => Power > 0.0 ? Signal / Power : 0.0;

    /// <summary>How much χ² falls by the line.</summary>
    internal double ChiSquareGain => Power > 0.0 ? Signal * Signal / Power : 0.0;

    /// <summary>Standard deviation of the depth by noise and by the continuum.</summary>
    /// <param name="continuumSigma">Relative uncertainty of the continuum.</param>
    internal double DepthSigma(double continuumSigma)
    {
        if (!(Power > 0.0))
        {
            return double.PositiveInfinity;
        }

        double placement = continuumSigma * Level / Power;
        return Math.Sqrt((1.0 / Power) + (placement * placement));
    }

    /// <summary>Depth over its standard deviation.</summary>
    /// <param name="continuumSigma">Relative uncertainty of the continuum.</param>
    internal double Significance(double continuumSigma) => Depth / DepthSigma(continuumSigma);
}
