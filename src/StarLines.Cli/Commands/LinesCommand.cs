using System;
using System.Collections.Generic;
using System.CommandLine;
using StarLines.Cli.Options;
using StarLines.Cli.Output;
using StarLines.LineLists;
using StarLines.Tables;

namespace StarLines.Cli.Commands;

/// <summary><c>starlines lines</c>: search the line lists.</summary>
internal static class LinesCommand
{
    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal, Provenance provenance)
    {
        var species = new Argument<string[]>("SPECIES")
        {
            Description = "Atoms and ions, such as 'Fe I' or Fe for all of iron; none for all.",
            Arity = ArgumentArity.ZeroOrMore,
        };
        Option<List<string>> lists = Make.Many("--lines", "LIST", "Search this list, by name or path; else all that come with the program.", static text => text);
        Make.Complete(lists, [.. LineListCatalog.Names]);
        Option<List<WavelengthRange>> ranges = Make.Many("--range", "A:B", "Only lines in this range, Å, in the medium of the list.", Values.Range);
        var table = new TableOutput();
        var command = new VerbCommand("lines", "Searches the line lists.", "starlines lines 'Fe I' --range 6000:6100")
        {
            species, lists, ranges,
        };
        table.AddTo(command);
        command.SetAction(parsed =>
        {
            TableSink sink = table.Open(parsed, terminal);
            IReadOnlyList<string> names = parsed.GetValue(lists) is { Count: > 0 } given ? given : LineListCatalog.Names;
            string[] wanted = parsed.GetValue(species) ?? [];
            var tables = new List<Table>();
            var known = new SortedSet<string>(StringComparer.Ordinal);
            foreach (string name in names)
            {
                LineList list = NamedLists.Find(name);
                provenance.AddList(list);
                List<RestLine> found = [];
                foreach (RestLine line in list.Lines)
                {
                    known.Add(line.Species);
                    if (IsWanted(line, wanted) && IsInside(line, parsed.GetValue(ranges) ?? []))
                    {
                        found.Add(line);
                    }
                }

                tables.Add(FoundLines.ToTable(list, found));
            }

            CheckSpecies(wanted, known);
            sink.Write(Table.Concatenate(tables), provenance);
            return ExitCode.Done;
        });
        return command;
    }

    private static bool IsWanted(RestLine line, string[] wanted) =>
        wanted.Length == 0 || Array.Exists(wanted, name => Matches(line.Species, name));

    private static bool Matches(string species, string name)
    {
        string plain = name.Replace('_', ' ').Trim();
        return species.Equals(plain, StringComparison.OrdinalIgnoreCase)
            || species.Replace(" ", "", StringComparison.Ordinal).Equals(plain, StringComparison.OrdinalIgnoreCase)
            || species.Split(' ')[0].Equals(plain, StringComparison.OrdinalIgnoreCase);
    }

    private static bool IsInside(RestLine line, List<WavelengthRange> ranges) =>
        ranges.Count == 0 || ranges.Exists(range => range.Contains(line.WavelengthAngstrom));

    private static void CheckSpecies(string[] wanted, SortedSet<string> known)
    {
        foreach (string name in wanted)
        {
            bool isKnown = false;
            foreach (string species in known)
            {
                isKnown |= Matches(species, name);
            }

            if (!isKnown)
            {
                throw new UsageException($"No line list has '{name}'{UsageProblem.Hint(name, known)}");
            }
        }
    }
}
