using System;
using System.Collections.Generic;
using System.Linq;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Templates;

namespace StarLines.Velocities;

/// <summary>
/// The built-in templates under the names a user gives them: Balmer lines, metal lines, and the velocity that both give
/// together. Keep it for all spectra; it may be used by several threads.
/// </summary>
public sealed class StellarTemplates
{
    /// <summary>Name of the template of hydrogen lines.</summary>
    public const string BalmerName = "balmer";

    /// <summary>Name of the template of metal lines.</summary>
    public const string MetalName = "metal";

    /// <summary>Name of the combination of both.</summary>
    public const string BothName = "both";

    // Hydrogen of stars down to K3 in survey spectra gives peaks of 0.16 and more, a wrong match up to 0.14; common
    // practice, no source.
    private const double WeakestBalmerPeak = 0.15;

    // Where hydrogen is this plain, metals of the same star or of its companion are not farther off than this.
    private const double PlainBalmerPeak = 0.5;
    private const double FarthestMetalKmPerS = 400.0;

    private readonly TemplateFamily _balmer;
    private readonly TemplateFamily _metal;

    /// <summary>Makes the templates from the built-in line lists <c>balmer</c>, <c>metals-fgk</c> and <c>early-type</c>.</summary>
    public StellarTemplates()
    {
        LineList balmer = LineListCatalog.Find("balmer");
        LineList cool = LineListCatalog.Find("metals-fgk");
        LineList hot = LineListCatalog.Find("early-type");
        Lists = [balmer, cool, hot];
        _balmer = BuiltInTemplates.Balmer(balmer);
        _metal = BuiltInTemplates.Metal(cool, hot);
    }

    /// <summary>The line lists behind the templates.</summary>
    public IReadOnlyList<LineList> Lists { get; }

    /// <summary>Measures the velocity by hydrogen and by metals, each with the member that fits best, and combines them.</summary>
    /// <param name="spectrum">The spectrum.</param>
    /// <param name="continuum">Its continuum.</param>
    /// <param name="names">Which of <c>balmer</c>, <c>metal</c> and <c>both</c> to give, in this order.</param>
    /// <param name="options">Range and other choices.</param>
    /// <returns>One result a name.</returns>
    /// <exception cref="ArgumentException">A name is not known.</exception>
    public IReadOnlyList<VelocityResult> Measure(
        Spectrum spectrum, ContinuumFit continuum, IReadOnlyList<string> names, VelocityOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(spectrum);
        ArgumentNullException.ThrowIfNull(continuum);
        ArgumentNullException.ThrowIfNull(names);
        VelocityResult balmer = WithoutWeakPeak(VelocityMeasurer.MeasureFamilies(spectrum, continuum, [_balmer], options)[0]);
        bool metals = names.Contains(MetalName) || names.Contains(BothName);
        VelocityResult? metal = metals ? MeasureMetal(spectrum, continuum, balmer, options) : null;
        var results = new VelocityResult[names.Count];
        for (int k = 0; k < results.Length; k++)
        {
            results[k] = names[k] switch
            {
                BothName => VelocityCombiner.Combine(BothName, [balmer, metal!]),
                BalmerName => balmer,
                MetalName => metal!,
                _ => throw new ArgumentException(
                    $"There is no built-in template {names[k]}; there are {BalmerName}, {MetalName} and {BothName}.", nameof(names)),
            };
        }

        return results;
    }

    // A few broad lines match the bands of a cool star somewhere within the search; real hydrogen stands out.
    private static VelocityResult WithoutWeakPeak(VelocityResult balmer) =>
        balmer.Measurement.PeakHeight < WeakestBalmerPeak
            ? VelocityMeasurer.Nothing(BalmerName, VelocityStatus.NoPeak, new Remark(
                "weak-peak", "The hydrogen lines match the spectrum too weakly to give a velocity."))
            : balmer;

    private VelocityResult MeasureMetal(
        Spectrum spectrum, ContinuumFit continuum, VelocityResult balmer, VelocityOptions? options)
    {
        Spectrum without = balmer.ObservedKmPerS.HasValue
            ? spectrum.Excluding(HydrogenMask.Ranges(spectrum, continuum, Lists[0], balmer.ObservedKmPerS.Value))
            : spectrum;
        VelocityResult metal = VelocityMeasurer.MeasureFamilies(without, continuum, [_metal], options)[0];
        double apart = Math.Abs(metal.ObservedKmPerS.Value - balmer.ObservedKmPerS.Value);
        return balmer.Measurement.PeakHeight > PlainBalmerPeak && apart > FarthestMetalKmPerS
            ? VelocityMeasurer.Nothing(MetalName, VelocityStatus.NoPeak, new Remark(
                "far-from-hydrogen", "The best match of the metal lines lies over 400 km/s from plain hydrogen lines: it is chance."))
            : metal;
    }
}
