using System;
using System.Numerics.Tensors;
using StarLines.Numerics;
using StarLines.Profiles;

namespace StarLines.Lines;

/// <content>What the residuals of a finished fit say.</content>
internal sealed partial class BlendModel
{
    private static readonly LorentzianProfile Reference = new();
    private double[] _answers = [];
    private double[] _spare = [];
    private double[] _spareWidths = [];

    /// <summary>
    /// How strongly the residuals ask for wings (positive) or for shoulders (negative), in standard deviations: the score of
    /// the share η in A [(1 − η) φ + η L] at η = 0, L being the Lorentzian of the same full width, with all parameters free.
    /// </summary>
    /// <param name="line">Index of the line.</param>
    /// <param name="fwhm">Its full width at half maximum, Å.</param>
    /// <param name="parameters">The solution, at which the model was evaluated last.</param>
    /// <param name="covariance">Covariance of the parameters.</param>
    internal double WingScore(int line, double fwhm, ReadOnlySpan<double> parameters, ReadOnlySpan<double> covariance)
    {
        int size = ParameterCount;
        Span<double> template = Factor;
        Span<double> answers = _answers.AsSpan(0, size);
        Wings(parameters.Slice(1 + (line * Stride), Stride), fwhm, template);
        TensorPrimitives.Multiply(template, Weight, template);
        answers[0] = FixedLanes.Dot(Unity, template);
        for (int other = 0; other < _lines; other++)
        {
            for (int which = 0; which < Stride; which++)
            {
                answers[1 + (other * Stride) + which] =
                    FixedLanes.Dot(Column(other, which), template.Slice(_starts[other], _counts[other]));
            }
        }

        double explained = 0.0;
        for (int i = 0; i < size; i++)
        {
            explained += answers[i] * FixedLanes.Dot(covariance.Slice(i * size, size), answers);
        }

        double information = FixedLanes.Dot(template, template) - explained;
        return information > 0.0 ? -FixedLanes.Dot(template, Residual) / Math.Sqrt(information) : 0.0;
    }

    /// <summary>A (L − φ) on all pixels; the sign of the flux is left to the caller.</summary>
    private void Wings(ReadOnlySpan<double> line, double fwhm, Span<double> destination)
    {
        int count = PixelCount;
        if (_spare.Length < 3 * count)
        {
            _spare = new double[3 * count];
        }

        Span<double> value = _spare.AsSpan(0, count);
        Span<double> byCentre = _spare.AsSpan(count, count);
        Span<double> byWidth = _spare.AsSpan(2 * count, count);
        var grid = new PixelGrid(Edges, Centres, _sampling);
        ReadOnlySpan<double> half = [0.5 * fwhm];
        Reference.Evaluate(grid, line[1], half, value, byCentre, byWidth, _scratch);
        value.CopyTo(destination);
        if (_spareWidths.Length < count * (Stride - 2))
        {
            _spareWidths = new double[count * (Stride - 2)];
        }

        _profile.Evaluate(grid, line[1], line[2..], value, byCentre, _spareWidths, _scratch);
        TensorPrimitives.Subtract(destination, value, destination);
        TensorPrimitives.Multiply(destination, line[0], destination);
    }

    /// <summary>How far the fit follows a pixel, 0 to 1: the derivative of the fitted value by the datum.</summary>
    /// <param name="pixel">Index of the pixel.</param>
    /// <param name="covariance">Covariance of the parameters.</param>
    internal double Leverage(int pixel, ReadOnlySpan<double> covariance)
    {
        int size = ParameterCount;
        Span<double> row = _answers.AsSpan(0, size);
        row.Clear();
        row[0] = Unity[pixel];
        for (int line = 0; line < _lines; line++)
        {
            int index = pixel - _starts[line];
            for (int which = 0; which < Stride && index >= 0 && index < _counts[line]; which++)
            {
                row[1 + (line * Stride) + which] = Column(line, which)[index];
            }
        }

        double sum = 0.0;
        for (int i = 0; i < size; i++)
        {
            sum += row[i] * FixedLanes.Dot(covariance.Slice(i * size, size), row);
        }

        return sum;
    }
}
