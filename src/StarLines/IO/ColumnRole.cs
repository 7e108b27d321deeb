using System;
using System.Collections.Frozen;

namespace StarLines.IO;

/// <summary>What a column, an image extension or a row of an image holds.</summary>
internal enum ColumnRole
{
    /// <summary>Nothing that a spectrum needs.</summary>
    None,

    /// <summary>A spectral coordinate.</summary>
    Wavelength,

    /// <summary>log10 of the wavelength.</summary>
    LogWavelength,

    /// <summary>Flux.</summary>
    Flux,

    /// <summary>Standard deviation of the flux.</summary>
    Sigma,

    /// <summary>Variance of the flux.</summary>
    Variance,

    /// <summary>Inverse variance of the flux.</summary>
    InverseVariance,

    /// <summary>Mask, 0 where good.</summary>
    Mask,
}

/// <summary>What can be known of a column before its values.</summary>
/// <param name="Number">Number, from 1.</param>
/// <param name="Name">Name; may be empty.</param>
/// <param name="Unit">Unit; may be empty.</param>
/// <param name="Ucd">Unified content descriptor; may be empty.</param>
/// <param name="Utype">Role in a data model; may be empty.</param>
/// <param name="Comment">Description.</param>
internal readonly record struct ColumnFacts(int Number, string Name, string Unit, string Ucd, string Utype, string Comment);

/// <summary>Recognises what columns hold by their descriptors and names.</summary>
internal static class ColumnRoles
{
    /// <summary>Names in capitals without signs, each with its role and its rank among names of that role (small is better).</summary>
    private static readonly FrozenDictionary<string, (ColumnRole Role, int Rank)> Names = Make(
        (ColumnRole.Wavelength, ["WAVE", "WAVELENGTH", "WAVELENGTHS", "LAMBDA", "LAM", "WAVELEN", "WLEN", "WL", "WAVEOBS", "WVL", "WAV", "WAVES", "AWAV", "VWAV", "WAVEVAC", "WAVELENGTHVAC", "WAVEVACUUM", "VACWAVE", "WAVELENGTHVACUUM", "LAMBDAVAC", "WAVEAIR", "WAVELENGTHAIR", "AIRWAVE", "LAMBDAAIR", "SPECTRALAXIS", "FREQ", "FREQUENCY", "NU", "ENERGY", "WAVENUMBER", "ANGSTROM", "ANGSTROMS", "NM"]),
        (ColumnRole.LogWavelength, ["LOGLAM", "LOGLAMBDA", "LOGWAVE", "LOGWAVELENGTH", "LOG10WAVE", "LOG10LAMBDA", "LOGWL", "LOGWLEN"]),
        (ColumnRole.Flux, ["FLUX", "FLUXES", "FLUXDENSITY", "FLAM", "FLAMBDA", "FLUXREDUCED", "FLUXCAL", "FLUXOBS", "SPEC", "SPECTRUM", "INTENSITY", "INTENS", "INT", "COUNTS", "COUNT", "NET", "SIGNAL", "ADU", "ELECTRONS", "RELFLUX", "RELATIVEFLUX", "NORMFLUX", "NORMALIZEDFLUX", "FLUXNORM", "F", "DATA", "VALUE", "Y"]),
        (ColumnRole.Sigma, ["ERR", "ERROR", "ERRORS", "ERRS", "SIGMA", "UNCERTAINTY", "UNCERT", "STATERROR", "STDDEV", "STDEV", "STD", "FLUXERR", "FLUXERROR", "ERRFLUX", "EFLUX", "SIGMAFLUX", "FLUXSIGMA", "FLUXUNCERTAINTY", "FLUXUNC", "UNC", "NOISE", "RMS", "SIG", "DFLUX", "ERRREDUCED"]),
        (ColumnRole.Variance, ["VAR", "VARIANCE", "FLUXVAR", "FLUXVARIANCE"]),
        (ColumnRole.InverseVariance, ["IVAR", "INVVAR", "INVERSEVARIANCE", "FLUXIVAR", "INVERSE", "IVARFLUX", "INVVARIANCE"]),
        (ColumnRole.Mask, ["MASK", "ANDMASK", "QUAL", "QUALITY", "DQ", "FLAG", "FLAGS", "DATAQUAL", "DATAQUALITY", "BPM", "BADPIX", "BADPIXEL", "MASKS", "QFLAG"]));

    /// <summary>The role of a name and its rank; none where the name says nothing.</summary>
    internal static (ColumnRole Role, int Rank) OfName(string name)
    {
        Span<char> letters = stackalloc char[32];
        int length = 0;
        foreach (char c in name)
        {
            // A unit in parentheses is not part of the name.
            if (c is '(' or '[')
            {
                break;
            }

            if (char.IsAsciiLetterOrDigit(c))
            {
                if (length == letters.Length)
                {
                    return (ColumnRole.None, 0);
                }

                letters[length++] = char.ToUpperInvariant(c);
            }
        }

        if (name is "\u03BB" or "\u03BB ")
        {
            return (ColumnRole.Wavelength, 0);
        }

        return Names.GetAlternateLookup<ReadOnlySpan<char>>().TryGetValue(letters[..length], out (ColumnRole Role, int Rank) found)
            ? found
            : (ColumnRole.None, 0);
    }

    /// <summary>The role that a descriptor or data-model role states.</summary>
    internal static ColumnRole OfDescriptor(string ucd, string utype)
    {
        if (utype.Length != 0)
        {
            ColumnRole role = OfUtype(utype);
            if (role != ColumnRole.None)
            {
                return role;
            }
        }

        if (ucd.StartsWith("em.wl", StringComparison.OrdinalIgnoreCase)
            || ucd.StartsWith("em.freq", StringComparison.OrdinalIgnoreCase)
            || ucd.StartsWith("em.energy", StringComparison.OrdinalIgnoreCase)
            || ucd.StartsWith("em.wavenumber", StringComparison.OrdinalIgnoreCase))
        {
            return ColumnRole.Wavelength;
        }

        bool flux = ucd.Contains("phot.flux", StringComparison.OrdinalIgnoreCase) || ucd.Contains("phot.count", StringComparison.OrdinalIgnoreCase);
        if (ucd.StartsWith("stat.error", StringComparison.OrdinalIgnoreCase) && (flux || !ucd.Contains(';', StringComparison.Ordinal)))
        {
            return ColumnRole.Sigma;
        }

        return flux && !ucd.StartsWith("stat.", StringComparison.OrdinalIgnoreCase) && !ucd.StartsWith("arith.", StringComparison.OrdinalIgnoreCase)
                ? ColumnRole.Flux
            : ucd.StartsWith("meta.code.qual", StringComparison.OrdinalIgnoreCase) ? ColumnRole.Mask
            : ColumnRole.None;
    }

    private static ColumnRole OfUtype(string utype) =>
        utype.EndsWith("SpectralAxis.Value", StringComparison.OrdinalIgnoreCase) ? ColumnRole.Wavelength
        : utype.EndsWith("FluxAxis.Value", StringComparison.OrdinalIgnoreCase) ? ColumnRole.Flux
        : utype.EndsWith("FluxAxis.Accuracy.StatError", StringComparison.OrdinalIgnoreCase) ? ColumnRole.Sigma
        : utype.EndsWith("FluxAxis.Quality", StringComparison.OrdinalIgnoreCase)
            || utype.EndsWith("FluxAxis.Accuracy.QualityStatus", StringComparison.OrdinalIgnoreCase) ? ColumnRole.Mask
        : ColumnRole.None;

    private static FrozenDictionary<string, (ColumnRole Role, int Rank)> Make(params (ColumnRole Role, string[] Names)[] roles)
    {
        var names = new System.Collections.Generic.Dictionary<string, (ColumnRole Role, int Rank)>(StringComparer.Ordinal);
        foreach ((ColumnRole role, string[] spellings) in roles)
        {
            for (int i = 0; i < spellings.Length; i++)
            {
                names[spellings[i]] = (role, i);
            }
        }

        return names.ToFrozenDictionary(StringComparer.Ordinal);
    }
}
