using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.IO;

/// <summary>What a reader carries along while it turns one part of a file into spectra: the name of the place, what the user said, and what was found odd.</summary>
internal sealed class ReadContext(string fileName, string hduLabel, SpectrumReadOptions options)
{
    private readonly List<Remark> _remarks = [];

    internal string FileName { get; } = fileName;

    /// <summary>The HDU as a user names it; empty in files without HDUs.</summary>
    internal string HduLabel { get; } = hduLabel;

    internal SpectrumReadOptions Options { get; } = options;

    internal IReadOnlyList<Remark> Remarks => _remarks;

    /// <summary>The name of the part: <c>FILE</c>, <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c>.</summary>
    internal string SourceName(int row = 0)
    {
        string hdu = HduLabel.Length == 0 ? "" : "#" + HduLabel;
        return row == 0 ? FileName + hdu : string.Create(CultureInfo.InvariantCulture, $"{FileName}{hdu}:{row}");
    }

    internal void Note(string word, string sentence)
    {
        foreach (Remark known in _remarks)
        {
            if (known.Word == word && known.Sentence == sentence)
            {
                return;
            }
        }

        _remarks.Add(new Remark(word, sentence));
    }

    /// <summary>A copy for one of several spectra, which goes on with remarks of its own.</summary>
    internal ReadContext Fork()
    {
        var copy = new ReadContext(FileName, HduLabel, Options);
        copy._remarks.AddRange(_remarks);
        return copy;
    }

    internal SpectrumFormatException Error(string problem, Exception? cause = null)
    {
        string message = (HduLabel.Length == 0 ? FileName : $"{FileName}, HDU {HduLabel}") + ": " + problem;
        return cause is null ? new SpectrumFormatException(message) : new SpectrumFormatException(message, cause);
    }
}
