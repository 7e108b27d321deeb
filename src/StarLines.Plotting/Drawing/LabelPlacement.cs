using System;
using System.Collections.Generic;

namespace StarLines.Plotting.Drawing;

/// <summary>Places labels side by side near the things they name.</summary>
internal static class LabelPlacement
{
    /// <summary>
    /// Chooses the labels that can be shown, the strongest first, and moves them apart as little as possible.
    /// </summary>
    /// <param name="wanted">N places where labels would stand, ascending; those outside the limits are never shown.</param>
    /// <param name="strengths">N strengths; where two are equal the first goes before.</param>
    /// <param name="spacing">Least distance between two labels; above 0.</param>
    /// <param name="minimum">Least place of a label.</param>
    /// <param name="maximum">Largest place of a label.</param>
    /// <param name="farthest">Largest distance of a label from where it is wanted.</param>
    /// <returns>N places, NaN for a label that is not shown; the order of the labels is that of the things they name.</returns>
    internal static double[] Place(
        ReadOnlySpan<double> wanted, ReadOnlySpan<double> strengths, double spacing, double minimum, double maximum, double farthest)
    {
        var places = new double[wanted.Length];
        Array.Fill(places, double.NaN);
        double[] all = wanted.ToArray();
        int[] order = ByStrength(strengths);
        int capacity = maximum < minimum ? 0 : (int)Math.Floor((maximum - minimum) / spacing) + 1;
        var shown = new List<int>(Math.Min(capacity + 1, all.Length));
        var trial = new double[Math.Min(capacity, all.Length)];
        foreach (int index in order)
        {
            if (!(all[index] >= minimum && all[index] <= maximum) || shown.Count == capacity)
            {
                continue;
            }

            int at = ~shown.BinarySearch(index);
            shown.Insert(at, index);
            if (!Fits(all, shown, spacing, minimum, maximum, farthest, trial))
            {
                shown.RemoveAt(at);
            }
        }

        if (shown.Count != 0)
        {
            Spread(all, shown, spacing, minimum, maximum, trial);
        }

        for (int i = 0; i < shown.Count; i++)
        {
            places[shown[i]] = trial[i];
        }

        return places;
    }

    private static int[] ByStrength(ReadOnlySpan<double> strengths)
    {
        double[] keys = strengths.ToArray();
        var order = new int[keys.Length];
        for (int i = 0; i < order.Length; i++)
        {
            order[i] = i;
        }

        Array.Sort(order, (a, b) =>
        {
            int byStrength = keys[b].CompareTo(keys[a]);
            return byStrength != 0 ? byStrength : a.CompareTo(b);
        });
        return order;
    }

    private static bool Fits(
        double[] wanted, List<int> shown, double spacing, double minimum, double maximum, double farthest, double[] trial)
    {
        Spread(wanted, shown, spacing, minimum, maximum, trial);
        for (int i = 0; i < shown.Count; i++)
        {
            if (Math.Abs(trial[i] - wanted[shown[i]]) > farthest)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>
    /// Least squares under the least distance: with u_i = x_i − i·spacing the distances become an order, so that pooling
    /// neighbours that are out of order (isotonic regression, Ayer et al. 1955) gives the answer; the limits then clip it.
    /// </summary>
    private static void Spread(
        double[] wanted, List<int> shown, double spacing, double minimum, double maximum, double[] places)
    {
        int count = shown.Count;
        Span<double> means = count <= 256 ? stackalloc double[count] : new double[count];
        Span<int> sizes = count <= 256 ? stackalloc int[count] : new int[count];
        int blocks = 0;
        for (int i = 0; i < count; i++)
        {
            means[blocks] = wanted[shown[i]] - (i * spacing);
            sizes[blocks++] = 1;
            while (blocks > 1 && means[blocks - 2] > means[blocks - 1])
            {
                int size = sizes[blocks - 2] + sizes[blocks - 1];
                means[blocks - 2] = ((means[blocks - 2] * sizes[blocks - 2]) + (means[blocks - 1] * sizes[blocks - 1])) / size;
                sizes[blocks - 2] = size;
                blocks--;
            }
        }

        double largest = Math.Max(minimum, maximum - ((count - 1) * spacing));
        int next = 0;
        for (int b = 0; b < blocks; b++)
        {
            double start = Math.Clamp(means[b], minimum, largest);
            for (int k = 0; k < sizes[b]; k++, next++)
            {
                places[next] = start + (next * spacing);
            }
        }
    }
}
