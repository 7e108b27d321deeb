using System.Collections.Generic;

namespace StarLines.Fits;

/// <summary>One header and data unit.</summary>
public sealed class FitsHdu
{
    private readonly HduData? data;
    private readonly long headerOffset;

    private FitsHdu(HduContext context, FitsHeader header, HduData? data, long headerOffset)
    {
        Context = context;
        Header = header;
        this.data = data;
        this.headerOffset = headerOffset;
        Name = header.TryGetString("EXTNAME", out string? name) ? name.Trim() : "";
    }

    /// <summary>The number in the file, 0 for the primary HDU.</summary>
    public int Number => Context.Number;

    /// <summary>The EXTNAME; empty where there is none.</summary>
    public string Name { get; }

    /// <summary>What the HDU holds.</summary>
    public FitsHduKind Kind { get; private set; }

    /// <summary>The header.</summary>
    public FitsHeader Header { get; }

    /// <summary>The image, also of a tile-compressed one; null for other kinds.</summary>
    public FitsImage? Image { get; private set; }

    /// <summary>The table; null for other kinds. A tile-compressed image is no table here.</summary>
    public FitsTable? Table { get; private set; }

    /// <summary>Why the HDU cannot be read; null unless <see cref="Kind"/> is <see cref="FitsHduKind.Damaged"/>.</summary>
    public FitsFormatException? Damage { get; private set; }

    /// <summary>What in the HDU is not as the standard asks and was read all the same. Reading data may add to it.</summary>
    public IReadOnlyList<FitsWarning> Warnings
    {
        get
        {
            Header.Check();
            return Context.Warnings;
        }
    }

    internal HduContext Context { get; }

    internal bool HasData => Image is { PixelCount: > 0 } || Table is not null || Kind is FitsHduKind.RandomGroups or FitsHduKind.Other;

    /// <summary>Compares the content with CHECKSUM and DATASUM. Reads the whole HDU.</summary>
    /// <returns>What the two keywords say; absent for a damaged or truncated HDU.</returns>
    public FitsChecksum VerifyChecksum() =>
        data is null || data.IsTruncated ? new FitsChecksum(FitsChecksumStatus.Absent, FitsChecksumStatus.Absent) : ChecksumCheck.Verify(data, Header, headerOffset);

    internal static FitsHdu Broken(HduContext context, FitsHeader header, FitsFormatException damage) =>
        new(context, header, null, 0) { Kind = FitsHduKind.Damaged, Damage = damage };

    internal static FitsHdu Read(HduData data, FitsHeader header, long headerOffset)
    {
        FitsHdu hdu = new(data.Context, header, data, headerOffset);
        hdu.CheckPrimary();
        hdu.Classify(data);
        hdu.CheckSize(data);
        if (data.Options.VerifyChecksums && data.Source.InMemory)
        {
            ChecksumCheck.Warn(hdu.VerifyChecksum(), data.Context);
        }

        return hdu;
    }

    private void CheckPrimary()
    {
        if (Number == 0 && !(Header.TryGetCard("SIMPLE", out FitsCard? card) && card.Text == "T"))
        {
            Context.Warn("not-simple", "SIMPLE", "SIMPLE is not T: the file says that it does not conform to the FITS standard; it was read as if it did.");
        }
    }

    private void Classify(HduData source)
    {
        HduLayout layout = source.Layout;
        switch (layout.Extension)
        {
            case "BINTABLE" or "A3DTABLE":
                ReadTable(source);
                break;
            case "TABLE":
                Kind = FitsHduKind.AsciiTable;
                Table = FitsTable.Read(source, Header, isAscii: true);
                break;
            case "" or "IMAGE" or "IUEIMAGE" when !layout.IsGroups:
                Kind = layout.Axes.Length == 0 ? FitsHduKind.Empty : FitsHduKind.Image;
                Image = Kind == FitsHduKind.Empty ? null : FitsImage.Read(source, Header);
                break;
            default:
                Kind = layout.IsGroups ? FitsHduKind.RandomGroups : FitsHduKind.Other;
                break;
        }
    }

    private void ReadTable(HduData source)
    {
        FitsTable table = FitsTable.Read(source, Header, isAscii: false);
        if (Header.TryGetCard("ZIMAGE", out FitsCard? card) && card.Text == "T")
        {
            Kind = FitsHduKind.CompressedImage;
            Image = FitsImage.ReadCompressed(source, Header, table);
            return;
        }

        Kind = FitsHduKind.BinaryTable;
        Table = table;
    }

    private void CheckSize(HduData source)
    {
        if (source.IsTruncated)
        {
            Context.Warn("truncated", "", System.FormattableString.Invariant(
                $"The file ends after {source.StoredBytes} of the {source.Layout.DataBytes} bytes of data; what is missing is undefined. Get the file again."));
        }
        else if (source.Offset + HeaderScanner.RoundUp(source.Layout.DataBytes) > source.Source.Length)
        {
            Context.Warn("no-padding", "", "The last block is not filled up to 2880 bytes; all data are there.");
        }
    }
}
