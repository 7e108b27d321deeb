using System;
using CsCheck;

namespace StarLines.Tables.Tests;

/// <summary>Tables to test with.</summary>
internal static class TableSamples
{
    /// <summary>Texts that break careless writers and readers.</summary>
    public static readonly string[] HostileTexts =
    [
        "", " ", "  lead", "trail ", "\t", "a,b", "a;b", "a\tb", "\"", "\"\"", "say \"so\"", "line\nfeed", "cr\rhere", "crlf\r\n", "\n", "#hash",
        "# %ECSV 1.0", "1", "-1.5", "007", "1e5", "1D5", "nan", "NaN", "inf", "-Infinity", "true", "FALSE", "null", "~", "N/A", "-", "---", "'",
        "it's", "''", "[1, 2]", "{a: b}", "key: value", "- item", "!!omap", "&a", "*a", "|", ">", "%", "@", "`", "<a&b>", "]]>", "<![CDATA[x]]>",
        "&amp;", "\\", "\\n", "Å", "λ 5889.95 Å", "日本", "😀", "\u00A0", "\u2028", "\uFEFFbom", "Fe I 6065.48", "[O III] 5006.84", "a\u0085b",
    ];

    private static readonly Gen<string> Hostile = Gen.Int[0, HostileTexts.Length - 1].Select(i => HostileTexts[i]);

    /// <summary>Two rows of every type with every note, a missing value in each column, and nested metadata.</summary>
    public static Table Full() => new(
        [
            new TableColumn("rv", (ReadOnlySpan<double>)[12.3456, double.NaN]) { Unit = "km/s", Description = "Velocity: \"barycentric\", it's", Ucd = "spect.dopplerVeloc", Decimals = 4 },
            new TableColumn("flux", (ReadOnlySpan<double>)[1e-300, double.PositiveInfinity]) { Unit = "erg/(s cm2 Angstrom)" },
            new TableColumn("pixels", (ReadOnlySpan<long?>)[long.MaxValue, null]),
            new TableColumn("line", (ReadOnlySpan<string?>)["Fe I, \"6065.48\"", null]) { Ucd = "meta.id" },
            new TableColumn("used", (ReadOnlySpan<bool?>)[true, null]) { Description = "whether # it was used" },
        ],
        new TableMetadata
        {
            { "program", "starlines 0.1.0" },
            { "command", "starlines measure \"a b.fits\" --lines x: y" },
            { "count", 12 },
            { "real", 2.5e-7 },
            { "whole real", 3.0 },
            { "ok", true },
            { "none", MetadataValue.Null },
            { "looks", "123" },
            { "yes", "yes" },
            { "inputs", MetadataValue.FromTexts(["a.fits", "", "- b", "multi\nline\t☃"]) },
            { "nested", new TableMetadata { { "sha256", "00ff" }, { "lists", new MetadataValue[] { new TableMetadata { { "name", "balmer" }, { "n", 2 } } } } } },
            { "empty list", MetadataValue.FromTexts([]) },
            { "empty map", new TableMetadata() },
        });

    /// <summary>Random tables of all types with hostile texts and any double.</summary>
    public static Gen<Table> Random(Gen<string?> texts)
    {
        Gen<double> doubles = Gen.OneOf(Gen.Double, Gen.Double.Special, Gen.Double[-1e4, 1e4]);
        Gen<long?> longs = Gen.OneOf(Gen.Long.Select(v => (long?)v), Gen.Const((long?)null));
        Gen<bool?> bools = Gen.OneOf(Gen.Bool.Select(v => (bool?)v), Gen.Const((bool?)null));
        return Gen.Int[0, 12].SelectMany(n => Gen.Select(
            doubles.Array[n], longs.Array[n], texts.Array[n], bools.Array[n], texts.Array[n], Hostile,
            (d, l, t, b, t2, name) => new Table(
            [
                new TableColumn("d", (ReadOnlySpan<double>)d),
                new TableColumn("l", (ReadOnlySpan<long?>)l),
                new TableColumn(" " + name, (ReadOnlySpan<string?>)t) { Unit = "m", Description = name },
                new TableColumn("b", (ReadOnlySpan<bool?>)b),
                new TableColumn("t2", (ReadOnlySpan<string?>)t2),
            ],
            new TableMetadata { { "k" + name, name } })));
    }

    /// <summary>Hostile texts, any well-formed text, and missing ones.</summary>
    public static Gen<string?> Texts { get; } = Gen.OneOf(
        Hostile.Select(t => (string?)t),
        Gen.Char['\u0001', '\uD7FF'].Array[0, 10].Select(c => (string?)new string(c)),
        Gen.Const((string?)null));
}
