using System;
using System.Globalization;

namespace StarLines.IO;

/// <summary>The unit of a wavelength axis: stated by the user or somewhere in the header, else guessed from the size of the numbers and reported.</summary>
internal static class AxisUnitGuess
{
    /// <summary>The unit that the user or the header states, or null.</summary>
    internal static SpectralUnit? Stated(HeaderKeywords header, AxisDescription axis, ReadContext context)
    {
        string asked = context.Options.AxisUnit;
        if (asked.Length != 0)
        {
            return SpectralUnit.TryParse(asked, out SpectralUnit wanted) ? wanted : null;
        }

        if (axis.Unit.Length != 0)
        {
            return SpectralUnit.TryParse(axis.Unit, out SpectralUnit unit)
                ? unit
                : throw context.Error($"The unit '{axis.Unit}' of the spectral axis (CUNIT{axis.Number.ToString(CultureInfo.InvariantCulture)}) is not known; name it by --axis-unit, such as Angstrom or nm.");
        }

        return FromWords(axis.Type)
            ?? FromAttributes(header, axis.Number)
            ?? FromWords(axis.ReferenceComment)
            ?? FromWords(axis.TypeComment);
    }

    /// <summary>A unit of length guessed from the wavelengths; reported unless the numbers can only be metres.</summary>
    internal static SpectralUnit OfLength(AxisDescription axis, ReadContext context)
    {
        double first = axis.ReferenceValue!.Value + axis.OffsetOf(0);
        double last = axis.ReferenceValue.Value + axis.OffsetOf(axis.Count - 1);
        return OfLength(Math.Min(first, last), Math.Max(first, last), context);
    }

    /// <summary>A unit of length guessed from the range of the numbers.</summary>
    internal static SpectralUnit OfLength(double minimum, double maximum, ReadContext context)
    {
        // Metres are the default of the standard and cannot be taken for anything else.
        if (maximum < 1e-3)
        {
            return SpectralUnit.Metre;
        }

        // 0.1 to 100 µm; then nm up to 1100 (silicon's end); what lies above, and the far ultraviolet, is written in Å.
        (SpectralUnit unit, string name) = maximum < 100.0 ? (SpectralUnit.Micrometre, "um")
            : maximum <= 1100.0 && minimum >= 150.0 ? (SpectralUnit.Nanometre, "nm")
            : (SpectralUnit.Angstrom, "Angstrom");
        context.Note("unit-guessed", string.Create(
            CultureInfo.InvariantCulture,
            $"The unit of the wavelengths is not stated; {minimum:G7} to {maximum:G7} is taken to be in {name}. If it is not, name it by --axis-unit."));
        return unit;
    }

    /// <summary>A unit in brackets or parentheses, or as the whole text.</summary>
    internal static SpectralUnit? FromWords(string text)
    {
        string trimmed = text.Trim();
        if (trimmed.Length is > 1 and < 16 && SpectralUnit.TryParse(trimmed, out SpectralUnit whole))
        {
            return whole;
        }

        for (int i = 0; i < trimmed.Length; i++)
        {
            char close = trimmed[i] switch { '[' => ']', '(' => ')', _ => '\0' };
            int end = close == '\0' ? -1 : trimmed.IndexOf(close, i);
            if (end > i && SpectralUnit.TryParse(trimmed[(i + 1)..end], out SpectralUnit unit))
            {
                return unit;
            }
        }

        return null;
    }

    /// <summary>The <c>units=</c> of an axis attribute list, <c>WATi_001 = 'wtype=linear label=Wavelength units=Angstroms'</c>.</summary>
    private static SpectralUnit? FromAttributes(HeaderKeywords header, int axis)
    {
        string list = header.Text(string.Create(CultureInfo.InvariantCulture, $"WAT{axis}_001"));
        int at = list.IndexOf("units=", StringComparison.OrdinalIgnoreCase);
        if (at < 0)
        {
            return null;
        }

        string unit = list[(at + 6)..].Trim('\'', '"', ' ');
        int blank = unit.IndexOf(' ', StringComparison.Ordinal);
        return SpectralUnit.TryParse(blank < 0 ? unit : unit[..blank], out SpectralUnit found) ? found : null;
    }
}
