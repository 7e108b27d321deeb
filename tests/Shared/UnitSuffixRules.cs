using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using System.Runtime.CompilerServices;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>Every public number with a dimension says its unit in its name.</summary>
public sealed class UnitSuffixRules
{
    /// <summary>The units of the public interface.</summary>
    private static readonly string[] Suffixes =
    [
        "Angstrom", "Milliangstrom", "KmPerS", "MetresPerS", "Degrees", "Radians", "Seconds", "Days", "Years", "Metres", "Km",
        "Au", "Ev", "PerS", "PerKelvin", "Kelvin", "Pixels", "JdTdb", "JdTt", "JdUtc", "JdUt1", "Mjd", "Milliarcseconds",
        "MilliarcsecondsPerYear", "Mas", "MasPerYear", "JouleSeconds", "Coulomb", "Percent",
    ];

    /// <summary>Whole names that need no unit, and why.</summary>
    private static readonly Dictionary<string, string> Exempt = new(StringComparer.OrdinalIgnoreCase)
    {
        ["Value"] = "the holder states the unit",
        ["None"] = "Measured.None, no value at all",
        ["FwhmPerSigma"] = "a ratio",
        ["Values"] = "the holder states the unit",
        ["Doubles"] = "TableColumn.Unit",
        ["Uncertainty"] = "in the unit of its value",
        ["Flux"] = "Spectrum.FluxUnit",
        ["Sigma"] = "standard deviations of a flux, Spectrum.FluxUnit",
        ["Level"] = "continuum in the flux unit",
        ["Error"] = "standard deviations of a flux, Spectrum.FluxUnit",
        ["Continuum"] = "in the flux unit",
        ["Normalized"] = "in units of the continuum",
        ["Noise"] = "in the flux unit",
        ["Index"] = "a fractional pixel index",
        ["Day"] = "the unit is the name",
        ["Fraction"] = "of a day or of one",
        ["Days"] = "the unit is the name",
        ["Factor"] = "1 + z, a ratio",
        ["LogStep"] = "step of ln λ, a ratio",
        ["LogGf"] = "a logarithm",
        ["Intensity"] = "arbitrary unit by the source",
        ["Depth"] = "in units of the continuum",
        ["ReducedChiSquare"] = "a ratio",
        ["SignalToNoise"] = "a ratio",
        ["ResolvingPower"] = "a ratio, λ/FWHM",
        ["Scale"] = "the factor between stored and true values of a FITS file, a ratio",
        ["Zero"] = "the offset of the true values of a FITS file, in their own unit",
        ["PeakHeight"] = "a correlation, −1 to 1",
        ["Redshift"] = "a ratio",
        ["BarycentricRedshift"] = "a ratio",
        ["Airmass"] = "in units of the zenith",
        ["EpochJulianYear"] = "the unit is the name",
        ["Model"] = "in units of the continuum",
        ["LocalContinuum"] = "in units of the continuum",
        ["ContinuumSigma"] = "in units of the continuum",
        ["Strength"] = "any unit, the same for all lines of a figure",
        ["TextSizePoints"] = "typographic points, 1/72 inch",
        ["RValue"] = "a ratio (Tonry and Davis 1979)",
        ["Significance"] = "a ratio to its standard deviation",
        ["DetectionSignificance"] = "a ratio to its standard deviation",
        ["WindowHalfWidthFwhm"] = "in full widths at half maximum, a ratio",
        ["SearchFwhm"] = "in full widths at half maximum, a ratio",
        ["FluxOverContinuum"] = "a ratio",
        ["Coefficient"] = "a number of a published formula",
        ["Cayrel1988Coefficient"] = "a number of a published formula",
        ["Cayrel2004Coefficient"] = "a number of a published formula",
        ["FalseAlarmProbability"] = "a probability",
        ["Variance"] = "the square of the unit of its value",
        ["Electrons"] = "the unit is the name",
        ["MinimumDepth"] = "in units of the continuum",
        ["LineModel"] = "in units of the continuum",
        ["Correlation"] = "a correlation, −1 to 1",
        ["SignalToNoiseFromFlux"] = "a ratio",
    };

    [Fact]
    public void Public_numbers_carry_their_unit()
    {
        IEnumerable<string> bare = ProjectUnderTest.Assembly.GetExportedTypes()
            .SelectMany(static type => Numbers(type).Select(name => (type, name)))
            .Where(static number => !IsNamed(number.name))
            .Select(static number => $"{number.type.Name}: {number.name}")
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal);
        Assert.True(!bare.Any(), "Give these a unit suffix, or exempt them with a reason: " + string.Join("; ", bare));
    }

    private static bool IsNamed(string name) =>
        Exempt.ContainsKey(name) || Suffixes.Any(suffix => name.EndsWith(suffix, StringComparison.OrdinalIgnoreCase));

    private static IEnumerable<string> Numbers(Type type)
    {
        const BindingFlags declared =
            BindingFlags.Public | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;
        IEnumerable<string> fields = type.GetFields(declared).Where(static f => IsNumber(f.FieldType)).Select(static f => f.Name);
        IEnumerable<string> properties = type.GetProperties(declared)
            .Where(static p => IsNumber(p.PropertyType)).Select(static p => p.Name);
        IEnumerable<string> parameters = type.GetMethods(declared).Cast<MethodBase>().Concat(type.GetConstructors(declared))
            .Where(static m => !m.IsSpecialName || m is ConstructorInfo)
            .Where(static m => !m.IsDefined(typeof(CompilerGeneratedAttribute), inherit: false))
            .SelectMany(static m => m.GetParameters())
            .Where(static p => IsNumber(p.ParameterType)).Select(static p => p.Name!);
        return fields.Concat(properties).Concat(parameters);
    }

    private static bool IsNumber(Type type)
    {
        Type bare = type.IsByRef ? type.GetElementType()! : type;
        bare = Nullable.GetUnderlyingType(bare) ?? bare;
        return bare == typeof(double) || bare == typeof(double[]) || bare == typeof(Span<double>)
            || bare == typeof(ReadOnlySpan<double>) || bare.FullName == "StarLines.Measured";
    }
}
