using System;
using System.IO;
using System.IO.Compression;
using StarLines.Fits;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>An input once its format is known: an open FITS file, or a table.</summary>
internal sealed class SpectrumSource : IDisposable
{
    private static readonly string[] FitsExtensions = [".fits", ".fit", ".fts", ".fz"];

    private SpectrumSource(string name, FitsFile? fits, Table? table, string format)
    {
        Name = name;
        Fits = fits;
        Table = table;
        Format = format;
    }

    internal string Name { get; }

    internal FitsFile? Fits { get; }

    internal Table? Table { get; }

    /// <summary>The format in words.</summary>
    internal string Format { get; }

    /// <summary>Opens a file; FITS is known by its name or its first bytes.</summary>
    internal static SpectrumSource Open(string path, SpectrumReadOptions options)
    {
        if (LooksLikeFitsName(path))
        {
            return new SpectrumSource(path, FitsFile.Open(path, ToFits(options)), null, "FITS");
        }

        using FileStream stream = File.OpenRead(path);
        if (StartsAsFits(stream))
        {
            return new SpectrumSource(path, FitsFile.Open(path, ToFits(options)), null, "FITS");
        }

        return OpenContent(ReadAll(stream, path, options), path, options);
    }

    /// <summary>Opens the content of a stream.</summary>
    internal static SpectrumSource Open(Stream stream, string name, SpectrumReadOptions options) =>
        OpenContent(ReadAll(stream, name, options), name, options);

    public void Dispose() => Fits?.Dispose();

    private static SpectrumSource OpenContent(byte[] bytes, string name, SpectrumReadOptions options)
    {
        if (bytes is [0x1F, 0x8B, ..])
        {
            bytes = Unpack(bytes, name, options);
        }

        if (bytes.Length == 0)
        {
            throw new SpectrumFormatException($"{name}: The file is empty; get it again.");
        }

        if (bytes.AsSpan().StartsWith("SIMPLE  ="u8) || LooksLikeFitsName(name))
        {
            using var memory = new MemoryStream(bytes, writable: false);
            return new SpectrumSource(name, FitsFile.Open(memory, name, ToFits(options)), null, "FITS");
        }

        try
        {
            using var memory = new MemoryStream(TextPreamble.Comment(bytes), writable: false);
            return new SpectrumSource(name, null, TableReader.Read(memory, TableFormat.Auto, name), "table");
        }
        catch (TableFormatException cause)
        {
            throw new SpectrumFormatException(cause.Message, cause);
        }
    }

    private static FitsOptions ToFits(SpectrumReadOptions options) =>
        new() { MaximumDecompressedBytes = options.MaximumDecompressedBytes };

    private static bool LooksLikeFitsName(string path)
    {
        string name = path.EndsWith(".gz", StringComparison.OrdinalIgnoreCase) ? path[..^3] : path;
        foreach (string extension in FitsExtensions)
        {
            if (name.EndsWith(extension, StringComparison.OrdinalIgnoreCase))
            {
                return true;
            }
        }

        return false;
    }

    private static bool StartsAsFits(FileStream stream)
    {
        Span<byte> start = stackalloc byte[9];
        int read = stream.ReadAtLeast(start, start.Length, throwOnEndOfStream: false);
        stream.Position = 0;
        return start[..read].SequenceEqual("SIMPLE  ="u8);
    }

    private static byte[] ReadAll(Stream stream, string name, SpectrumReadOptions options)
    {
        using var memory = new MemoryStream();
        CopyLimited(stream, memory, Math.Max(options.MaximumDecompressedBytes, 1L << 30), name);
        return memory.ToArray();
    }

    private static byte[] Unpack(byte[] bytes, string name, SpectrumReadOptions options)
    {
        try
        {
            using var unpacker = new GZipStream(new MemoryStream(bytes), CompressionMode.Decompress);
            using var memory = new MemoryStream();
            CopyLimited(unpacker, memory, options.MaximumDecompressedBytes, name);
            return memory.ToArray();
        }
        catch (InvalidDataException cause)
        {
            throw new SpectrumFormatException($"{name}: The gzip data are damaged ({cause.Message}); get the file again.", cause);
        }
    }

    private static void CopyLimited(Stream from, MemoryStream to, long limit, string name)
    {
        byte[] buffer = new byte[1 << 16];
        int read;
        while ((read = from.Read(buffer, 0, buffer.Length)) > 0)
        {
            if (to.Length + read > limit)
            {
                throw new SpectrumFormatException(string.Create(
                    System.Globalization.CultureInfo.InvariantCulture,
                    $"{name}: The content is larger than {limit >> 20} MiB; cut it, or raise the limit."));
            }

            to.Write(buffer, 0, read);
        }
    }
}
