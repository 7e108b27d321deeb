using System;
using System.Collections.Generic;
using StarLines.Analysis;
using StarLines.Tables;

namespace StarLines.Runs.Output;

/// <summary>The table of spectra: what a summary knows, and how the input ended; also rows for inputs that hold no spectrum.</summary>
internal static class SpectraTable
{
    internal static Table Create(IReadOnlyList<SpectraRow> rows, bool withTimes)
    {
        var summaries = new List<SpectrumSummary>();
        var place = new int[rows.Count];
        for (int i = 0; i < place.Length; i++)
        {
            place[i] = rows[i].Summary is null ? -1 : summaries.Count;
            if (rows[i].Summary is { } summary)
            {
                summaries.Add(summary);
            }
        }

        var columns = new List<TableColumn>();
        foreach (TableColumn column in SpectrumSummaryTable.Create(summaries).Columns)
        {
            columns.Add(column.Name == "file" ? Files(rows, column) : Spread(column, place));
        }

        Table ending = new TableMap<SpectraRow>()
            .Text("state", static r => r.State, "done or failed", "meta.code")
            .Double("seconds", r => withTimes ? r.Seconds : double.NaN, "s", "Time that it took; see the journal", "time.duration", decimals: 3)
            .Text("error", static r => r.Error.Length == 0 ? null : r.Error, "What went wrong", "meta.note")
            .ToTable(rows);
        columns.AddRange(ending.Columns);
        return new Table(columns, null, "spectra");
    }

    private static TableColumn Files(IReadOnlyList<SpectraRow> rows, TableColumn like)
    {
        var files = new string?[rows.Count];
        for (int i = 0; i < files.Length; i++)
        {
            files[i] = rows[i].File;
        }

        return new TableColumn(like.Name, (ReadOnlySpan<string?>)files) { Description = like.Description, Ucd = like.Ucd };
    }

    // The values of a column put at the rows they belong to; the other rows are missing.
    private static TableColumn Spread(TableColumn column, int[] place) => column.Type switch
    {
        ColumnType.Double => new TableColumn(column.Name, (ReadOnlySpan<double>)Pick(place, column.Doubles, double.NaN))
        {
            Unit = column.Unit,
            Description = column.Description,
            Ucd = column.Ucd,
            Decimals = column.Decimals,
            SignificantDigits = column.SignificantDigits,
        },
        ColumnType.Long => new TableColumn(column.Name, (ReadOnlySpan<long?>)Pick(place, column.Longs, null))
        {
            Unit = column.Unit,
            Description = column.Description,
            Ucd = column.Ucd,
        },
        ColumnType.Text => new TableColumn(column.Name, (ReadOnlySpan<string?>)Pick(place, column.Texts, null))
        {
            Description = column.Description,
            Ucd = column.Ucd,
        },
        _ => new TableColumn(column.Name, (ReadOnlySpan<bool?>)Pick(place, column.Bools, null))
        {
            Description = column.Description,
            Ucd = column.Ucd,
        },
    };

    private static T[] Pick<T>(int[] place, ReadOnlySpan<T> values, T missing)
    {
        var picked = new T[place.Length];
        for (int i = 0; i < picked.Length; i++)
        {
            picked[i] = place[i] < 0 ? missing : values[place[i]];
        }

        return picked;
    }
}
