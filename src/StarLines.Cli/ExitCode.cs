namespace StarLines.Cli;

/// <summary>What the program tells the shell.</summary>
internal static class ExitCode
{
    /// <summary>All done.</summary>
    public const int Done = 0;

    /// <summary>Some inputs failed and the others are done.</summary>
    public const int SomeFailed = 1;

    /// <summary>The command line is wrong.</summary>
    public const int Usage = 2;

    /// <summary>No input could be used.</summary>
    public const int NoInput = 3;

    /// <summary>Stopped by the user with Ctrl-C: 128 + SIGINT, as shells count.</summary>
    public const int Interrupted = 130;
}
