using System.Collections.Generic;
using StarLines.Analysis;
using StarLines.Continuum;
using StarLines.LineLists;
using StarLines.Lines;
using StarLines.Templates;
using StarLines.Velocities;

namespace StarLines.Runs;

/// <summary>What all inputs of a run share: settings of the analysis, templates and line lists, made once.</summary>
internal sealed class RunSetup
{
    private RunSetup(AnalysisOptions options, IReadOnlyList<LineList> lists)
    {
        Options = options;
        Lists = lists;
    }

    /// <summary>Settings of the analysis.</summary>
    internal AnalysisOptions Options { get; }

    /// <summary>The line lists used, each once.</summary>
    internal IReadOnlyList<LineList> Lists { get; }

    /// <summary>Makes the setup of a plan.</summary>
    /// <exception cref="System.IO.FileNotFoundException">A line list is not there; the message gives the nearest name.</exception>
    /// <exception cref="LineListFormatException">A file is not a line list.</exception>
    internal static RunSetup Of(RunPlan plan)
    {
        var lists = new List<LineList>();
        LineList? lines = plan.Steps.HasFlag(RunSteps.Lines) ? Lines(plan, lists) : null;
        bool needsVelocity = plan.Steps.HasFlag(RunSteps.Velocity) || (lines is not null && plan.LineVelocityKmPerS is null);
        var names = new List<string>();
        var templates = new List<LineTemplate>();
        if (needsVelocity)
        {
            Templates(plan, names, templates, lists);
        }

        StellarTemplates? stellar = names.Count == 0 ? null : new StellarTemplates();
        foreach (LineList list in stellar?.Lists ?? [])
        {
            AddOnce(lists, list);
        }

        return new RunSetup(
            new AnalysisOptions
            {
                Exclude = plan.Exclude,
                FindOutliers = plan.FindOutliers,
                Continuum = ContinuumOptions.Default with { StiffnessAngstrom = plan.StiffnessAngstrom },
                MeasureVelocities = plan.Steps.HasFlag(RunSteps.Velocity),
                StellarTemplates = stellar,
                StellarTemplateNames = names,
                Templates = templates,
                Velocity = new VelocityOptions { SearchHalfRangeKmPerS = plan.SearchHalfRangeKmPerS },
                Lines = lines,
                LineVelocityKmPerS = plan.LineVelocityKmPerS,
                Measure = new LineMeasureOptions { Profile = plan.Profile, Sampling = plan.Sampling },
            },
            lists);
    }

    // Several lists are measured as one, so that neighbours of different lists are fitted together.
    private static LineList? Lines(RunPlan plan, List<LineList> lists)
    {
        LineList? all = null;
        foreach (string name in plan.LineLists)
        {
            LineList list = LineListCatalog.Find(name, plan.Reading.Medium);
            AddOnce(lists, list);
            all = all is null ? list : new LineList(
                $"{all.Name}+{list.Name}", all.Medium, [.. all.Lines, .. list.ToMedium(all.Medium).Lines]);
        }

        return all;
    }

    private static void Templates(RunPlan plan, List<string> names, List<LineTemplate> templates, List<LineList> lists)
    {
        foreach (string name in plan.Templates)
        {
            string word = name.ToLowerInvariant();
            if (word is StellarTemplates.BalmerName or StellarTemplates.MetalName)
            {
                names.Add(word);
            }
            else if (word == StellarTemplates.BothName)
            {
                names.AddRange([StellarTemplates.BalmerName, StellarTemplates.MetalName, StellarTemplates.BothName]);
            }
            else
            {
                LineList list = LineListCatalog.Find(name, plan.Reading.Medium);
                AddOnce(lists, list);
                templates.Add(LineTemplate.FromLineList(list));
            }
        }
    }

    private static void AddOnce(List<LineList> lists, LineList list)
    {
        if (!lists.Exists(known => known.Name == list.Name && known.Sha256 == list.Sha256))
        {
            lists.Add(list);
        }
    }
}
