using System;
using System.Globalization;
using System.IO;
using System.Text;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Writing;

/// <summary>
/// Puts one HDU on a stream. The data are produced twice: first for their checksum, which stands before them, then to be written; so nothing is held in memory
/// and the stream need not be seekable. Pieces but for the last hold whole words of four bytes.
/// </summary>
internal sealed class HduBytes(Stream stream, CardWriter structure, FitsHeaderBuilder? header, long dataBytes)
{
    private const string UnknownChecksum = "0000000000000000";

    private uint dataSum;

    /// <summary>Whether a pass writes: first not, then yes.</summary>
    internal static bool[] Passes => [false, true];

    internal void Add(ReadOnlySpan<byte> data, bool isWriting)
    {
        if (isWriting)
        {
            stream.Write(data);
        }
        else
        {
            dataSum = Checksum.Add(data, dataSum);
        }
    }

    /// <summary>Ends a pass: the first with the header, the second with the padding.</summary>
    internal void Finish(bool isWriting)
    {
        if (isWriting)
        {
            stream.Write(new byte[HeaderScanner.RoundUp(dataBytes) - dataBytes]);
            return;
        }

        byte[] draft = Header(UnknownChecksum);
        stream.Write(Header(Checksum.Encode(Checksum.Add(draft, dataSum))));
    }

    private byte[] Header(string checksum)
    {
        CardWriter end = new();
        end.Add("CHECKSUM", checksum, "of the HDU");
        end.Add("DATASUM", dataSum.ToString(CultureInfo.InvariantCulture), "of the data");
        StringBuilder text = new();
        Append(text, structure);
        if (structure.HasLongText || header is { Cards.HasLongText: true })
        {
            CardWriter convention = new();
            convention.Add("LONGSTRN", "OGIP 1.0", "long strings go on in CONTINUE cards");
            Append(text, convention);
        }

        if (header is not null)
        {
            Append(text, header.Cards);
        }

        Append(text, end);
        text.Append("END");
        return Encoding.ASCII.GetBytes(text.ToString().PadRight((int)HeaderScanner.RoundUp(text.Length)));
    }

    private static void Append(StringBuilder text, CardWriter cards)
    {
        foreach (string card in cards.Cards)
        {
            text.Append(card);
        }
    }
}
