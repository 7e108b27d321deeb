using System;

namespace StarLines.Fits;

/// <summary>The data part of one HDU: where it lies and how much of it is really there.</summary>
internal sealed class HduData(ByteSource source, long offset, HduLayout layout, HduContext context, FitsOptions options)
{
    internal ByteSource Source { get; } = source;

    internal long Offset { get; } = offset;

    internal HduLayout Layout { get; } = layout;

    internal HduContext Context { get; } = context;

    internal FitsOptions Options { get; } = options;

    /// <summary>The bytes that are stored: what the header states, or less in a file that was cut short.</summary>
    internal long StoredBytes { get; } = Math.Clamp(source.Length - offset, 0, layout.DataBytes);

    internal bool IsTruncated => StoredBytes < Layout.DataBytes;

    /// <summary>Bytes of the data part; the caller has checked them against <see cref="StoredBytes"/>.</summary>
    internal ReadOnlyMemory<byte> Read(long start, int count) => Source.Read(Offset + start, count);
}
