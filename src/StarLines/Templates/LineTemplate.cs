using System;
using System.Collections.Generic;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Noise;
using StarLines.Velocities;

namespace StarLines.Templates;

/// <summary>
/// What the absorption of a star at rest looks like: computed lines, or a spectrum. A template remembers its transform
/// on the last grid it was correlated on, so keep it for all spectra; it may be used by several threads.
/// </summary>
public sealed class LineTemplate
{
    private readonly TemplateProfile? _vacuum;
    private readonly TemplateProfile? _fromAir;
    private volatile TemplateTransform? _transform;

    private LineTemplate(
        string name, Medium medium, IReadOnlyList<TemplateLine> lines, bool widthsKnown, TemplateProfile? vacuum, TemplateProfile? fromAir)
    {
        Name = name;
        Medium = medium;
        Lines = lines;
        WidthsKnown = widthsKnown;
        _vacuum = vacuum;
        _fromAir = fromAir;
    }

    /// <summary>Name of the template.</summary>
    public string Name { get; }

    /// <summary>Medium of the wavelengths of <see cref="Lines"/>.</summary>
    public Medium Medium { get; }

    /// <summary>The lines in order of wavelength; none where the template is a spectrum.</summary>
    public IReadOnlyList<TemplateLine> Lines { get; }

    /// <summary>
    /// Whether the widths of the lines are those of the spectra to be measured, or at least a true lower limit of the
    /// star's own; else the width is measured with the velocity.
    /// </summary>
    public bool WidthsKnown { get; }

    /// <summary>Makes a template of a line list.</summary>
    /// <param name="list">The list. Depth and width of a line are taken from it; where it gives none they are computed.</param>
    /// <param name="options">How to compute what the list does not give.</param>
    /// <exception cref="ArgumentException">An option is out of range.</exception>
    public static LineTemplate FromLineList(LineList list, TemplateOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(list);
        options ??= new TemplateOptions();
        List<TemplateLine> lines = LineStrength.TemplateLines(list, options, out bool widthsKnown);
        return FromLines(options.Name.Length != 0 ? options.Name : list.Name, list.Medium, lines, widthsKnown);
    }

    /// <summary>Makes a template of lines.</summary>
    /// <param name="name">Name of the template.</param>
    /// <param name="medium">Medium of the wavelengths; where unknown, that of the spectrum is taken.</param>
    /// <param name="lines">The lines.</param>
    /// <param name="widthsKnown">See <see cref="WidthsKnown"/>.</param>
    public static LineTemplate FromLines(string name, Medium medium, IReadOnlyCollection<TemplateLine> lines, bool widthsKnown)
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(lines);
        TemplateLine[] sorted = [.. lines];
        Array.Sort(sorted, static (a, b) => a.WavelengthAngstrom.CompareTo(b.WavelengthAngstrom));
        foreach (TemplateLine line in sorted)
        {
            Guard.Positive(line.WavelengthAngstrom, nameof(lines), "Å");
            Guard.Positive(line.FwhmAngstrom, nameof(lines), "Å");
            Guard.Positive(line.Depth, nameof(lines), "of the continuum");
        }

        TemplateProfile? asVacuum = sorted.Length == 0 || medium == Medium.Air ? null : new LineProfileSet(sorted);
        TemplateProfile? asAir = sorted.Length == 0 || medium == Medium.Vacuum ? null : new LineProfileSet(InVacuum(sorted));
        return new LineTemplate(name, medium, sorted, widthsKnown, asVacuum, asAir);
    }

    /// <summary>Makes a template of a spectrum, for instance the best exposure of a star against which to measure the others.</summary>
    /// <param name="spectrum">The spectrum; flagged pixels count as continuum, and without uncertainties its noise is estimated from the flux.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="velocityKmPerS">Velocity of the star in the frame of the spectrum, km/s: it is taken to rest by it.</param>
    /// <param name="name">Name of the template.</param>
    public static LineTemplate FromSpectrum(Spectrum spectrum, ContinuumFit continuum, double velocityKmPerS, string name)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(name);
        Guard.SameLength(continuum.Count, spectrum.Count, nameof(continuum));
        if (!spectrum.HasSigma)
        {
            spectrum = spectrum.WithSigma(NoiseEstimator.EstimatePerPixel(spectrum));
        }

        var rest = new SpectrumProfile(spectrum, continuum, Math.Log(Doppler.Factor(velocityKmPerS)));
        return new LineTemplate(name, Medium.Vacuum, [], widthsKnown: true, rest, fromAir: null);
    }

    /// <summary>The absorption against wavelengths in vacuum; null where the template has no line.</summary>
    /// <param name="assumed">What the wavelengths are taken for where the template does not know its medium.</param>
    internal TemplateProfile? Profile(Medium assumed) =>
        (Medium == Medium.Unknown ? assumed : Medium) == Medium.Air ? _fromAir : _vacuum;

    /// <summary>The transform of the template on a grid, made once and kept until the grid changes.</summary>
    internal TemplateTransform? TransformOn(CorrelationGrid grid, Medium assumed)
    {
        TemplateProfile? profile = Profile(assumed);
        TemplateTransform? kept = _transform;
        if (kept is not null && kept.Profile == profile && kept.Grid.Matches(grid))
        {
            return kept;
        }

        if (profile is null)
        {
            return null;
        }

        var made = new TemplateTransform(profile, grid);
        _transform = made;
        return made;
    }

    /// <summary>The grid of the transform that is kept, so that others may share it.</summary>
    internal CorrelationGrid? KeptGrid => _transform?.Grid;

    private static TemplateLine[] InVacuum(TemplateLine[] lines)
    {
        var converted = new TemplateLine[lines.Length];
        for (int j = 0; j < lines.Length; j++)
        {
            converted[j] = lines[j] with { WavelengthAngstrom = AirVacuum.ToVacuumAngstrom(lines[j].WavelengthAngstrom) };
        }

        return converted;
    }
}
