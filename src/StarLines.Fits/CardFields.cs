using System;

namespace StarLines.Fits;

/// <summary>Where the parts of a card lie, and what was wrong with it.</summary>
internal readonly ref struct CardFields
{
    /// <summary>A value follows the keyword when columns 9 and 10 hold this.</summary>
    private const int ValueColumn = 8;

    private CardFields(FitsValueKind kind, ReadOnlySpan<byte> value, ReadOnlySpan<byte> comment, string? fault)
    {
        Kind = kind;
        Value = value;
        Comment = comment;
        Fault = fault;
    }

    internal FitsValueKind Kind { get; }

    /// <summary>The value field without blanks around it; of a string what stands between its quotes.</summary>
    internal ReadOnlySpan<byte> Value { get; }

    internal ReadOnlySpan<byte> Comment { get; }

    /// <summary>What the standard does not allow, but was read; null if all is well.</summary>
    internal string? Fault { get; }

    /// <summary>A card of free text.</summary>
    internal static CardFields Free(ReadOnlySpan<byte> card) =>
        new(FitsValueKind.Commentary, CardText.TrimEnd(card[KeywordCode.Length..]), default, null);

    /// <summary>Splits a card whose keyword has at most eight characters.</summary>
    internal static CardFields OfCard(ReadOnlySpan<byte> card)
    {
        if (card[ValueColumn] != '=')
        {
            return Free(card);
        }

        CardFields fields = OfField(card[(ValueColumn + 1)..]);
        return card[ValueColumn + 1] == ' ' || fields.Fault is not null
            ? fields
            : new CardFields(fields.Kind, fields.Value, fields.Comment, "no blank after the equals sign");
    }

    /// <summary>Splits what follows the equals sign.</summary>
    internal static CardFields OfField(ReadOnlySpan<byte> field)
    {
        ReadOnlySpan<byte> text = field.TrimStart((byte)' ');
        return text.IsEmpty || text[0] != '\'' ? OfPlainField(text) : OfString(text[1..]);
    }

    private static CardFields OfString(ReadOnlySpan<byte> text)
    {
        int end = 0;
        while (end < text.Length)
        {
            if (text[end] != '\'')
            {
                end++;
            }
            else if (end + 1 < text.Length && text[end + 1] == '\'')
            {
                end += 2;
            }
            else
            {
                break;
            }
        }

        if (end >= text.Length)
        {
            return new CardFields(FitsValueKind.Text, text, default, "a string without its closing quote");
        }

        ReadOnlySpan<byte> rest = text[(end + 1)..].TrimStart((byte)' ');
        string? fault = rest.IsEmpty || rest[0] == '/' ? null : "text behind the closing quote without a slash";
        return new CardFields(FitsValueKind.Text, text[..end], CommentOf(rest), fault);
    }

    private static CardFields OfPlainField(ReadOnlySpan<byte> text)
    {
        int slash = text.IndexOf((byte)'/');
        ReadOnlySpan<byte> value = CardText.TrimEnd(slash < 0 ? text : text[..slash]);
        ReadOnlySpan<byte> comment = slash < 0 ? default : CommentOf(text[slash..]);
        FitsValueKind kind = FitsNumber.Classify(value);
        string? fault = null;
        if (kind == FitsValueKind.Invalid && TryCutAtBlank(value, out ReadOnlySpan<byte> first, out ReadOnlySpan<byte> rest))
        {
            // A number or T or F, then words without the slash that starts a comment.
            kind = FitsNumber.Classify(first);
            value = first;
            comment = rest;
            fault = "a comment without a slash before it";
        }
        else if (kind == FitsValueKind.Real && value.IndexOfAny((byte)'e', (byte)'d') >= 0)
        {
            fault = "a lower-case exponent letter";
        }

        return new CardFields(kind, value, comment, kind == FitsValueKind.Invalid ? "a value that is no string, number or logical" : fault);
    }

    /// <summary>Whether the first word is a value and a word that starts with a letter follows it.</summary>
    private static bool TryCutAtBlank(ReadOnlySpan<byte> value, out ReadOnlySpan<byte> first, out ReadOnlySpan<byte> rest)
    {
        int blank = value.IndexOf((byte)' ');
        first = blank < 0 ? value : value[..blank];
        rest = blank < 0 ? default : CardText.Trim(value[blank..]);
        return !rest.IsEmpty && char.IsAsciiLetter((char)rest[0])
            && FitsNumber.Classify(first) is FitsValueKind.Logical or FitsValueKind.WholeNumber or FitsValueKind.Real;
    }

    private static ReadOnlySpan<byte> CommentOf(ReadOnlySpan<byte> rest) =>
        CardText.Trim(rest.IsEmpty || rest[0] != '/' ? rest : rest[1..]);
}
