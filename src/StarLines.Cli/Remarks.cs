using StarLines.Analysis;

namespace StarLines.Cli;

/// <summary>Says what an analysis had to assume.</summary>
internal static class Remarks
{
    /// <summary>Says the remarks of an analysis, each in one sentence that names the spectrum.</summary>
    public static void Say(Terminal terminal, AnalysisResult result)
    {
        foreach (Remark remark in result.Remarks)
        {
            terminal.SayRemark($"{result.Spectrum.Metadata.Source}: {remark.Sentence}");
        }
    }
}
