using System;
using System.Numerics.Tensors;
using StarLines.Fitting;
using StarLines.Numerics;
using StarLines.Profiles;

namespace StarLines.Lines;

/// <summary>
/// The flux in a window, in units of the global continuum: f = c (b − Σ A φ((λ − λ₀); w)), where c is the local continuum with
/// the global one as prior, b = 1 less the lines fitted elsewhere, and each line has depth A, centre λ₀ and widths w.
/// Parameters in this order: c, then A, λ₀ and the widths of each line. Wavelengths count from a reference inside the window.
/// </summary>
internal sealed partial class BlendModel : INormalEquations
{
    private readonly ILineProfile _profile;
    private readonly PixelSampling _sampling;
    private double[] _pixels = [];
    private double[] _columns = [];
    private double[] _scratch = [];
    private int[] _starts = [];
    private int[] _counts = [];
    private int[] _offsets = [];
    private double[] _priorWidths = [];
    private double[] _priorWidthWeights = [];
    private int _lines;
    private double _priorWeight;

    /// <summary>Makes a model for lines of one shape.</summary>
    internal BlendModel(ILineProfile profile, PixelSampling sampling)
    {
        _profile = profile;
        _sampling = sampling;
        Stride = 2 + profile.WidthCount;
    }

    /// <summary>Parameters of one line.</summary>
    internal int Stride { get; }

    /// <summary>Number of pixels.</summary>
    internal int PixelCount { get; private set; }

    /// <inheritdoc/>
    public int ParameterCount => 1 + (_lines * Stride);

    /// <summary>Flux in units of the global continuum.</summary>
    internal Span<double> Flux => Row(0);

    /// <summary>Inverse standard deviations of the flux; 0 for a pixel that is not used.</summary>
    internal Span<double> Weight => Row(1);

    /// <summary>1 less the lines fitted elsewhere.</summary>
    internal Span<double> Base => Row(2);

    /// <summary>Weighted residuals (data − model)/σ of the latest evaluation.</summary>
    internal Span<double> Residual => Row(3);

    /// <summary>Pixel centres, Å from the reference.</summary>
    internal Span<double> Centres => Row(6);

    /// <summary>Pixel edges, Å from the reference; one more than the pixels.</summary>
    internal Span<double> Edges => _pixels.AsSpan(7 * PixelCount, PixelCount + 1);

    private Span<double> Unity => Row(4);

    private Span<double> Factor => Row(5);

    /// <summary>Makes room for a window; the caller then fills flux, weight, base, centres and edges.</summary>
    internal void Prepare(int pixels)
    {
        PixelCount = pixels;
        if (_pixels.Length < (8 * pixels) + 1)
        {
            _pixels = new double[(8 * pixels) + 1];
            _scratch = new double[3 * (pixels + 1)];
        }
    }

    /// <summary>Says how many lines are fitted and how well the global continuum is known.</summary>
    /// <param name="lines">Number of lines.</param>
    /// <param name="continuumSigma">Standard deviation of the global continuum in units of itself; above 0.</param>
    internal void Arrange(int lines, double continuumSigma)
    {
        _lines = lines;
        _priorWeight = 1.0 / continuumSigma;
        if (_starts.Length < lines)
        {
            _starts = new int[lines];
            _counts = new int[lines];
            _offsets = new int[lines];
            _priorWidths = new double[lines];
            _answers = new double[1 + (lines * Stride)];
            _priorWidthWeights = new double[lines];
        }
    }

    /// <summary>Makes the expected first width of a line a datum.</summary>
    /// <param name="line">Index of the line.</param>
    /// <param name="width">Expected width, Å.</param>
    /// <param name="weight">Inverse of its standard deviation in ln of the width; 0 for none.</param>
    internal void SetWidthPrior(int line, double width, double weight)
    {
        _priorWidths[line] = width;
        _priorWidthWeights[line] = weight;
    }

    /// <inheritdoc/>
    public double Linearize(ReadOnlySpan<double> parameters, Span<double> matrix, Span<double> gradient)
    {
        PlaceColumns(parameters);
        EvaluateLines(parameters);
        double continuum = parameters[0];
        Span<double> weight = Weight;
        Span<double> residual = Residual;
        TensorPrimitives.Multiply(Unity, -continuum, residual);
        TensorPrimitives.Add(residual, Flux, residual);
        TensorPrimitives.Multiply(residual, weight, residual);
        TensorPrimitives.Multiply(weight, -continuum, Factor);
        TensorPrimitives.Multiply(Unity, weight, Unity);
        WeighColumns(parameters);
        double pull = (1.0 - continuum) * _priorWeight;
        matrix[0] = FixedLanes.Dot(Unity, Unity) + (_priorWeight * _priorWeight);
        gradient[0] = FixedLanes.Dot(Unity, residual) + (pull * _priorWeight);
        for (int line = 0; line < _lines; line++)
        {
            FillRows(line, matrix, gradient);
        }

        return FixedLanes.Dot(residual, residual) + (pull * pull) + AddWidthPriors(parameters, matrix, gradient);
    }

    /// <summary>Depth times profile of one line on the pixels of the window, in units of the local continuum.</summary>
    /// <param name="line">A, λ₀ and widths.</param>
    /// <param name="destination">Receives PixelCount values.</param>
    internal void EvaluateLine(ReadOnlySpan<double> line, Span<double> destination)
    {
        int count = PixelCount;
        EnsureColumns(count * Stride);
        Span<double> columns = _columns.AsSpan(0, count * Stride);
        var grid = new PixelGrid(Edges, Centres, _sampling);
        _profile.Evaluate(
            grid, line[1], line[2..], destination, columns.Slice(count, count), columns[(2 * count)..], _scratch);
        TensorPrimitives.Multiply(destination[..count], line[0], destination);
    }

    private Span<double> Row(int row) => _pixels.AsSpan(row * PixelCount, PixelCount);

    private Span<double> Column(int line, int which) =>
        _columns.AsSpan(_offsets[line] + (which * _counts[line]), _counts[line]);

    private void PlaceColumns(ReadOnlySpan<double> parameters)
    {
        ReadOnlySpan<double> edges = Edges;
        int total = 0;
        for (int line = 0; line < _lines; line++)
        {
            ReadOnlySpan<double> values = parameters.Slice(1 + (line * Stride), Stride);
            double reach = _profile.Reach(values[2..]);
            int start = values[1] - reach <= edges[0] ? 0 : Math.Max(0, PixelAt(edges, values[1] - reach));
            int end = values[1] + reach >= edges[^1] ? PixelCount : Math.Min(PixelCount, PixelAt(edges, values[1] + reach) + 1);
            _starts[line] = Math.Min(start, PixelCount);
            _counts[line] = Math.Max(0, end - start);
            _offsets[line] = total;
            total += _counts[line] * Stride;
        }

        EnsureColumns(total);
    }

    private void EvaluateLines(ReadOnlySpan<double> parameters)
    {
        var grid = new PixelGrid(Edges, Centres, _sampling);
        Base.CopyTo(Unity);
        for (int line = 0; line < _lines; line++)
        {
            int count = _counts[line];
            if (count == 0)
            {
                continue;
            }

            ReadOnlySpan<double> values = parameters.Slice(1 + (line * Stride), Stride);
            Span<double> byWidths = _columns.AsSpan(_offsets[line] + (2 * count), (Stride - 2) * count);
            Span<double> value = Column(line, 0);
            _profile.Evaluate(
                grid.Slice(_starts[line], count), values[1], values[2..], value, Column(line, 1), byWidths, _scratch);
            Span<double> unity = Unity.Slice(_starts[line], count);
            TensorPrimitives.MultiplyAdd(value, -values[0], unity, unity);
        }
    }

    private void WeighColumns(ReadOnlySpan<double> parameters)
    {
        for (int line = 0; line < _lines; line++)
        {
            ReadOnlySpan<double> factor = Factor.Slice(_starts[line], _counts[line]);
            double depth = parameters[1 + (line * Stride)];
            TensorPrimitives.Multiply(Column(line, 0), factor, Column(line, 0));
            for (int which = 1; which < Stride; which++)
            {
                Span<double> column = Column(line, which);
                TensorPrimitives.Multiply(column, factor, column);
                TensorPrimitives.Multiply(column, depth, column);
            }
        }
    }

    private void FillRows(int line, Span<double> matrix, Span<double> gradient)
    {
        int size = ParameterCount;
        int start = _starts[line];
        int end = start + _counts[line];
        for (int which = 0; which < Stride; which++)
        {
            int index = 1 + (line * Stride) + which;
            ReadOnlySpan<double> column = Column(line, which);
            Span<double> row = matrix.Slice(index * size, size);
            gradient[index] = FixedLanes.Dot(column, Residual[start..end]);
            row[0] = FixedLanes.Dot(column, Unity[start..end]);
            for (int other = 0; other <= line; other++)
            {
                int from = Math.Max(start, _starts[other]);
                int to = Math.Min(end, _starts[other] + _counts[other]);
                int last = other == line ? which : Stride - 1;
                for (int second = 0; second <= last; second++)
                {
                    row[1 + (other * Stride) + second] = from < to
                        ? FixedLanes.Dot(column[(from - start)..(to - start)], Column(other, second)[(from - _starts[other])..(to - _starts[other])])
                        : 0.0;
                }
            }
        }
    }

    private double AddWidthPriors(ReadOnlySpan<double> parameters, Span<double> matrix, Span<double> gradient)
    {
        double sum = 0.0;
        for (int line = 0; line < _lines; line++)
        {
            int index = 3 + (line * Stride);
            double pull = Math.Log(_priorWidths[line] / parameters[index]) * _priorWidthWeights[line];
            double slope = _priorWidthWeights[line] / parameters[index];
            matrix[(index * ParameterCount) + index] += slope * slope;
            gradient[index] += pull * slope;
            sum += pull * pull;
        }

        return sum;
    }

    private void EnsureColumns(int length)
    {
        if (_columns.Length < length)
        {
            _columns = new double[length + (length / 2)];
        }
    }

    private static int PixelAt(ReadOnlySpan<double> edges, double position)
    {
        int found = edges.BinarySearch<double, double>(position);
        return found >= 0 ? found : ~found - 1;
    }
}
