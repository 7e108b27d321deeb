namespace StarLines.Fits;

/// <summary>One keyword of a header: a card, with the CONTINUE cards that belong to it.</summary>
public sealed class FitsCard
{
    internal FitsCard(string keyword, FitsValueKind kind, string text, string comment)
    {
        Keyword = keyword;
        Kind = kind;
        Text = text;
        Comment = comment;
    }

    /// <summary>The keyword in capitals; for a HIERARCH card the words after HIERARCH, one space between them.</summary>
    public string Keyword { get; }

    /// <summary>What the value field holds.</summary>
    public FitsValueKind Kind { get; }

    /// <summary>The value as text: a string without its quotes and trailing blanks, a number as it is written; for a commentary card its text.</summary>
    public string Text { get; }

    /// <summary>The comment behind the value; empty where there is none.</summary>
    public string Comment { get; }
}
