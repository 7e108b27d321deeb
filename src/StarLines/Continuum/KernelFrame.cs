namespace StarLines.Continuum;

/// <summary>What all pixels of one call of the <see cref="MixtureKernel"/> share.</summary>
/// <param name="Core">Fraction of pixels in the core.</param>
/// <param name="Below">Density of absorbed pixels.</param>
/// <param name="Above">Density of pixels in emission.</param>
/// <param name="Shift">κ of the mixture, in units of the noise.</param>
/// <param name="InverseScale">1 over the scale of the noise.</param>
/// <param name="Left">Left end of the knot interval.</param>
/// <param name="PerStep">1 over its length.</param>
internal readonly record struct KernelFrame(
    double Core, double Below, double Above, double Shift, double InverseScale, double Left, double PerStep);
