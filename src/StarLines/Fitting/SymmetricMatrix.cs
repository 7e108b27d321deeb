using System;

namespace StarLines.Fitting;

/// <summary>Small symmetric positive definite matrices, N × N by rows in a span; nothing is allocated.</summary>
internal static class SymmetricMatrix
{
    /// <summary>
    /// Replaces the lower triangle of A by L of A = L Lᵀ (Cholesky). A NaN or a matrix that is not positive definite gives false.
    /// </summary>
    internal static bool TryFactorInPlace(Span<double> matrix, int count)
    {
        for (int j = 0; j < count; j++)
        {
            Span<double> rowJ = matrix.Slice(j * count, j + 1);
            double pivot = rowJ[j];
            for (int k = 0; k < j; k++)
            {
                pivot -= rowJ[k] * rowJ[k];
            }

            if (!(pivot > 0.0) || double.IsInfinity(pivot))
            {
                return false;
            }

            double root = Math.Sqrt(pivot);
            rowJ[j] = root;
            double inverse = 1.0 / root;
            for (int i = j + 1; i < count; i++)
            {
                Span<double> rowI = matrix.Slice(i * count, j + 1);
                double sum = rowI[j];
                for (int k = 0; k < j; k++)
                {
                    sum -= rowI[k] * rowJ[k];
                }

                rowI[j] = sum * inverse;
            }
        }

        return true;
    }

    /// <summary>Solves L Lᵀ x = b in place of b.</summary>
    internal static void SolveInPlace(ReadOnlySpan<double> factor, int count, Span<double> vector)
    {
        for (int i = 0; i < count; i++)
        {
            ReadOnlySpan<double> row = factor.Slice(i * count, i + 1);
            double sum = vector[i];
            for (int k = 0; k < i; k++)
            {
                sum -= row[k] * vector[k];
            }

            vector[i] = sum / row[i];
        }

        for (int i = count - 1; i >= 0; i--)
        {
            double sum = vector[i];
            for (int k = i + 1; k < count; k++)
            {
                sum -= factor[(k * count) + i] * vector[k];
            }

            vector[i] = sum / factor[(i * count) + i];
        }
    }

    /// <summary>Writes the full inverse of L Lᵀ.</summary>
    internal static void Invert(ReadOnlySpan<double> factor, int count, Span<double> inverse)
    {
        // Column by column: solve for unit vectors; the rows of the symmetric inverse are its columns.
        for (int j = 0; j < count; j++)
        {
            Span<double> row = inverse.Slice(j * count, count);
            row.Clear();
            row[j] = 1.0;
            SolveInPlace(factor, count, row);
        }
    }
}
