namespace StarLines.Continuum;

/// <summary>The sums of an expectation step over some pixels.</summary>
internal struct MixtureCounts
{
    /// <summary>Pixels within reach, their probabilities of being continuum and of being absorbed.</summary>
    internal double Pixels, Core, Below;

    /// <summary>Information lost by not knowing which pixels are continuum (Louis 1982).</summary>
    internal double Lost;

    /// <summary>Squared residuals above the level, and their weight: absorption leaves this side alone.</summary>
    internal double Squares, Weight;

    /// <summary>Counts a pixel.</summary>
    internal void Add(double r, double shift, double p, double absorbed)
    {
        double shifted = r + shift;
        Pixels += 1.0;
        Core += p;
        Below += absorbed;
        Lost += p * (1.0 - p) * shifted * shifted;
        double above = r > 0.0 ? p : 0.0;
        Squares += above * r * r;
        Weight += above;
    }
}
