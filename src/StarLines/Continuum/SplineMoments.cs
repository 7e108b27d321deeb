namespace StarLines.Continuum;

/// <summary>
/// Sums over the pixels of one knot interval: weight times powers of the fraction t of the interval, alone and times the
/// datum. Kept apart from the normal equations so that a pixel costs no memory traffic.
/// </summary>
internal struct SplineMoments
{
    /// <summary>Σ w tᵏ.</summary>
    internal double W0, W1, W2, W3, W4, W5, W6;

    /// <summary>Σ w tᵏ y.</summary>
    internal double Y0, Y1, Y2, Y3;

    /// <summary>Adds a datum.</summary>
    internal void Add(double t, double weight, double value)
    {
        double t2 = t * t;
        double t3 = t2 * t;
        double wt3 = weight * t3;
        double wv = weight * value;
        W0 += weight;
        W1 += weight * t;
        W2 += weight * t2;
        W3 += wt3;
        W4 += wt3 * t;
        W5 += wt3 * t2;
        W6 += wt3 * t3;
        Y0 += wv;
        Y1 += wv * t;
        Y2 += wv * t2;
        Y3 += wv * t3;
    }

    /// <summary>Σ w tᵏ by its power.</summary>
    internal readonly double W(int k) => k switch
    {
        0 => W0,
        1 => W1,
        2 => W2,
        3 => W3,
        4 => W4,
        5 => W5,
        _ => W6,
    };

    /// <summary>Σ w tᵏ y by its power.</summary>
    internal readonly double Y(int k) => k switch
    {
        0 => Y0,
        1 => Y1,
        2 => Y2,
        _ => Y3,
    };
}
