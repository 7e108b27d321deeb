using System;

namespace StarLines.Continuum;

/// <summary>The good pixels of a spectrum as the continuum fit sees them: flux in units of its typical level, lines divided out.</summary>
internal sealed class ContinuumData
{
    // A fitted line is known to a few per cent of its depth; its pixels weigh accordingly less.
    private const double ModelError = 0.03;

    // Under this the division by the model blows up noise and scattered light.
    private const double LeastModel = 0.4;

    private ContinuumData(double[] x, double[] flux, double[] inverseSigma, double unit, int stride = 1)
    {
        X = x;
        Flux = flux;
        InverseSigma = inverseSigma;
        Unit = unit;
        Stride = stride;
        Level = new double[x.Length];
    }

    /// <summary>Wavelengths, Å.</summary>
    internal double[] X { get; }

    /// <summary>Flux in units of <see cref="Unit"/>.</summary>
    internal double[] Flux { get; }

    /// <summary>1/σ in the same units; 0 for a pixel that is left out.</summary>
    internal double[] InverseSigma { get; }

    /// <summary>Flux unit of this copy, in the unit of the spectrum.</summary>
    internal double Unit { get; }

    /// <summary>How many pixels of the spectrum each one here stands for.</summary>
    internal int Stride { get; }

    /// <summary>The present level at each pixel.</summary>
    internal double[] Level { get; }

    /// <summary>Number of pixels.</summary>
    internal int Count => X.Length;

    /// <summary>Collects the good pixels; null where there are none with a usable level.</summary>
    /// <param name="spectrum">The spectrum; N pixels.</param>
    /// <param name="sigma">N standard deviations of the flux.</param>
    /// <param name="lineModel">N values of the fitted lines in units of the continuum, or none.</param>
    internal static ContinuumData? From(Spectrum spectrum, ReadOnlySpan<double> sigma, ReadOnlySpan<double> lineModel)
    {
        int count = spectrum.Count;
        var x = new double[count];
        var y = new double[count];
        var w = new double[count];
        int kept = 0;
        for (int i = 0; i < count; i++)
        {
            double model = lineModel.IsEmpty ? 1.0 : lineModel[i];
            if (spectrum.Faults[i] != PixelFaults.None || !(sigma[i] > 0.0) || !(model > LeastModel))
            {
                continue;
            }

            x[kept] = spectrum.Scale.WavelengthsAngstrom[i];
            y[kept] = spectrum.Flux[i] / model;
            double noise = sigma[i] / model;
            double doubt = ModelError * (1.0 - model) * y[kept];
            w[kept] = 1.0 / Math.Sqrt((noise * noise) + (doubt * doubt));
            kept++;
        }

        double unit = kept == 0 ? 0.0 : TypicalLevel(y.AsSpan(0, kept));
        if (!(unit > 0.0))
        {
            return null;
        }

        Array.Resize(ref x, kept);
        Array.Resize(ref y, kept);
        Array.Resize(ref w, kept);
        for (int i = 0; i < kept; i++)
        {
            y[i] /= unit;
            w[i] *= unit;
        }

        return new ContinuumData(x, y, w, unit);
    }

    /// <summary>Takes the level over from a continuum of all pixels.</summary>
    /// <param name="continuum">The continuum.</param>
    /// <param name="scale">Its wavelengths.</param>
    internal void SetLevel(ContinuumFit continuum, WavelengthScale scale)
    {
        ReadOnlySpan<double> wavelengths = scale.WavelengthsAngstrom;
        int pixel = 0;
        for (int i = 0; i < Count; i++)
        {
            while (wavelengths[pixel] < X[i])
            {
                pixel++;
            }

            Level[i] = continuum.Level[pixel] / Unit;
        }
    }

    /// <summary>Every so-manieth pixel, in arrays of its own.</summary>
    /// <param name="stride">At least 1.</param>
    internal ContinuumData Thinned(int stride)
    {
        int count = (Count + stride - 1) / stride;
        var thin = new ContinuumData(new double[count], new double[count], new double[count], Unit, stride);
        for (int i = 0; i < count; i++)
        {
            thin.X[i] = X[i * stride];
            thin.Flux[i] = Flux[i * stride];
            thin.InverseSigma[i] = InverseSigma[i * stride];
            thin.Level[i] = Level[i * stride];
        }

        return thin;
    }

    /// <summary>A quantile of some values, which are reordered.</summary>
    internal static double Quantile(Span<double> values, double fraction)
    {
        values.Sort();
        double position = fraction * (values.Length - 1);
        int i = (int)position;
        double next = values[Math.Min(i + 1, values.Length - 1)];
        return values[i] + ((position - i) * (next - values[i]));
    }

    private static double TypicalLevel(ReadOnlySpan<double> flux)
    {
        // A few thousand pixels give the order of magnitude; sorting them all would cost more than a step of the fit.
        int stride = Math.Max(1, flux.Length / 2000);
        var copy = new double[(flux.Length + stride - 1) / stride];
        for (int i = 0; i < copy.Length; i++)
        {
            copy[i] = flux[i * stride];
        }

        double median = Quantile(copy, 0.5);
        return median > 0.0 ? median : copy[^1];
    }
}
