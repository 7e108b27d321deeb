using System;

namespace StarLines;

/// <summary>Why a pixel is not used; <see cref="None"/> is a good pixel.</summary>
[Flags]
public enum PixelFaults : byte
{
    /// <summary>A good pixel.</summary>
    None = 0,

    /// <summary>No finite flux; the stored value is 0 and means nothing.</summary>
    Missing = 1,

    /// <summary>Marked bad by the file's own mask.</summary>
    Flagged = 2,

    /// <summary>The uncertainty is absent, zero or not finite while the rest of the spectrum has one.</summary>
    NoSigma = 4,

    /// <summary>Excluded by the user.</summary>
    Excluded = 8,

    /// <summary>Found to be a cosmic-ray hit or another outlier.</summary>
    Outlier = 16,
}
