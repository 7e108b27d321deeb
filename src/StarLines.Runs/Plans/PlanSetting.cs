using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace StarLines.Runs.Plans;

/// <summary>One setting of a plan: where it stands in the file, and how it is read and written.</summary>
/// <param name="Section">Section of the file, or an empty string for the top.</param>
/// <param name="Key">Its key.</param>
/// <param name="Comment">What it is, written beside it.</param>
/// <param name="Write">Its value as TOML; null where it is not set.</param>
/// <param name="Read">The plan with the value.</param>
internal sealed record PlanSetting(
    string Section, string Key, string Comment, Func<RunPlan, string?> Write, Func<RunPlan, PlanValue, RunPlan> Read)
{
    internal static string? Toml(double? value) => value?.ToString("R", CultureInfo.InvariantCulture) is { } text
        ? (text.AsSpan().IndexOfAny(".eE") < 0 ? text + ".0" : text)
        : null;

    internal static string Toml(int value) => value.ToString(CultureInfo.InvariantCulture);

    internal static string Toml(bool value) => value ? "true" : "false";

    internal static string Toml(IEnumerable<string> values)
    {
        var items = new List<string>();
        foreach (string value in values)
        {
            items.Add(Quoted(value));
        }

        return "[" + string.Join(", ", items) + "]";
    }

    internal static string? Toml(string value) => value.Length == 0 ? null : Quoted(value);

    private static string Quoted(string value)
    {
        var text = new StringBuilder("\"");
        foreach (char letter in value)
        {
            _ = letter switch
            {
                '"' => text.Append("\\\""),
                '\\' => text.Append(@"\\"),
                < ' ' or '\x7f' => text.Append(CultureInfo.InvariantCulture, $"\\u{(int)letter:X4}"),
                _ => text.Append(letter),
            };
        }

        return text.Append('"').ToString();
    }
}
