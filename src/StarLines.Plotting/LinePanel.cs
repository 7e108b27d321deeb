using System;
using System.Collections.Generic;

namespace StarLines.Plotting;

/// <summary>What one panel of <see cref="LineFigure"/> shows: the pixels around a line, over the continuum, and the fit.</summary>
public sealed partial class LinePanel
{
    private readonly double[] _wavelengths;
    private readonly double[] _flux;
    private readonly double[] _sigma;
    private readonly double[] _model;
    private readonly bool[] _used;

    /// <summary>Makes a panel; the arrays are copied.</summary>
    /// <param name="title">The name of the line.</param>
    /// <param name="wavelengthsAngstrom">N wavelengths, Å, increasing; at least 1.</param>
    /// <param name="flux">N values of the flux over the continuum.</param>
    /// <param name="sigma">N standard deviations of them, or none.</param>
    /// <param name="model">N values of the fitted model over the continuum, NaN outside the fit; or none.</param>
    /// <param name="used">N flags, whether the fit used the pixel; or none where it used all.</param>
    /// <exception cref="ArgumentException">There is no pixel, or the lengths differ.</exception>
    public LinePanel(
        string title,
        ReadOnlySpan<double> wavelengthsAngstrom,
        ReadOnlySpan<double> flux,
        ReadOnlySpan<double> sigma = default,
        ReadOnlySpan<double> model = default,
        ReadOnlySpan<bool> used = default)
    {
        ArgumentNullException.ThrowIfNull(title);
        if (wavelengthsAngstrom.Length == 0)
        {
            throw new ArgumentException("A panel needs at least one pixel.", nameof(wavelengthsAngstrom));
        }

        Guard.SameLength(flux.Length, wavelengthsAngstrom.Length, nameof(flux));
        CheckOptional(sigma.Length, wavelengthsAngstrom.Length, nameof(sigma));
        CheckOptional(model.Length, wavelengthsAngstrom.Length, nameof(model));
        CheckOptional(used.Length, wavelengthsAngstrom.Length, nameof(used));
        Title = title;
        _wavelengths = wavelengthsAngstrom.ToArray();
        _flux = flux.ToArray();
        _sigma = sigma.ToArray();
        _model = model.ToArray();
        _used = used.ToArray();
    }

    /// <summary>The name of the line.</summary>
    public string Title { get; }

    /// <summary>Lines of text written under the name, such as the equivalent width.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];

    /// <summary>The centre of the line, Å; NaN for none.</summary>
    public double CentreAngstrom { get; init; } = double.NaN;

    /// <summary>The local continuum that the fit found, in units of the continuum.</summary>
    public double LocalContinuum { get; init; } = 1.0;

    /// <summary>Standard deviation of the continuum at the line, in units of the continuum; 0 for none.</summary>
    public double ContinuumSigma { get; init; }

    /// <summary>Centres of lines that were fitted together with this one, Å.</summary>
    public IReadOnlyList<double> NeighboursAngstrom { get; init; } = [];

    /// <summary>Wavelengths, Å.</summary>
    public ReadOnlySpan<double> WavelengthsAngstrom => _wavelengths;

    /// <summary>Flux over the continuum.</summary>
    public ReadOnlySpan<double> Flux => _flux;

    /// <summary>Standard deviations of the flux over the continuum, or none.</summary>
    public ReadOnlySpan<double> Sigma => _sigma;

    /// <summary>The model over the continuum, or none.</summary>
    public ReadOnlySpan<double> Model => _model;

    /// <summary>Whether the fit used the pixels, or none where it used all.</summary>
    public ReadOnlySpan<bool> Used => _used;

    private static void CheckOptional(int length, int expected, string name)
    {
        if (length != 0)
        {
            Guard.SameLength(length, expected, name);
        }
    }
}
