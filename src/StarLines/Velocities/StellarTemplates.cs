using System;
using System.Collections.Generic;
using System.Globalization;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// The built-in templates: Balmer lines, metal lines at a few temperatures of which the data choose one, and both together.
/// Keep it for all spectra; it may be used by several threads.
/// </summary>
public sealed class StellarTemplates
{
    /// <summary>Name of the template of hydrogen lines.</summary>
    public const string BalmerName = "balmer";

    /// <summary>Name of the template of metal lines.</summary>
    public const string MetalName = "metal";

    /// <summary>Name of the template of all of them.</summary>
    public const string BothName = "both";

    // Two velocities that differ by more than this many of their joint standard deviations do not belong together.
    private const double Disagreement = 3.0;

    // Within a step the pattern of the lines changes little: the main spectral types from K5 to O9.
    private static readonly double[] s_temperatures = [4200.0, 5000.0, 5800.0, 6800.0, 8500.0, 11_000.0, 16_000.0, 25_000.0];

    private readonly LineTemplate _balmer;
    private readonly LineTemplate[] _metal;
    private readonly LineTemplate[] _both;

    /// <summary>Makes the templates from the built-in line lists <c>balmer</c>, <c>metals-fgk</c> and <c>early-type</c>.</summary>
    public StellarTemplates()
        : this(LineListCatalog.Find("balmer"), LineListCatalog.Find("metals-fgk"), LineListCatalog.Find("early-type"))
    {
    }

    private StellarTemplates(LineList balmer, LineList cool, LineList hot)
    {
        var metals = new LineList(MetalName, balmer.Medium, WithoutHydrogen(cool, hot));
        var all = new LineList(BothName, balmer.Medium, [.. balmer.Lines, .. metals.Lines]);
        Lists = [balmer, cool, hot];
        _balmer = LineTemplate.FromLineList(balmer, new TemplateOptions { Name = BalmerName, TemperatureKelvin = 8500.0 });
        _metal = new LineTemplate[s_temperatures.Length];
        _both = new LineTemplate[s_temperatures.Length];
        for (int k = 0; k < s_temperatures.Length; k++)
        {
            _metal[k] = LineTemplate.FromLineList(
                metals, new TemplateOptions { Name = MetalName, TemperatureKelvin = s_temperatures[k] });
            _both[k] = LineTemplate.FromLineList(
                all, new TemplateOptions { Name = BothName, TemperatureKelvin = s_temperatures[k] });
        }
    }

    /// <summary>The line lists behind the templates.</summary>
    public IReadOnlyList<LineList> Lists { get; }

    /// <summary>Measures the velocity by hydrogen, by metals at the temperature that fits best, and by both together.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="names">Which of <c>balmer</c>, <c>metal</c> and <c>both</c> to give, in this order.</param>
    /// <param name="options">Range and other choices.</param>
    /// <returns>One result a name. Balmer and metal velocities that disagree by more than 3σ carry a warning with both numbers.</returns>
    /// <exception cref="ArgumentException">A name is not known.</exception>
    public IReadOnlyList<VelocityResult> Measure(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<string> names, VelocityOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(names);
        options ??= new VelocityOptions();
        int best = BestTemperature(spectrum, continuum, options);
        var templates = new LineTemplate[names.Count];
        for (int k = 0; k < templates.Length; k++)
        {
            templates[k] = names[k] switch
            {
                BalmerName => _balmer,
                MetalName => _metal[best],
                BothName => _both[best],
                _ => throw new ArgumentException($"There is no built-in template {names[k]}; there are {BalmerName}, {MetalName} and {BothName}.", nameof(names)),
            };
        }

        VelocityResult[] results = VelocityMeasurer.MeasureAll(spectrum, continuum, templates, options);
        for (int k = 0; k < results.Length; k++)
        {
            results[k] = names[k] == BalmerName ? results[k] : WithTemperature(results[k], s_temperatures[best]);
        }

        WarnOfDisagreement(results);
        return results;
    }

    private int BestTemperature(Spectrum spectrum, ContinuumFit continuum, VelocityOptions options)
    {
        VelocityResult[] tried = VelocityMeasurer.MeasureAll(
            spectrum, continuum, _both, options with { SecondComponent = false });
        int best = 0;
        double highest = double.NegativeInfinity;
        for (int k = 0; k < tried.Length; k++)
        {
            if (tried[k].Measurement.PeakHeight > highest)
            {
                highest = tried[k].Measurement.PeakHeight;
                best = k;
            }
        }

        return best;
    }

    private static VelocityResult WithTemperature(VelocityResult result, double kelvin) => result.With(result.Measurement with
    {
        Warnings = [.. result.Measurement.Warnings, new Remark(
            string.Create(CultureInfo.InvariantCulture, $"template-{kelvin:F0}K"),
            string.Create(CultureInfo.InvariantCulture, $"The lines of a star of {kelvin:F0} K fit best among the built-in templates."))],
    });

    private static void WarnOfDisagreement(VelocityResult[] results)
    {
        int balmer = Array.FindIndex(results, static r => r.TemplateName == BalmerName);
        int metal = Array.FindIndex(results, static r => r.TemplateName == MetalName);
        if (balmer < 0 || metal < 0 || !results[balmer].ObservedKmPerS.HasValue || !results[metal].ObservedKmPerS.HasValue)
        {
            return;
        }

        Measured one = results[balmer].ObservedKmPerS;
        Measured other = results[metal].ObservedKmPerS;
        double joint = Math.Sqrt((one.Uncertainty * one.Uncertainty) + (other.Uncertainty * other.Uncertainty));
        if (!(Math.Abs(one.Value - other.Value) > Disagreement * joint))
        {
            return;
        }

        var remark = new Remark("balmer-metal-differ", string.Create(
            CultureInfo.InvariantCulture,
            $"Hydrogen says {one.Value:F2} ± {one.Uncertainty:F2} km/s and metals say {other.Value:F2} ± {other.Uncertainty:F2} km/s: emission, two stars or a wrong template."));
        for (int k = 0; k < results.Length; k++)
        {
            results[k] = results[k].With(results[k].Measurement with { Warnings = [.. results[k].Measurement.Warnings, remark] });
        }
    }

    private static List<RestLine> WithoutHydrogen(params ReadOnlySpan<LineList> lists)
    {
        var lines = new List<RestLine>();
        foreach (LineList list in lists)
        {
            foreach (RestLine line in list.Lines)
            {
                if (!LineStrength.IsHydrogen(line) && !lines.Exists(
                    other => other.Species == line.Species && Math.Abs(other.WavelengthAngstrom - line.WavelengthAngstrom) < 0.02))
                {
                    lines.Add(line);
                }
            }
        }

        return lines;
    }
}
