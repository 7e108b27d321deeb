using System;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>What an image extension holds, by HDUCLAS keywords or EXTNAME.</summary>
internal static class ExtensionRole
{
    /// <summary>The role of an image HDU; flux where nothing says otherwise.</summary>
    /// <param name="hdu">The HDU.</param>
    /// <param name="form">How its noise is stated, where it is noise.</param>
    internal static ColumnRole Of(FitsHdu hdu, out NoiseForm form)
    {
        form = NoiseForm.Sigma;
        if (hdu.Header.TryGetString("HDUCLAS2", out string? class2))
        {
            string kind = hdu.Header.TryGetString("HDUCLAS3", out string? class3) ? class3.Trim().ToUpperInvariant() : "";
            switch (class2.Trim().ToUpperInvariant())
            {
                case "DATA":
                    return ColumnRole.Flux;
                case "ERROR":
                    form = kind.StartsWith("INV", StringComparison.Ordinal) ? NoiseForm.InverseVariance
                        : kind is "MSE" or "VARIANCE" ? NoiseForm.Variance
                        : NoiseForm.Sigma;
                    return Noise(form);
                case "QUALITY":
                    return ColumnRole.Mask;
                default:
                    break;
            }
        }

        return OfName(hdu.Name, out form);
    }

    private static ColumnRole OfName(string name, out NoiseForm form)
    {
        form = NoiseForm.Sigma;
        string text = name.ToUpperInvariant().TrimEnd('0', '1', '2', '3', '4', '5', '6', '7', '8', '9', '_', '-', '.', ' ');
        (ColumnRole role, _) = ColumnRoles.OfName(text);
        if (role == ColumnRole.None && text.Length != 0)
        {
            role = OfPart(text);
        }

        form = role switch
        {
            ColumnRole.Variance => NoiseForm.Variance,
            ColumnRole.InverseVariance => NoiseForm.InverseVariance,
            _ => NoiseForm.Sigma,
        };
        return role;
    }

    private static ColumnRole OfPart(string text) =>
        text is "SCI" or "SCIENCE" or "PRIMARY" or "OBJ" or "OBJECT" or "STAR" ? ColumnRole.Flux
        : text.EndsWith("IVAR", StringComparison.Ordinal) ? ColumnRole.InverseVariance
        : text.EndsWith("ERR", StringComparison.Ordinal) || text.EndsWith("ERRS", StringComparison.Ordinal) || text.EndsWith("ERROR", StringComparison.Ordinal)
            || text.StartsWith("ERR", StringComparison.Ordinal) || text.EndsWith("SIGMA", StringComparison.Ordinal) ? ColumnRole.Sigma
        : text.EndsWith("VAR", StringComparison.Ordinal) || text.EndsWith("VARIANCE", StringComparison.Ordinal) ? ColumnRole.Variance
        : text.EndsWith("MASK", StringComparison.Ordinal) || text.EndsWith("QUAL", StringComparison.Ordinal) ? ColumnRole.Mask
        : text.EndsWith("WAVE", StringComparison.Ordinal) || text.EndsWith("WAVELENGTH", StringComparison.Ordinal) ? ColumnRole.Wavelength
        : text.Contains("SKY", StringComparison.Ordinal) || text.Contains("BACKGROUND", StringComparison.Ordinal) || text.Contains("CONT", StringComparison.Ordinal)
            || text.Contains("MODEL", StringComparison.Ordinal) || text.Contains("RESOLUTION", StringComparison.Ordinal) || text.Contains("DISP", StringComparison.Ordinal) ? ColumnRole.None
        : ColumnRole.Flux;

    private static ColumnRole Noise(NoiseForm form) => form switch
    {
        NoiseForm.Variance => ColumnRole.Variance,
        NoiseForm.InverseVariance => ColumnRole.InverseVariance,
        _ => ColumnRole.Sigma,
    };
}
