using System.Globalization;
using System.IO;
using System.Text;
using StarLines.Tables.Delimited;

namespace StarLines.Tables.Ecsv;

/// <summary>Writes ECSV 1.0 with commas; a missing value is an empty cell.</summary>
/// <remarks>Source: Astropy Proposal for Enhancement 6, Enhanced Character Separated Values table format.</remarks>
internal static class EcsvWriter
{
    internal static void Write(Table table, Stream stream)
    {
        using var output = new Utf8Output(stream);
        output.Text(Header(table));
        CsvWriter.WriteRows(table, output, "True"u8, "False"u8);
        output.Flush();
    }

    private static string Header(Table table)
    {
        var header = new StringBuilder("# %ECSV 1.0\n# ---\n# datatype:\n");
        foreach (TableColumn column in table.Columns)
        {
            AppendColumn(header, column);
        }

        header.Append("# delimiter: ','\n");
        if (table.Metadata.Count > 0)
        {
            header.Append("# meta: !!omap\n");
            foreach ((string key, MetadataValue value) in table.Metadata)
            {
                header.Append("# - {");
                YamlWriter.AppendText(header, key);
                header.Append(": ");
                YamlWriter.Append(header, value);
                header.Append("}\n");
            }
        }

        return header.Append("# schema: astropy-2.0\n").ToString();
    }

    private static void AppendColumn(StringBuilder header, TableColumn column)
    {
        header.Append("# - {name: ");
        YamlWriter.AppendText(header, column.Name);
        AppendEntry(header, "unit", column.Unit);
        AppendEntry(header, "datatype", column.Type switch
        {
            ColumnType.Double => "float64",
            ColumnType.Long => "int64",
            ColumnType.Bool => "bool",
            _ => "string",
        });
        AppendEntry(header, "format", FormatOf(column));
        AppendEntry(header, "description", column.Description);
        if (column.Ucd.Length > 0)
        {
            header.Append(", meta: !!omap [{ucd: ");
            YamlWriter.AppendText(header, column.Ucd);
            header.Append("}]");
        }

        header.Append("}\n");
    }

    private static void AppendEntry(StringBuilder header, string key, string text)
    {
        if (text.Length > 0)
        {
            header.Append(", ").Append(key).Append(": ");
            YamlWriter.AppendText(header, text);
        }
    }

    private static string FormatOf(TableColumn column)
    {
        if (column.Type != ColumnType.Double)
        {
            return "";
        }

        return column.Decimals is int decimals ? string.Create(CultureInfo.InvariantCulture, $".{decimals}f")
            : column.SignificantDigits is int digits ? string.Create(CultureInfo.InvariantCulture, $".{digits}g")
            : "";
    }
}
