using System;
using System.Collections.Generic;

namespace StarLines.Fits;

/// <summary>Finds where a header ends.</summary>
internal static class HeaderScanner
{
    /// <summary>Ten times the longest headers of observatories; a header that goes on further has lost its END.</summary>
    private const int MaximumCards = 131_072;

    /// <summary>Reads a header.</summary>
    /// <param name="source">The file.</param>
    /// <param name="offset">Where the header starts.</param>
    /// <param name="context">Its place.</param>
    /// <param name="dataOffset">Receives where the data start; it may lie beyond the end of the file.</param>
    internal static FitsHeader Read(ByteSource source, long offset, HduContext context, out long dataOffset)
    {
        List<ulong> codes = new(72);
        if (!TryFindEnd(source, offset, codes))
        {
            throw context.Error("END", codes.Count >= MaximumCards
                ? FormattableString.Invariant($"no END card in the first {MaximumCards} cards; the header is damaged.")
                : FormattableString.Invariant($"the header has no END card: after {codes.Count} cards comes the end of the file or something that is no card; the file is damaged or cut short, get it again."));
        }

        int bytes = codes.Count * CardText.CardBytes;
        dataOffset = offset + RoundUp(bytes + CardText.CardBytes);

        // The header keeps its own copy, as it may outlive the open file.
        return new FitsHeader(context, source.Read(offset, bytes).ToArray(), [.. codes]);
    }

    internal static long RoundUp(long bytes) => (bytes + CardText.BlockBytes - 1) / CardText.BlockBytes * CardText.BlockBytes;

    private static bool TryFindEnd(ByteSource source, long offset, List<ulong> codes)
    {
        while (codes.Count < MaximumCards)
        {
            long at = offset + ((long)codes.Count * CardText.CardBytes);
            int count = (int)Math.Min(CardText.BlockBytes, source.Length - at) / CardText.CardBytes;
            if (count <= 0)
            {
                return false;
            }

            ReadOnlySpan<byte> block = source.Read(at, count * CardText.CardBytes).Span;
            for (int i = 0; i < count; i++)
            {
                ulong code = KeywordCode.OfCard(block[(i * CardText.CardBytes)..]);
                if (code == KeywordCode.End)
                {
                    return true;
                }

                if (IsBinary(code))
                {
                    return false;
                }

                codes.Add(code);
            }
        }

        return false;
    }

    /// <summary>Whether a keyword field holds a NUL or a byte above 0x7F, as data do and keywords, even misspelt ones, do not.</summary>
    private static bool IsBinary(ulong code)
    {
        const ulong Ones = 0x0101010101010101;
        const ulong Highs = 0x8080808080808080;
        return (code & Highs) != 0 || ((code - Ones) & ~code & Highs) != 0;
    }
}
