using System;
using System.Collections.Generic;

namespace StarLines.IO;

/// <summary>
/// The dispersion of a grating, prism or grism: G m λ / cos ε = n(λ) sin α + sin β with n(λ) = n_r + n′_r (λ − λ_r), linear in
/// the tangent of the exit angle on a detector tilted by θ.
/// Source: Greisen, Calabretta, Valdes &amp; Allen (2006), A&amp;A 446, 747, section 5; PVi_0 to PVi_6 are G, m, α, n_r, n′_r, ε, θ.
/// </summary>
internal sealed class GrismEquation
{
    private readonly double _grating;
    private readonly double _constant;
    private readonly double _betaPlusTheta;
    private readonly double _gammaReference;
    private readonly double _slope;

    /// <summary>Sets up the equation at a reference wavelength.</summary>
    /// <param name="parameters">PVi_m by m; angles in degrees, G in 1/m, n′_r in 1/m.</param>
    /// <param name="referenceMetres">λ_r, m, in the medium in which the grism works.</param>
    internal GrismEquation(IReadOnlyDictionary<int, double> parameters, double referenceMetres)
    {
        double g = Parameter(parameters, 0, 0.0);
        double m = Parameter(parameters, 1, 0.0);
        double alpha = Parameter(parameters, 2, 0.0) * Math.PI / 180.0;
        double n = Parameter(parameters, 3, 1.0);
        double dn = Parameter(parameters, 4, 0.0);
        double epsilon = Parameter(parameters, 5, 0.0) * Math.PI / 180.0;
        double theta = Parameter(parameters, 6, 0.0) * Math.PI / 180.0;
        double gm = g * m / Math.Cos(epsilon);
        double beta = Math.Asin((gm * referenceMetres) - (n * Math.Sin(alpha)));
        _grating = gm - (dn * Math.Sin(alpha));
        _constant = (n - (dn * referenceMetres)) * Math.Sin(alpha);
        _betaPlusTheta = beta + theta;
        _gammaReference = -Math.Tan(theta);
        _slope = _grating / (Math.Cos(beta) * Math.Cos(theta) * Math.Cos(theta));
    }

    /// <summary>The wavelength at an offset that would be linear in wavelength at the reference, m; NaN where the angle is impossible.</summary>
    /// <param name="offsetMetres">Offset, m of wavelength at the reference.</param>
    internal double WavelengthMetres(double offsetMetres)
    {
        double gamma = _gammaReference + (offsetMetres * _slope);
        return (_constant + Math.Sin(Math.Atan(gamma) + _betaPlusTheta)) / _grating;
    }

    private static double Parameter(IReadOnlyDictionary<int, double> parameters, int m, double byDefault) =>
        parameters.TryGetValue(m, out double value) ? value : byDefault;
}
