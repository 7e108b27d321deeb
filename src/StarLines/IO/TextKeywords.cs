using System.Diagnostics.CodeAnalysis;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>Keywords from the metadata of a table.</summary>
internal sealed class TextKeywords(TableMetadata metadata) : HeaderKeywords
{
    internal override bool TryGet(string name, [NotNullWhen(true)] out string? text, out string comment)
    {
        text = metadata.TextOf(name);
        comment = "";
        return text.Length != 0;
    }
}
