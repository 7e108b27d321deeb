using System.Collections.Generic;

namespace StarLines.Fits;

/// <content>The check of all cards against the standard.</content>
public sealed partial class FitsHeader
{
    private bool isChecked;

    /// <summary>Adds a warning for everything in the cards that the standard does not allow.</summary>
    internal void Check()
    {
        if (isChecked)
        {
            return;
        }

        isChecked = true;
        bool plain = CardText.IsPlain(cards.Span);
        HashSet<ulong> seen = [];
        for (int i = 0; i < codes.Length; i++)
        {
            if (!plain)
            {
                CheckBytes(i);
            }

            CheckCard(i, seen);
        }
    }

    private void CheckBytes(int index)
    {
        if (!CardText.IsPlain(CardBytesAt(index)))
        {
            string keyword = KeywordAt(index);
            context.Warn("non-ascii", keyword, $"The card of {keyword} holds bytes that are not printable ASCII; they were read as UTF-8 or Latin-1, control bytes as blanks.");
        }
    }

    private void CheckCard(int index, HashSet<ulong> seen)
    {
        ulong code = codes[index];
        if (IsCommentary(code))
        {
            return;
        }

        if (KeywordCode.IsLowered(CardBytesAt(index)))
        {
            context.Warn("lower-case-keyword", KeywordAt(index), $"The keyword {KeywordAt(index)} is written in lower-case letters.");
        }

        CardFields fields = FieldsAt(index);
        if (fields.Fault is not null)
        {
            string keyword = KeywordAt(index);
            context.Warn("card-syntax", keyword, $"The card of {keyword} has {fields.Fault}.");
        }

        if (code == KeywordCode.Continue)
        {
            CheckContinuation(index);
        }
        else if (code != KeywordCode.Hierarch && fields.Kind != FitsValueKind.Commentary && !seen.Add(code))
        {
            string keyword = KeywordAt(index);
            context.Warn("duplicate-keyword", keyword, $"{keyword} stands more than once; the first value was read.");
        }
        else if (code == KeywordCode.Hierarch && HierarchName(index) is { Length: > 0 } name && HierarchIndex()[name] != index)
        {
            context.Warn("duplicate-keyword", name, $"{name} stands more than once; the first value was read.");
        }
    }

    private void CheckContinuation(int index)
    {
        if (!IsContinuation(index) || index == 0 || FieldsAt(index - 1).Kind != FitsValueKind.Text)
        {
            context.Warn("stray-continue", "CONTINUE", "A CONTINUE card follows no string; it was left out.");
        }
    }
}
