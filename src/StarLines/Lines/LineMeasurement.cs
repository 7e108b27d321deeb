namespace StarLines.Lines;

/// <summary>What was measured on one line; the members are the columns of the table of lines.</summary>
public sealed record LineMeasurement
{
    /// <summary>Name of the line.</summary>
    public required string Line { get; init; }

    /// <summary>The atom or ion.</summary>
    public required string Species { get; init; }

    /// <summary>Rest wavelength, Å, in <see cref="Medium"/>.</summary>
    public required double RestWavelengthAngstrom { get; init; }

    /// <summary>Medium of all wavelengths of this record, that of the spectrum.</summary>
    public required Medium Medium { get; init; }

    /// <summary>How it ended.</summary>
    public required LineStatus Status { get; init; }

    /// <summary>Centre of the fitted profile, Å; the uncertainty covers the noise.</summary>
    public Measured CentreAngstrom { get; init; } = Measured.None;

    /// <summary>Velocity of the centre against rest, km/s, in the frame of the spectrum.</summary>
    public Measured VelocityKmPerS { get; init; } = Measured.None;

    /// <summary>Equivalent width by the fit, mÅ; absorption positive; the uncertainty covers noise and continuum.</summary>
    public Measured EquivalentWidthMilliangstrom { get; init; } = Measured.None;

    /// <summary>Its uncertainty by the noise alone, mÅ.</summary>
    public double EquivalentWidthNoiseMilliangstrom { get; init; } = double.NaN;

    /// <summary>Its uncertainty by the placement of the continuum alone, mÅ.</summary>
    public double EquivalentWidthContinuumMilliangstrom { get; init; } = double.NaN;

    /// <summary>Upper limit of the equivalent width at three standard deviations, mÅ, where the status is <see cref="LineStatus.Limit"/>.</summary>
    public double LimitMilliangstrom { get; init; } = double.NaN;

    /// <summary>Equivalent width by direct summation, mÅ; the uncertainty covers noise and continuum.</summary>
    public Measured DirectEquivalentWidthMilliangstrom { get; init; } = Measured.None;

    /// <summary>Depth of the fitted profile in units of the continuum; emission negative.</summary>
    public Measured Depth { get; init; } = Measured.None;

    /// <summary>Full width at half maximum of the fitted profile, Å.</summary>
    public Measured FwhmAngstrom { get; init; } = Measured.None;

    /// <summary>Flux of the line, flux unit × Å, positive in emission; none where the flux has no unit.</summary>
    public Measured Flux { get; init; } = Measured.None;

    /// <summary>Name of the profile, such as <c>gaussian</c>.</summary>
    public string Profile { get; init; } = "";

    /// <summary>Reduced χ² of the fit.</summary>
    public double ReducedChiSquare { get; init; } = double.NaN;

    /// <summary>Signal-to-noise ratio a pixel of the continuum at the line.</summary>
    public double SignalToNoise { get; init; } = double.NaN;

    /// <summary>Number of pixels used by the fit.</summary>
    public int Pixels { get; init; }

    /// <summary>Number shared by the lines that were fitted together, from 1; 0 for a line fitted alone.</summary>
    public int Blend { get; init; }

    /// <summary>Reservations.</summary>
    public LineWarnings Warnings { get; init; }
}
