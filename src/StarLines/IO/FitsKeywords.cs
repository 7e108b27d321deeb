using System.Diagnostics.CodeAnalysis;
using StarLines.Fits;

namespace StarLines.IO;

/// <summary>Keywords of an HDU; what it has not is looked up in the primary header.</summary>
internal sealed class FitsKeywords(FitsHeader own, FitsHeader? primary = null) : HeaderKeywords
{
    internal override bool TryGet(string name, [NotNullWhen(true)] out string? text, out string comment)
    {
        if (Find(own, name, out text, out comment))
        {
            return true;
        }

        return primary is not null && !ReferenceEquals(primary, own) && Find(primary, name, out text, out comment);
    }

    private static bool Find(FitsHeader header, string name, [NotNullWhen(true)] out string? text, out string comment)
    {
        if (header.TryGetCard(name, out FitsCard? card)
            && card.Kind is not (FitsValueKind.Commentary or FitsValueKind.Undefined))
        {
            text = card.Text;
            comment = card.Comment;
            return true;
        }

        text = null;
        comment = "";
        return false;
    }
}
