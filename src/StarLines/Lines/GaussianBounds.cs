namespace StarLines.Lines;

/// <summary>Least standard deviations that any unbiased measurement of a Gaussian line can have.</summary>
/// <param name="CentreAngstrom">Of the centre, Å.</param>
/// <param name="FwhmAngstrom">Of the full width at half maximum, Å.</param>
/// <param name="Depth">Of the depth, in units of the continuum.</param>
/// <param name="EquivalentWidthMilliangstrom">Of the equivalent width, mÅ.</param>
public readonly record struct GaussianBounds(
    double CentreAngstrom, double FwhmAngstrom, double Depth, double EquivalentWidthMilliangstrom);
