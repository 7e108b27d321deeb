using System.Collections.Generic;
using System.CommandLine;
using StarLines.Analysis;
using StarLines.Cli.Output;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Profiles;
using StarLines.Runs;
using StarLines.Templates;
using StarLines.Velocities;

namespace StarLines.Cli.Options;

/// <summary>Options of the analysis: continuum, velocity and lines. A command adds the groups it has a use for.</summary>
internal sealed class AnalysisSettings
{
    private readonly Option<List<WavelengthRange>> _exclude = Make.Many(
        "--exclude", "A:B", "Leave these wavelengths out of everything, Å.", Values.Range);

    private readonly Option<double?> _stiffness = Make.One<double?>(
        "--stiffness", "ANGSTROM", "Length over which the continuum may bend, Å; else chosen by the data.", static text => Values.Positive(text));

    private readonly Option<bool> _keepOutliers = Make.Flag(
        "--keep-outliers", "Use pixels that look like cosmic-ray hits or dead pixels too.");

    private readonly Option<List<string>> _templates = Make.Many(
        "--template", "NAME", "balmer, metal, both, the name or path of a line list, or a spectrum. Default both.", static text => text);

    private readonly Option<double?> _search = Make.One<double?>(
        "--search", "KM_S", "Search velocities from minus to plus this, km/s. Default 1000.", static text => Values.Positive(text));

    private readonly Option<bool> _single = Make.Flag("--single", "Do not look for a second star.");

    private readonly Option<List<string>> _lines = Make.Many(
        "--lines", "LIST", "Lines to measure: the name of a list (see 'starlines lines') or the path of one.", static text => text);

    private readonly Option<double?> _velocity = Make.One<double?>(
        "--velocity", "KM_S", "Velocity of the star in the frame of the file, km/s; else measured first.", static text => Values.Number(text));

    private readonly Option<ProfileShape> _profile = Make.One(
        "--profile",
        "SHAPE",
        "Shape that is fitted: gaussian (default) or lorentzian.",
        static text => Values.Word(text, ("gaussian", ProfileShape.Gaussian), ("lorentzian", ProfileShape.Lorentzian)),
        "gaussian", "lorentzian");

    private readonly Option<PixelSampling> _sampling = Make.One(
        "--sampling",
        "KIND",
        "A pixel is the mean over its width (integrated, default) or the value at its centre (point).",
        static text => Values.Word(text, ("integrated", PixelSampling.Integrated), ("point", PixelSampling.Point)),
        "integrated", "point");

    /// <summary>Makes the options.</summary>
    public AnalysisSettings()
    {
        Make.Complete(_templates, StellarTemplates.BalmerName, StellarTemplates.MetalName, StellarTemplates.BothName);
        Make.Complete(_lines, [.. LineListCatalog.Names]);
    }

    /// <summary>Adds the options of the continuum.</summary>
    public void AddContinuumTo(Command command)
    {
        command.Add(_exclude);
        command.Add(_stiffness);
        command.Add(_keepOutliers);
    }

    /// <summary>Adds the options of velocities.</summary>
    public void AddVelocityTo(Command command)
    {
        command.Add(_templates);
        command.Add(_search);
        command.Add(_single);
    }

    /// <summary>Adds the options of lines.</summary>
    public void AddLinesTo(Command command)
    {
        command.Add(_lines);
        command.Add(_velocity);
        command.Add(_profile);
        command.Add(_sampling);
    }

    /// <summary>The velocity given, or null.</summary>
    public double? Velocity(ParseResult parsed) => parsed.GetValue(_velocity);

    /// <summary>Whether a line list was named.</summary>
    public bool HasLines(ParseResult parsed) => (parsed.GetValue(_lines) ?? []).Count > 0;

    /// <summary>The settings of an analysis; lists and templates are read here and named in the provenance.</summary>
    public AnalysisOptions From(ParseResult parsed, Provenance provenance)
    {
        LineList? lines = NamedLists.Join(parsed.GetValue(_lines) ?? []);
        if (lines is not null)
        {
            provenance.AddList(lines);
        }

        return WithTemplates(parsed, provenance, new AnalysisOptions
        {
            Exclude = parsed.GetValue(_exclude) ?? [],
            FindOutliers = !parsed.GetValue(_keepOutliers),
            Continuum = ContinuumOptions.Default with { StiffnessAngstrom = parsed.GetValue(_stiffness) },
            Velocity = Search(parsed),
            Lines = lines,
            LineVelocityKmPerS = parsed.GetValue(_velocity),
            Measure = new LineMeasureOptions { Profile = parsed.GetValue(_profile), Sampling = parsed.GetValue(_sampling) },
        });
    }

    /// <summary>A plan with what the command line says instead.</summary>
    public RunPlan Override(ParseResult parsed, RunPlan plan) => plan with
    {
        Exclude = parsed.GetValue(_exclude) is { Count: > 0 } exclude ? exclude : plan.Exclude,
        StiffnessAngstrom = parsed.GetValue(_stiffness) ?? plan.StiffnessAngstrom,
        FindOutliers = plan.FindOutliers && !parsed.GetValue(_keepOutliers),
        Templates = parsed.GetValue(_templates) is { Count: > 0 } templates ? templates : plan.Templates,
        SearchHalfRangeKmPerS = parsed.GetValue(_search) ?? plan.SearchHalfRangeKmPerS,
        LineLists = parsed.GetValue(_lines) is { Count: > 0 } lines ? lines : plan.LineLists,
        LineVelocityKmPerS = parsed.GetValue(_velocity) ?? plan.LineVelocityKmPerS,
        Profile = parsed.GetResult(_profile) is null ? plan.Profile : parsed.GetValue(_profile),
        Sampling = parsed.GetResult(_sampling) is null ? plan.Sampling : parsed.GetValue(_sampling),
    };

    private VelocityOptions Search(ParseResult parsed)
    {
        var options = new VelocityOptions { SecondComponent = !parsed.GetValue(_single) };
        return parsed.GetValue(_search) is { } search ? options with { SearchHalfRangeKmPerS = search } : options;
    }

    private AnalysisOptions WithTemplates(ParseResult parsed, Provenance provenance, AnalysisOptions options)
    {
        List<string> names = parsed.GetValue(_templates) ?? [];
        var builtIn = new List<string>();
        var others = new List<LineTemplate>();
        foreach (string name in names)
        {
            switch (name.ToUpperInvariant())
            {
                case "BALMER":
                    builtIn.Add(StellarTemplates.BalmerName);
                    break;
                case "METAL":
                    builtIn.Add(StellarTemplates.MetalName);
                    break;
                case "BOTH":
                    builtIn.Add(StellarTemplates.BothName);
                    break;
                default:
                    others.Add(NamedLists.Template(name, provenance));
                    break;
            }
        }

        if (names is [var only] && only.Equals(StellarTemplates.BothName, System.StringComparison.OrdinalIgnoreCase))
        {
            names = [];
        }

        var stellar = others.Count > 0 && builtIn.Count == 0 ? null : new StellarTemplates();
        foreach (LineList list in stellar?.Lists ?? [])
        {
            provenance.AddList(list);
        }

        return options with
        {
            StellarTemplates = stellar,
            StellarTemplateNames = names.Count == 0 ? options.StellarTemplateNames : builtIn,
            Templates = others,
        };
    }
}
