using System;
using System.Collections.Generic;
using StarLines.Lines;
using StarLines.Plotting.Text;

namespace StarLines.Plotting;

/// <summary>A line to be named in a figure.</summary>
public sealed record LineMark
{
    /// <summary>Makes a mark.</summary>
    /// <param name="label">The name to be written; not empty.</param>
    /// <param name="wavelengthAngstrom">Where it stands, Å, in the medium and frame of the spectrum; finite.</param>
    /// <param name="strength">Where there is no room for all, the largest are named; such as the equivalent width without its sign.</param>
    /// <param name="isEmission">Whether it is an emission line.</param>
    /// <exception cref="ArgumentException">The label is empty, or the wavelength is not finite.</exception>
    public LineMark(string label, double wavelengthAngstrom, double strength, bool isEmission = false)
    {
        ArgumentException.ThrowIfNullOrWhiteSpace(label);
        if (!double.IsFinite(wavelengthAngstrom))
        {
            throw new ArgumentOutOfRangeException(nameof(wavelengthAngstrom), $"The wavelength of “{label}” is not a finite number.");
        }

        Label = label;
        WavelengthAngstrom = wavelengthAngstrom;
        Strength = double.IsFinite(strength) ? strength : 0.0;
        IsEmission = isEmission;
    }

    /// <summary>The name to be written.</summary>
    public string Label { get; }

    /// <summary>Where it stands, Å.</summary>
    public double WavelengthAngstrom { get; }

    /// <summary>How strong it is; the unit is the same for all marks of a figure.</summary>
    public double Strength { get; }

    /// <summary>Whether it is an emission line.</summary>
    public bool IsEmission { get; }

    /// <summary>Marks for the lines that were measured; limits and failures are left out.</summary>
    /// <param name="lines">Measured lines, in the medium and frame of the spectrum to be drawn.</param>
    public static IReadOnlyList<LineMark> FromMeasurements(IEnumerable<LineMeasurement> lines)
    {
        ArgumentNullException.ThrowIfNull(lines);
        var marks = new List<LineMark>();
        foreach (LineMeasurement line in lines)
        {
            double width = line.EquivalentWidthMilliangstrom.Value;
            if (line.Status == LineStatus.Measured && line.CentreAngstrom.HasValue)
            {
                marks.Add(new LineMark(LineText.Name(line.Line), line.CentreAngstrom.Value, Math.Abs(width), width < 0));
            }
        }

        return marks;
    }
}
