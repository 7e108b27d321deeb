using System.Collections.Generic;

namespace StarLines.Velocities;

/// <summary>A radial velocity by one template; the members are the columns of the table of velocities.</summary>
public sealed record VelocityMeasurement
{
    /// <summary>Name of the template: <c>balmer</c>, <c>metal</c>, <c>both</c>, or of a list or file.</summary>
    public required string Template { get; init; }

    /// <summary>How it ended.</summary>
    public required VelocityStatus Status { get; init; }

    /// <summary>Barycentric Julian Date of mid-exposure, TDB.</summary>
    public JulianDate? BarycentricJdTdb { get; init; }

    /// <summary>Barycentric radial velocity, km/s, receding positive.</summary>
    public Measured VelocityKmPerS { get; init; } = Measured.None;

    /// <summary>Radial velocity as the telescope saw it, km/s.</summary>
    public double TopocentricKmPerS { get; init; } = double.NaN;

    /// <summary>Uncertainty of <see cref="TopocentricKmPerS"/>, km/s, one standard deviation; the reduction adds nothing to it.</summary>
    public double TopocentricUncertaintyKmPerS { get; init; } = double.NaN;

    /// <summary>Barycentric correction c z_B, km/s; (1 + z_true) = (1 + z_measured)(1 + z_B).</summary>
    public double BarycentricCorrectionKmPerS { get; init; } = double.NaN;

    /// <summary>Height of the correlation peak, −1 to 1.</summary>
    public double PeakHeight { get; init; } = double.NaN;

    /// <summary>Full width at half maximum of the correlation peak, km/s.</summary>
    public double PeakFwhmKmPerS { get; init; } = double.NaN;

    /// <summary>The ratio r of Tonry and Davis (1979).</summary>
    public double RValue { get; init; } = double.NaN;

    /// <summary>Projected rotational velocity, km/s, where the peak is wider than template and instrument explain.</summary>
    public Measured ProjectedRotationKmPerS { get; init; } = Measured.None;

    /// <summary>Photon limit of the uncertainty (Bouchy et al. 2001), km/s.</summary>
    public double PhotonLimitKmPerS { get; init; } = double.NaN;

    /// <summary>Number of pixels used.</summary>
    public int Pixels { get; init; }

    /// <summary>Number of stars seen in the correlation.</summary>
    public int Components { get; init; } = 1;

    /// <summary>Which of them this is, from 1.</summary>
    public int Component { get; init; } = 1;

    /// <summary>Reservations.</summary>
    public IReadOnlyList<Remark> Warnings { get; init; } = [];
}
