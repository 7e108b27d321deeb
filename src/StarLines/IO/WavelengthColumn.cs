using System;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Turns the numbers of a spectral column into wavelengths.</summary>
internal static class WavelengthColumn
{
    /// <summary>Converts to Å in place. The medium of frequencies and energies is vacuum.</summary>
    internal static void ToAngstromInPlace(double[] values, string statedUnit, bool log10, string name, ReadContext context)
    {
        SpectralUnit unit = UnitOf(values, statedUnit, log10, name, context);
        if (unit.Form != SpectralForm.Linear)
        {
            double scale = unit.Form == SpectralForm.Log10 ? Math.Log(10.0) : 1.0;
            double factor = unit.AngstromFactor;
            for (int i = 0; i < values.Length; i++)
            {
                values[i] = unit.Form == SpectralForm.Log10 ? Math.Pow(10.0, values[i]) * factor : Math.Exp(values[i] * scale) * factor;
            }

            return;
        }

        if (unit.Quantity == SpectralQuantity.Length)
        {
            if (unit.AngstromFactor != 1.0)
            {
                System.Numerics.Tensors.TensorPrimitives.Multiply(values, unit.AngstromFactor, values);
            }

            return;
        }

        var variable = new SpectralVariable(TypeOf(unit.Quantity, statedUnit, context), double.NaN);
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = variable.ToVacuum(values[i] * unit.SiFactor) * 1e10;
        }
    }

    private static SpectralUnit UnitOf(double[] values, string statedUnit, bool log10, string name, ReadContext context)
    {
        string asked = context.Options.AxisUnit;
        if (asked.Length != 0 && SpectralUnit.TryParse(asked, out SpectralUnit wanted))
        {
            return wanted;
        }

        if (statedUnit.Length != 0)
        {
            if (!SpectralUnit.TryParse(statedUnit, out SpectralUnit unit))
            {
                if (!log10)
                {
                    throw context.Error($"The unit '{statedUnit}' of column {name} is not known; name it by --axis-unit, such as Angstrom or nm.");
                }

                unit = SpectralUnit.Angstrom;
            }

            return log10 && unit.Quantity == SpectralQuantity.Length ? unit with { Form = SpectralForm.Log10 } : unit;
        }

        if (log10)
        {
            return SpectralUnit.Angstrom with { Form = SpectralForm.Log10 };
        }

        return AxisUnitGuess.FromWords(name) is SpectralUnit named ? named : Guessed(values, name, context);
    }

    private static SpectralUnit Guessed(double[] values, string name, ReadContext context)
    {
        double minimum = double.PositiveInfinity;
        double maximum = double.NegativeInfinity;
        foreach (double value in values)
        {
            minimum = value > 0.0 && value < minimum ? value : minimum;
            maximum = value > maximum && double.IsFinite(value) ? value : maximum;
        }

        return double.IsFinite(minimum)
            ? AxisUnitGuess.OfLength(minimum, maximum, context)
            : throw context.Error(string.Create(
                CultureInfo.InvariantCulture, $"Column {name} holds no positive wavelength; name the right column by --columns wave=…."));
    }

    private static string TypeOf(SpectralQuantity quantity, string unit, ReadContext context) => quantity switch
    {
        SpectralQuantity.Frequency => "FREQ",
        SpectralQuantity.Energy => "ENER",
        SpectralQuantity.Wavenumber => "WAVN",
        _ => throw context.Error($"The spectral column is in {unit}, a velocity without the rest wavelength it belongs to; convert it to wavelengths."),
    };
}
