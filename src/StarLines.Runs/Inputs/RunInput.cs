using StarLines.IO;

namespace StarLines.Runs.Inputs;

/// <summary>One input of a run.</summary>
/// <param name="Name">As the user names it: <c>FILE</c>, <c>FILE#HDU</c> or <c>FILE#HDU:ROW</c>.</param>
/// <param name="Reading">What is said of it.</param>
/// <param name="Stem">Begin of the names of its result files, told apart from all others.</param>
internal sealed record RunInput(string Name, SpectrumReadOptions Reading, string Stem)
{
    /// <summary>The file of the input.</summary>
    internal string Path => System.IO.File.Exists(Name) ? Name : Name.Split('#')[0];
}
