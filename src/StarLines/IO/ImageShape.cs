using System.Collections.Generic;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>How an image lays out spectra: pixels along one axis, rows and planes along others.</summary>
/// <param name="Axis">The spectral axis, from 1.</param>
/// <param name="Count">Pixels of a spectrum.</param>
/// <param name="Rows">Length of the second axis that is longer than 1; 1 where there is none.</param>
/// <param name="Planes">Length of the third axis that is longer than 1; 1 where there is none.</param>
/// <param name="Regular">Whether the pixels of a spectrum lie side by side and no further axis is longer than 1.</param>
internal readonly record struct ImageShape(int Axis, int Count, int Rows, int Planes, bool Regular)
{
    /// <summary>Finds the layout; null for an image without pixels or too long for an array.</summary>
    internal static ImageShape? Of(FitsImage image, HeaderKeywords header)
    {
        IReadOnlyList<long> axes = image.Axes;
        var longAxes = new List<int>(axes.Count);
        for (int i = 0; i < axes.Count; i++)
        {
            if (axes[i] is < 1 or > int.MaxValue)
            {
                return null;
            }

            if (axes[i] > 1)
            {
                longAxes.Add(i);
            }
        }

        if (axes.Count == 0)
        {
            return null;
        }

        if (longAxes.Count == 0)
        {
            int single = SpectralAmong(header, axes.Count) ?? 0;
            return new ImageShape(single + 1, 1, 1, 1, true);
        }

        int rows = longAxes.Count > 1 ? (int)axes[longAxes[1]] : 1;
        int planes = longAxes.Count > 2 ? (int)axes[longAxes[2]] : 1;
        int? named = SpectralAmong(header, axes.Count);
        int axis = named is int found && axes[found] > 1 ? found : longAxes[0];
        return new ImageShape(axis + 1, (int)axes[axis], rows, planes, axis == longAxes[0] && longAxes.Count <= 3);
    }

    /// <summary>The axis of a spectral type, from 0, or null.</summary>
    private static int? SpectralAmong(HeaderKeywords header, int count)
    {
        for (int i = 0; i < count; i++)
        {
            string type = header.Text(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"CTYPE{i + 1}"));
            if (type.Length != 0 && SpectralAxis.TrySplitType(type, out _, out _))
            {
                return i;
            }
        }

        return null;
    }
}
