using System;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits;

/// <summary>CHECKSUM and DATASUM. Source: FITS Standard 4.0, section 4.4.2.7 and appendix J.</summary>
internal static class ChecksumCheck
{
    /// <summary>A whole number of blocks, so that words never straddle two pieces.</summary>
    private const int PieceBytes = CardText.BlockBytes * 364;

    /// <summary>The ones' complement sum of an HDU whose CHECKSUM is right: all bits set (or, by definition the same, none).</summary>
    private const uint AllOnes = uint.MaxValue;

    internal static FitsChecksum Verify(HduData data, FitsHeader header, long headerOffset)
    {
        bool hasData = header.TryGetString("DATASUM", out string? text);
        bool hasHdu = header.TryGetString("CHECKSUM", out string? sum) && sum.Length == 16;
        if (!hasData && !hasHdu)
        {
            return new FitsChecksum(FitsChecksumStatus.Absent, FitsChecksumStatus.Absent);
        }

        uint dataSum = Sum(data.Source, data.Offset, data.Offset + HeaderScanner.RoundUp(data.Layout.DataBytes), 0);
        uint hduSum = Sum(data.Source, headerOffset, data.Offset, dataSum);
        return new FitsChecksum(
            uint.TryParse(text?.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out uint stated) ? Status(stated == dataSum) : FitsChecksumStatus.Absent,
            hasHdu ? Status(hduSum is AllOnes or 0) : FitsChecksumStatus.Absent);
    }

    internal static void Warn(FitsChecksum checksum, HduContext context)
    {
        if (checksum.Data == FitsChecksumStatus.Wrong)
        {
            context.Warn("datasum", "DATASUM", "The data do not agree with DATASUM: they have changed since the file was written. Get the file again, or write the checksum anew if the change was meant.");
        }

        if (checksum.Hdu == FitsChecksumStatus.Wrong)
        {
            context.Warn("checksum", "CHECKSUM", "Header and data do not agree with CHECKSUM: the HDU has changed since it was written.");
        }
    }

    private static FitsChecksumStatus Status(bool right) => right ? FitsChecksumStatus.Correct : FitsChecksumStatus.Wrong;

    private static uint Sum(ByteSource source, long start, long end, uint sum)
    {
        end = Math.Min(end, source.Length);
        for (long at = start; at < end; at += PieceBytes)
        {
            sum = Checksum.Add(source.Read(at, (int)Math.Min(PieceBytes, end - at)).Span, sum);
        }

        return sum;
    }
}
