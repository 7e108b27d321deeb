using System;
using System.Collections.Generic;
using System.Text;

namespace StarLines.Fits;

/// <content>Finding and reading single cards.</content>
public sealed partial class FitsHeader
{
    private const string HierarchWord = "HIERARCH ";

    /// <summary>Keywords that describe one HDU's own structure and content, and so are never inherited.</summary>
    private static readonly string[] OwnKeywords =
    [
        "SIMPLE", "XTENSION", "BITPIX", "NAXIS", "EXTEND", "PCOUNT", "GCOUNT", "GROUPS", "TFIELDS", "THEAP", "BSCALE", "BZERO", "BLANK",
        "BUNIT", "CHECKSUM", "DATASUM", "EXTNAME", "EXTVER", "EXTLEVEL", "INHERIT", "LONGSTRN",
    ];

    internal ReadOnlySpan<byte> CardBytesAt(int index) => cards.Span.Slice(index * CardText.CardBytes, CardText.CardBytes);

    /// <summary>A whole number of the structure: absent, of another type or out of range is an error, whatever a lenient reader would take.</summary>
    internal long RequireInteger(string keyword, long minimum, long maximum)
    {
        int index = FindOwn(keyword);
        if (index < 0)
        {
            throw context.Error(keyword, "the keyword is missing, though the structure needs it; correct the header.");
        }

        CardFields fields = FieldsAt(index);
        return fields.Kind == FitsValueKind.WholeNumber && FitsNumber.TryParseInteger(fields.Value, out long value) && value >= minimum && value <= maximum
            ? value
            : throw Wrong(keyword, fields, FormattableString.Invariant($"a whole number from {minimum} to {maximum}"));
    }

    internal long OptionalInteger(string keyword, long minimum, long maximum, long absent) =>
        FindOwn(keyword) < 0 ? absent : RequireInteger(keyword, minimum, maximum);

    /// <summary>Whether a keyword stands more than once, with values that differ.</summary>
    internal bool HasContradiction(string keyword)
    {
        ulong code = KeywordCode.Of(keyword);
        int first = Array.IndexOf(codes, code);
        int next = first < 0 ? -1 : Array.IndexOf(codes, code, first + 1);
        return next >= 0 && !FieldsAt(first).Value.SequenceEqual(FieldsAt(next).Value);
    }

    private FitsHeader? Find(string keyword, out int index)
    {
        index = FindOwn(keyword);
        if (index >= 0)
        {
            return this;
        }

        if (Inherited is null || IsOwnKeyword(keyword))
        {
            return null;
        }

        index = Inherited.FindOwn(keyword);
        return index < 0 ? null : Inherited;
    }

    private static bool IsOwnKeyword(string keyword) =>
        keyword.StartsWith("NAXIS", StringComparison.OrdinalIgnoreCase)
        || Array.Exists(OwnKeywords, own => own.Equals(keyword, StringComparison.OrdinalIgnoreCase));

    private int FindOwn(string keyword)
    {
        ulong code = KeywordCode.Of(keyword);
        int index = code == 0 ? -1 : Array.IndexOf(codes, code);
        if (index >= 0 || Array.IndexOf(codes, KeywordCode.Hierarch) < 0)
        {
            return index;
        }

        string words = keyword.StartsWith(HierarchWord, StringComparison.OrdinalIgnoreCase) ? keyword[HierarchWord.Length..] : keyword;
        return HierarchIndex().GetValueOrDefault(OneSpaced(words), -1);
    }

    private Dictionary<string, int> HierarchIndex()
    {
        if (hierarch is null)
        {
            Dictionary<string, int> found = new(StringComparer.OrdinalIgnoreCase);
            for (int i = 0; i < codes.Length; i++)
            {
                if (codes[i] == KeywordCode.Hierarch && HierarchName(i) is { Length: > 0 } name)
                {
                    found.TryAdd(name, i);
                }
            }

            hierarch = found;
        }

        return hierarch;
    }

    /// <summary>The words between HIERARCH and the equals sign; empty where there is none.</summary>
    private string HierarchName(int index)
    {
        ReadOnlySpan<byte> rest = CardBytesAt(index)[KeywordCode.Length..];
        int equals = rest.IndexOf((byte)'=');
        return equals < 0 ? "" : OneSpaced(CardText.Decode(rest[..equals]));
    }

    private static string OneSpaced(string words) =>
        string.Join(' ', words.Split(' ', StringSplitOptions.RemoveEmptyEntries)).ToUpperInvariant();

    private CardFields FieldsAt(int index)
    {
        ReadOnlySpan<byte> card = CardBytesAt(index);
        ulong code = codes[index];
        if (code == KeywordCode.Hierarch && card.IndexOf((byte)'=') is int equals && equals >= 0)
        {
            return CardFields.OfField(card[(equals + 1)..]);
        }

        return code == KeywordCode.Continue
            ? CardFields.OfField(card[KeywordCode.Length..])
            : IsCommentary(code) ? CardFields.Free(card) : CardFields.OfCard(card);
    }

    private static bool IsCommentary(ulong code) => code == KeywordCode.Comment || code == KeywordCode.History || code == KeywordCode.Blank;

    private FitsCard CardAt(int index)
    {
        CardFields fields = FieldsAt(index);
        string keyword = KeywordAt(index);
        string comment = CardText.Decode(fields.Comment);
        if (fields.Kind != FitsValueKind.Text)
        {
            return new FitsCard(keyword, fields.Kind, CardText.Decode(fields.Value), comment);
        }

        string text = Unescaped(fields.Value);
        return text.EndsWith('&') && IsContinuation(index + 1)
            ? Continued(index, keyword, text, comment)
            : new FitsCard(keyword, FitsValueKind.Text, text, comment);
    }

    private FitsCard Continued(int index, string keyword, string first, string firstComment)
    {
        StringBuilder text = new(first);
        StringBuilder comment = new(firstComment);
        for (int next = index + 1; text.Length > 0 && text[^1] == '&' && IsContinuation(next); next++)
        {
            CardFields fields = FieldsAt(next);
            text.Length--;
            text.Append(Unescaped(fields.Value));
            comment.Append(comment.Length > 0 && !fields.Comment.IsEmpty ? " " : "").Append(CardText.Decode(fields.Comment));
        }

        return new FitsCard(keyword, FitsValueKind.Text, text.ToString(), comment.ToString());
    }

    /// <summary>Whether a card continues the string of the card before it.</summary>
    private bool IsContinuation(int index) =>
        index > 0 && index < codes.Length && codes[index] == KeywordCode.Continue && FieldsAt(index).Kind == FitsValueKind.Text;

    private string KeywordAt(int index)
    {
        string name = codes[index] == KeywordCode.Hierarch ? HierarchName(index) : "";
        return name.Length > 0 ? name : CardText.Decode(CardText.TrimEnd(CardBytesAt(index)[..KeywordCode.Length])).ToUpperInvariant();
    }

    private static string Unescaped(ReadOnlySpan<byte> value)
    {
        string text = CardText.Decode(CardText.TrimEnd(value));
        return text.Contains('\'') ? text.Replace("''", "'", StringComparison.Ordinal) : text;
    }

    private List<string> Commentary(ulong code)
    {
        List<string> texts = [];
        for (int i = 0; i < codes.Length; i++)
        {
            if (codes[i] == code)
            {
                texts.Add(CardText.Decode(CardText.TrimEnd(CardBytesAt(i)[KeywordCode.Length..])));
            }
        }

        return texts;
    }
}
