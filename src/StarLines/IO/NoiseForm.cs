using System;

namespace StarLines.IO;

/// <summary>How a file states the noise of its flux.</summary>
internal enum NoiseForm
{
    /// <summary>Standard deviation.</summary>
    Sigma,

    /// <summary>Variance.</summary>
    Variance,

    /// <summary>Inverse variance; 0 means that the pixel carries no information.</summary>
    InverseVariance,
}

/// <summary>Noise and masks as files state them to what a <see cref="Spectrum"/> holds.</summary>
internal static class Noise
{
    /// <summary>Converts to standard deviations; what has none becomes 0, which a spectrum flags.</summary>
    internal static double[] ToSigmaInPlace(double[] values, NoiseForm form)
    {
        if (form == NoiseForm.Sigma)
        {
            return values;
        }

        for (int i = 0; i < values.Length; i++)
        {
            double value = values[i];
            values[i] = !(value > 0.0) || double.IsInfinity(value) ? 0.0
                : form == NoiseForm.Variance ? Math.Sqrt(value)
                : 1.0 / Math.Sqrt(value);
        }

        return values;
    }

    /// <summary>
    /// Bits of the and-masks of fibre surveys that leave no flux: 18 all exposures rejected, 22 no sky, 24 no data.
    /// The other bits tell of bright sky, scattered light and the like, for which the inverse variance accounts (documented by those surveys).
    /// </summary>
    private const long SurveyFatalBits = (1L << 18) | (1L << 22) | (1L << 24);

    /// <summary>Faults of the and-mask of a fibre survey, which comes with inverse variances.</summary>
    internal static PixelFaults[] ToSurveyFaults(ReadOnlySpan<double> mask)
    {
        var faults = new PixelFaults[mask.Length];
        for (int i = 0; i < faults.Length; i++)
        {
            bool fatal = !double.IsFinite(mask[i]) || ((long)mask[i] & SurveyFatalBits) != 0;
            faults[i] = fatal ? PixelFaults.Flagged : PixelFaults.None;
        }

        return faults;
    }

    /// <summary>Whether a mask is the and-mask of a fibre survey.</summary>
    internal static bool IsSurveyMask(string name, NoiseForm form) =>
        form == NoiseForm.InverseVariance
        && name.Replace("_", "", StringComparison.Ordinal).Equals("andmask", StringComparison.OrdinalIgnoreCase);

    /// <summary>Faults of a mask; any value but the good one is a fault, an undefined value too.</summary>
    internal static PixelFaults[] ToFaults(ReadOnlySpan<double> mask, bool zeroIsGood = true)
    {
        var faults = new PixelFaults[mask.Length];
        for (int i = 0; i < faults.Length; i++)
        {
            bool good = zeroIsGood ? mask[i] == 0.0 : mask[i] > 0.0;
            faults[i] = good ? PixelFaults.None : PixelFaults.Flagged;
        }

        return faults;
    }
}
