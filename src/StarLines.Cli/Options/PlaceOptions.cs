using System.Collections.Generic;
using System.CommandLine;
using StarLines.Velocities.Barycentre;
using StarLines.Velocities.Time;

namespace StarLines.Cli.Options;

/// <summary>Where the star stands, where the telescope stands and when it looked: what a barycentric correction needs.</summary>
/// <param name="severalTimes">Whether <c>--time</c> may repeat.</param>
internal sealed class PlaceOptions(bool severalTimes = false)
{
    private readonly Option<double?> _ra = Make.One<double?>(
        "--ra", "RA", "Right ascension, ICRS: degrees, or hours as HH:MM:SS.", static text => Values.RightAscensionDegrees(text));

    private readonly Option<double?> _dec = Make.One<double?>(
        "--dec", "DEC", "Declination, ICRS, degrees, decimal or DD:MM:SS.", static text => Values.DeclinationDegrees(text));

    private readonly Option<ObservingSite?> _site = Make.One<ObservingSite?>(
        "--site", "SITE", "Observatory by name, or LAT,LON,HEIGHT (degrees, degrees east, metres).", ObservingSites.Parse);

    private readonly Option<List<JulianDate>> _times = Make.Many(
        "--time", "UTC", "Mid-exposure, UTC, such as 2024-02-10T03:04:05.6.", UtcTime.Parse, severalTimes);

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(_ra);
        command.Add(_dec);
        command.Add(_site);
        command.Add(_times);
    }

    /// <summary>Right ascension, degrees, or null.</summary>
    public double? RightAscensionDegrees(ParseResult parsed) => parsed.GetValue(_ra);

    /// <summary>Declination, degrees, or null.</summary>
    public double? DeclinationDegrees(ParseResult parsed) => parsed.GetValue(_dec);

    /// <summary>The site, or null.</summary>
    public ObservingSite? Site(ParseResult parsed) => parsed.GetValue(_site);

    /// <summary>The only time, or null.</summary>
    public JulianDate? Time(ParseResult parsed) => Times(parsed) is [JulianDate time, ..] ? time : null;

    /// <summary>All times that were given.</summary>
    public IReadOnlyList<JulianDate> Times(ParseResult parsed) => parsed.GetValue(_times) ?? [];
}
