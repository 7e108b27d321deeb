namespace StarLines.Fits;

/// <summary>Something in a file that is not as the FITS standard asks, and that was read all the same.</summary>
/// <param name="HduNumber">The HDU, 0 for the primary.</param>
/// <param name="Word">One word that names the kind of trouble, e.g. <c>truncated</c> or <c>duplicate-keyword</c>.</param>
/// <param name="Keyword">The keyword concerned; empty where there is none.</param>
/// <param name="Sentence">What was found and what was made of it.</param>
public sealed record FitsWarning(int HduNumber, string Word, string Keyword, string Sentence);
