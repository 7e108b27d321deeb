using System;
using System.Globalization;

namespace StarLines;

/// <summary>
/// The wavelengths of the pixels of a spectrum: strictly increasing, finite and positive, with the two facts that
/// ruin results when guessed, the medium and the velocity frame. Pixel centres lie at whole indices, counted from 0.
/// </summary>
public sealed class WavelengthScale
{
    private readonly double[] _wavelengths;
    private readonly double _first;
    private readonly double _step;

    private WavelengthScale(
        WavelengthSampling sampling, double[] wavelengths, double first, double step, Medium medium, VelocityFrame frame)
    {
        Sampling = sampling;
        _wavelengths = wavelengths;
        _first = first;
        _step = step;
        Medium = medium;
        Frame = frame;
    }

    /// <summary>How the wavelengths are spaced.</summary>
    public WavelengthSampling Sampling { get; }

    /// <summary>Air or vacuum.</summary>
    public Medium Medium { get; }

    /// <summary>The velocity frame.</summary>
    public VelocityFrame Frame { get; }

    /// <summary>The step a pixel: Å of a linear scale, ln λ of a logarithmic one, NaN of a table.</summary>
    internal double Step => _step;

    /// <summary>Number of pixels.</summary>
    public int Count => _wavelengths.Length;

    /// <summary>Wavelengths at the pixel centres, Å; <see cref="Count"/> values, strictly increasing.</summary>
    public ReadOnlySpan<double> WavelengthsAngstrom => _wavelengths;

    /// <summary>First and last pixel centre.</summary>
    public WavelengthRange Range => new(_wavelengths[0], _wavelengths[^1]);

    /// <summary>Makes a scale of equal steps in wavelength.</summary>
    /// <param name="firstAngstrom">Wavelength of pixel 0, Å; above 0.</param>
    /// <param name="stepAngstrom">Å a pixel; above 0.</param>
    /// <param name="count">Number of pixels; at least 1.</param>
    /// <param name="medium">Air or vacuum.</param>
    /// <param name="frame">The velocity frame.</param>
    /// <exception cref="ArgumentException">A value is out of range.</exception>
    public static WavelengthScale Linear(
        double firstAngstrom, double stepAngstrom, int count, Medium medium, VelocityFrame frame = VelocityFrame.Unknown)
    {
        Guard.Positive(firstAngstrom, nameof(firstAngstrom), "Å");
        Guard.Positive(stepAngstrom, nameof(stepAngstrom), "Å");
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        var wavelengths = new double[count];
        for (int i = 0; i < count; i++)
        {
            wavelengths[i] = firstAngstrom + (i * stepAngstrom);
        }

        CheckIncreasing(wavelengths);
        return new WavelengthScale(WavelengthSampling.Linear, wavelengths, firstAngstrom, stepAngstrom, medium, frame);
    }

    /// <summary>Makes a scale of equal steps in the natural logarithm of wavelength.</summary>
    /// <param name="firstAngstrom">Wavelength of pixel 0, Å; above 0.</param>
    /// <param name="logStep">Step of ln λ a pixel; above 0.</param>
    /// <param name="count">Number of pixels; at least 1.</param>
    /// <param name="medium">Air or vacuum.</param>
    /// <param name="frame">The velocity frame.</param>
    /// <exception cref="ArgumentException">A value is out of range.</exception>
    public static WavelengthScale LogLinear(
        double firstAngstrom, double logStep, int count, Medium medium, VelocityFrame frame = VelocityFrame.Unknown)
    {
        Guard.Positive(firstAngstrom, nameof(firstAngstrom), "Å");
        Guard.Positive(logStep, nameof(logStep), "(ln Å)");
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        var wavelengths = new double[count];
        for (int i = 0; i < count; i++)
        {
            wavelengths[i] = firstAngstrom * Math.Exp(i * logStep);
        }

        CheckIncreasing(wavelengths);
        return new WavelengthScale(WavelengthSampling.LogLinear, wavelengths, firstAngstrom, logStep, medium, frame);
    }

    /// <summary>Makes a scale from a table of wavelengths.</summary>
    /// <param name="wavelengthsAngstrom">Å, one a pixel; finite, above 0 and strictly increasing; copied.</param>
    /// <param name="medium">Air or vacuum.</param>
    /// <param name="frame">The velocity frame.</param>
    /// <exception cref="ArgumentException">The table is empty, or a value is out of order or out of range.</exception>
    public static WavelengthScale Tabulated(
        ReadOnlySpan<double> wavelengthsAngstrom, Medium medium, VelocityFrame frame = VelocityFrame.Unknown) =>
        FromOwned(wavelengthsAngstrom.ToArray(), medium, frame);

    /// <summary>Makes a scale from a table that the caller gives up.</summary>
    internal static WavelengthScale FromOwned(double[] wavelengthsAngstrom, Medium medium, VelocityFrame frame)
    {
        if (wavelengthsAngstrom.Length == 0)
        {
            throw new ArgumentException("A wavelength scale needs at least one pixel.", nameof(wavelengthsAngstrom));
        }

        CheckIncreasing(wavelengthsAngstrom);
        return new WavelengthScale(
            WavelengthSampling.Tabulated, wavelengthsAngstrom, wavelengthsAngstrom[0], double.NaN, medium, frame);
    }

    /// <summary>The wavelength at a fractional pixel index, Å; extrapolated with the step at the end outside 0 to Count − 1.</summary>
    /// <param name="index">Fractional index, pixel centres at whole numbers.</param>
    public double WavelengthAngstrom(double index)
    {
        switch (Sampling)
        {
            case WavelengthSampling.Linear:
                return _first + (index * _step);
            case WavelengthSampling.LogLinear:
                return _first * Math.Exp(index * _step);
            default:
                if (Count == 1)
                {
                    return _first;
                }

                int i = Math.Clamp((int)Math.Floor(index), 0, Count - 2);
                return _wavelengths[i] + ((index - i) * (_wavelengths[i + 1] - _wavelengths[i]));
        }
    }

    /// <summary>The fractional pixel index of a wavelength; extrapolated outside the range; 0 for a one-pixel table.</summary>
    /// <param name="wavelengthAngstrom">Wavelength, Å; above 0.</param>
    public double IndexOf(double wavelengthAngstrom)
    {
        switch (Sampling)
        {
            case WavelengthSampling.Linear:
                return (wavelengthAngstrom - _first) / _step;
            case WavelengthSampling.LogLinear:
                return Math.Log(wavelengthAngstrom / _first) / _step;
            default:
                if (Count == 1)
                {
                    return 0.0;
                }

                int found = Array.BinarySearch(_wavelengths, wavelengthAngstrom);
                if (found >= 0)
                {
                    return found;
                }

                int i = Math.Clamp(~found - 1, 0, Count - 2);
                return i + ((wavelengthAngstrom - _wavelengths[i]) / (_wavelengths[i + 1] - _wavelengths[i]));
        }
    }

    /// <summary>The index of the first pixel whose centre is not below a wavelength; <see cref="Count"/> where none is.</summary>
    /// <param name="wavelengthAngstrom">Wavelength, Å.</param>
    public int FirstIndexAtOrAbove(double wavelengthAngstrom)
    {
        int found = Array.BinarySearch(_wavelengths, wavelengthAngstrom);
        return found >= 0 ? found : ~found;
    }

    /// <summary>The edge between pixel <c>index − 1</c> and pixel <c>index</c>, Å: half way between their centres.</summary>
    /// <param name="index">0 to Count, both included.</param>
    public double EdgeAngstrom(int index)
    {
        if (Sampling == WavelengthSampling.Tabulated && index > 0 && index < Count)
        {
            return 0.5 * (_wavelengths[index - 1] + _wavelengths[index]);
        }

        return WavelengthAngstrom(index - 0.5);
    }

    /// <summary>The width of a pixel, Å, from edge to edge; NaN where a table has one pixel only.</summary>
    /// <param name="index">0 to Count − 1.</param>
    public double PixelWidthAngstrom(int index) =>
        Sampling == WavelengthSampling.Linear ? _step
        : Count == 1 ? double.NaN
        : EdgeAngstrom(index + 1) - EdgeAngstrom(index);

    /// <summary>The same wavelengths said to be in another medium; nothing is converted.</summary>
    /// <param name="medium">What the wavelengths are.</param>
    public WavelengthScale WithMedium(Medium medium) =>
        new(Sampling, _wavelengths, _first, _step, medium, Frame);

    /// <summary>The same wavelengths said to be in another frame; nothing is shifted.</summary>
    /// <param name="frame">What the wavelengths are.</param>
    public WavelengthScale WithFrame(VelocityFrame frame) =>
        new(Sampling, _wavelengths, _first, _step, Medium, frame);

    /// <summary>All wavelengths multiplied by a Doppler factor, in a new frame.</summary>
    /// <param name="factor">1 + z; above 0.</param>
    /// <param name="frame">The frame of the result.</param>
    public WavelengthScale Scaled(double factor, VelocityFrame frame)
    {
        Guard.Positive(factor, nameof(factor), "");
        var scaled = new double[Count];
        System.Numerics.Tensors.TensorPrimitives.Multiply(_wavelengths, factor, scaled);
        double step = Sampling == WavelengthSampling.Linear ? _step * factor : _step;
        return new WavelengthScale(Sampling, scaled, _first * factor, step, Medium, frame);
    }

    /// <summary>A run of pixels.</summary>
    /// <param name="start">First index.</param>
    /// <param name="count">Number of pixels; at least 1.</param>
    public WavelengthScale Slice(int start, int count)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        double[] slice = _wavelengths.AsSpan(start, count).ToArray();
        return new WavelengthScale(Sampling, slice, slice[0], _step, Medium, Frame);
    }

    private static void CheckIncreasing(ReadOnlySpan<double> wavelengths)
    {
        double previous = 0.0;
        for (int i = 0; i < wavelengths.Length; i++)
        {
            double value = wavelengths[i];
            if (!(value > previous) || double.IsInfinity(value))
            {
                throw new ArgumentException(string.Create(
                    CultureInfo.InvariantCulture,
                    $"The wavelength at index {i} is {value} Å after {previous} Å; wavelengths must be finite, positive and strictly increasing."));
            }

            previous = value;
        }
    }
}
