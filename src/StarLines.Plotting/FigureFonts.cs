using System;
using System.IO;
using System.Linq;
using ScottPlot;
using SkiaSharp;

namespace StarLines.Plotting;

/// <summary>The font of the figures.</summary>
public static class FigureFonts
{
    /// <summary>The name by which the plotting library asks for our font; no font of a system has it.</summary>
    internal const string Key = "StarLines figures";

    private const string FontResource = "DejaVuSans.ttf";
    private const string LicenceResource = "DejaVuSans.licence.txt";

    /// <summary>What must be there for a font to be of use: Latin, Greek, the ångström, a minus sign, superscripts.</summary>
    private const string Needed = "HgαÅ0−⁻¹±";

    private static readonly string[] SystemFamilies =
        ["DejaVu Sans", "Noto Sans", "Liberation Sans", "Segoe UI", "Arial", "Helvetica"];

    private static readonly Lazy<(SKTypeface? Typeface, FigureFontStatus Status)> Found = new(Find);

    /// <summary>Which font is used.</summary>
    public static FigureFontStatus Status => Found.Value.Status;

    /// <summary>The family of the font, or an empty string where there is none.</summary>
    public static string Family => Found.Value.Typeface?.FamilyName ?? "";

    /// <summary>What the user should know where figures have no text or miss signs, or null where all is well.</summary>
    public static Remark? Problem => Status switch
    {
        FigureFontStatus.None => new Remark("no-font",
            "No font was found, so figures have no text; install a font such as DejaVu Sans, or a build that contains one."),
        FigureFontStatus.System when !Found.Value.Typeface!.ContainsGlyphs(Needed) => new Remark("poor-font",
            $"The font “{Family}” lacks signs that figures use; install a font such as DejaVu Sans."),
        _ => null,
    };

    /// <summary>The licence of the embedded font, or an empty string where none is embedded.</summary>
    public static string LicenceNotice
    {
        get
        {
            using Stream? stream = typeof(FigureFonts).Assembly.GetManifestResourceStream(LicenceResource);
            if (stream is null)
            {
                return "";
            }

            using var reader = new StreamReader(stream);
            return reader.ReadToEnd();
        }
    }

    /// <summary>The typeface; the default one, which draws nothing, where there is no font.</summary>
    internal static SKTypeface Typeface => Found.Value.Typeface ?? SKTypeface.Default;

    private static (SKTypeface?, FigureFontStatus) Find()
    {
        (SKTypeface? typeface, FigureFontStatus status) = FromResource() is { } embedded
            ? (embedded, FigureFontStatus.Embedded)
            : FromSystem() is { } system ? (system, FigureFontStatus.System) : (null, FigureFontStatus.None);
        if (typeface is not null)
        {
            Fonts.FontResolvers.Insert(0, new Resolver(typeface));
        }

        return (typeface, status);
    }

    private static SKTypeface? FromResource()
    {
        using Stream? stream = typeof(FigureFonts).Assembly.GetManifestResourceStream(FontResource);
        return stream is null ? null : SKFontManager.Default.CreateTypeface(stream);
    }

    private static SKTypeface? FromSystem()
    {
        SKFontManager manager = SKFontManager.Default;
        foreach (string family in SystemFamilies.Concat(manager.FontFamilies.Order(StringComparer.Ordinal)))
        {
            SKTypeface? typeface = manager.MatchFamily(family);
            if (typeface is not null && typeface.ContainsGlyphs("Ag0"))
            {
                return typeface;
            }
        }

        return null;
    }

    private sealed class Resolver(SKTypeface typeface) : IFontResolver
    {
        public SKTypeface? CreateTypeface(string fontName, FontWeight weight, FontSlant slant, FontSpacing spacing) =>
            fontName == Key ? typeface : null;

        public SKTypeface? CreateTypeface(string fontName, bool bold, bool italic) => fontName == Key ? typeface : null;
    }
}
