using System;
using System.Collections.Generic;
using System.IO;

namespace StarLines.Fits;

/// <summary>
/// An open FITS file: its HDUs, read on demand. Files up to 64 MiB are read whole when opened; larger ones stay open until disposed.
/// Not safe for use by several threads at once.
/// </summary>
public sealed class FitsFile : IDisposable
{
    private readonly ByteSource source;

    private FitsFile(string name, ByteSource source, IReadOnlyList<FitsHdu> hdus)
    {
        Name = name;
        this.source = source;
        Hdus = hdus;
    }

    /// <summary>The path, or the name that was given with the stream.</summary>
    public string Name { get; }

    /// <summary>The HDUs in order; the first is the primary. At least one.</summary>
    public IReadOnlyList<FitsHdu> Hdus { get; }

    /// <summary>The warnings of all HDUs, in their order.</summary>
    public IReadOnlyList<FitsWarning> Warnings
    {
        get
        {
            List<FitsWarning> all = [];
            foreach (FitsHdu hdu in Hdus)
            {
                all.AddRange(hdu.Warnings);
            }

            return all;
        }
    }

    /// <summary>Opens a file; a whole-file gzip is recognised by its content and undone.</summary>
    /// <param name="path">The path.</param>
    /// <param name="options">How to open it; null for the defaults.</param>
    /// <returns>The open file; dispose it.</returns>
    /// <exception cref="FitsFormatException">It is no FITS file, or its primary HDU, or the only HDU with data, is damaged.</exception>
    /// <exception cref="IOException">It cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be read.</exception>
    public static FitsFile Open(string path, FitsOptions? options = null)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        FitsOptions how = Checked(options);
        return Open(SourceOpener.Open(path, how), path, how);
    }

    /// <summary>Opens a stream, read to its end and left open; it need not be seekable, and may be gzip-compressed.</summary>
    /// <param name="stream">The stream, at the start of the FITS content.</param>
    /// <param name="name">What messages call it.</param>
    /// <param name="options">How to open it; null for the defaults.</param>
    /// <returns>The open file.</returns>
    /// <exception cref="FitsFormatException">It is no FITS content, or its primary HDU, or the only HDU with data, is damaged.</exception>
    /// <exception cref="IOException">It cannot be read.</exception>
    public static FitsFile Open(Stream stream, string name, FitsOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentNullException.ThrowIfNull(name);
        FitsOptions how = Checked(options);
        return Open(SourceOpener.Open(stream, name, how), name, how);
    }

    /// <summary>The first HDU of a name.</summary>
    /// <param name="name">The EXTNAME, in any case.</param>
    /// <returns>The HDU, or null where no HDU has that name.</returns>
    public FitsHdu? FindHdu(string name)
    {
        ArgumentNullException.ThrowIfNull(name);
        foreach (FitsHdu hdu in Hdus)
        {
            if (hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase))
            {
                return hdu;
            }
        }

        return null;
    }

    /// <summary>Gives the memory and the open file back. Headers and warnings stay readable, images and tables do not.</summary>
    public void Dispose() => source.Dispose();

    internal static FitsFile Open(ByteSource source, string name, FitsOptions options)
    {
        try
        {
            return new FitsFile(name, source, HduScanner.Scan(source, name, options));
        }
        catch
        {
            source.Dispose();
            throw;
        }
    }

    private static FitsOptions Checked(FitsOptions? options)
    {
        FitsOptions how = options ?? new FitsOptions();
        how.Validate();
        return how;
    }
}
