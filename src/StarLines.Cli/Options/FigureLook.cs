using System.Collections.Generic;
using System.CommandLine;
using StarLines.Plotting;

namespace StarLines.Cli.Options;

/// <summary>How a figure looks.</summary>
internal sealed class FigureLook
{
    private readonly Option<int?> _width = Make.One<int?>("--width", "PIXELS", "Width, pixels. Default 1600.", static text => Values.Whole(text, 200));
    private readonly Option<int?> _height = Make.One<int?>("--height", "PIXELS", "Height, pixels; else by the content.", static text => Values.Whole(text, 150));
    private readonly Option<int?> _dpi = Make.One<int?>("--dpi", "DPI", "Dots an inch. Default 200.", static text => Values.Whole(text, 48));
    private readonly Option<int?> _strips = Make.One<int?>("--strips", "N", "Cut the range into this many panels one under another.", static text => Values.Whole(text, 1));
    private readonly Option<bool> _dark = Make.Flag("--dark", "Light on dark.");
    private readonly Option<string?> _title = Make.One<string?>("--title", "TEXT", "The heading; '' for none.", static text => text);

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(_width);
        command.Add(_height);
        command.Add(_dpi);
        command.Add(_strips);
        command.Add(_dark);
        command.Add(_title);
    }

    /// <summary>The look.</summary>
    public FigureOptions From(ParseResult parsed)
    {
        var plain = new FigureOptions();
        return plain with
        {
            WidthPixels = parsed.GetValue(_width) ?? plain.WidthPixels,
            HeightPixels = parsed.GetValue(_height),
            DotsPerInch = parsed.GetValue(_dpi) ?? plain.DotsPerInch,
            Theme = parsed.GetValue(_dark) ? FigureTheme.Dark : FigureTheme.Light,
            Title = parsed.GetValue(_title),
        };
    }

    /// <summary>One view a range; one of everything where there is no range.</summary>
    public IReadOnlyList<SpectrumView> Views(ParseResult parsed, IReadOnlyList<WavelengthRange> ranges)
    {
        int strips = parsed.GetValue(_strips) ?? 1;
        return ranges.Count == 0
            ? [new SpectrumView { Strips = strips }]
            : [.. System.Linq.Enumerable.Select(ranges, range => new SpectrumView { Range = range, Strips = strips })];
    }
}
