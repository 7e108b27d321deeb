using System;
using System.Globalization;

namespace StarLines.IO;

/// <summary>Decides what the keywords of an axis mean: a type of the standard, one of the older words, or log10 wavelengths as surveys write them.</summary>
internal static class AxisInterpreter
{
    /// <summary>Logarithms (base 10) of wavelengths between 100 Å and 100 µm.</summary>
    private const double MinimumLog10 = 2.0, MaximumLog10 = 6.0;

    /// <summary>A wavelength axis never steps this much in log10 λ; a linear one in µm may.</summary>
    private const double MaximumLog10Step = 0.01;

    /// <summary>Words that were written for a plain wavelength axis before the standard had any.</summary>
    private static readonly string[] LegacyWords =
        ["LINEAR", "LAMBDA", "WAVELENGTH", "WAVELEN", "WAVELNTH", "WLEN", "WL", "LAMBD", "WAVELGTH", "DISPERSION", "SPECTRUM", "SPECTRAL", "MULTISPE", "LONGUEUR D'ONDE"];

    private static readonly string[] LogWords =
        ["LOG", "LOGLAM", "LOG-LAM", "LOG10", "LOGLAMBDA", "LOG-LAMBDA", "LOGLINEAR", "LOG-LINEAR", "LOG_LINEAR", "LOG10LAM", "LOGWAVE", "LOG(WAVE)", "LOG10(WAVE)", "LAMBDA-LOG", "LOG(LAMBDA)"];

    /// <summary>Wavelengths of an axis, or null where its header describes none.</summary>
    internal static AxisSolution? Interpret(HeaderKeywords header, AxisDescription axis, ReadContext context)
    {
        if (header.TryNumber("COEFF0", out double first) && header.TryNumber("COEFF1", out double step)
            && context.Options.AxisUnit.Length == 0)
        {
            // log10 λ(Å) of the first pixel and its step, as surveys document them; pixels count from 0.
            return Log10(axis with { ReferenceValue = first, Increment = step, ReferencePixel = 1.0 }, 1.0, context);
        }

        if (SpectralAxis.TrySplitType(axis.Type, out string type, out string algorithm) && !IsDisguisedLog10(axis, algorithm, header))
        {
            return Standard(axis, type, algorithm, context);
        }

        if (axis.Increment is not double increment || axis.ReferenceValue is null)
        {
            return axis.Type.Length != 0 && IsSpectralWord(axis)
                ? throw context.Error($"The spectral axis {axis.Type} has no CRVAL{Number(axis)} or CDELT{Number(axis)}; correct the header.")
                : null;
        }

        if (!IsSpectralWord(axis))
        {
            return null;
        }

        if (increment == 0.0)
        {
            throw context.Error($"The spectral axis has an increment of 0; correct CDELT{Number(axis)}.");
        }

        return Legacy(header, WithReferencePixel(axis, 1.0, context), context);
    }

    private static AxisSolution Standard(AxisDescription axis, string type, string algorithm, ReadContext context)
    {
        if (axis.Increment is null && axis.ReferenceValue is null)
        {
            throw context.Error($"The spectral axis {axis.Type} has neither CRVAL{Number(axis)} nor CDELT{Number(axis)}; correct the header.");
        }

        // The standard's default for CRPIX is 0, for CDELT and CRVAL 1 and 0 (FITS 4.0, section 8.2).
        AxisDescription full = WithReferencePixel(axis, 0.0, context) with
        {
            Increment = axis.Increment ?? 1.0,
            ReferenceValue = axis.ReferenceValue ?? 0.0,
        };
        return SpectralAxis.Solve(full, type, algorithm, StandardUnit(full, type, context), context);
    }

    private static SpectralUnit StandardUnit(AxisDescription axis, string type, ReadContext context)
    {
        SpectralQuantity quantity = type switch
        {
            "FREQ" or "AFRQ" => SpectralQuantity.Frequency,
            "ENER" => SpectralQuantity.Energy,
            "WAVN" => SpectralQuantity.Wavenumber,
            "VRAD" or "VOPT" or "VELO" => SpectralQuantity.Velocity,
            "ZOPT" or "BETA" => SpectralQuantity.None,
            _ => SpectralQuantity.Length,
        };
        string stated = context.Options.AxisUnit.Length != 0 ? context.Options.AxisUnit : axis.Unit;
        if (quantity == SpectralQuantity.None)
        {
            return new SpectralUnit(SpectralQuantity.None, 1.0);
        }

        if (stated.Length != 0)
        {
            return SpectralUnit.TryParse(stated, out SpectralUnit unit) && unit.Quantity == quantity && unit.Form == SpectralForm.Linear
                ? unit
                : throw context.Error($"The unit '{stated}' of the spectral axis {axis.Type} is not known as one of {Word(quantity)}; name it by --axis-unit.");
        }

        return quantity == SpectralQuantity.Length
            ? AxisUnitGuess.OfLength(axis, context)
            : new SpectralUnit(quantity, 1.0);
    }

    private static AxisSolution? Legacy(HeaderKeywords header, AxisDescription axis, ReadContext context)
    {
        SpectralUnit? stated = AxisUnitGuess.Stated(header, axis, context);
        if (stated is SpectralUnit known && known.Quantity != SpectralQuantity.Length)
        {
            return Other(axis, known, context);
        }

        if (stated is null && IsPixelCount(axis))
        {
            return null;
        }

        SpectralForm form = context.Options.AxisUnit.Length != 0 || stated?.Form is SpectralForm.Log10 or SpectralForm.Ln
            ? stated!.Value.Form
            : FormOf(header, axis, context);
        double reference = axis.ReferenceValue!.Value;
        double factor = stated?.AngstromFactor ?? 1.0;
        if (form == SpectralForm.Ln)
        {
            return SpectralAxis.EqualLogSteps(axis, Math.Exp(reference) * factor, axis.Increment!.Value, Medium.Unknown, context);
        }

        if (form == SpectralForm.Log10)
        {
            return Log10(axis, factor, context);
        }

        SpectralUnit unit = stated ?? AxisUnitGuess.OfLength(axis, context);
        return SpectralAxis.EqualSteps(axis, reference, axis.Increment!.Value, unit.AngstromFactor, Medium.Unknown, context);
    }

    /// <summary>An axis without a standard type whose unit says what it is.</summary>
    private static AxisSolution Other(AxisDescription axis, SpectralUnit unit, ReadContext context)
    {
        string type = unit.Quantity switch
        {
            SpectralQuantity.Frequency => "FREQ",
            SpectralQuantity.Energy => "ENER",
            SpectralQuantity.Wavenumber => "WAVN",
            _ => throw context.Error($"The axis '{axis.Type}' is in {axis.Unit} and does not say which velocity it is; set CTYPE{Number(axis)} to VELO, VOPT or VRAD."),
        };
        return SpectralAxis.Solve(axis, type, "", unit, context);
    }

    private static AxisSolution Log10(AxisDescription axis, double angstromFactor, ReadContext context)
    {
        double reference = axis.ReferenceValue!.Value;
        if (!(Math.Abs(reference) < 20.0) || !(Math.Abs(axis.Increment!.Value) < 1.0))
        {
            throw context.Error(string.Create(
                CultureInfo.InvariantCulture,
                $"The header says that the axis holds log10 wavelengths, but gives {reference} with a step of {axis.Increment}; correct it or name the unit by --axis-unit."));
        }

        return SpectralAxis.EqualLogSteps(
            axis, Math.Pow(10.0, reference) * angstromFactor, axis.Increment.Value * Math.Log(10.0), Medium.Unknown, context);
    }

    /// <summary>Whether an axis without a logarithmic unit is logarithmic all the same.</summary>
    private static SpectralForm FormOf(HeaderKeywords header, AxisDescription axis, ReadContext context)
    {
        double reference = axis.ReferenceValue!.Value;
        bool looks = LooksLog10(axis);
        bool flagged = header.Text("DC-FLAG").TrimEnd('.', '0') == "1"
            || header.Text(string.Create(CultureInfo.InvariantCulture, $"WAT{axis.Number}_001")).Contains("wtype=log", StringComparison.OrdinalIgnoreCase)
            || Array.IndexOf(LogWords, Squeezed(axis.Type)) >= 0
            || header.Text("WFITTYPE") == "LOG-LINEAR";
        if (flagged && !looks)
        {
            // ln λ(Å) of optical light lies between 6.9 and 10.1.
            if (reference is > 6.9 and < 10.2 && Math.Abs(axis.Increment!.Value) < 0.02)
            {
                context.Note("axis-guessed", "The axis is said to be logarithmic; the size of its values shows natural logarithms of Å.");
                return SpectralForm.Ln;
            }

            throw context.Error(string.Create(
                CultureInfo.InvariantCulture,
                $"The axis is said to be logarithmic, but CRVAL{axis.Number} = {reference} is no logarithm of a wavelength; correct it or name the unit by --axis-unit."));
        }

        if (!flagged && looks && axis.Unit.Length == 0 && Math.Abs(axis.Increment!.Value) < 0.001)
        {
            context.Note("axis-guessed", string.Create(
                CultureInfo.InvariantCulture,
                $"CRVAL{axis.Number} = {reference} with steps of {axis.Increment} is taken for log10 of Å; if it is not, name the unit by --axis-unit."));
            return SpectralForm.Log10;
        }

        return flagged ? SpectralForm.Log10 : SpectralForm.Linear;
    }

    /// <summary>An axis that only counts its pixels, from 0 or 1.</summary>
    private static bool IsPixelCount(AxisDescription axis) =>
        axis.Increment == 1.0 && axis.ReferenceValue!.Value + axis.OffsetOf(0) is 0.0 or 1.0;

    private static bool LooksLog10(AxisDescription axis) =>
        axis.ReferenceValue is > MinimumLog10 and < MaximumLog10 && Math.Abs(axis.Increment ?? 1.0) < MaximumLog10Step;

    /// <summary>WAVE or WAVE-LOG whose numbers are log10 λ, which the standard does not know but some writers use.</summary>
    private static bool IsDisguisedLog10(AxisDescription axis, string algorithm, HeaderKeywords header)
    {
        bool logUnit = SpectralUnit.TryParse(axis.Unit, out SpectralUnit unit) && unit.Form != SpectralForm.Linear;
        bool flagged = header.Text("DC-FLAG").TrimEnd('.', '0') == "1";
        return algorithm is "LOG" or "" && LooksLog10(axis)
            && (logUnit || flagged || (algorithm == "LOG" && axis.Unit.Length != 0 && unit.AngstromFactor == 1.0));
    }

    private static bool IsSpectralWord(AxisDescription axis)
    {
        string word = Squeezed(axis.Type);
        return word.Length == 0
            || SpectralAxis.TrySplitType(axis.Type, out _, out _)
            || Array.IndexOf(LegacyWords, word) >= 0
            || Array.IndexOf(LogWords, word) >= 0
            || word.StartsWith("WAVELENGTH", StringComparison.Ordinal)
            || word.StartsWith("LAMBDA", StringComparison.Ordinal)
            || SpectralUnit.TryParse(axis.Type, out _)
            || (SpectralUnit.TryParse(axis.Unit, out SpectralUnit unit) && unit.Quantity == SpectralQuantity.Length && unit.SiFactor < 1e-5);
    }

    private static AxisDescription WithReferencePixel(AxisDescription axis, double byDefault, ReadContext context)
    {
        if (axis.ReferencePixel is not null)
        {
            return axis;
        }

        context.Note("reference-pixel-assumed", string.Create(
            CultureInfo.InvariantCulture, $"CRPIX{axis.Number} is absent; {byDefault} is taken{(byDefault == 0.0 ? ", the default of the FITS standard" : "")}."));
        return axis with { ReferencePixel = byDefault };
    }

    private static string Squeezed(string type) => type.Replace(" ", "", StringComparison.Ordinal).ToUpperInvariant();

    private static string Number(AxisDescription axis) => axis.Number.ToString(CultureInfo.InvariantCulture);

    private static string Word(SpectralQuantity quantity) => quantity switch
    {
        SpectralQuantity.Frequency => "frequency",
        SpectralQuantity.Energy => "energy",
        SpectralQuantity.Wavenumber => "wavenumber",
        SpectralQuantity.Velocity => "velocity",
        _ => "wavelength",
    };
}
