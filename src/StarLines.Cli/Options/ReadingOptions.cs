using System.Collections.Generic;
using System.CommandLine;
using StarLines.IO;

namespace StarLines.Cli.Options;

/// <summary>The files of a command and what the user says about them; what is said here wins over what a file says.</summary>
internal sealed class ReadingOptions
{
    private readonly Argument<string[]> _files;

    private readonly Option<List<WavelengthRange>> _ranges = Make.Many(
        "--range", "A:B", "Use these wavelengths only, Å, in the file's own medium.", Values.Range);

    private readonly Option<Medium> _medium = Make.One(
        "--medium",
        "MEDIUM",
        "What the wavelengths of the file are, air or vacuum, where it does not say or says it wrongly.",
        static text => Values.Word(text, ("air", Medium.Air), ("vacuum", Medium.Vacuum)),
        "air", "vacuum");

    private readonly Option<VelocityFrame> _frame = Make.One(
        "--frame",
        "FRAME",
        "The velocity frame of the wavelengths: topocentric, geocentric, heliocentric, barycentric or rest.",
        static text => Values.Word(
            text,
            ("topocentric", VelocityFrame.Topocentric),
            ("barycentric", VelocityFrame.Barycentric),
            ("heliocentric", VelocityFrame.Heliocentric),
            ("geocentric", VelocityFrame.Geocentric),
            ("rest", VelocityFrame.Rest)),
        "topocentric", "barycentric", "heliocentric", "geocentric", "rest");

    private readonly Option<string?> _axisUnit = Make.One<string?>(
        "--axis-unit", "UNIT", "Unit of the spectral axis, such as Angstrom, nm, um, log10(Angstrom), Hz.", static text => text);

    private readonly Option<ColumnSelection?> _columns = Make.One<ColumnSelection?>(
        "--columns", "LIST", "Which columns hold what: wave=…,flux=…,error=…,mask=….", ColumnSelection.Parse);

    private readonly Option<string?> _target = Make.One<string?>("--target", "NAME", "Name of the target.", static text => text);

    private readonly Option<double?> _power = Make.One<double?>(
        "--resolving-power", "R", "Resolving power λ/FWHM of the instrument.", static text => Values.Positive(text));

    private readonly PlaceOptions _place = new();

    /// <summary>Makes the argument and the options of a command that reads spectra.</summary>
    public ReadingOptions()
        : this(new Argument<string[]>("FILE")
        {
            Description = "FITS, CSV, ECSV or VOTable files, also .gz; FILE#HDU or FILE#HDU:ROW for a part; - for standard input.",
            Arity = ArgumentArity.OneOrMore,
        })
    {
    }

    /// <summary>Makes the options with an argument of the command's own.</summary>
    public ReadingOptions(Argument<string[]> files) => _files = files;

    /// <summary>Adds the argument and the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(_files);
        command.Add(_ranges);
        command.Add(_medium);
        command.Add(_frame);
        command.Add(_axisUnit);
        command.Add(_columns);
        command.Add(_target);
        _place.AddTo(command);
        command.Add(_power);
    }

    /// <summary>The files as they were named.</summary>
    public IReadOnlyList<string> Files(ParseResult parsed) => parsed.GetValue(_files) ?? [];

    /// <summary>The ranges that were given.</summary>
    public IReadOnlyList<WavelengthRange> Ranges(ParseResult parsed) => parsed.GetValue(_ranges) ?? [];

    /// <summary>What the user says about them.</summary>
    public SpectrumReadOptions From(ParseResult parsed) => Override(parsed, SpectrumReadOptions.Default);

    /// <summary>Something said before, with what the command line says instead.</summary>
    public SpectrumReadOptions Override(ParseResult parsed, SpectrumReadOptions said) => said with
    {
        Ranges = Ranges(parsed) is { Count: > 0 } ranges ? ranges : said.Ranges,
        Medium = parsed.GetValue(_medium) is var medium and not Medium.Unknown ? medium : said.Medium,
        Frame = parsed.GetValue(_frame) is var frame and not VelocityFrame.Unknown ? frame : said.Frame,
        AxisUnit = parsed.GetValue(_axisUnit) ?? said.AxisUnit,
        Columns = parsed.GetValue(_columns) ?? said.Columns,
        Target = parsed.GetValue(_target) ?? said.Target,
        RightAscensionDegrees = _place.RightAscensionDegrees(parsed) ?? said.RightAscensionDegrees,
        DeclinationDegrees = _place.DeclinationDegrees(parsed) ?? said.DeclinationDegrees,
        Site = _place.Site(parsed) ?? said.Site,
        MidExposureUtc = _place.Time(parsed) ?? said.MidExposureUtc,
        ResolvingPower = parsed.GetValue(_power) ?? said.ResolvingPower,
    };
}
