namespace StarLines.Fits.Tiles;

/// <summary>
/// The random numbers of subtractive dithering: 10000 values of the generator of Park and Miller (1988), Communications of the ACM 31, 1192,
/// walked through from a place that depends on the tile. Source: FITS Standard 4.0, section 10.2 and appendix I.
/// </summary>
internal struct DitherSequence
{
    private const int Length = 10000;

    /// <summary>A tile starts somewhere in the first 500 values.</summary>
    private const int StartRange = 500;

    private static readonly float[] Values = Generate();

    private int start;
    private int next;

    /// <summary>The sequence of a tile.</summary>
    /// <param name="offset">The number of the tile from 0, plus ZDITHER0 − 1.</param>
    internal DitherSequence(long offset)
    {
        start = (int)(((offset % Length) + Length) % Length);
        next = (int)(Values[start] * StartRange);
    }

    internal double Next()
    {
        float value = Values[next];
        if (++next == Length)
        {
            start = (start + 1) % Length;
            next = (int)(Values[start] * StartRange);
        }

        return value;
    }

    private static float[] Generate()
    {
        const long Multiplier = 16807;
        const long Modulus = 2147483647;
        float[] values = new float[Length];
        long seed = 1;
        for (int i = 0; i < Length; i++)
        {
            seed = Multiplier * seed % Modulus;
            values[i] = (float)(seed / (double)Modulus);
        }

        return values;
    }
}
