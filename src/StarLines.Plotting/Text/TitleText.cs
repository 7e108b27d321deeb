using System;
using System.Collections.Generic;
using System.IO;

namespace StarLines.Plotting.Text;

/// <summary>Headings of figures.</summary>
internal static class TitleText
{
    /// <summary>The target, or else the name of the file; then the instrument.</summary>
    internal static string Of(SpectrumMetadata metadata)
    {
        var parts = new List<string>();
        string name = metadata.Target.Trim();
        if (name.Length == 0)
        {
            name = Path.GetFileName(metadata.Source.Replace('\\', '/'));
        }

        foreach (string part in (string[])[name, metadata.Instrument.Trim()])
        {
            if (part.Length != 0 && !parts.Exists(known => known.Equals(part, StringComparison.OrdinalIgnoreCase)))
            {
                parts.Add(part);
            }
        }

        return string.Join("  ·  ", parts);
    }
}
