using System;
using StarLines.LineLists;

namespace StarLines.Lines;

/// <summary>One line of the list on its way to a measurement; all wavelengths in the spectrum's frame, Å.</summary>
internal sealed class LineTask
{
    internal LineTask(RestLine rest, double predicted)
    {
        Rest = rest;
        Predicted = predicted;
        Centre = predicted;
    }

    /// <summary>The line at rest.</summary>
    internal RestLine Rest { get; }

    /// <summary>Where the velocity puts the centre.</summary>
    internal double Predicted { get; }

    /// <summary>The width expected before the fit: of the list, the instrument, or lines like it.</summary>
    internal double ExpectedFwhm { get; set; } = double.NaN;

    /// <summary>Least full width at half maximum that the fit may take.</summary>
    internal double LeastFwhm { get; set; }

    /// <summary>Width of a pixel at the line.</summary>
    internal double PixelWidth { get; set; }

    /// <summary>The pixel nearest to the prediction.</summary>
    internal int Pixel { get; set; }

    /// <summary>Relative uncertainty of the global continuum at the line.</summary>
    internal double ContinuumSigma { get; set; }

    /// <summary>Significance found before the fit, signed; absorption positive.</summary>
    internal double Significance { get; set; }

    /// <summary>How it stands.</summary>
    internal LineStatus Status { get; set; } = LineStatus.Limit;

    /// <summary>Reservations.</summary>
    internal LineWarnings Warnings { get; set; }

    /// <summary>Whether it takes part in the fit of its group.</summary>
    internal bool Fitted { get; set; }

    /// <summary>Whether the width is held at the expected one, because the data do not determine it.</summary>
    internal bool WidthHeld { get; set; }

    /// <summary>How often it was allowed to be wider than expected.</summary>
    internal int Widenings { get; set; }

    /// <summary>Centre.</summary>
    internal double Centre { get; set; }

    /// <summary>Depth in units of the local continuum.</summary>
    internal double Depth { get; set; }

    /// <summary>First width of the profile.</summary>
    internal double Width { get; set; }

    /// <summary>Second width of the profile, where it has one.</summary>
    internal double SecondWidth { get; set; }

    /// <summary>Full width at half maximum.</summary>
    internal double Fwhm { get; set; }

    /// <summary>The full width for which the window of the latest fit was made.</summary>
    internal double WindowFwhm { get; set; }

    /// <summary>Whether the latest fit had the window that its result asks for.</summary>
    internal bool IsSettled => Math.Abs((Fwhm / WindowFwhm) - 1.0) < 0.25;

    /// <summary>Local continuum in units of the global one.</summary>
    internal double Continuum { get; set; } = 1.0;

    /// <summary>First pixel of the window.</summary>
    internal int First { get; set; }

    /// <summary>Last pixel of the window.</summary>
    internal int Last { get; set; }

    /// <summary>Number of the blend, 0 for a line fitted alone.</summary>
    internal int Blend { get; set; }

    /// <summary>Good pixels of the fit.</summary>
    internal int Pixels { get; set; }

    /// <summary>Reduced χ² of the fit.</summary>
    internal double ReducedChiSquare { get; set; } = double.NaN;

    /// <summary>Uncertainty of the centre.</summary>
    internal double CentreSigma { get; set; } = double.NaN;

    /// <summary>Uncertainty of the depth.</summary>
    internal double DepthSigma { get; set; } = double.NaN;

    /// <summary>Uncertainty of the full width at half maximum.</summary>
    internal double FwhmSigma { get; set; } = double.NaN;

    /// <summary>Equivalent width, Å.</summary>
    internal double EquivalentWidth { get; set; } = double.NaN;

    /// <summary>Its total uncertainty, Å.</summary>
    internal double TotalSigma { get; set; } = double.NaN;

    /// <summary>Its uncertainty by the noise alone, Å.</summary>
    internal double NoiseSigma { get; set; } = double.NaN;

    /// <summary>Uncertainty of c × equivalent width, Å: what counts for the flux of the line.</summary>
    internal double FluxSigma { get; set; } = double.NaN;

    /// <summary>Relative uncertainty of the local continuum after the fit.</summary>
    internal double ContinuumPosterior { get; set; } = double.NaN;

    /// <summary>Equivalent width by direct summation, Å.</summary>
    internal Measured Direct { get; set; } = Measured.None;

    /// <summary>Noise part of the uncertainty of the direct summation, Å.</summary>
    internal double DirectNoise { get; set; } = double.NaN;

    /// <summary>Three standard deviations of the equivalent width at the expected width, Å.</summary>
    internal double Limit { get; set; } = double.NaN;

    /// <summary>Whether the line lies in the spectrum and its pixels can be used.</summary>
    internal bool Usable => Status is LineStatus.Limit or LineStatus.Measured;
}
