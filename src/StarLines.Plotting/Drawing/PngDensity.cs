using System;
using System.Buffers.Binary;

namespace StarLines.Plotting.Drawing;

/// <summary>Writes into a PNG file how large it is in print.</summary>
internal static class PngDensity
{
    /// <summary>Signature and the chunk IHDR, which always come first and have this length together.</summary>
    private const int HeaderLength = 33;

    private const int ChunkLength = 21;
    private const double MetresPerInch = 0.0254;

    /// <summary>The file with a chunk pHYs after its header (PNG, third edition, 11.3.4.3).</summary>
    internal static byte[] Insert(ReadOnlySpan<byte> png, int dotsPerInch)
    {
        var file = new byte[png.Length + ChunkLength];
        png[..HeaderLength].CopyTo(file);
        Span<byte> chunk = file.AsSpan(HeaderLength, ChunkLength);
        var perMetre = (uint)Math.Round(dotsPerInch / MetresPerInch);
        BinaryPrimitives.WriteUInt32BigEndian(chunk, 9);
        "pHYs"u8.CopyTo(chunk[4..]);
        BinaryPrimitives.WriteUInt32BigEndian(chunk[8..], perMetre);
        BinaryPrimitives.WriteUInt32BigEndian(chunk[12..], perMetre);
        chunk[16] = 1;
        BinaryPrimitives.WriteUInt32BigEndian(chunk[17..], Checksum(chunk[4..17]));
        png[HeaderLength..].CopyTo(file.AsSpan(HeaderLength + ChunkLength));
        return file;
    }

    /// <summary>The CRC of a chunk's type and data (PNG, third edition, annex D).</summary>
    private static uint Checksum(ReadOnlySpan<byte> bytes)
    {
        uint crc = 0xFFFFFFFF;
        foreach (byte value in bytes)
        {
            crc ^= value;
            for (int bit = 0; bit < 8; bit++)
            {
                crc = (crc & 1) != 0 ? 0xEDB88320 ^ (crc >> 1) : crc >> 1;
            }
        }

        return ~crc;
    }
}
