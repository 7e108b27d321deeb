using System;

namespace StarLines.Continuum;

/// <summary>
/// A cubic spline on equal knots with a penalty on the third differences of its coefficients (Eilers and Marx 1996,
/// Statistical Science 11, 89), fitted by weighted least squares through a banded Cholesky factor.
/// </summary>
internal sealed class PenalizedSpline
{
    /// <summary>Coefficients that share a pixel.</summary>
    internal const int Order = 4;

    // Keeps the factor positive where no pixel has weight; 10⁻⁹ of the largest diagonal moves nothing else.
    private const double Ridge = 1e-9;

    // The four basis functions as polynomials of t: row k holds the coefficients of 1, t, t², t³.
    private static readonly double[] s_powers =
    [
        1.0 / 6.0, -0.5, 0.5, -1.0 / 6.0,
        4.0 / 6.0, 0.0, -1.0, 0.5,
        1.0 / 6.0, 0.5, 0.5, -0.5,
        0.0, 0.0, 0.0, 1.0 / 6.0,
    ];

    private readonly double[] _matrix;
    private readonly double[] _right;
    private readonly double[] _factor;

    /// <summary>Makes a spline over a range.</summary>
    /// <param name="first">Lower end of the range.</param>
    /// <param name="last">Upper end of the range, above the lower.</param>
    /// <param name="intervals">Number of knot intervals, at least 1.</param>
    internal PenalizedSpline(double first, double last, int intervals)
    {
        First = first;
        Intervals = intervals;
        KnotStep = (last - first) / intervals;
        Coefficients = new double[intervals + Order - 1];
        _matrix = new double[Coefficients.Length * Order];
        _right = new double[Coefficients.Length];
        _factor = new double[_matrix.Length];
    }

    /// <summary>Lower end of the range.</summary>
    internal double First { get; }

    /// <summary>Number of knot intervals.</summary>
    internal int Intervals { get; }

    /// <summary>Length of a knot interval.</summary>
    internal double KnotStep { get; }

    /// <summary>The coefficients; Intervals + 3 values.</summary>
    internal double[] Coefficients { get; }

    /// <summary>The four basis functions at a fraction of an interval, 0 to 1.</summary>
    internal static void Basis(double t, out double b0, out double b1, out double b2, out double b3)
    {
        double u = 1.0 - t;
        double t2 = t * t;
        b0 = u * u * u / 6.0;
        b3 = t2 * t / 6.0;
        b1 = (4.0 / 6.0) - t2 + (0.5 * t2 * t);
        b2 = 1.0 - b0 - b1 - b3;
    }

    /// <summary>The interval and the fraction of it at which an abscissa lies; clamped to the range.</summary>
    internal int Locate(double x, out double t)
    {
        double position = (x - First) / KnotStep;
        int interval = Math.Clamp((int)position, 0, Intervals - 1);
        t = Math.Clamp(position - interval, 0.0, 1.0);
        return interval;
    }

    /// <summary>Forgets what was accumulated.</summary>
    internal void Clear()
    {
        Array.Clear(_matrix);
        Array.Clear(_right);
    }

    /// <summary>For each interval the index after its last abscissa.</summary>
    /// <param name="x">Abscissae in rising order, within the range.</param>
    internal int[] IntervalEnds(ReadOnlySpan<double> x)
    {
        var ends = new int[Intervals];
        int i = 0;
        for (int interval = 0; interval < Intervals - 1; interval++)
        {
            double right = First + ((interval + 1) * KnotStep);
            while (i < x.Length && x[i] < right)
            {
                i++;
            }

            ends[interval] = i;
        }

        ends[Intervals - 1] = x.Length;
        return ends;
    }

    /// <summary>The spline at many abscissae.</summary>
    /// <param name="x">Abscissae in rising order.</param>
    /// <param name="ends">Their <see cref="IntervalEnds"/>.</param>
    /// <param name="destination">As many values, which move towards the spline.</param>
    /// <param name="length">How far they move: 1 all the way, more beyond it.</param>
    internal void Evaluate(ReadOnlySpan<double> x, ReadOnlySpan<int> ends, Span<double> destination, double length = 1.0)
    {
        int i = 0;
        double perStep = 1.0 / KnotStep;
        for (int interval = 0; interval < ends.Length; interval++)
        {
            ReadOnlySpan<double> c = Coefficients.AsSpan(interval, Order);
            double p0 = (c[0] + (4.0 * c[1]) + c[2]) / 6.0;
            double p1 = (c[2] - c[0]) / 2.0;
            double p2 = (c[0] - (2.0 * c[1]) + c[2]) / 2.0;
            double p3 = (c[3] - c[0] + (3.0 * (c[1] - c[2]))) / 6.0;
            double left = First + (interval * KnotStep);
            for (; i < ends[interval]; i++)
            {
                double t = (x[i] - left) * perStep;
                double value = p0 + (t * (p1 + (t * (p2 + (t * p3)))));
                destination[i] = (length * value) + ((1.0 - length) * destination[i]);
            }
        }
    }

    /// <summary>Adds the data of one interval to the normal equations.</summary>
    internal void Add(int interval, in SplineMoments moments)
    {
        for (int k = 0; k < Order; k++)
        {
            double right = 0.0;
            for (int i = 0; i < Order; i++)
            {
                right += s_powers[(k * Order) + i] * moments.Y(i);
            }

            _right[interval + k] += right;
            for (int l = k; l < Order; l++)
            {
                double sum = 0.0;
                for (int i = 0; i < Order; i++)
                {
                    for (int j = 0; j < Order; j++)
                    {
                        sum += s_powers[(k * Order) + i] * s_powers[(l * Order) + j] * moments.W(i + j);
                    }
                }

                _matrix[((interval + k) * Order) + l - k] += sum;
            }
        }
    }

    /// <summary>Solves for the coefficients.</summary>
    /// <param name="penalty">Weight of the squared third differences.</param>
    internal void Solve(double penalty)
    {
        Factorize(penalty);
        _right.AsSpan().CopyTo(Coefficients);
        SolveInPlace(Coefficients);
    }

    /// <summary>The variance of the spline at an abscissa after the last <see cref="Solve"/>, for weights that are inverse variances.</summary>
    /// <param name="x">Where.</param>
    /// <param name="scratch">As many values as there are coefficients.</param>
    internal double Variance(double x, Span<double> scratch)
    {
        int j = Locate(x, out double t);
        Basis(t, out double b0, out double b1, out double b2, out double b3);
        scratch.Clear();
        scratch[j] = b0;
        scratch[j + 1] = b1;
        scratch[j + 2] = b2;
        scratch[j + 3] = b3;
        SolveInPlace(scratch);
        return (b0 * scratch[j]) + (b1 * scratch[j + 1]) + (b2 * scratch[j + 2]) + (b3 * scratch[j + 3]);
    }

    private void Factorize(double penalty)
    {
        int n = Coefficients.Length;
        double[] a = _factor;
        _matrix.AsSpan().CopyTo(a);
        AddPenalty(a, n, penalty);
        double largest = 0.0;
        for (int i = 0; i < n; i++)
        {
            largest = Math.Max(largest, a[i * Order]);
        }

        double floor = Math.Max(largest * Ridge, double.Epsilon);
        for (int i = 0; i < n; i++)
        {
            // Row i of the factor: a[i*4 + k] = L(i + k, i); the band is three below the diagonal.
            double pivot = Math.Sqrt(Math.Max(a[i * Order], floor));
            a[i * Order] = pivot;
            int reach = Math.Min(Order - 1, n - 1 - i);
            for (int k = 1; k <= reach; k++)
            {
                a[(i * Order) + k] /= pivot;
            }

            for (int k = 1; k <= reach; k++)
            {
                double lk = a[(i * Order) + k];
                for (int l = k; l <= reach; l++)
                {
                    a[((i + k) * Order) + l - k] -= lk * a[(i * Order) + l];
                }
            }
        }
    }

    private static void AddPenalty(double[] a, int n, double penalty)
    {
        ReadOnlySpan<double> d = [-1.0, 3.0, -3.0, 1.0];
        for (int row = 0; row + 3 < n; row++)
        {
            for (int k = 0; k < Order; k++)
            {
                for (int l = k; l < Order; l++)
                {
                    a[((row + k) * Order) + l - k] += penalty * d[k] * d[l];
                }
            }
        }
    }

    private void SolveInPlace(Span<double> x)
    {
        int n = x.Length;
        double[] a = _factor;
        for (int i = 0; i < n; i++)
        {
            double value = x[i] / a[i * Order];
            x[i] = value;
            int reach = Math.Min(Order - 1, n - 1 - i);
            for (int k = 1; k <= reach; k++)
            {
                x[i + k] -= a[(i * Order) + k] * value;
            }
        }

        for (int i = n - 1; i >= 0; i--)
        {
            double value = x[i];
            int reach = Math.Min(Order - 1, n - 1 - i);
            for (int k = 1; k <= reach; k++)
            {
                value -= a[(i * Order) + k] * x[i + k];
            }

            x[i] = value / a[i * Order];
        }
    }
}
