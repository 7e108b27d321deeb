using System;
using System.Globalization;
using StarLines.LineLists;

namespace StarLines.Examples.MakeNight;

/// <summary>Writes the invented night into a folder.</summary>
internal static class Program
{
    private static int Main(string[] args)
    {
        CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
        if (args.Length != 1)
        {
            Console.Error.WriteLine("Give the folder to write to, such as examples/night.");
            return 2;
        }

        var writer = new NightWriter(args[0], LineListCatalog.Find("metals-fgk"), LineListCatalog.Find("balmer"));
        writer.Write(NightPlan.Exposures);
        return 0;
    }
}
