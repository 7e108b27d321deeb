namespace StarLines.Tables.Ecsv;

/// <summary>A line of YAML: its number in the file, its indentation and what follows.</summary>
internal readonly record struct YamlLine(int Number, int Indent, string Content)
{
    /// <summary>True where the line begins an item of a list.</summary>
    internal bool IsItem => Content == "-" || Content.StartsWith("- ", System.StringComparison.Ordinal);

    /// <summary>Splits a line into indentation and content.</summary>
    internal static YamlLine From(int number, string text)
    {
        string content = text.TrimStart(' ');
        return new YamlLine(number, text.Length - content.Length, content.TrimEnd(' ', '\t', '\r'));
    }
}
