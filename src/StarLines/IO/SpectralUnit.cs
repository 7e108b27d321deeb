using System;
using System.Collections.Frozen;
using System.Collections.Generic;

namespace StarLines.IO;

/// <summary>What a unit of a spectral axis measures.</summary>
internal enum SpectralQuantity
{
    /// <summary>Wavelength.</summary>
    Length,

    /// <summary>Frequency.</summary>
    Frequency,

    /// <summary>Energy.</summary>
    Energy,

    /// <summary>Wavenumber.</summary>
    Wavenumber,

    /// <summary>Velocity.</summary>
    Velocity,

    /// <summary>No unit: redshift, v/c, pixels.</summary>
    None,
}

/// <summary>How a stored number stands for the quantity.</summary>
internal enum SpectralForm
{
    /// <summary>The number is the quantity.</summary>
    Linear,

    /// <summary>The number is its decimal logarithm.</summary>
    Log10,

    /// <summary>The number is its natural logarithm.</summary>
    Ln,
}

/// <summary>A unit of a spectral axis: SI value = number × <paramref name="SiFactor"/>, or the logarithm of a number in that unit.</summary>
/// <param name="Quantity">What it measures.</param>
/// <param name="SiFactor">SI units (m, Hz, J, 1/m, m/s) in one unit.</param>
/// <param name="Form">Plain number or logarithm.</param>
internal readonly record struct SpectralUnit(SpectralQuantity Quantity, double SiFactor, SpectralForm Form = SpectralForm.Linear)
{
    /// <summary>Ångström.</summary>
    internal static SpectralUnit Angstrom { get; } = new(SpectralQuantity.Length, 1e-10);

    /// <summary>Nanometre.</summary>
    internal static SpectralUnit Nanometre { get; } = new(SpectralQuantity.Length, 1e-9);

    /// <summary>Micrometre.</summary>
    internal static SpectralUnit Micrometre { get; } = new(SpectralQuantity.Length, 1e-6);

    /// <summary>Metre.</summary>
    internal static SpectralUnit Metre { get; } = new(SpectralQuantity.Length, 1.0);

    private static readonly FrozenDictionary<string, SpectralUnit> Names = MakeNames();

    /// <summary>Å in one unit of length.</summary>
    internal double AngstromFactor => SiFactor == 1e-10 ? 1.0
        : SiFactor == 1e-9 ? 10.0
        : SiFactor == 1e-6 ? 1e4
        : SiFactor == 1.0 ? 1e10
        : SiFactor / 1e-10;

    /// <summary>Reads a unit as files and people write it: any case, plural, with powers, and the usual forms of a logarithm.</summary>
    internal static bool TryParse(string? text, out SpectralUnit unit)
    {
        unit = default;
        string name = Squeeze(text);
        if (name.Length == 0)
        {
            return false;
        }

        SpectralForm form = TakeLogarithm(ref name);
        if (!Names.TryGetValue(name, out unit) && !Names.TryGetValue(name.ToLowerInvariant(), out unit))
        {
            return false;
        }

        unit = unit with { Form = form };
        return true;
    }

    private static string Squeeze(string? text)
    {
        if (text is null)
        {
            return "";
        }

        string name = text.Replace(" ", "", StringComparison.Ordinal)
            .Replace("**", "^", StringComparison.Ordinal)
            .Replace("_", "", StringComparison.Ordinal)
            .Replace(".", "", StringComparison.Ordinal)
            .Replace("\u03BC", "u", StringComparison.Ordinal)
            .Replace("\u00B5", "u", StringComparison.Ordinal)
            .Replace("\u212B", "\u00C5", StringComparison.Ordinal);
        return name;
    }

    /// <summary>Takes <c>log10(…)</c>, <c>log(…)</c>, <c>dex(…)</c>, <c>ln(…)</c> or the <c>[…]</c> of catalogues from a unit.</summary>
    private static SpectralForm TakeLogarithm(ref string name)
    {
        foreach ((string prefix, SpectralForm form) in LogarithmPrefixes)
        {
            if (name.StartsWith(prefix, StringComparison.OrdinalIgnoreCase) && name.Length > prefix.Length)
            {
                string inner = name[prefix.Length..].TrimStart('(').TrimEnd(')').Trim('[', ']');
                int slash = inner.IndexOf('/', StringComparison.Ordinal);
                if (slash > 0 && inner[..slash].ToLowerInvariant() is "lambda" or "wavelength" or "wave")
                {
                    inner = inner[(slash + 1)..];
                }

                name = inner;
                return form;
            }
        }

        return SpectralForm.Linear;
    }

    private static readonly (string Prefix, SpectralForm Form)[] LogarithmPrefixes =
    [
        ("log10", SpectralForm.Log10),
        ("log(", SpectralForm.Log10),
        ("log[", SpectralForm.Log10),
        ("dex(", SpectralForm.Log10),
        ("[", SpectralForm.Log10),
        ("ln(", SpectralForm.Ln),
        ("log", SpectralForm.Log10),
    ];

    private static FrozenDictionary<string, SpectralUnit> MakeNames()
    {
        var names = new Dictionary<string, SpectralUnit>(StringComparer.Ordinal);
        Add(names, SpectralQuantity.Length, 1e-10, "a", "A", "aa", "ang", "angs", "angstr", "angstrom", "angstroms", "angström", "ångström", "ångstrom", "Å", "å", "01nm", "10^-10m", "1e-10m", "10-10m");
        Add(names, SpectralQuantity.Length, 1e-9, "nm", "nanometer", "nanometers", "nanometre", "nanometres", "nanom", "10^-9m");
        Add(names, SpectralQuantity.Length, 1e-6, "um", "micron", "microns", "micrometer", "micrometers", "micrometre", "micrometres", "mum", "10^-6m");
        Add(names, SpectralQuantity.Length, 1e-12, "pm");
        Add(names, SpectralQuantity.Length, 1e-3, "mm");
        Add(names, SpectralQuantity.Length, 1e-2, "cm");
        Add(names, SpectralQuantity.Length, 1.0, "m", "meter", "meters", "metre", "metres");
        AddPrefixed(names, SpectralQuantity.Frequency, 1.0, "Hz");
        AddPrefixed(names, SpectralQuantity.Energy, PhysicalConstants.ElementaryChargeCoulomb, "eV");
        Add(names, SpectralQuantity.Energy, 1.0, "J");
        Add(names, SpectralQuantity.Energy, 1e-7, "erg");
        AddInverse(names, 1.0, "m");
        AddInverse(names, 1e2, "cm");
        AddInverse(names, 1e3, "mm");
        AddInverse(names, 1e6, "um");
        AddInverse(names, 1e9, "nm");
        AddInverse(names, 1e10, "angstrom");
        Add(names, SpectralQuantity.Wavenumber, 1e2, "kayser");
        Add(names, SpectralQuantity.Velocity, 1.0, "m/s", "ms-1", "ms^-1", "ms^(-1)");
        Add(names, SpectralQuantity.Velocity, 1e3, "km/s", "kms-1", "kms^-1", "kms^(-1)", "km/sec", "kms");
        Add(names, SpectralQuantity.Velocity, 1e-2, "cm/s", "cms-1");
        return names.ToFrozenDictionary(StringComparer.Ordinal);
    }

    private static void Add(Dictionary<string, SpectralUnit> names, SpectralQuantity quantity, double factor, params string[] spellings)
    {
        foreach (string spelling in spellings)
        {
            names[spelling] = new SpectralUnit(quantity, factor);
        }
    }

    private static void AddPrefixed(Dictionary<string, SpectralUnit> names, SpectralQuantity quantity, double factor, string name)
    {
        (string Prefix, double Factor)[] prefixes = [("", 1.0), ("k", 1e3), ("M", 1e6), ("G", 1e9), ("T", 1e12), ("P", 1e15)];
        foreach ((string prefix, double scale) in prefixes)
        {
            names[prefix + name] = new SpectralUnit(quantity, factor * scale);
            names[(prefix + name).ToLowerInvariant()] = new SpectralUnit(quantity, factor * scale);
        }

        // Milli has the small letter that mega loses above; an exact spelling wins over a lower-case one.
        names["m" + name] = new SpectralUnit(quantity, factor * 1e-3);
        names.Remove(("m" + name).ToLowerInvariant());
    }

    private static void AddInverse(Dictionary<string, SpectralUnit> names, double factor, string length) =>
        Add(names, SpectralQuantity.Wavenumber, factor, "1/" + length, "/" + length, length + "-1", length + "^-1", length + "^(-1)");
}
