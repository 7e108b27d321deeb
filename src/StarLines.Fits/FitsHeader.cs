using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Numerics;

namespace StarLines.Fits;

/// <summary>
/// The header of one HDU. Keywords are found whatever their case; <c>HIERARCH</c> keywords by their words, with or without the word HIERARCH.
/// Where a keyword stands twice its first value counts and the HDU has a warning. An extension with <c>INHERIT = T</c> also answers from
/// a primary header without data.
/// </summary>
public sealed partial class FitsHeader
{
    private readonly HduContext context;
    private readonly ReadOnlyMemory<byte> cards;
    private readonly ulong[] codes;
    private Dictionary<string, int>? hierarch;

    internal FitsHeader(HduContext context, ReadOnlyMemory<byte> cards, ulong[] codes)
    {
        this.context = context;
        this.cards = cards;
        this.codes = codes;
    }

    /// <summary>The number of cards, without END.</summary>
    public int Count => codes.Length;

    /// <summary>The texts of the COMMENT cards, in order.</summary>
    public IReadOnlyList<string> Comments => Commentary(KeywordCode.Comment);

    /// <summary>The texts of the HISTORY cards, in order.</summary>
    public IReadOnlyList<string> History => Commentary(KeywordCode.History);

    /// <summary>The header that keywords are looked up in when this one has them not.</summary>
    internal FitsHeader? Inherited { get; set; }

    /// <summary>Whether the header has a keyword, with a value or without.</summary>
    /// <param name="keyword">The keyword.</param>
    public bool Contains(string keyword)
    {
        ArgumentNullException.ThrowIfNull(keyword);
        return Find(keyword, out _) is not null;
    }

    /// <summary>The card of a keyword.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="card">The card, with its value and comment.</param>
    /// <returns>False where the header has it not.</returns>
    public bool TryGetCard(string keyword, [NotNullWhen(true)] out FitsCard? card)
    {
        ArgumentNullException.ThrowIfNull(keyword);
        card = Find(keyword, out int index)?.CardAt(index);
        return card is not null;
    }

    /// <summary>A real or whole number. A number in quotes is taken, with a warning.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The number, finite.</param>
    /// <returns>False where the keyword is absent or its value is blank.</returns>
    /// <exception cref="FitsFormatException">The value is something else.</exception>
    public bool TryGetDouble(string keyword, out double value)
    {
        value = 0.0;
        ArgumentNullException.ThrowIfNull(keyword);
        if (!TryGetFields(keyword, out FitsHeader owner, out CardFields fields))
        {
            return false;
        }

        ReadOnlySpan<byte> text = owner.Unquoted(fields, keyword);
        return text.IsEmpty ? false : FitsNumber.TryParse(text, out value) ? true : throw owner.Wrong(keyword, fields, "a number");
    }

    /// <summary>A whole number. A number in quotes, or with a decimal point and zeros, is taken, with a warning.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The number.</param>
    /// <returns>False where the keyword is absent or its value is blank.</returns>
    /// <exception cref="FitsFormatException">The value is something else, or beyond 64 bits.</exception>
    public bool TryGetInteger(string keyword, out long value)
    {
        value = 0;
        ArgumentNullException.ThrowIfNull(keyword);
        if (!TryGetFields(keyword, out FitsHeader owner, out CardFields fields))
        {
            return false;
        }

        ReadOnlySpan<byte> text = owner.Unquoted(fields, keyword);
        if (text.IsEmpty || FitsNumber.TryParseInteger(text, out value))
        {
            return !text.IsEmpty;
        }

        // Beyond 2^53 a double no longer tells whole numbers apart.
        if (FitsNumber.TryParse(text, out double real) && real == Math.Truncate(real) && Math.Abs(real) < 1L << 53)
        {
            owner.context.Warn("real-for-integer", keyword, string.Create(CultureInfo.InvariantCulture, $"{keyword} is written as a real number; read as {real}."));
            value = (long)real;
            return true;
        }

        throw owner.Wrong(keyword, fields, "a whole number");
    }

    /// <summary>A character string, trailing blanks dropped, continued strings joined. A number or logical gives its text.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The string; it may be empty.</param>
    /// <returns>False where the keyword is absent or has no value.</returns>
    public bool TryGetString(string keyword, [NotNullWhen(true)] out string? value)
    {
        value = null;
        ArgumentNullException.ThrowIfNull(keyword);
        if (Find(keyword, out int index) is not FitsHeader owner)
        {
            return false;
        }

        FitsCard card = owner.CardAt(index);
        value = card.Kind is FitsValueKind.Commentary or FitsValueKind.Undefined ? null : card.Text;
        return value is not null;
    }

    /// <summary>A logical value.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The value.</param>
    /// <returns>False where the keyword is absent or its value is blank.</returns>
    /// <exception cref="FitsFormatException">The value is something else.</exception>
    public bool TryGetLogical(string keyword, out bool value)
    {
        value = false;
        ArgumentNullException.ThrowIfNull(keyword);
        if (!TryGetFields(keyword, out FitsHeader owner, out CardFields fields))
        {
            return false;
        }

        ReadOnlySpan<byte> text = owner.Unquoted(fields, keyword);
        value = text.SequenceEqual("T"u8);
        return text.IsEmpty ? false : value || text.SequenceEqual("F"u8) ? true : throw owner.Wrong(keyword, fields, "T or F");
    }

    /// <summary>A complex number.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The number.</param>
    /// <returns>False where the keyword is absent or its value is blank.</returns>
    /// <exception cref="FitsFormatException">The value is something else.</exception>
    public bool TryGetComplex(string keyword, out Complex value)
    {
        value = default;
        ArgumentNullException.ThrowIfNull(keyword);
        return TryGetFields(keyword, out FitsHeader owner, out CardFields fields)
            && (FitsNumber.TryParseComplex(fields.Value, out value) ? true : throw owner.Wrong(keyword, fields, "a complex number"));
    }

    /// <summary>All cards in order, continued strings joined.</summary>
    public IEnumerable<FitsCard> EnumerateCards()
    {
        for (int i = 0; i < Count; i++)
        {
            if (!IsContinuation(i))
            {
                yield return CardAt(i);
            }
        }
    }

    private bool TryGetFields(string keyword, out FitsHeader owner, out CardFields fields)
    {
        owner = Find(keyword, out int index) ?? this;
        fields = index < 0 ? default : owner.FieldsAt(index);
        return fields.Kind is not (FitsValueKind.Commentary or FitsValueKind.Undefined);
    }

    private ReadOnlySpan<byte> Unquoted(CardFields fields, string keyword)
    {
        if (fields.Kind != FitsValueKind.Text)
        {
            return fields.Value;
        }

        ReadOnlySpan<byte> text = CardText.Trim(fields.Value);
        if (!text.IsEmpty && FitsNumber.Classify(text) != FitsValueKind.Invalid)
        {
            context.Warn("quoted-value", keyword, $"{keyword} is written as a string, '{CardText.Decode(text)}'; its content was read.");
        }

        return text;
    }

    private FitsFormatException Wrong(string keyword, CardFields fields, string expected) =>
        context.Error(keyword, $"found {Shown(fields)}, expected {expected}; correct the header.");

    private static string Shown(CardFields fields)
    {
        string text = CardText.DecodeTrimmed(fields.Value);
        return fields.Kind == FitsValueKind.Text ? $"the string '{text}'" : $"\"{text}\"";
    }
}
