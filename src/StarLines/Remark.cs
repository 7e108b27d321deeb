namespace StarLines;

/// <summary>Something that was guessed, assumed or found odd while a spectrum was read or measured.</summary>
/// <param name="Word">One output word, such as <c>medium-assumed</c>; stands in the <c>warnings</c> columns.</param>
/// <param name="Sentence">One sentence for people: what, where and the cure.</param>
public sealed record Remark(string Word, string Sentence);
