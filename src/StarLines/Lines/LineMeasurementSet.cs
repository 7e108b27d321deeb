using System;
using System.Collections.Generic;

namespace StarLines.Lines;

/// <summary>The lines of a list as measured in one spectrum, with the fitted model.</summary>
public sealed class LineMeasurementSet
{
    private readonly LineMeasurement[] _lines;
    private readonly LineWindow[] _windows;
    private readonly double[] _model;

    internal LineMeasurementSet(LineMeasurement[] lines, LineWindow[] windows, double[] model)
    {
        _lines = lines;
        _windows = windows;
        _model = model;
    }

    /// <summary>One measurement for each line of the list, in its order, also for lines outside the spectrum.</summary>
    public IReadOnlyList<LineMeasurement> Lines => _lines;

    /// <summary>Where each line was measured; in the order of <see cref="Lines"/>.</summary>
    public IReadOnlyList<LineWindow> Windows => _windows;

    /// <summary>One value a pixel: the fitted lines in units of the continuum, 1 where there is none.</summary>
    public ReadOnlySpan<double> Model => _model;
}
