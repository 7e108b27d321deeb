using System;
using System.Collections.Generic;
using StarLines.Fits.Writing;

namespace StarLines.Fits;

/// <summary>
/// The cards of a header that is to be written, in the order in which they are added. The cards of the structure (BITPIX, NAXIS, TFORM, CHECKSUM and the
/// like) come from <see cref="FitsWriter"/> and are refused here. A keyword over eight characters, or with blanks, becomes a HIERARCH card, a string too long
/// for one card goes on in CONTINUE cards. Text becomes ASCII: accents are dropped, other characters become question marks.
/// </summary>
public sealed class FitsHeaderBuilder
{
    private const int LongestKeyword = 48;

    private static readonly HashSet<string> Structure = new(StringComparer.Ordinal)
    {
        "SIMPLE", "XTENSION", "BITPIX", "EXTEND", "PCOUNT", "GCOUNT", "GROUPS", "TFIELDS", "THEAP", "BSCALE", "BZERO", "BLANK", "CHECKSUM", "DATASUM",
        "EXTNAME", "END", "CONTINUE", "LONGSTRN", "COMMENT", "HISTORY", "HIERARCH", "",
    };

    private static readonly string[] ColumnPrefixes = ["NAXIS", "TFORM", "TTYPE", "TUNIT", "TNULL", "TSCAL", "TZERO", "TDIM", "TBCOL"];

    /// <summary>Adds a real number.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The number, finite.</param>
    /// <param name="comment">A comment; what does not fit the card is cut.</param>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentException">The keyword cannot be written here, or the number is not finite.</exception>
    public FitsHeaderBuilder Add(string keyword, double value, string comment = "")
    {
        if (!double.IsFinite(value))
        {
            throw new ArgumentException($"{keyword} is not finite; a FITS header cannot hold it.", nameof(value));
        }

        Cards.Add(Checked(keyword), value, comment);
        return this;
    }

    /// <summary>Adds a whole number.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The number.</param>
    /// <param name="comment">A comment; what does not fit the card is cut.</param>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentException">The keyword cannot be written here.</exception>
    public FitsHeaderBuilder Add(string keyword, long value, string comment = "")
    {
        Cards.Add(Checked(keyword), value, comment);
        return this;
    }

    /// <summary>Adds a logical value.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The value.</param>
    /// <param name="comment">A comment; what does not fit the card is cut.</param>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentException">The keyword cannot be written here.</exception>
    public FitsHeaderBuilder Add(string keyword, bool value, string comment = "")
    {
        Cards.Add(Checked(keyword), value, comment);
        return this;
    }

    /// <summary>Adds a string.</summary>
    /// <param name="keyword">The keyword.</param>
    /// <param name="value">The string; trailing blanks are dropped.</param>
    /// <param name="comment">A comment; what does not fit the card is cut.</param>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentException">The keyword cannot be written here.</exception>
    public FitsHeaderBuilder Add(string keyword, string value, string comment = "")
    {
        ArgumentNullException.ThrowIfNull(value);
        Cards.Add(Checked(keyword), value, comment);
        return this;
    }

    /// <summary>Adds COMMENT cards.</summary>
    /// <param name="text">The text; lines and long lines go on separate cards.</param>
    /// <returns>This builder.</returns>
    public FitsHeaderBuilder AddComment(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        Cards.AddCommentary("COMMENT", text);
        return this;
    }

    /// <summary>Adds HISTORY cards.</summary>
    /// <param name="text">The text; lines and long lines go on separate cards.</param>
    /// <returns>This builder.</returns>
    public FitsHeaderBuilder AddHistory(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        Cards.AddCommentary("HISTORY", text);
        return this;
    }

    internal CardWriter Cards { get; } = new();

    private static string Checked(string keyword)
    {
        ArgumentNullException.ThrowIfNull(keyword);
        string upper = keyword.Trim().ToUpperInvariant();
        bool isOfStructure = Structure.Contains(upper) || Array.Exists(ColumnPrefixes, prefix => IsNumbered(upper, prefix));
        bool isText = upper.AsSpan().IndexOfAnyExceptInRange(' ', '~') < 0 && !upper.Contains('=') && upper.Length <= LongestKeyword;
        return !isOfStructure && isText
            ? upper
            : throw new ArgumentException($"'{keyword}' cannot be added to a header: it belongs to the structure, or is no keyword of ASCII letters.", nameof(keyword));
    }

    private static bool IsNumbered(string keyword, string prefix) =>
        keyword.StartsWith(prefix, StringComparison.Ordinal) && keyword.AsSpan(prefix.Length).IndexOfAnyExceptInRange('0', '9') < 0;
}
