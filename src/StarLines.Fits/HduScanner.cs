using System.Collections.Generic;
using System.Globalization;

namespace StarLines.Fits;

/// <summary>Walks through a file from HDU to HDU.</summary>
internal static class HduScanner
{
    internal static List<FitsHdu> Scan(ByteSource source, string name, FitsOptions options)
    {
        Signature.RequireFits(source, name);
        List<FitsHdu> hdus = [];
        long offset = 0;
        while (offset < source.Length && (hdus.Count == 0 || IsExtension(source, offset, hdus[^1])))
        {
            HduContext context = new(name, hdus.Count);
            FitsHdu hdu = ReadHdu(source, offset, context, hdus, options, out offset);
            hdus.Add(hdu);
        }

        FitsHdu? damaged = hdus.Find(hdu => hdu.Damage is not null);
        return damaged is null || hdus.Exists(hdu => hdu.HasData) ? hdus : throw damaged.Damage!;
    }

    private static FitsHdu ReadHdu(ByteSource source, long offset, HduContext context, List<FitsHdu> before, FitsOptions options, out long next)
    {
        next = source.Length;
        FitsHeader? header = null;
        try
        {
            header = HeaderScanner.Read(source, offset, context, out long dataOffset);
            HduLayout layout = HduLayout.Of(header, context);
            next = dataOffset + HeaderScanner.RoundUp(layout.DataBytes);
            if (before.Count > 0)
            {
                LetInherit(header, before[0]);
            }

            return FitsHdu.Read(new HduData(source, dataOffset, layout, context, options), header, offset);
        }
        catch (FitsFormatException damage) when (context.Number > 0)
        {
            context.Warn("damaged", damage.Keyword ?? "", damage.Problem);
            return FitsHdu.Broken(context, header ?? new FitsHeader(context, default, []), damage);
        }
    }

    /// <summary>An extension may inherit from a primary header that has no data.</summary>
    private static void LetInherit(FitsHeader header, FitsHdu primary)
    {
        if (primary.Kind == FitsHduKind.Empty && header.TryGetCard("INHERIT", out FitsCard? card) && card.Text == "T")
        {
            header.Inherited = primary.Header;
        }
    }

    /// <summary>Whether an extension starts here; anything else after the last HDU is left alone, with a warning.</summary>
    private static bool IsExtension(ByteSource source, long offset, FitsHdu last)
    {
        long left = source.Length - offset;
        if (left >= CardText.CardBytes && KeywordCode.OfCard(source.Read(offset, CardText.CardBytes).Span) == KeywordCode.Extension)
        {
            return true;
        }

        last.Context.Warn("trailing-bytes", "", string.Create(
            CultureInfo.InvariantCulture, $"{left} bytes after the data of HDU {last.Number} are no extension (no XTENSION keyword); they were left out."));
        return false;
    }
}
