using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace StarLines.Runs.Plans;

/// <summary>A plan as a TOML file.</summary>
public static class PlanFile
{
    /// <summary>Reads a plan from a file.</summary>
    /// <param name="path">The file.</param>
    /// <exception cref="RunPlanException">The file is not a plan; the message names line and cure.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static RunPlan Read(string path) => Parse(File.ReadAllText(path), path);

    /// <summary>Reads a plan from text; settings that are not there keep their defaults.</summary>
    /// <param name="toml">The text.</param>
    /// <param name="name">What messages call it.</param>
    /// <exception cref="RunPlanException">The text is not a plan; the message names line and cure.</exception>
    public static RunPlan Parse(string toml, string name = "plan")
    {
        ArgumentNullException.ThrowIfNull(toml);
        DocumentSyntax document = SyntaxParser.Parse(toml, name, validate: true);
        foreach (DiagnosticMessage message in document.Diagnostics)
        {
            throw new RunPlanException($"{name}, line {message.Span.Start.Line + 1}: {message.Message}");
        }

        RunPlan plan = ReadSection(new RunPlan(), "", document.KeyValues, name);
        foreach (TableSyntaxBase table in document.Tables)
        {
            plan = ReadSection(plan, KeyText(table.Name), table.Items, name);
        }

        return plan;
    }

    /// <summary>Writes a plan with all its settings; those that are not set stand in comments.</summary>
    /// <param name="plan">The plan.</param>
    /// <returns>TOML that <see cref="Parse"/> reads as the same plan.</returns>
    public static string Write(RunPlan plan)
    {
        ArgumentNullException.ThrowIfNull(plan);
        var text = new StringBuilder("# A plan of StarLines: starlines run --plan plan.toml --out DIR\n");
        string section = "";
        foreach (PlanSetting setting in PlanSettings.All)
        {
            if (setting.Section != section)
            {
                section = setting.Section;
                text.Append('\n').Append('[').Append(section).Append("]\n");
            }

            text.Append(setting.Write(plan) is { } value
                ? $"{setting.Key} = {value}  # {setting.Comment}\n"
                : $"# {setting.Key} =  # {setting.Comment}\n");
        }

        return text.ToString();
    }

    private static RunPlan ReadSection(RunPlan plan, string section, IEnumerable<KeyValueSyntax> items, string name)
    {
        foreach (KeyValueSyntax item in items)
        {
            string key = KeyText(item.Key);
            string where = $"{name}, line {item.Span.Start.Line + 1}";
            PlanSetting setting = PlanSettings.All.FirstOrDefault(s => s.Section == section && s.Key == key)
                ?? throw Unknown(where, section, key);
            plan = setting.Read(plan, new PlanValue(where, key, item.Value));
        }

        return plan;
    }

    private static RunPlanException Unknown(string where, string section, string key)
    {
        List<string> known = [.. PlanSettings.All.Where(s => s.Section == section).Select(static s => s.Key)];
        string place = section.Length == 0 ? "outside a section" : $"in [{section}]";
        return known.Count == 0
            ? new RunPlanException($"{where}: there is no section [{section}]; the sections are {Sections()}.")
            : new RunPlanException($"{where}: there is no setting '{key}' {place}; there are {string.Join(", ", known)}.");
    }

    private static string Sections() => string.Join(
        ", ", PlanSettings.All.Select(static s => s.Section).Where(static s => s.Length != 0).Distinct().Select(static s => $"[{s}]"));

    private static string KeyText(KeySyntax? key) => key?.ToString().Trim().Trim('"') ?? "";
}
