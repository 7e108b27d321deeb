using System;
using System.Globalization;
using System.Text;

namespace StarLines.Tables.Ecsv;

/// <summary>Escapes of double-quoted YAML.</summary>
internal static class YamlEscapes
{
    /// <summary>Replaces the escapes of a text.</summary>
    /// <exception cref="FormatException">An escape is unknown or cut off.</exception>
    internal static string Decode(string text)
    {
        if (!text.Contains('\\', StringComparison.Ordinal))
        {
            return text;
        }

        var result = new StringBuilder(text.Length);
        for (int i = 0; i < text.Length; i++)
        {
            if (text[i] != '\\')
            {
                result.Append(text[i]);
                continue;
            }

            i++;
            char kind = i < text.Length ? text[i] : '\0';
            int digits = kind switch { 'x' => 2, 'u' => 4, 'U' => 8, _ => 0 };
            result.Append(digits > 0 ? Code(text, i + 1, digits) : Single(kind));
            i += digits;
        }

        return result.ToString();
    }

    /// <summary>Writes a text in double quotes; all but printable ASCII is escaped.</summary>
    internal static void AppendQuoted(StringBuilder output, string text)
    {
        output.Append('"');
        foreach (char c in text)
        {
            _ = c switch
            {
                '"' => output.Append("\\\""),
                '\\' => output.Append("\\\\"),
                '\n' => output.Append("\\n"),
                '\r' => output.Append("\\r"),
                '\t' => output.Append("\\t"),
                < ' ' or '\u007F' or (>= '\u0080' and <= '\u00A0') or '\u2028' or '\u2029' or '\uFEFF' or '\uFFFE' or '\uFFFF' =>
                    output.Append(CultureInfo.InvariantCulture, $"\\u{(int)c:X4}"),
                _ => output.Append(c),
            };
        }

        output.Append('"');
    }

    private static string Code(string text, int start, int digits)
    {
        bool good = start + digits <= text.Length
            & int.TryParse(text.AsSpan(start, Math.Max(0, Math.Min(digits, text.Length - start))), NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture, out int code);
        if (!good || code is < 0 or > 0x10FFFF)
        {
            throw new FormatException("an escape without its hexadecimal digits");
        }

        return code > 0xFFFF ? char.ConvertFromUtf32(code) : ((char)code).ToString();
    }

    private static char Single(char kind) => kind switch
    {
        '0' => '\0',
        'a' => '\a',
        'b' => '\b',
        't' or '\t' => '\t',
        'n' => '\n',
        'v' => '\v',
        'f' => '\f',
        'r' => '\r',
        'e' => '\u001B',
        ' ' or '"' or '/' or '\\' => kind,
        'N' => '\u0085',
        '_' => '\u00A0',
        'L' => '\u2028',
        'P' => '\u2029',
        _ => throw new FormatException($"the unknown escape \\{kind}"),
    };
}
