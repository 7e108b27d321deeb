using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>What the rows (NAXIS2) or planes (NAXIS3) of an image of several hold, from the keywords that label them.</summary>
internal sealed class ImageRows
{
    private readonly ColumnRole[] _roles;

    private ImageRows(ColumnRole[] roles) => _roles = roles;

    /// <summary>The row of the flux, from 0.</summary>
    internal int Flux => Math.Max(0, Array.IndexOf(_roles, ColumnRole.Flux));

    /// <summary>The row of the noise, from 0, and its form; −1 where there is none.</summary>
    internal (int Row, NoiseForm Form) Noise
    {
        get
        {
            int row = Array.IndexOf(_roles, ColumnRole.Sigma);
            if (row >= 0)
            {
                return (row, NoiseForm.Sigma);
            }

            row = Array.IndexOf(_roles, ColumnRole.InverseVariance);
            return row >= 0 ? (row, NoiseForm.InverseVariance) : (Array.IndexOf(_roles, ColumnRole.Variance), NoiseForm.Variance);
        }
    }

    /// <summary>The row of the mask, from 0; −1 where there is none.</summary>
    internal int Mask => Array.IndexOf(_roles, ColumnRole.Mask);

    /// <summary>Whether the mask is the and-mask of a fibre survey.</summary>
    internal bool MaskIsOfSurvey { get; private init; }

    /// <summary>Reads the labels; null where the rows have none.</summary>
    /// <param name="header">The header of the image.</param>
    /// <param name="count">Number of rows or planes.</param>
    internal static ImageRows? Read(HeaderKeywords header, int count)
    {
        List<string> labels = Labels(header, count);
        var roles = new ColumnRole[count];
        bool any = false;
        for (int i = 0; i < count && i < labels.Count; i++)
        {
            ColumnRole role = RoleOf(labels[i]);
            // The first of a kind counts: flux before continuum-subtracted flux, and-mask before or-mask.
            roles[i] = Array.IndexOf(roles, role) >= 0 ? ColumnRole.None : role;
            any |= role != ColumnRole.None;
        }

        return any && Array.IndexOf(roles, ColumnRole.Flux) >= 0 ? new ImageRows(roles) { MaskIsOfSurvey = IsOfSurvey(roles, labels) } : null;
    }

    private static bool IsOfSurvey(ColumnRole[] roles, List<string> labels)
    {
        int mask = Array.IndexOf(roles, ColumnRole.Mask);
        return mask >= 0 && Array.IndexOf(roles, ColumnRole.InverseVariance) >= 0
            && IO.Noise.IsSurveyMask(labels[mask], NoiseForm.InverseVariance);
    }

    private static List<string> Labels(HeaderKeywords header, int count)
    {
        string list = header.FirstText(["EXTEN0", "ROWS", "ARRAYS"]);
        if (list.Contains(',', StringComparison.Ordinal))
        {
            return [.. list.Split(',', StringSplitOptions.TrimEntries)];
        }

        var labels = new List<string>(count);
        for (int i = 1; i <= count; i++)
        {
            string label = "";
            foreach (string prefix in (string[])["BANDID", "ARRAY", "ROW", "COL", "BAND"])
            {
                label = label.Length == 0 ? header.Text(string.Create(CultureInfo.InvariantCulture, $"{prefix}{i}")) : label;
            }

            labels.Add(label);
        }

        return labels;
    }

    private static ColumnRole RoleOf(string label)
    {
        string text = label.ToUpperInvariant();
        return text.Length == 0 ? ColumnRole.None
            : text.Contains("INVERSE", StringComparison.Ordinal) || text.Contains("IVAR", StringComparison.Ordinal) ? ColumnRole.InverseVariance
            : text.Contains("VARIANCE", StringComparison.Ordinal) ? ColumnRole.Variance
            : text.StartsWith("SIGMA", StringComparison.Ordinal) || text.Contains("ERROR", StringComparison.Ordinal)
                || text.Contains("UNCERT", StringComparison.Ordinal) || text.Contains("NOISE", StringComparison.Ordinal) ? ColumnRole.Sigma
            : text.Contains("ORMASK", StringComparison.Ordinal) || text.Contains("OR MASK", StringComparison.Ordinal) ? ColumnRole.None
            : text.Contains("MASK", StringComparison.Ordinal) || text.Contains("QUALITY", StringComparison.Ordinal) ? ColumnRole.Mask
            : text.Contains("WAVELENGTH", StringComparison.Ordinal) || text.Contains("LAMBDA", StringComparison.Ordinal) ? ColumnRole.Wavelength
            : text.StartsWith("BACKGROUND", StringComparison.Ordinal) || text.Contains("CONTINUUM", StringComparison.Ordinal) || text.StartsWith("SKY", StringComparison.Ordinal) ? ColumnRole.None
            : text.Contains("FLUX", StringComparison.Ordinal) || text.Contains("SPECTRUM", StringComparison.Ordinal) ? ColumnRole.Flux
            : ColumnRole.None;
    }
}
