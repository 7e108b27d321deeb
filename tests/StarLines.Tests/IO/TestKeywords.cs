using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using StarLines.IO;

namespace StarLines.Tests.IO;

/// <summary>Keywords written down in a test, with comments where they matter.</summary>
internal sealed class TestKeywords : HeaderKeywords
{
    private readonly Dictionary<string, (string Text, string Comment)> _values = [];

    public TestKeywords With(string name, string text, string comment = "")
    {
        _values[name] = (text, comment);
        return this;
    }

    internal override bool TryGet(string name, [NotNullWhen(true)] out string? text, out string comment)
    {
        bool found = _values.TryGetValue(name, out (string Text, string Comment) value);
        text = found ? value.Text : null;
        comment = found ? value.Comment : "";
        return found;
    }

    public static ReadContext Context(SpectrumReadOptions? options = null) => new("test.fits", "0", options ?? SpectrumReadOptions.Default);
}
