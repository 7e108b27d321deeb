using System;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.IO;
using System.Text;
using StarLines.LineLists;

namespace StarLines.Velocities.Barycentre;

/// <summary>Observatories by name, good to a few hundred metres (0.1 m/s for each km); and places written as numbers.</summary>
public static class ObservingSites
{
    private const string ResourceName = "StarLines.Velocities.Barycentre.Data.observing-sites.csv";

    private static readonly Lazy<SiteList> Lazily = new(Load);

    /// <summary>All observatories, in the order of the list.</summary>
    public static IReadOnlyList<ObservingSite> All => Lazily.Value.Sites;

    /// <summary>Finds an observatory by its name or another name of it or of its telescopes.</summary>
    /// <param name="name">The name; letters and digits are compared, without case.</param>
    /// <param name="site">The observatory.</param>
    public static bool TryFind(string? name, [NotNullWhen(true)] out ObservingSite? site) =>
        Lazily.Value.ByKey.TryGetValue(Key(name ?? ""), out site);

    /// <summary>The name, of those known, that a mistyped one was likely meant to be; null where none is near.</summary>
    /// <param name="name">What was typed.</param>
    public static string? Nearest(string name) => NearestName.Of(name, Lazily.Value.Names);

    /// <summary>Reads a place: the name of an observatory, or <c>LAT,LON,HEIGHT</c>.</summary>
    /// <param name="text">A name, or degrees, degrees east and metres, separated by commas.</param>
    /// <exception cref="FormatException">It is neither; the message names the nearest observatory.</exception>
    public static ObservingSite Parse(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        if (TryFind(text, out ObservingSite? known))
        {
            return known;
        }

        string[] parts = text.Split(',', StringSplitOptions.TrimEntries);
        if (parts.Length != 3)
        {
            string hint = Nearest(text) is { } near ? $"did you mean '{near}'? Or write" : "write";
            throw new FormatException(
                $"The site '{text}' is not known; {hint} LAT,LON,HEIGHT (degrees, degrees east, metres), such as -24.63,-70.40,2635.");
        }

        if (!TryNumber(parts[0], out double latitude) || !TryNumber(parts[1], out double longitude) || !TryNumber(parts[2], out double height))
        {
            throw new FormatException(
                $"The site '{text}' is not LAT,LON,HEIGHT: three numbers, degrees, degrees east, metres, such as -24.63,-70.40,2635.");
        }

        try
        {
            return new ObservingSite("", latitude, longitude, height);
        }
        catch (ArgumentOutOfRangeException problem)
        {
            throw new FormatException($"The site '{text}' is not a place on the Earth: {problem.Message}", problem);
        }
    }

    private static bool TryNumber(string text, out double value) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);

    private static string Key(string name)
    {
        var key = new StringBuilder(name.Length);
        foreach (char letter in name.Normalize(NormalizationForm.FormD))
        {
            if (char.IsAsciiLetterOrDigit(letter))
            {
                key.Append(char.ToUpperInvariant(letter));
            }
        }

        return key.ToString();
    }

    private static SiteList Load()
    {
        using Stream stream = typeof(ObservingSites).Assembly.GetManifestResourceStream(ResourceName)
            ?? throw new InvalidOperationException($"The resource {ResourceName} is missing from the program.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        var sites = new List<ObservingSite>();
        var names = new List<string>();
        var byKey = new Dictionary<string, ObservingSite>(StringComparer.Ordinal);
        bool isHeader = true;
        while (reader.ReadLine() is { } line)
        {
            if (line.StartsWith('#'))
            {
                continue;
            }

            if (isHeader)
            {
                isHeader = false;
                continue;
            }

            // name, aliases, latitude, longitude, height, check; no cell holds a comma
            string[] cells = line.Split(',');
            ObservingSite site = new(cells[0], Number(cells[2]), Number(cells[3]), Number(cells[4]));
            sites.Add(site);
            foreach (string name in (string[])[cells[0], .. cells[1].Split('|', StringSplitOptions.RemoveEmptyEntries)])
            {
                names.Add(name);

                // Throws where two rows claim one name: caught by the tests.
                byKey.Add(Key(name), site);
            }
        }

        return new SiteList(sites, names, byKey);
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private sealed record SiteList(
        IReadOnlyList<ObservingSite> Sites, IReadOnlyList<string> Names, Dictionary<string, ObservingSite> ByKey);
}
