using System;
using System.Buffers;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.Fits.Writing;

/// <summary>Lays out header cards: fixed format where the value allows it, CONTINUE for long strings, HIERARCH for long keywords.</summary>
internal sealed class CardWriter
{
    /// <summary>The column in which numbers and logicals of fixed format end.</summary>
    private const int ValueWidth = 20;

    private const int KeywordWidth = 8;

    /// <summary>The least characters between the quotes, as old readers expect.</summary>
    private const int LeastText = 8;

    private static readonly SearchValues<char> KeywordLetters = SearchValues.Create("ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789_-");

    private readonly List<string> cards = [];

    internal IReadOnlyList<string> Cards => cards;

    internal bool HasLongText { get; private set; }

    internal static bool IsStandardKeyword(string keyword) =>
        keyword.Length is > 0 and <= KeywordWidth && keyword.AsSpan().IndexOfAnyExcept(KeywordLetters) < 0;

    internal void Add(string keyword, long value, string comment) =>
        AddPlain(keyword, value.ToString(CultureInfo.InvariantCulture), comment);

    internal void Add(string keyword, bool value, string comment) => AddPlain(keyword, value ? "T" : "F", comment);

    internal void Add(string keyword, double value, string comment) => AddPlain(keyword, Real(value), comment);

    internal void Add(string keyword, string value, string comment)
    {
        string head = Head(keyword);
        string quoted = AsciiText.From(value).TrimEnd(' ').Replace("'", "''", StringComparison.Ordinal);
        int room = CardText.CardBytes - head.Length - 2;
        if (quoted.Length <= room)
        {
            // Comments start in one column; readers that write a card anew for its checksum do the same.
            string text = $"'{quoted.PadRight(Math.Min(LeastText, room))}'";
            AddWithComment(head + text.PadRight(Math.Min(ValueWidth, room)), comment);
            return;
        }

        AddLong(head, quoted, comment);
    }

    /// <summary>Text without a value, over as many cards as it needs.</summary>
    internal void AddCommentary(string keyword, string text)
    {
        const int Room = CardText.CardBytes - KeywordWidth;
        foreach (string line in text.Split('\n'))
        {
            string rest = AsciiText.From(line.TrimEnd('\r')).TrimEnd(' ');
            do
            {
                int cut = rest.Length <= Room ? rest.Length : CutAtBlank(rest, Room);
                cards.Add((keyword.PadRight(KeywordWidth) + rest[..cut]).PadRight(CardText.CardBytes));
                rest = rest[cut..];
            }
            while (rest.Length > 0);
        }
    }

    /// <summary>The shortest text that reads back as the same number, always with a decimal point.</summary>
    internal static string Real(double value)
    {
        string text = value.ToString("R", CultureInfo.InvariantCulture);
        if (text.Contains('.'))
        {
            return text;
        }

        int exponent = text.IndexOf('E');
        return exponent < 0 ? text + ".0" : text.Insert(exponent, ".0");
    }

    private static string Head(string keyword) => IsStandardKeyword(keyword)
        ? keyword.PadRight(KeywordWidth) + "= "
        : $"HIERARCH {keyword} = ";

    private void AddPlain(string keyword, string value, string comment)
    {
        string head = Head(keyword);
        int width = Math.Min(ValueWidth, CardText.CardBytes - head.Length);
        AddWithComment(head + value.PadLeft(IsStandardKeyword(keyword) ? width : 0), comment);
    }

    private void AddWithComment(string card, string comment)
    {
        string note = AsciiText.From(comment).Trim();
        string whole = note.Length == 0 || card.Length + 4 > CardText.CardBytes ? card : $"{card} / {note}";
        cards.Add(whole.Length > CardText.CardBytes ? whole[..CardText.CardBytes] : whole.PadRight(CardText.CardBytes));
    }

    private void AddLong(string head, string quoted, string comment)
    {
        HasLongText = true;
        const string Next = "CONTINUE  ";
        for (string start = head; ; start = Next)
        {
            int room = CardText.CardBytes - start.Length - 2;
            if (quoted.Length <= room)
            {
                AddWithComment($"{start}'{quoted}'", comment);
                return;
            }

            // One character is for the ampersand; a doubled quote stays together.
            int cut = room - 1;
            while (cut > 1 && QuotesBefore(quoted, cut) % 2 != 0)
            {
                cut--;
            }

            cards.Add($"{start}'{quoted[..cut]}&'".PadRight(CardText.CardBytes));
            quoted = quoted[cut..];
        }
    }

    private static int QuotesBefore(string text, int end)
    {
        int count = 0;
        while (count < end && text[end - 1 - count] == '\'')
        {
            count++;
        }

        return count;
    }

    private static int CutAtBlank(string text, int room)
    {
        int blank = text.LastIndexOf(' ', room - 1);
        return blank > room / 2 ? blank + 1 : room;
    }
}
