using System;
using System.Text;

namespace StarLines.Fits;

/// <summary>Bytes of a header as text.</summary>
internal static class CardText
{
    internal const int CardBytes = 80;
    internal const int BlockBytes = 2880;

    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    internal static bool IsPlain(ReadOnlySpan<byte> bytes) => bytes.IndexOfAnyExceptInRange((byte)0x20, (byte)0x7E) < 0;

    /// <summary>ASCII as it is; other bytes as UTF-8 where they are that, else as Latin-1; control characters become blanks.</summary>
    internal static string Decode(ReadOnlySpan<byte> bytes)
    {
        if (IsPlain(bytes))
        {
            return Encoding.ASCII.GetString(bytes);
        }

        string text;
        try
        {
            text = StrictUtf8.GetString(bytes);
        }
        catch (DecoderFallbackException)
        {
            text = Encoding.Latin1.GetString(bytes);
        }

        return string.Create(text.Length, text, static (target, source) =>
        {
            for (int i = 0; i < source.Length; i++)
            {
                target[i] = char.IsControl(source[i]) ? ' ' : source[i];
            }
        });
    }

    internal static string DecodeTrimmed(ReadOnlySpan<byte> bytes) => Decode(bytes).Trim(' ');

    internal static ReadOnlySpan<byte> TrimEnd(ReadOnlySpan<byte> bytes) => bytes.TrimEnd((byte)' ');

    internal static ReadOnlySpan<byte> Trim(ReadOnlySpan<byte> bytes) => bytes.Trim((byte)' ');
}
