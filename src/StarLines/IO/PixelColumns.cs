using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>The arrays of a spectrum as they come from a table: any order, with holes; and the way from there to a <see cref="Spectrum"/>.</summary>
internal sealed class PixelColumns
{
    internal required double[] WavelengthsAngstrom { get; set; }

    internal required double[] Flux { get; set; }

    /// <summary>Standard deviations; empty where there are none.</summary>
    internal double[] Sigma { get; set; } = [];

    /// <summary>Faults; empty where there are none.</summary>
    internal PixelFaults[] Faults { get; set; } = [];

    /// <summary>More repeated wavelengths than this part of the pixels are no slip but a wrong column.</summary>
    private const double MaximumRepeated = 0.05;

    /// <summary>Brings the pixels into rising order; those without a wavelength, or with that of their neighbour, are left out and reported.</summary>
    internal void PutInOrder(ReadContext context)
    {
        if (IsRising(WavelengthsAngstrom))
        {
            return;
        }

        DropUnusable(context);
        if (WavelengthsAngstrom.Length > 1 && WavelengthsAngstrom[^1] < WavelengthsAngstrom[0])
        {
            Reverse();
        }

        DropRepeated(context);
        for (int i = 1; i < WavelengthsAngstrom.Length; i++)
        {
            if (WavelengthsAngstrom[i] < WavelengthsAngstrom[i - 1])
            {
                throw context.Error(string.Create(
                    CultureInfo.InvariantCulture,
                    $"The wavelengths do not run one way: {WavelengthsAngstrom[i]:G8} Å follows {WavelengthsAngstrom[i - 1]:G8} Å at pixel {i + 1}; sort the rows, or write each order as a table of its own."));
            }
        }
    }

    /// <summary>Turns all arrays round.</summary>
    internal void Reverse()
    {
        Array.Reverse(WavelengthsAngstrom);
        ReverseValues();
    }

    /// <summary>Turns all arrays but the wavelengths round.</summary>
    internal void ReverseValues()
    {
        Array.Reverse(Flux);
        Array.Reverse(Sigma);
        Array.Reverse(Faults);
    }

    /// <summary>An error column without any positive number says nothing and is left out.</summary>
    internal void DropEmptySigma(ReadContext context)
    {
        foreach (double value in Sigma)
        {
            if (value > 0.0 && double.IsFinite(value))
            {
                return;
            }
        }

        if (Sigma.Length != 0)
        {
            context.Note("errors-empty", "The flux errors hold no positive number; they are not used.");
            Sigma = [];
        }
    }

    private static bool IsRising(double[] values)
    {
        double previous = 0.0;
        foreach (double value in values)
        {
            if (!(value > previous))
            {
                return false;
            }

            previous = value;
        }

        return double.IsFinite(previous);
    }

    private void DropUnusable(ReadContext context)
    {
        var keep = new List<int>(WavelengthsAngstrom.Length);
        for (int i = 0; i < WavelengthsAngstrom.Length; i++)
        {
            if (WavelengthsAngstrom[i] > 0.0 && double.IsFinite(WavelengthsAngstrom[i]))
            {
                keep.Add(i);
            }
        }

        int dropped = WavelengthsAngstrom.Length - keep.Count;
        if (dropped == 0)
        {
            return;
        }

        if (keep.Count == 0)
        {
            throw context.Error("No row has a positive wavelength; name the right column by --columns wave=….");
        }

        context.Note("wavelengths-missing", string.Create(
            CultureInfo.InvariantCulture, $"{dropped} pixel{(dropped == 1 ? " has" : "s have")} no wavelength and {(dropped == 1 ? "was" : "were")} left out."));
        Keep(keep);
    }

    private void DropRepeated(ReadContext context)
    {
        var keep = new List<int>(WavelengthsAngstrom.Length);
        for (int i = 0; i < WavelengthsAngstrom.Length; i++)
        {
            if (i == 0 || WavelengthsAngstrom[i] != WavelengthsAngstrom[i - 1])
            {
                keep.Add(i);
            }
        }

        int dropped = WavelengthsAngstrom.Length - keep.Count;
        if (dropped == 0)
        {
            return;
        }

        if (dropped > 2 && dropped > MaximumRepeated * WavelengthsAngstrom.Length)
        {
            throw context.Error(string.Create(
                CultureInfo.InvariantCulture,
                $"{dropped} of {WavelengthsAngstrom.Length} wavelengths repeat the one before; name the right column by --columns wave=…."));
        }

        context.Note("wavelengths-repeat", string.Create(
            CultureInfo.InvariantCulture, $"{dropped} pixel{(dropped == 1 ? " repeats" : "s repeat")} the wavelength before and {(dropped == 1 ? "was" : "were")} left out."));
        Keep(keep);
    }

    private void Keep(List<int> indices)
    {
        WavelengthsAngstrom = Pick(WavelengthsAngstrom, indices);
        Flux = Pick(Flux, indices);
        Sigma = Sigma.Length == 0 ? Sigma : Pick(Sigma, indices);
        Faults = Faults.Length == 0 ? Faults : Pick(Faults, indices);
    }

    private static T[] Pick<T>(T[] values, List<int> indices)
    {
        var picked = new T[indices.Count];
        for (int i = 0; i < picked.Length; i++)
        {
            picked[i] = values[indices[i]];
        }

        return picked;
    }
}
