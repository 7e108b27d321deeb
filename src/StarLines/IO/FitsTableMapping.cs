using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using StarLines.Fits;
using StarLines.Tables;

namespace StarLines.IO;

/// <summary>Tables as FITS binary tables and back: units, descriptions, UCDs and metadata included.</summary>
public static class FitsTableMapping
{
    /// <summary>Writes a FITS file of one binary table.</summary>
    /// <param name="table">The table.</param>
    /// <param name="stream">Receives the bytes; left open.</param>
    /// <param name="history">Lines for HISTORY cards; null for none.</param>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    public static void Write(Table table, Stream stream, IReadOnlyList<string>? history = null) => Write([table], stream, history);

    /// <summary>Writes a FITS file of binary tables, one HDU each.</summary>
    /// <param name="tables">The tables, at least one.</param>
    /// <param name="stream">Receives the bytes; left open.</param>
    /// <param name="history">Lines for HISTORY cards; null for none.</param>
    /// <exception cref="ArgumentException">There is no table.</exception>
    /// <exception cref="IOException">The stream does not take the bytes.</exception>
    public static void Write(IReadOnlyList<Table> tables, Stream stream, IReadOnlyList<string>? history = null)
    {
        ArgumentNullException.ThrowIfNull(tables);
        ArgumentNullException.ThrowIfNull(stream);
        if (tables.Count == 0)
        {
            throw new ArgumentException("There is no table to write.", nameof(tables));
        }

        var writer = new FitsWriter(stream);
        foreach (Table table in tables)
        {
            var columns = new List<FitsColumnData>(table.Columns.Count);
            foreach (TableColumn column in table.Columns)
            {
                columns.Add(ToFits(column));
            }

            writer.WriteTable(columns, Header(table.Metadata, history), table.Name.Length != 0 ? table.Name : "TABLE");
        }
    }

    /// <summary>Reads a binary or ASCII table of one value a cell.</summary>
    /// <param name="hdu">The HDU of the table.</param>
    /// <returns>Its columns; vectors, bits and complex numbers are left out. Keywords that are not structure become metadata.</returns>
    /// <exception cref="ArgumentException">The HDU is no table, or no column has one value a cell.</exception>
    /// <exception cref="FitsFormatException">The table is damaged.</exception>
    public static Table Read(FitsHdu hdu)
    {
        ArgumentNullException.ThrowIfNull(hdu);
        FitsTable source = hdu.Table ?? throw new ArgumentException(
            string.Create(CultureInfo.InvariantCulture, $"HDU {hdu.Number} is no table."), nameof(hdu));
        var columns = new List<TableColumn>();
        foreach (FitsColumn column in source.Columns)
        {
            if (FromFits(column) is TableColumn read)
            {
                columns.Add(read);
            }
        }

        return columns.Count == 0
            ? throw new ArgumentException(string.Create(CultureInfo.InvariantCulture, $"The table of HDU {hdu.Number} has no column of one value a cell."), nameof(hdu))
            : new Table(columns, Metadata(hdu.Header), hdu.Name);
    }

    /// <summary>A column with its values, unit, UCD and description.</summary>
    internal static FitsColumnData ToFits(TableColumn column)
    {
        FitsColumnData data = column.Type switch
        {
            ColumnType.Double => FitsColumnData.OfDoubles(column.Name, column.Doubles.ToArray()),
            ColumnType.Long => FitsColumnData.OfIntegers(column.Name, Integers(column)),
            ColumnType.Bool => FitsColumnData.OfLogicals(column.Name, column.Bools.ToArray()),
            _ => FitsColumnData.OfStrings(column.Name, Strings(column)),
        };
        return data.With(column.Unit, column.Ucd, "", column.Description);
    }

    private static FitsHeaderBuilder Header(TableMetadata metadata, IReadOnlyList<string>? history)
    {
        var header = new FitsHeaderBuilder();
        foreach ((string key, MetadataValue value) in metadata)
        {
            Add(header, key, value);
        }

        foreach (string line in history ?? [])
        {
            header.AddHistory(line);
        }

        return header;
    }

    /// <summary>A scalar becomes a card, a list of texts comments, a map of scalars one card each.</summary>
    private static void Add(FitsHeaderBuilder header, string key, MetadataValue value)
    {
        switch (value.Kind)
        {
            case MetadataKind.List:
                for (int i = 0; i < value.Items.Count; i++)
                {
                    MetadataValue item = value.Items[i];
                    if (item.Kind == MetadataKind.Text)
                    {
                        header.AddComment($"{key}: {item.Text}");
                    }
                    else
                    {
                        Add(header, string.Create(CultureInfo.InvariantCulture, $"{key}{i + 1}"), item);
                    }
                }

                break;
            case MetadataKind.Map:
                foreach ((string name, MetadataValue entry) in value.Map)
                {
                    Add(header, $"{key} {name}", entry);
                }

                break;
            case MetadataKind.Null:
                break;
            default:
                AddScalar(header, key, value);
                break;
        }
    }

    private static void AddScalar(FitsHeaderBuilder header, string key, MetadataValue value)
    {
        try
        {
            _ = value.Kind switch
            {
                MetadataKind.Integer => header.Add(key, long.Parse(value.Text, CultureInfo.InvariantCulture)),
                MetadataKind.Real when double.IsFinite(value.ToReal()) => header.Add(key, value.ToReal()),
                MetadataKind.Boolean => header.Add(key, value.Text == "true"),
                _ => header.Add(key, value.Text),
            };
        }
        catch (ArgumentException)
        {
            // A key that is no keyword of FITS, or belongs to the structure, stands in a comment.
            header.AddComment($"{key} = {value.Text}");
        }
    }

    private static TableColumn? FromFits(FitsColumn column)
    {
        string name = column.Name.Length != 0 ? column.Name : string.Create(CultureInfo.InvariantCulture, $"col{column.Number}");
        if (column.IsVariableLength || (!column.IsText && column.Repeat != 1) || column.TypeLetter is 'C' or 'M' or 'X')
        {
            return null;
        }

        string unit = column.Unit;
        string description = column.Keyword("TCOMM") ?? "";
        string ucd = column.Ucd;
        return column.IsText ? new TableColumn(name, (ReadOnlySpan<string?>)Texts(column)) { Unit = unit, Description = description, Ucd = ucd }
            : column.TypeLetter == 'L' ? new TableColumn(name, (ReadOnlySpan<bool?>)column.ReadLogicals()) { Unit = unit, Description = description, Ucd = ucd }
            : column.IsReal || column.TypeLetter is 'F' or 'E' or 'D'
                ? new TableColumn(name, (ReadOnlySpan<double>)column.ReadDoubles()) { Unit = unit, Description = description, Ucd = ucd }
            : new TableColumn(name, (ReadOnlySpan<long?>)Longs(column)) { Unit = unit, Description = description, Ucd = ucd };
    }

    private static TableMetadata Metadata(FitsHeader header)
    {
        var metadata = new TableMetadata();
        foreach (FitsCard card in header.EnumerateCards())
        {
            if (card.Keyword.Length == 0 || IsStructure(card.Keyword) || metadata.TryGetValue(card.Keyword, out _))
            {
                continue;
            }

            switch (card.Kind)
            {
                case FitsValueKind.Logical:
                    metadata[card.Keyword] = card.Text == "T";
                    break;
                case FitsValueKind.WholeNumber when long.TryParse(card.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out long whole):
                    metadata[card.Keyword] = whole;
                    break;
                case FitsValueKind.WholeNumber or FitsValueKind.Real when HeaderKeywords.TryParseNumber(card.Text, out double real):
                    metadata[card.Keyword] = real;
                    break;
                case FitsValueKind.Text:
                    metadata[card.Keyword] = card.Text;
                    break;
                default:
                    break;
            }
        }

        return metadata;
    }

    private static bool IsStructure(string keyword) =>
        keyword is "SIMPLE" or "XTENSION" or "BITPIX" or "NAXIS" or "PCOUNT" or "GCOUNT" or "TFIELDS" or "EXTNAME" or "EXTEND"
            or "THEAP" or "CHECKSUM" or "DATASUM"
        || (keyword.Length > 4 && char.IsAsciiDigit(keyword[^1])
            && keyword.TrimEnd('0', '1', '2', '3', '4', '5', '6', '7', '8', '9')
                is "NAXIS" or "TTYPE" or "TFORM" or "TUNIT" or "TDISP" or "TNULL" or "TSCAL" or "TZERO" or "TDIM" or "TBCOL"
                or "TUCD" or "TUTYP" or "TCOMM" or "TDMIN" or "TDMAX" or "TLMIN" or "TLMAX");

    private static long[] Integers(TableColumn column)
    {
        var values = new long[column.Count];
        ReadOnlySpan<long?> source = column.Longs;
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = source[i] ?? long.MinValue;
        }

        return values;
    }

    private static string[] Strings(TableColumn column)
    {
        var values = new string[column.Count];
        ReadOnlySpan<string?> source = column.Texts;
        for (int i = 0; i < values.Length; i++)
        {
            values[i] = source[i] ?? "";
        }

        return values;
    }

    private static long?[] Longs(FitsColumn column) =>
        Array.ConvertAll<long, long?>(column.ReadIntegers(), value => value == long.MinValue ? null : value);

    /// <summary>An empty string of FITS cannot be told from a missing one.</summary>
    private static string?[] Texts(FitsColumn column) =>
        Array.ConvertAll<string, string?>(column.ReadStrings(), value => value.Length == 0 ? null : value);
}
