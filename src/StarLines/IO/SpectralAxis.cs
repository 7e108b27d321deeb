using System;
using System.Globalization;
using StarLines.Velocities;

namespace StarLines.IO;

/// <summary>The wavelengths of an axis.</summary>
/// <param name="WavelengthsAngstrom">Å, strictly increasing; null where <paramref name="Scale"/> stands.</param>
/// <param name="Scale">A scale of equal steps; null where the wavelengths are a table.</param>
/// <param name="Reversed">Whether the first wavelength belongs to the last pixel.</param>
/// <param name="Medium">What the axis itself says of its medium.</param>
internal sealed record AxisSolution(double[]? WavelengthsAngstrom, WavelengthScale? Scale, bool Reversed, Medium Medium)
{
    internal double FirstAngstrom => Scale?.WavelengthsAngstrom[0] ?? WavelengthsAngstrom![0];

    internal double LastAngstrom => Scale?.WavelengthsAngstrom[^1] ?? WavelengthsAngstrom![^1];

    /// <summary>The scale in a medium and a frame.</summary>
    internal WavelengthScale ToScale(Medium medium, VelocityFrame frame) => Scale is null
        ? WavelengthScale.FromOwned(WavelengthsAngstrom!, medium, frame)
        : Scale.WithMedium(medium).WithFrame(frame);
}

/// <summary>
/// Turns the axis types of the FITS standard into wavelengths.
/// Source: FITS standard 4.0, section 8; Greisen, Calabretta, Valdes &amp; Allen (2006), A&amp;A 446, 747 (Paper III).
/// </summary>
internal static class SpectralAxis
{
    private static readonly string[] Types = ["FREQ", "AFRQ", "ENER", "WAVN", "VRAD", "WAVE", "VOPT", "ZOPT", "AWAV", "VELO", "BETA"];

    /// <summary>Whether a CTYPE names a spectral coordinate of the standard, with or without an algorithm code.</summary>
    internal static bool TrySplitType(string ctype, out string type, out string algorithm)
    {
        type = "";
        algorithm = "";
        string name = ctype.Trim().ToUpperInvariant();
        if (name.Length < 4 || Array.IndexOf(Types, name[..4]) < 0)
        {
            return false;
        }

        type = name[..4];
        if (name.Length == 4)
        {
            return true;
        }

        if (name[4] != '-' || name.Length > 8)
        {
            return false;
        }

        algorithm = name[4..].Trim('-');
        return true;
    }

    /// <summary>Wavelengths of an axis of a standard type.</summary>
    internal static AxisSolution Solve(AxisDescription axis, string type, string algorithm, SpectralUnit unit, ReadContext context)
    {
        if (!(axis.Increment is double step) || !(axis.ReferenceValue is double reference))
        {
            throw context.Error($"The spectral axis {axis.Type} has no {(axis.Increment is null ? "CDELT" : "CRVAL")}{Number(axis)}; correct the header.");
        }

        if (step == 0.0)
        {
            throw context.Error($"The spectral axis has an increment of 0; correct CDELT{Number(axis)}.");
        }

        double factor = unit.SiFactor;
        bool length = type is "WAVE" or "AWAV";
        Medium medium = type == "AWAV" ? Medium.Air : Medium.Vacuum;
        if (algorithm.Length == 0 && length)
        {
            return EqualSteps(axis, reference, step, unit.AngstromFactor, medium, context);
        }

        if (algorithm == "LOG" && length)
        {
            return EqualLogSteps(axis, reference * unit.AngstromFactor, step / reference, medium, context);
        }

        double rest = RestMetres(axis, type, algorithm, context);
        var variable = new SpectralVariable(type, rest);
        Func<double, double> toVacuum = algorithm switch
        {
            "" => w => variable.ToVacuum((reference + w) * factor),
            "LOG" => w => variable.ToVacuum(reference * Math.Exp(w / reference) * factor),
            "GRI" or "GRA" => Grism(axis, variable, algorithm == "GRA", reference * factor, factor, context),
            _ => Resampled(variable, algorithm, reference * factor, factor, rest, context),
        };

        var wavelengths = new double[axis.Count];
        try
        {
            for (int i = 0; i < wavelengths.Length; i++)
            {
                double vacuum = toVacuum(axis.OffsetOf(i)) * 1e10;
                wavelengths[i] = medium == Medium.Air ? AirVacuum.ToAirAngstrom(vacuum) : vacuum;
            }
        }
        catch (ArgumentOutOfRangeException cause)
        {
            throw context.Error($"The spectral axis {axis.Type} leaves the range in which air and vacuum wavelengths can be converted; correct CRVAL{Number(axis)} or CUNIT{Number(axis)}.", cause);
        }

        return Sorted(wavelengths, medium, context);
    }

    /// <summary>A scale of equal steps of wavelength.</summary>
    internal static AxisSolution EqualSteps(
        AxisDescription axis, double reference, double step, double angstromFactor, Medium medium, ReadContext context)
    {
        double first = (reference + axis.OffsetOf(0)) * angstromFactor;
        double last = (reference + axis.OffsetOf(axis.Count - 1)) * angstromFactor;
        CheckEnds(first, last, axis.Count, context);
        bool reversed = step < 0.0;
        WavelengthScale scale = WavelengthScale.Linear(
            reversed ? last : first, Math.Abs(step) * angstromFactor, axis.Count, medium);
        return new AxisSolution(null, scale, reversed, medium);
    }

    /// <summary>A scale of equal steps of ln λ.</summary>
    internal static AxisSolution EqualLogSteps(
        AxisDescription axis, double referenceAngstrom, double logStep, Medium medium, ReadContext context)
    {
        double offset = 1.0 - (axis.ReferencePixel ?? 0.0);
        double first = referenceAngstrom * Math.Exp(offset * logStep);
        double last = referenceAngstrom * Math.Exp((offset + axis.Count - 1) * logStep);
        CheckEnds(first, last, axis.Count, context);
        bool reversed = logStep < 0.0;
        WavelengthScale scale = WavelengthScale.LogLinear(reversed ? last : first, Math.Abs(logStep), axis.Count, medium);
        return new AxisSolution(null, scale, reversed, medium);
    }

    /// <summary>A table of wavelengths, turned round where it runs down.</summary>
    internal static AxisSolution Sorted(double[] wavelengths, Medium medium, ReadContext context)
    {
        CheckEnds(wavelengths[0], wavelengths[^1], wavelengths.Length, context);
        bool reversed = wavelengths.Length > 1 && wavelengths[^1] < wavelengths[0];
        if (reversed)
        {
            Array.Reverse(wavelengths);
        }

        for (int i = 0; i < wavelengths.Length; i++)
        {
            if (!(wavelengths[i] > (i == 0 ? 0.0 : wavelengths[i - 1])) || !double.IsFinite(wavelengths[i]))
            {
                throw context.Error(string.Create(
                    CultureInfo.InvariantCulture,
                    $"The spectral axis gives {wavelengths[i]:G6} Å at pixel {i + 1}, so its wavelengths do not run steadily one way; correct the axis keywords."));
            }
        }

        return new AxisSolution(wavelengths, null, reversed, medium);
    }

    private static void CheckEnds(double first, double last, int count, ReadContext context)
    {
        if (!double.IsFinite(first) || !double.IsFinite(last) || first <= 0.0 || last <= 0.0 || (count > 1 && first == last))
        {
            throw context.Error(string.Create(
                CultureInfo.InvariantCulture,
                $"The spectral axis runs from {first:G6} to {last:G6} Å, which are no wavelengths; correct the axis keywords or name the unit by --axis-unit."));
        }
    }

    private static double RestMetres(AxisDescription axis, string type, string algorithm, ReadContext context)
    {
        double rest = axis.RestWavelengthMetres is double metres && metres > 0.0 ? metres
            : axis.RestFrequencyHertz is double hertz && hertz > 0.0 ? PhysicalConstants.SpeedOfLightKmPerS * 1000.0 / hertz
            : double.NaN;
        bool needed = type is "VRAD" or "VOPT" or "ZOPT" or "VELO" or "BETA" || algorithm is ['V', '2', _];
        return needed && double.IsNaN(rest)
            ? throw context.Error($"The axis {axis.Type} gives velocities without the rest wavelength they belong to; add RESTWAV or RESTFRQ.")
            : rest;
    }

    /// <summary>An axis linear in another variable X: X = X_r + (dX/dS)_r w (Paper III, section 3.2).</summary>
    private static Func<double, double> Resampled(
        SpectralVariable variable, string algorithm, double reference, double factor, double rest, ReadContext context)
    {
        string? sampled = algorithm is [_, '2', _] ? TypeOf(algorithm[0]) : null;
        if (sampled is null || BasicOf(variable.Type) != algorithm[2] || algorithm[0] == algorithm[2])
        {
            throw context.Error($"The spectral axis {variable.Type}-{algorithm} uses an algorithm that the FITS standard does not know; correct CTYPE or convert the file to a plain axis.");
        }

        var x = new SpectralVariable(sampled, rest);
        double vacuum;
        try
        {
            vacuum = variable.ToVacuum(reference);
        }
        catch (ArgumentOutOfRangeException cause)
        {
            throw context.Error("The reference value of the spectral axis is out of range; correct CRVAL or CUNIT.", cause);
        }

        double xReference = x.FromVacuum(vacuum);
        double slope = x.Derivative(vacuum) / variable.Derivative(vacuum) * factor;
        return w => x.ToVacuum(xReference + (slope * w));
    }

    private static Func<double, double> Grism(
        AxisDescription axis, SpectralVariable variable, bool inAir, double reference, double factor, ReadContext context)
    {
        var works = new SpectralVariable(inAir ? "AWAV" : "WAVE", double.NaN);
        double vacuum = variable.ToVacuum(reference);
        var equation = new GrismEquation(axis.Parameters, works.FromVacuum(vacuum));
        double slope = works.Derivative(vacuum) / variable.Derivative(vacuum) * factor;
        double probe = equation.WavelengthMetres(0.0);
        return double.IsFinite(probe)
            ? w => works.ToVacuum(equation.WavelengthMetres(slope * w))
            : throw context.Error($"The grism parameters PV{Number(axis)}_0 to PV{Number(axis)}_6 allow no light at the reference wavelength; correct them.");
    }

    private static string? TypeOf(char code) => code switch
    {
        'F' => "FREQ",
        'W' => "WAVE",
        'A' => "AWAV",
        'V' => "VELO",
        _ => null,
    };

    /// <summary>The letter of the basic variable a coordinate belongs to (Paper III, table 2).</summary>
    private static char BasicOf(string type) => type switch
    {
        "FREQ" or "AFRQ" or "ENER" or "WAVN" or "VRAD" => 'F',
        "WAVE" or "VOPT" or "ZOPT" => 'W',
        "AWAV" => 'A',
        _ => 'V',
    };

    private static string Number(AxisDescription axis) => axis.Number.ToString(CultureInfo.InvariantCulture);
}
