using System;
using System.Globalization;
using System.IO;

namespace StarLines.IO;

/// <summary>An input as a user names it: <c>FILE</c>, <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c>; the HDU by number (0 is the primary) or EXTNAME, the row from 1.</summary>
/// <param name="Path">The path of the file, or <c>-</c> for standard input.</param>
/// <param name="Hdu">The HDU; empty for all.</param>
/// <param name="Row">The row; 0 for all.</param>
public readonly record struct InputName(string Path, string Hdu, int Row)
{
    /// <summary>Splits a name. A file whose own name holds a <c>#</c> is found first.</summary>
    /// <param name="name">The name.</param>
    /// <returns>Its parts.</returns>
    /// <exception cref="SpectrumFormatException">The row is no whole number above 0.</exception>
    public static InputName Parse(string name)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        int hash = name.LastIndexOf('#');
        if (hash <= 0 || hash == name.Length - 1 || File.Exists(name))
        {
            return new InputName(name, "", 0);
        }

        string path = name[..hash];
        string hdu = name[(hash + 1)..];
        int colon = hdu.LastIndexOf(':');
        if (colon < 0)
        {
            return new InputName(path, hdu, 0);
        }

        return int.TryParse(hdu[(colon + 1)..], NumberStyles.None, CultureInfo.InvariantCulture, out int row) && row > 0
            ? new InputName(path, hdu[..colon], row)
            : throw new SpectrumFormatException($"{name}: '{hdu[(colon + 1)..]}' is no row; rows count from 1.");
    }
}
