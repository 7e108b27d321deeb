using System.Globalization;

namespace StarLines.Cli;

/// <summary>The entry of the program.</summary>
internal static class Program
{
    private static int Main(string[] args)
    {
        // Before anything else: under a decimal comma 5889.95 would be read as 588995.
        CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
        CultureInfo.CurrentUICulture = CultureInfo.InvariantCulture;
        CultureInfo.DefaultThreadCurrentCulture = CultureInfo.InvariantCulture;
        CultureInfo.DefaultThreadCurrentUICulture = CultureInfo.InvariantCulture;
        using Terminal terminal = Terminal.OfThisProcess();
        return Application.Run(args, terminal);
    }
}
