using System;
using System.Collections.Generic;
using StarLines.LineLists;

namespace StarLines.Templates;

/// <summary>The templates that need no file: Balmer lines of several widths, metal lines of several temperatures.</summary>
public static class BuiltInTemplates
{
    /// <summary>
    /// Full widths at half maximum of the wings of the Balmer lines, Å, from cool or evolved stars (none) to A dwarfs;
    /// common practice, no source.
    /// </summary>
    private static readonly double[] s_wingFwhm = [0.0, 4.0, 9.0, 18.0];

    /// <summary>Full width of the core that all hydrogen lines have, Å at H-beta, and depths of core and wings; common practice, no source.</summary>
    private const double CoreFwhm = 1.2;

    private const double CoreDepth = 0.35;

    private const double WingDepth = 0.5;

    private const double HBeta = 4861.0;

    /// <summary>Effective temperatures of the metal templates, K.</summary>
    private static readonly double[] s_temperatures = [4000.0, 5000.0, 6000.0, 7500.0, 10_000.0, 14_000.0, 20_000.0, 30_000.0];

    /// <summary>Below this wavelength the Balmer series, above and below these the Paschen series, run together, Å.</summary>
    private const double FirstBalmer = 3790.0;

    private const double LastBalmer = 7000.0;

    private const double FirstPaschen = 8740.0;

    /// <summary>Lines of one species closer than this are one line, in units of wavelength.</summary>
    private const double SameLine = 3e-6;

    /// <summary>Hydrogen lines, from <c>balmer</c> of the built-in lists.</summary>
    public static TemplateFamily Balmer() => Balmer(LineListCatalog.Find("balmer"));

    /// <summary>Hydrogen lines of several widths; those that run together near the series limits are left out.</summary>
    /// <param name="list">The lines.</param>
    public static TemplateFamily Balmer(LineList list)
    {
        ArgumentNullException.ThrowIfNull(list);
        var kept = new List<RestLine>();
        foreach (RestLine line in list.Lines)
        {
            double wavelength = line.WavelengthAngstrom;
            if (wavelength > FirstPaschen || (wavelength > FirstBalmer && wavelength < LastBalmer))
            {
                kept.Add(line);
            }
        }

        return new TemplateFamily("balmer", Array.ConvertAll(s_wingFwhm, fwhm => Hydrogen(kept, list.Medium, fwhm)));
    }

    /// <summary>Metal and helium lines, from <c>metals-fgk</c> and <c>early-type</c> of the built-in lists.</summary>
    public static TemplateFamily Metal() => Metal(LineListCatalog.Find("metals-fgk"), LineListCatalog.Find("early-type"));

    /// <summary>Metal and helium lines of two lists, with the strengths of several temperatures.</summary>
    /// <param name="cool">Lines of cool stars.</param>
    /// <param name="hot">Lines of hot stars, in the same medium.</param>
    /// <exception cref="ArgumentException">The media differ.</exception>
    public static TemplateFamily Metal(LineList cool, LineList hot)
    {
        ArgumentNullException.ThrowIfNull(cool);
        ArgumentNullException.ThrowIfNull(hot);
        if (cool.Medium != hot.Medium)
        {
            throw new ArgumentException("Both lists must be in one medium.", nameof(hot));
        }

        var lines = new List<RestLine>();
        foreach (RestLine line in new LineList("metal", cool.Medium, [.. cool.Lines, .. hot.Lines]).Lines)
        {
            if (!LineStrength.IsHydrogen(line) && !Holds(lines, line))
            {
                lines.Add(line);
            }
        }

        var list = new LineList("metal", cool.Medium, lines);
        return new TemplateFamily("metal", Array.ConvertAll(s_temperatures, temperature => LineTemplate.FromLineList(
            list, new TemplateOptions { Name = "metal", TemperatureKelvin = temperature })));
    }

    /// <summary>Each line as a narrow core, which holds the velocity, on wings.</summary>
    private static LineTemplate Hydrogen(List<RestLine> lines, Medium medium, double wingFwhm)
    {
        var profiles = new List<TemplateLine>();
        foreach (RestLine line in lines)
        {
            profiles.Add(new TemplateLine
            {
                Name = line.Name,
                WavelengthAngstrom = line.WavelengthAngstrom,
                Depth = CoreDepth,
                FwhmAngstrom = CoreFwhm * line.WavelengthAngstrom / HBeta,
            });
            if (wingFwhm > 0.0)
            {
                profiles.Add(profiles[^1] with { Depth = WingDepth, FwhmAngstrom = wingFwhm, Shape = LineShape.Stark });
            }
        }

        return LineTemplate.FromLines("balmer", medium, profiles, widthsKnown: false);
    }

    private static bool Holds(List<RestLine> lines, RestLine line)
    {
        for (int k = lines.Count - 1; k >= 0; k--)
        {
            if (line.WavelengthAngstrom - lines[k].WavelengthAngstrom > SameLine * line.WavelengthAngstrom)
            {
                return false;
            }

            if (lines[k].Species == line.Species)
            {
                return true;
            }
        }

        return false;
    }
}
