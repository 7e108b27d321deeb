namespace StarLines.Cli;

/// <summary>The entry of the program.</summary>
internal static class Program
{
    private static int Main() => 2;
}
