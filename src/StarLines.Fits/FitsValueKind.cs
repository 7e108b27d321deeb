namespace StarLines.Fits;

/// <summary>What the value field of a header card holds.</summary>
public enum FitsValueKind
{
    /// <summary>The card has no value: COMMENT, HISTORY, a blank keyword, or free text.</summary>
    Commentary,

    /// <summary>A value field that is blank.</summary>
    Undefined,

    /// <summary>T or F.</summary>
    Logical,

    /// <summary>A whole number.</summary>
    WholeNumber,

    /// <summary>A number with a decimal point or an exponent.</summary>
    Real,

    /// <summary>A pair of numbers in parentheses.</summary>
    Complex,

    /// <summary>A quoted character string.</summary>
    Text,

    /// <summary>None of these.</summary>
    Invalid,
}
