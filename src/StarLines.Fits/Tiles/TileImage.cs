using System;

namespace StarLines.Fits;

internal sealed class TileImage
{
    internal int BitPix { get; private init; }

    internal long[] Axes { get; private init; } = [];

    internal long PixelCount { get; private init; }

    internal static TileImage Open(HduData data, FitsHeader header, FitsTable table) => throw data.Context.Error("ZIMAGE", "tile-compressed images are not read yet.");

    internal void ReadDoubles(long firstIndex, in Scaling scaling, Span<double> destination) => throw new NotSupportedException();

    internal void ReadStoredIntegers(long firstIndex, Span<long> destination) => throw new NotSupportedException();
}
