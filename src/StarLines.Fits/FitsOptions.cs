using System;

namespace StarLines.Fits;

/// <summary>How FITS content is opened.</summary>
public sealed record FitsOptions
{
    /// <summary>The largest size of a gzip-compressed file, or of a tile-compressed image, once decompressed, bytes; 256 MiB by default. Larger content is refused.</summary>
    public long MaximumDecompressedBytes { get; init; } = 256L << 20;

    /// <summary>The largest size of a stream that cannot be read in place (such as standard input), bytes; 1 GiB by default. A longer stream is refused.</summary>
    public long MaximumStreamBytes { get; init; } = 1L << 30;

    /// <summary>Whether CHECKSUM and DATASUM are compared with the content on opening; a mismatch is a warning. True by default. Files over 64 MiB, which are not read whole, are not checked on opening.</summary>
    public bool VerifyChecksums { get; init; } = true;

    internal void Validate()
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(MaximumDecompressedBytes);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(MaximumStreamBytes);
    }
}
