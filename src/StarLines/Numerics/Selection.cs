using System;

namespace StarLines.Numerics;

/// <summary>Selection without sorting (Hoare 1961, Communications of the ACM 4, 321).</summary>
internal static class Selection
{
    /// <summary>The value that would stand at an index if the values were sorted; linear in their number.</summary>
    /// <param name="values">Finite values; reordered so that none before the index is larger and none after it smaller.</param>
    /// <param name="index">0 to the number of values less 1.</param>
    internal static double Smallest(Span<double> values, int index)
    {
        int low = 0;
        int high = values.Length - 1;
        while (low < high)
        {
            double pivot = MiddleOfThree(values[low], values[(low + high) >> 1], values[high]);
            int i = low;
            int j = high;
            while (i <= j)
            {
                while (values[i] < pivot)
                {
                    i++;
                }

                while (values[j] > pivot)
                {
                    j--;
                }

                if (i <= j)
                {
                    (values[i], values[j]) = (values[j], values[i]);
                    i++;
                    j--;
                }
            }

            if (index <= j)
            {
                high = j;
            }
            else if (index >= i)
            {
                low = i;
            }
            else
            {
                break;
            }
        }

        return values[index];
    }

    private static double MiddleOfThree(double a, double b, double c) =>
        Math.Max(Math.Min(a, b), Math.Min(Math.Max(a, b), c));
}
