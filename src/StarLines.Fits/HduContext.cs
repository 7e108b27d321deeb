using System;
using System.Collections.Generic;

namespace StarLines.Fits;

/// <summary>Where in which file a piece of content lies, and the warnings about it.</summary>
internal sealed class HduContext(string fileName, int number)
{
    /// <summary>A damaged header can hold thousands of bad cards; nobody reads more than this.</summary>
    private const int MaximumWarnings = 100;

    private readonly List<FitsWarning> warnings = [];

    internal string FileName { get; } = fileName;

    internal int Number { get; } = number;

    internal IReadOnlyList<FitsWarning> Warnings => warnings;

    internal void Warn(string word, string keyword, string sentence)
    {
        if (warnings.Count < MaximumWarnings
            && !warnings.Exists(known => known.Word == word && known.Keyword == keyword))
        {
            warnings.Add(new FitsWarning(Number, word, keyword, sentence));
        }
    }

    internal FitsFormatException Error(string? keyword, string problem, Exception? cause = null) =>
        new(FileName, Number, keyword, problem, cause);
}
