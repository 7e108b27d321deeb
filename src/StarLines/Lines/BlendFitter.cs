using System;
using StarLines.Fitting;
using StarLines.Profiles;

namespace StarLines.Lines;

/// <summary>Fits the lines of one window together and stores what came out. Its memory is kept from window to window.</summary>
internal sealed partial class BlendFitter
{
    /// <summary>No absorption line is deeper than the continuum is high; noise and undersampling are allowed for.</summary>
    private const double GreatestDepth = 1.5;

    /// <summary>No emission line is higher than this, in units of the continuum.</summary>
    private const double GreatestHeight = 1e6;

    /// <summary>How much wider than expected a line may come out.</summary>
    private const double GreatestWidthFactor = 4.0;

    /// <summary>The local continuum stays within a factor of this many: more is another object.</summary>
    private const double GreatestContinuumFactor = 2.0;

    /// <summary>Smallest uncertainty of the global continuum that counts, relative: where it is taken as exact.</summary>
    private const double LeastContinuumSigma = 1e-7;

    /// <summary>Residual, in standard deviations, from which a single pixel may be a hit: noise alone does so in 6e-7 of pixels.</summary>
    private const double OutlierSigma = 5.0;

    /// <summary>Share of the excess χ² that a hit alone must explain; a wrong profile spreads it over more pixels.</summary>
    private const double OutlierShare = 0.6;

    /// <summary>Significance from which a line that wants to be wider than expected is believed.</summary>
    private const double WideningSignificance = 10.0;

    /// <summary>How often a line may widen beyond its bound in one fit.</summary>
    private const int MostWidenings = 3;

    /// <summary>
    /// Significance below which the expected width counts as a datum, with an uncertainty of <see cref="WidthPrior"/>: a weak
    /// line alone may else settle on a single pixel or on the whole window.
    /// </summary>
    private const double WeakSignificance = 12.0;

    /// <summary>Uncertainty of the expected width of a weak line, in ln of the width: a factor of 1.6.</summary>
    private const double WidthPrior = 0.5;

    /// <summary>A pixel that the fit follows more closely than this cannot be judged.</summary>
    private const double MostLeverage = 0.9;

    /// <summary>Pixels dropped from one window at most: a hit takes one to three.</summary>
    private const int MostOutliers = 4;

    /// <summary>Warnings that a new fit decides anew.</summary>
    private const LineWarnings OfTheFit =
        LineWarnings.PoorFit | LineWarnings.AtBound | LineWarnings.NoConvergence | LineWarnings.Unresolved | LineWarnings.Blended;

    private readonly NormalizedPixels _pixels;
    private readonly LineMeasureOptions _options;
    private readonly ILineProfile _profile;
    private readonly BlendModel _model;
    private readonly FitWorkspace _workspace = new();
    private readonly double[] _widthGradient = new double[2];
    private double[] _parameters = [];
    private double[] _lower = [];
    private double[] _upper = [];
    private bool[] _held = [];
    private double[] _own = [];
    private double[] _amplitudes = [];
    private int[] _fitted = [];
    private readonly int[] _dropped = new int[MostOutliers];
    private int _outliers;
    private int _count;

    internal BlendFitter(NormalizedPixels pixels, LineMeasureOptions options, ILineProfile profile)
    {
        _pixels = pixels;
        _options = options;
        _profile = profile;
        _model = new BlendModel(profile, options.Sampling);
    }

    /// <summary>Fits the members of a group in a run of pixels.</summary>
    internal void Fit(LineTask[] tasks, ReadOnlySpan<int> members, int first, int last)
    {
        int reference = members[members.Length / 2];
        double origin = tasks[reference].Predicted;
        double continuumSigma = _options.IncludeContinuumError
            ? Math.Max(tasks[reference].ContinuumSigma, LeastContinuumSigma)
            : LeastContinuumSigma;
        Grow(members.Length);
        foreach (int member in members)
        {
            tasks[member].Warnings &= ~OfTheFit;
            tasks[member].WidthHeld = false;
            tasks[member].WindowFwhm = tasks[member].Fwhm;
        }

        Load(tasks, members, first, last, origin);
        _outliers = 0;
        while (Collect(tasks, members) > 0)
        {
            _model.Arrange(_count, continuumSigma);
            SetStart(tasks, origin);
            if (UsedPixels() <= _model.ParameterCount - 1)
            {
                Fail(tasks, LineWarnings.NoConvergence);
                return;
            }

            FitOutcome outcome = Minimize();
            if (ChangeWidthsAtBound(tasks))
            {
                continue;
            }

            bool determined = LevenbergMarquardt.TryCovariance(_workspace, _model.ParameterCount);
            if (DropWeakest(tasks, determined))
            {
                continue;
            }

            if (!determined)
            {
                Fail(tasks, LineWarnings.NoConvergence);
                return;
            }

            if (_outliers < MostOutliers && DropOutlier(outcome))
            {
                Keep(tasks, origin);
                continue;
            }

            Store(tasks, outcome, origin, first, last);
            return;
        }
    }
}
