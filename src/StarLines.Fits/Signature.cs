using System;

namespace StarLines.Fits;

/// <summary>The first bytes of a file.</summary>
internal static class Signature
{
    private const int ShownBytes = 12;

    internal static void RequireFits(ByteSource source, string name)
    {
        ReadOnlySpan<byte> start = source.Read(0, (int)Math.Min(source.Length, CardText.CardBytes)).Span;
        if (start.IsEmpty)
        {
            throw new FitsFormatException(name, null, null, "the file is empty; get it again.");
        }

        if (!start.StartsWith("SIMPLE"u8))
        {
            throw new FitsFormatException(name, null, null, $"not a FITS file: it starts with {Shown(start)}, expected SIMPLE = T{Cure(start)}");
        }
    }

    private static string Cure(ReadOnlySpan<byte> start)
    {
        string? tool = start.StartsWith("BZh"u8) ? "bzip2" : start.StartsWith("PK"u8) ? "zip"
            : start.StartsWith((ReadOnlySpan<byte>)[0xFD, (byte)'7', (byte)'z']) ? "xz"
            : start.StartsWith((ReadOnlySpan<byte>)[0x1F, 0x9D]) ? "compress (.Z)"
            : start.StartsWith((ReadOnlySpan<byte>)[0x28, 0xB5, 0x2F, 0xFD]) ? "zstd" : null;
        return tool is null ? "." : $"; it is compressed by {tool}: uncompress it first.";
    }

    private static string Shown(ReadOnlySpan<byte> start) =>
        $"\"{CardText.DecodeTrimmed(start[..Math.Min(ShownBytes, start.Length)])}\"";
}
