using System;
using System.Collections.Generic;
using StarLines.Profiles;

namespace StarLines.Lines;

/// <summary>Finds where to start: expected width, centre, depth and significance of each line, before anything is fitted.</summary>
internal sealed class LineFinder
{
    /// <summary>Ratio of neighbouring widths that are tried; the filter loses 3 % of its significance half way between.</summary>
    private const double WidthStep = 1.4142135623730951;

    /// <summary>Widest line that is tried where no width is known, km/s: beyond the Balmer lines of a white dwarf or a nova.</summary>
    private const double WidestKmPerS = 3000.0;

    /// <summary>Significance from which a line tells its own width.</summary>
    private const double StrongSignificance = 12.0;

    /// <summary>Significance from which a line takes part in the median width of the spectrum.</summary>
    private const double PlainWidthSignificance = 6.0;

    /// <summary>Strong lines needed to scale the expected widths by what they show.</summary>
    private const int LeastStrongLines = 5;

    /// <summary>Significance above which the start needs no search for the centre: the fit itself finds it.</summary>
    private const double PlainSignificance = 6.0;

    /// <summary>Fall of χ² gain with width that ends the climb: noise alone does less.</summary>
    private const double ClimbTolerance = 6.0;

    /// <summary>Extra significance asked of a line that is found only off its predicted place: the price of looking in several places.</summary>
    private const double SearchPenalty = 1.0;

    /// <summary>Narrowest line that is tried where neither width nor resolving power is known, pixels.</summary>
    private const double NarrowestPixels = 2.0;

    /// <summary>Least width of a fit, pixels: below it the flux of a pixel no longer tells the width.</summary>
    private const double LeastPixels = 0.5;

    /// <summary>Least width of a fit in units of the instrument's: stated resolving powers are good to a few tenths.</summary>
    private const double LeastInstrument = 0.6;

    /// <summary>A stellar line is a little wider than the instrument's profile.</summary>
    private const double TypicalOverInstrument = 1.25;

    /// <summary>Integral of a Gaussian of unit height over its full width, √(π/(4 ln 2)).</summary>
    private const double GaussianAreaPerFwhm = 1.0644670194312262;

    private readonly NormalizedPixels _pixels;
    private readonly LineMeasureOptions _options;
    private readonly double _resolvingPower;
    private readonly List<double> _relativeWidths = [];

    internal LineFinder(NormalizedPixels pixels, LineMeasureOptions options, double resolvingPower)
    {
        _pixels = pixels;
        _options = options;
        _resolvingPower = resolvingPower;
    }

    /// <summary>Sets the start of every usable line.</summary>
    internal void Start(LineTask[] tasks)
    {
        for (int i = 0; i < tasks.Length; i++)
        {
            if (tasks[i].Usable)
            {
                ExpectWidth(tasks, i);
            }
        }

        double common = CommonRelativeWidth();
        foreach (LineTask task in tasks)
        {
            if (task.Usable)
            {
                if (double.IsNaN(task.ExpectedFwhm))
                {
                    task.ExpectedFwhm = Math.Max(task.LeastFwhm, common * task.Predicted);
                }

                if (IsMasked(task))
                {
                    task.Status = LineStatus.Masked;
                    continue;
                }

                FindCentre(task);
            }
        }
    }

    /// <summary>Looks once more for lines that were not found, now that the others are fitted and taken out.</summary>
    internal void LookAgain(LineTask[] tasks)
    {
        ScaleExpectedWidths(tasks);
        foreach (LineTask task in tasks)
        {
            if (task.Status == LineStatus.Limit)
            {
                task.Centre = task.Predicted;
                FindCentre(task);
            }
        }
    }

    /// <summary>
    /// Where the strong lines came out wider or narrower than expected (rotation, another instrument than that of the list), so
    /// are the weak ones.
    /// </summary>
    private void ScaleExpectedWidths(LineTask[] tasks)
    {
        _relativeWidths.Clear();
        foreach (LineTask task in tasks)
        {
            if (task.Status == LineStatus.Measured && !task.WidthHeld && Math.Abs(task.Significance) > StrongSignificance)
            {
                _relativeWidths.Add(task.Fwhm / task.ExpectedFwhm);
            }
        }

        if (_relativeWidths.Count < LeastStrongLines)
        {
            return;
        }

        _relativeWidths.Sort();
        double ratio = _relativeWidths[_relativeWidths.Count / 2];
        foreach (LineTask task in tasks)
        {
            if (task.Usable && Math.Abs(task.Significance) <= StrongSignificance)
            {
                task.ExpectedFwhm = Math.Max(task.LeastFwhm, task.ExpectedFwhm * ratio);
            }
        }
    }

    /// <summary>Sets the limit of a line that was not found: three standard deviations of its equivalent width at the expected width.</summary>
    internal void SetLimit(LineTask task)
    {
        const double LimitSigma = 3.0;
        if (task.Status == LineStatus.Limit)
        {
            task.Fwhm = task.ExpectedFwhm;
            task.Centre = task.Predicted;
            double sigma = Respond(task, task.Predicted, task.ExpectedFwhm).DepthSigma(task.ContinuumSigma);
            task.Limit = LimitSigma * sigma * GaussianAreaPerFwhm * task.ExpectedFwhm;
        }
    }

    /// <summary>The response at a place with a given full width at half maximum, Å.</summary>
    internal FilterResponse Respond(LineTask task, double centre, double fwhm)
    {
        double sigma = fwhm / PhysicalConstants.FwhmPerSigma;
        if (_options.Sampling == PixelSampling.Integrated)
        {
            // The mean over a pixel widens a Gaussian by the variance of the pixel.
            sigma = Math.Sqrt((sigma * sigma) + (task.PixelWidth * task.PixelWidth / 12.0));
        }

        double reach = MatchedFilter.ReachInSigma * sigma;
        (int first, int last) = _pixels.Window(task.Pixel, centre - reach, centre + reach);
        int count = last - first + 1;
        return MatchedFilter.Apply(
            _pixels.Spectrum.Scale.WavelengthsAngstrom.Slice(first, count),
            _pixels.Flux.Slice(first, count),
            _pixels.Model.AsSpan(first, count),
            _pixels.Weight.Slice(first, count),
            centre,
            sigma);
    }

    /// <summary>Whether less than half of the pixels within a full width of the centre can be used.</summary>
    private bool IsMasked(LineTask task)
    {
        double reach = Math.Max(task.ExpectedFwhm, task.PixelWidth);
        (int first, int last) = _pixels.Window(task.Pixel, task.Predicted - reach, task.Predicted + reach);
        int used = 0;
        for (int i = first; i <= last; i++)
        {
            used += _pixels.IsUsed(i) ? 1 : 0;
        }

        return 2 * used < last - first + 1;
    }

    private void ExpectWidth(LineTask[] tasks, int index)
    {
        LineTask task = tasks[index];
        double instrument = task.Predicted / _resolvingPower;
        bool knowsInstrument = double.IsFinite(instrument);
        task.LeastFwhm = Math.Max(LeastPixels * task.PixelWidth, knowsInstrument ? LeastInstrument * instrument : 0.0);
        double listed = task.Rest.FwhmAngstrom * task.Predicted / task.Rest.WavelengthAngstrom;
        if (listed > 0.0)
        {
            task.ExpectedFwhm = Math.Max(knowsInstrument ? Math.Max(listed, instrument) : listed, task.LeastFwhm);
            return;
        }

        double narrowest = Math.Max(knowsInstrument ? instrument : 0.0, (knowsInstrument ? 1.0 : NarrowestPixels) * task.PixelWidth);
        double width = Climb(task, narrowest, out double significance);
        if (Math.Abs(significance) < PlainWidthSignificance || HasNeighbour(tasks, index, 1.5 * width))
        {
            return;
        }

        _relativeWidths.Add(width / task.Predicted);
        if (Math.Abs(significance) >= StrongSignificance)
        {
            task.ExpectedFwhm = width;
        }
    }

    /// <summary>Widens the filter while the line gains by it.</summary>
    private double Climb(LineTask task, double narrowest, out double significance)
    {
        double widest = Math.Max(2.0 * narrowest, task.Predicted * WidestKmPerS / PhysicalConstants.SpeedOfLightKmPerS);
        double bestWidth = narrowest;
        double bestGain = 0.0;
        significance = 0.0;
        for (double width = narrowest; width <= widest; width *= WidthStep)
        {
            FilterResponse response = Respond(task, task.Predicted, width);
            double gain = response.ChiSquareGain;
            if (gain > bestGain)
            {
                bestGain = gain;
                bestWidth = width;
                significance = response.Significance(task.ContinuumSigma);
            }
            else if (gain < bestGain - ClimbTolerance && gain < 0.9 * bestGain)
            {
                break;
            }
        }

        return bestWidth;
    }

    private static bool HasNeighbour(LineTask[] tasks, int index, double distance) =>
        (index > 0 && tasks[index].Predicted - tasks[index - 1].Predicted < distance)
        || (index < tasks.Length - 1 && tasks[index + 1].Predicted - tasks[index].Predicted < distance);

    /// <summary>Median width over wavelength of the lines that show one; without them that of the instrument, or three pixels.</summary>
    private double CommonRelativeWidth()
    {
        if (_relativeWidths.Count > 0)
        {
            _relativeWidths.Sort();
            return _relativeWidths[_relativeWidths.Count / 2];
        }

        if (double.IsFinite(1.0 / _resolvingPower))
        {
            return TypicalOverInstrument / _resolvingPower;
        }

        int middle = _pixels.Count / 2;
        return 3.0 * _pixels.PixelWidth(middle) / _pixels.Spectrum.Scale.WavelengthsAngstrom[middle];
    }

    private void FindCentre(LineTask task)
    {
        FilterResponse best = Respond(task, task.Predicted, task.ExpectedFwhm);
        task.Significance = best.Significance(task.ContinuumSigma);
        task.Depth = best.Depth;
        if (Math.Abs(task.Significance) < PlainSignificance)
        {
            Search(task, best);
        }

        task.Fwhm = task.ExpectedFwhm;
        task.Fitted = Math.Abs(task.Significance) >= _options.DetectionSignificance;
    }

    private void Search(LineTask task, FilterResponse atPrediction)
    {
        const int Steps = 4;
        double bestGain = atPrediction.ChiSquareGain;
        for (int step = -Steps; step <= Steps; step++)
        {
            double centre = task.Predicted + (_options.SearchFwhm * task.ExpectedFwhm * step / Steps);
            FilterResponse response = Respond(task, centre, task.ExpectedFwhm);
            double significance = response.Significance(task.ContinuumSigma);
            double penalized = Math.Max(0.0, Math.Abs(significance) - SearchPenalty);
            if (response.ChiSquareGain > bestGain && penalized > Math.Abs(task.Significance))
            {
                bestGain = response.ChiSquareGain;
                task.Significance = Math.CopySign(penalized, significance);
                task.Centre = centre;
                task.Depth = response.Depth;
            }
        }
    }
}
