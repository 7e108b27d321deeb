using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using MathNet.Numerics.Distributions;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>One spectrum against one template, from the correlation to the result.</summary>
internal sealed class VelocityRun
{
    /// <summary>Standard deviations of the widenings tried where the lines look wider than the template, km/s.</summary>
    private static readonly double[] s_widenings = [15.0, 45.0, 110.0];

    /// <summary>Lines look wider than the template above this ratio of the widths of the peaks.</summary>
    private const double WiderRatio = 1.25;

    /// <summary>A wider template is taken where its peak is higher by this factor.</summary>
    private const double BetterRatio = 1.03;

    /// <summary>Lines that belong together scatter by less than this many standard deviations of their profile.</summary>
    private const double LargestScatter = 2.0;

    /// <summary>So many lines are needed to know their scatter.</summary>
    private const int FewestScattered = 6;

    /// <summary>A peak wider than the range cannot be set against its surroundings: it must stand out by this much more.</summary>
    private const double UnboundedFactor = 2.0;

    /// <summary>FWHM in pixels of an instrument that samples as is usual, where nothing is known; common practice, no source.</summary>
    private const double UsualSampling = 2.2;

    private readonly ResidualSpectrum _residual;
    private readonly CorrelationSearch _search;
    private readonly LineTemplate _template;
    private readonly string _name;
    private readonly VelocityOptions _options;
    private readonly Spectrum _spectrum;
    private readonly List<Remark> _remarks;
    private readonly double _stepKmPerS;

    /// <summary>Joins spectrum and templates, and chooses the member whose correlation is highest.</summary>
    internal VelocityRun(VelocityMeasurer.PreparedSpectrum prepared, TemplateFamily family, VelocityOptions options)
    {
        _spectrum = prepared.Spectrum;
        _residual = prepared.Residual;
        _search = prepared.Search;
        _name = family.Name;
        _options = options;
        _remarks = [.. prepared.Remarks];
        _stepKmPerS = PhysicalConstants.SpeedOfLightKmPerS * _search.Grid.LogStep;
        _template = family.Members.Count == 1 ? family.Members[0] : Best(family);
    }

    /// <summary>Resolving power of the instrument; NaN where unknown.</summary>
    private double ResolvingPower => _options.ResolvingPower > 0.0 ? _options.ResolvingPower : _spectrum.Metadata.ResolvingPower ?? double.NaN;

    /// <summary>Measures.</summary>
    internal VelocityResult Result()
    {
        TemplateTransform? transform = _template.TransformOn(_search.Grid, _residual.Assumed);
        if (transform is null || !transform.HasAbsorption)
        {
            return VelocityMeasurer.Nothing(_name, VelocityStatus.OffSpectrum);
        }

        double narrowest = _template.WidthsKnown ? 0.0 : InstrumentVariance();
        (double[] c, SearchPeak peak, double broadening) = Search(transform, narrowest);
        if (peak.AtEnd || !(peak.Significance > Threshold(peak)))
        {
            return NoPeak(c, peak);
        }

        double start = peak.Lag * _search.Grid.LogStep;
        bool wider = broadening > narrowest || IsWider(peak, transform, narrowest);
        VelocityFit fit = Fit(transform, start, Reach(peak), StartingWidth(peak, transform, narrowest), !_template.WidthsKnown || wider);

        // Neither a fit nor a peak with two sides: nothing that could be given an error.
        if (IsScattered(fit, transform) || IsBoundless(fit, peak) || (!IsFitted(fit) && double.IsNaN(peak.Width)))
        {
            return NoPeak(c, peak);
        }

        SecondStar? pair = _options.SecondComponent && IsFitted(fit)
            ? SecondStar.Find(_residual, transform, c, peak, fit, Reach(peak))
            : null;
        if (pair is null)
        {
            return Summarize(c, peak, fit, component: 1, components: 1);
        }

        VelocityResult second = Summarize(c, pair.Peak, pair.SecondFit, component: 2, components: 2);
        VelocityResult first = Summarize(c, peak, pair.FirstFit, component: 1, components: 2);
        return first.With(first.Measurement, second);
    }

    /// <summary>Whether a weak peak asks for lines wider than any star's: then bands or a bent continuum were matched, not lines.</summary>
    private bool IsBoundless(VelocityFit fit, SearchPeak peak) =>
        fit.Broadening >= VelocityFit.LargestBroadening && peak.Significance < UnboundedFactor * UnboundedFactor * Threshold(peak);

    /// <summary>How far the fit may move from the peak: three quarters of its width, or an eighth of the range where it is wider than that.</summary>
    private double Reach(SearchPeak peak) =>
        _search.Grid.LogStep * Math.Max(3.0, double.IsNaN(peak.Width) ? 0.25 * _search.Grid.MaximumLag : 0.75 * peak.Width);

    /// <summary>Whether the lines, one by one, lie further from each other than they are wide: then the peak came by chance.</summary>
    private static bool IsScattered(VelocityFit fit, TemplateTransform transform)
    {
        double fwhm2 = PhysicalConstants.FwhmPerSigma * PhysicalConstants.FwhmPerSigma;
        double width = Math.Sqrt((transform.FwhmKmPerS * transform.FwhmKmPerS) + (fwhm2 * fit.Broadening)) / PhysicalConstants.FwhmPerSigma;
        return fit.Joint.Used >= FewestScattered
            && Math.Sqrt(fit.Joint.Scatter) * PhysicalConstants.SpeedOfLightKmPerS > LargestScatter * width;
    }

    private LineTemplate Best(TemplateFamily family)
    {
        LineTemplate best = family.Members[0];
        double highest = double.NegativeInfinity;
        foreach (LineTemplate member in family.Members)
        {
            TemplateTransform? transform = member.TransformOn(_search.Grid, _residual.Assumed);
            if (transform is { HasAbsorption: true })
            {
                double[] c = _search.Correlate(transform, member.WidthsKnown ? 0.0 : InstrumentVariance());
                double height = System.Numerics.Tensors.TensorPrimitives.Max<double>(c);
                if (height > highest)
                {
                    highest = height;
                    best = member;
                }
            }
        }

        return best;
    }

    private VelocityFit Fit(TemplateTransform transform, double start, double reach, double broadening, bool fitBroadening)
    {
        VelocityFit fit = VelocityFit.Run(_residual, transform.Profile, start, reach, broadening, fitBroadening);

        // Windows are cut for the width at the start: cut them anew where it was far too small or too large.
        if (fit.Converged && fitBroadening && (fit.Broadening > 2.0 * broadening + 20.0 || fit.Broadening < 0.3 * broadening))
        {
            fit = VelocityFit.Run(_residual, transform.Profile, fit.LogShift, reach, fit.Broadening, fitBroadening);
        }

        return fit;
    }

    /// <summary>Correlates with the template as it is, and wider where the lines look wider or are not found.</summary>
    private (double[] Correlation, SearchPeak Peak, double Broadening) Search(TemplateTransform transform, double narrowest)
    {
        double[] best = _search.Correlate(transform, narrowest);
        SearchPeak peak = SearchPeak.Find(best, _residual.Used);
        double broadening = narrowest;
        if (!transform.Profile.CanBroaden || (peak.Significance > Threshold(peak) && !IsWider(peak, transform, narrowest)))
        {
            return (best, peak, broadening);
        }

        foreach (double sigma in s_widenings)
        {
            double variance = narrowest + (sigma * sigma);
            double[] c = _search.Correlate(transform, variance);
            SearchPeak wide = SearchPeak.Find(c, _residual.Used);
            if (!wide.AtEnd && wide.Height > BetterRatio * peak.Height)
            {
                best = c;
                peak = wide;
                broadening = variance;
            }
        }

        return (best, peak, broadening);
    }

    /// <summary>Variance of the instrument's profile in velocity, (km/s)²; of the usual sampling where nothing is known.</summary>
    private double InstrumentVariance()
    {
        double fwhm = ResolvingPower > 0.0 ? PhysicalConstants.SpeedOfLightKmPerS / ResolvingPower : UsualSampling * _residual.PixelKmPerS;
        double sigma = fwhm / PhysicalConstants.FwhmPerSigma;
        return sigma * sigma;
    }

    /// <summary>Squared FWHM of the lines of the spectrum, from the width of the peak: what the template's own lines put in is taken off.</summary>
    private double LineWidthSquared(SearchPeak peak, TemplateTransform transform, double broadening)
    {
        double width = peak.Width * _stepKmPerS;
        double fwhm2 = PhysicalConstants.FwhmPerSigma * PhysicalConstants.FwhmPerSigma;
        return (width * width) - (transform.FwhmKmPerS * transform.FwhmKmPerS) - (fwhm2 * broadening);
    }

    private bool IsWider(SearchPeak peak, TemplateTransform transform, double broadening)
    {
        double fwhm2 = PhysicalConstants.FwhmPerSigma * PhysicalConstants.FwhmPerSigma;
        double expected = 2.0 * ((transform.FwhmKmPerS * transform.FwhmKmPerS) + (fwhm2 * broadening));
        double width = peak.Width * _stepKmPerS;
        return !(width * width < WiderRatio * WiderRatio * expected);
    }

    private double StartingWidth(SearchPeak peak, TemplateTransform transform, double narrowest)
    {
        double fwhm2 = PhysicalConstants.FwhmPerSigma * PhysicalConstants.FwhmPerSigma;
        double excess = (LineWidthSquared(peak, transform, narrowest) - (transform.FwhmKmPerS * transform.FwhmKmPerS)) / fwhm2;
        bool wider = IsWider(peak, transform, narrowest);
        return _template.WidthsKnown && !wider ? 0.0 : double.IsNaN(excess) ? narrowest : Math.Max(excess, narrowest);
    }

    /// <summary>
    /// How many standard deviations noise alone reaches once in 1/p searches: the range holds as many chances as peaks fit in.
    /// </summary>
    private double Threshold(SearchPeak peak)
    {
        double chances = Math.Max(1.0, 2.0 * _search.Grid.MaximumLag / Math.Max(double.IsNaN(peak.Width) ? 2.0 : peak.Width, 1.0));
        double sigmas = Normal.InvCDF(0.0, 1.0, 1.0 - (_options.FalseAlarmProbability / chances));
        return double.IsNaN(peak.Width) ? UnboundedFactor * sigmas : sigmas;
    }

    private static bool IsFitted(VelocityFit fit) => fit.Converged && fit.Joint.Used > 0 && fit.Joint.Variance > 0.0;

    private VelocityResult NoPeak(double[] c, SearchPeak peak)
    {
        if (peak.AtEnd && peak.Significance > Threshold(peak))
        {
            _remarks.Add(new Remark(
                "edge-of-range", "The correlation is highest at an end of the range searched: search a wider range."));
        }

        var measurement = new VelocityMeasurement
        {
            Template = _name,
            Status = VelocityStatus.NoPeak,
            PeakHeight = peak.Height,
            Pixels = _residual.Used,
            Components = 0,
            Warnings = _remarks,
        };
        return new VelocityResult(measurement, Velocities(c.Length), c) { Significance = peak.Significance };
    }

    private VelocityResult Summarize(double[] c, SearchPeak peak, VelocityFit fit, int component, int components)
    {
        double peakKmPerS = Velocity(peak.Lag * _search.Grid.LogStep);
        bool fitted = IsFitted(fit);
        double shift = fitted ? fit.LogShift : peak.Lag * _search.Grid.LogStep;
        double sigma = fitted
            ? Math.Sqrt(fit.Joint.Variance)
            : Math.Max(peak.ZuckerError, double.IsNaN(peak.TonryDavisError) ? 0.0 : peak.TonryDavisError) * _search.Grid.LogStep;
        if (!fitted)
        {
            _remarks.Add(new Remark(
                "peak-only", "The template could not be fitted to the lines: velocity and error are those of the correlation peak."));
        }

        AddLineRemarks(fit, fitted);
        double velocity = Velocity(shift);
        double perShift = KmPerShift(velocity);
        var observed = new Measured(velocity, sigma * perShift);
        bool reduced = _spectrum.Scale.Frame is VelocityFrame.Barycentric or VelocityFrame.Heliocentric or VelocityFrame.Rest;
        var measurement = new VelocityMeasurement
        {
            Template = _name,
            Status = reduced ? VelocityStatus.Measured : VelocityStatus.Topocentric,
            VelocityKmPerS = reduced ? observed : Measured.None,
            TopocentricKmPerS = reduced ? double.NaN : velocity,
            TopocentricUncertaintyKmPerS = reduced ? double.NaN : observed.Uncertainty,
            BarycentricCorrectionKmPerS = reduced ? _spectrum.Metadata.AppliedCorrectionKmPerS ?? double.NaN : double.NaN,
            PeakHeight = peak.Height,
            PeakFwhmKmPerS = peak.Width * _stepKmPerS,
            RValue = peak.Ratio,
            ProjectedRotationKmPerS = fitted ? Rotation(fit) : Measured.None,
            PhotonLimitKmPerS = fitted ? fit.PhotonSigma * perShift : double.NaN,
            Pixels = fitted ? fit.Pixels : _residual.Used,
            Components = components,
            Component = component,
            Warnings = [.. _remarks],
        };
        return new VelocityResult(measurement, Velocities(c.Length), c)
        {
            Frame = _spectrum.Scale.Frame,
            ObservedKmPerS = observed,
            PeakKmPerS = new Measured(peakKmPerS, peak.ZuckerError * _search.Grid.LogStep * KmPerShift(peakKmPerS)),
            TonryDavisErrorKmPerS = peak.TonryDavisError * _stepKmPerS,
            Significance = peak.Significance,
            LineScatterKmPerS = fitted ? Math.Sqrt(fit.Joint.Scatter) * perShift : double.NaN,
            ReducedChiSquare = fitted ? fit.ReducedChiSquare : double.NaN,
            Depth = fitted ? fit.Depth : double.NaN,
            BroadeningFwhmKmPerS = fitted ? PhysicalConstants.FwhmPerSigma * Math.Sqrt(fit.Broadening) : double.NaN,
            LinesUsed = fitted ? fit.Joint.Used : 0,
            LinesLeftOut = fitted ? fit.States.Length - fit.Joint.Used : 0,
        };
    }

    private void AddLineRemarks(VelocityFit fit, bool fitted)
    {
        var names = new StringBuilder();
        int outliers = 0;
        for (int g = 0; g < fit.States.Length; g++)
        {
            if (fit.States[g].Fate == WindowFate.Emission)
            {
                names.Append(names.Length == 0 ? "" : ", ").Append(fit.Windows[g].Name);
            }

            outliers += fit.States[g].Fate == WindowFate.Outlier ? 1 : 0;
        }

        if (names.Length != 0)
        {
            _remarks.Add(new Remark("emission-left-out", $"Lines in emission were left out of the velocity: {names}."));
        }

        if (fitted && outliers > 0.2 * fit.States.Length)
        {
            _remarks.Add(new Remark("lines-disagree", string.Create(
                CultureInfo.InvariantCulture,
                $"{outliers} of {fit.States.Length} lines were left out because their velocities lie off the others: does the template suit the star?")));
        }

        if (fitted && fit.Joint.Used == 1)
        {
            _remarks.Add(new Remark("one-line", "The velocity rests on one line, or one blend: its scatter from line to line is unknown."));
        }
    }

    /// <summary>
    /// v sin i from the widening beyond the instrument: a rotation profile with limb darkening ε = 0.6 has the standard deviation
    /// √((1 − ε)/4 + 2ε/15)/(1 − ε/3) v sin i (second moment of Gray 2005, eq. 18.14). Given where it is at least the
    /// instrument's FWHM/2 and 5 km/s, below which turbulence cannot be told from rotation, and known to a fifth.
    /// </summary>
    private Measured Rotation(VelocityFit fit)
    {
        const double LimbDarkening = 0.6;
        const double LeastKmPerS = 5.0;
        if (!(fit.BroadeningSigma > 0.0) || (!_template.WidthsKnown && !(ResolvingPower > 0.0)))
        {
            return Measured.None;
        }

        double second = (((1.0 - LimbDarkening) / 4.0) + (2.0 * LimbDarkening / 15.0)) / (1.0 - (LimbDarkening / 3.0));
        double instrument = _template.WidthsKnown ? 0.0 : InstrumentVariance();
        double variance = (fit.Broadening - instrument) / second;
        double rotation = Math.Sqrt(Math.Max(variance, 0.0));
        double uncertainty = 0.5 * fit.BroadeningSigma * Math.Sqrt(Math.Max(fit.ReducedChiSquare, 1.0)) / second / Math.Max(rotation, 1e-3);
        double least = Math.Max(LeastKmPerS, 0.5 * PhysicalConstants.FwhmPerSigma * Math.Sqrt(instrument));
        return rotation > least && uncertainty < 0.2 * rotation ? new Measured(rotation, uncertainty) : Measured.None;
    }

    private double[] Velocities(int count)
    {
        var velocities = new double[count];
        for (int k = 0; k < count; k++)
        {
            velocities[k] = Velocity((k - (count / 2)) * _search.Grid.LogStep);
        }

        return velocities;
    }

    /// <summary>v = c tanh ζ: the relativistic Doppler formula for ζ = ln(1 + z).</summary>
    private static double Velocity(double logShift) => PhysicalConstants.SpeedOfLightKmPerS * Math.Tanh(logShift);

    private static double KmPerShift(double velocityKmPerS)
    {
        double beta = velocityKmPerS / PhysicalConstants.SpeedOfLightKmPerS;
        return PhysicalConstants.SpeedOfLightKmPerS * (1.0 - (beta * beta));
    }
}
