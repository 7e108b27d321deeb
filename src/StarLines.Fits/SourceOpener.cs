using System;
using System.Buffers;
using System.Globalization;
using System.IO;
using System.IO.Compression;
using Microsoft.Win32.SafeHandles;

namespace StarLines.Fits;

/// <summary>Turns files and streams into byte sources; undoes gzip.</summary>
internal static class SourceOpener
{
    /// <summary>Files up to this size are read in one go, larger ones on demand: a spectrum costs one read, a survey table no memory.</summary>
    internal const long WholeFileBytes = 64L << 20;

    /// <summary>No deflate stream expands more than 1032 : 1, so nothing larger is set aside on the word of the file.</summary>
    private const long MaximumDeflateRatio = 1032;

    private const int GzipTrailerBytes = 8;

    private const int FirstBufferBytes = 1 << 16;

    private static ReadOnlySpan<byte> EndMark => "end of gzip content"u8;

    internal static ByteSource Open(string path, FitsOptions options)
    {
        SafeFileHandle handle = File.OpenHandle(path);
        try
        {
            if (TryGetLength(handle) is not long length)
            {
                using FileStream stream = new(handle, FileAccess.Read);
                return Open(stream, path, options);
            }

            byte[] start = new byte[2];
            ByteSource.ReadExactly(handle, start.AsSpan(0, (int)Math.Min(2, length)), 0);
            if (length > WholeFileBytes && !IsGzip(start))
            {
                return new ByteSource.Handle(handle, length);
            }

            RefuseLonger(length, Math.Max(WholeFileBytes, options.MaximumStreamBytes), path, nameof(FitsOptions.MaximumStreamBytes));
            byte[] bytes = ArrayPool<byte>.Shared.Rent((int)length);
            ByteSource.Pooled whole = new(bytes, (int)length);
            ByteSource.ReadExactly(handle, bytes.AsSpan(0, (int)length), 0);
            handle.Dispose();
            return IsGzip(start) ? Unpacked(whole, path, options) : whole;
        }
        catch
        {
            handle.Dispose();
            throw;
        }
    }

    internal static ByteSource Open(Stream stream, string name, FitsOptions options) =>
        FromMemory(ReadAll(stream, FirstBufferBytes, options.MaximumStreamBytes, name, nameof(FitsOptions.MaximumStreamBytes)), name, options);

    internal static ByteSource FromMemory(ReadOnlyMemory<byte> bytes, string name, FitsOptions options) =>
        new ByteSource.Memory(IsGzip(bytes.Span) ? Gunzip(bytes, name, options) : bytes);

    private static ByteSource.Memory Unpacked(ByteSource.Pooled whole, string path, FitsOptions options)
    {
        using (whole)
        {
            return new ByteSource.Memory(Gunzip(whole.Read(0, (int)whole.Length), path, options));
        }
    }

    private static bool IsGzip(ReadOnlySpan<byte> bytes) => bytes.Length >= 2 && bytes[0] == 0x1F && bytes[1] == 0x8B;

    private static long? TryGetLength(SafeFileHandle handle)
    {
        try
        {
            return RandomAccess.GetLength(handle);
        }
        catch (NotSupportedException)
        {
            // A pipe or a terminal has no length.
            return null;
        }
    }

    private static ReadOnlyMemory<byte> Gunzip(ReadOnlyMemory<byte> compressed, string name, FitsOptions options)
    {
        long stated = compressed.Length < GzipTrailerBytes ? 0 : BitConverter.ToUInt32(compressed.Span[^4..]);
        long first = Math.Min(Math.Min(stated, compressed.Length * MaximumDeflateRatio), options.MaximumDecompressedBytes) + EndMark.Length + 1;
        ReadOnlyMemory<byte> content;
        try
        {
            using MemoryStream input = new([.. compressed.Span, .. CompressedEndMark()], writable: false);
            using GZipStream gunzip = new(input, CompressionMode.Decompress);
            content = ReadAll(gunzip, Math.Max(first, FirstBufferBytes), options.MaximumDecompressedBytes + EndMark.Length, name, nameof(FitsOptions.MaximumDecompressedBytes));
        }
        catch (InvalidDataException damage)
        {
            throw DamagedGzip(name, damage);
        }

        return content.Span.EndsWith(EndMark) ? content[..^EndMark.Length] : throw DamagedGzip(name, null);
    }

    /// <summary>A gzip member of its own, put behind the content: it comes out only if the content's last member is complete, which the decompressor does not tell.</summary>
    private static ReadOnlySpan<byte> CompressedEndMark()
    {
        using MemoryStream output = new();
        using (GZipStream gzip = new(output, CompressionLevel.Fastest, leaveOpen: true))
        {
            gzip.Write(EndMark);
        }

        return output.ToArray();
    }

    private static FitsFormatException DamagedGzip(string name, Exception? cause) =>
        new(name, null, null, "the gzip stream is damaged, cut short, or followed by something else; get the file again.", cause);

    private static ReadOnlyMemory<byte> ReadAll(Stream stream, long firstBytes, long limit, string name, string option)
    {
        byte[] buffer = GC.AllocateUninitializedArray<byte>((int)Math.Min(firstBytes, Array.MaxLength));
        int count = 0;
        for (int got = stream.Read(buffer, 0, buffer.Length); got > 0; got = stream.Read(buffer, count, buffer.Length - count))
        {
            count += got;
            RefuseLonger(count, limit, name, option);
            if (count == buffer.Length)
            {
                RefuseLonger(count + 1L, Array.MaxLength, name, option);
                Array.Resize(ref buffer, (int)Math.Min(2L * count, Array.MaxLength));
            }
        }

        return buffer.AsMemory(0, count);
    }

    private static void RefuseLonger(long length, long limit, string name, string option)
    {
        if (length > limit || length > Array.MaxLength)
        {
            throw new FitsFormatException(name, null, null, string.Create(
                CultureInfo.InvariantCulture,
                $"the content is larger than {Math.Min(limit, Array.MaxLength)} bytes, the most that is read into memory; write it to an uncompressed file, or raise {option}."));
        }
    }
}
