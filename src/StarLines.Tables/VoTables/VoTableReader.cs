using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text.Json;
using System.Xml;
using StarLines.Tables.Delimited;
using StarLines.Tables.Json;

namespace StarLines.Tables.VoTables;

/// <summary>Reads the first table of a VOTable 1.0 to 1.5: TABLEDATA, BINARY and BINARY2.</summary>
/// <remarks>
/// INFO and PARAM elements before the table and in it become metadata. Where the table has one row whose arrays have one length, as spectra
/// are often stored, each element becomes a row; other arrays become text. Source: VOTable 1.4, IVOA Recommendation 2019.
/// </remarks>
internal sealed class VoTableReader
{
    private readonly XmlReader _xml;
    private readonly string _source;
    private readonly TableMetadata _metadata = [];
    private readonly List<VoField> _fields = [];
    private string _status = "";

    private VoTableReader(XmlReader xml, string source)
    {
        _xml = xml;
        _source = source;
    }

    private int Line => _xml is IXmlLineInfo info ? info.LineNumber : 0;

    internal static Table Read(byte[] bytes, string source)
    {
        var settings = new XmlReaderSettings { DtdProcessing = DtdProcessing.Ignore, XmlResolver = null, IgnoreComments = true };
        using var xml = XmlReader.Create(new MemoryStream(bytes), settings);
        try
        {
            return new VoTableReader(xml, source).ReadTable();
        }
        catch (XmlException exception)
        {
            throw new TableFormatException(source, exception.LineNumber, "text that is not XML", "a VOTable", exception.Message.TrimEnd('.'));
        }
    }

    private Table ReadTable()
    {
        if (_xml.MoveToContent() != XmlNodeType.Element || _xml.LocalName != "VOTABLE")
        {
            throw Fault($"the element {_xml.LocalName}", "VOTABLE", "name the true format");
        }

        string name = "";
        while (_xml.Read())
        {
            if (_xml.NodeType != XmlNodeType.Element)
            {
                continue;
            }

            switch (_xml.LocalName)
            {
                case "TABLE":
                    name = _xml.GetAttribute("name") ?? "";
                    break;
                case "INFO" or "PARAM":
                    TakeMetadata();
                    break;
                case "FIELD":
                    _fields.Add(ReadField());
                    break;
                case "DATA":
                    Table table = ReadData(name);
                    ReadTrailingInfo();
                    return table;
            }
        }

        return _fields.Count > 0
            ? MakeTable(Columns(), 0, name)
            : throw Fault("no table with data", "a TABLE with FIELD and DATA elements", _status.Length > 0 ? $"the service said: {_status}" : "give a file with a table");
    }

    /// <summary>INFO elements may stand after the data too; the table shares the metadata they join.</summary>
    private void ReadTrailingInfo()
    {
        while (_xml.Read() && !(_xml.NodeType == XmlNodeType.EndElement && _xml.LocalName == "TABLE"))
        {
            if (_xml.NodeType == XmlNodeType.Element && _xml.LocalName == "INFO")
            {
                TakeMetadata();
            }
        }
    }

    private void TakeMetadata()
    {
        string key = _xml.GetAttribute("name") ?? "";
        string value = _xml.GetAttribute("value") ?? "";
        if (key == "QUERY_STATUS" && value == "ERROR")
        {
            _status = _xml.IsEmptyElement ? "ERROR" : _xml.ReadElementContentAsString().Trim();
        }
        else if (key.Length > 0)
        {
            _metadata[key] = _xml.GetAttribute("xtype") == "json" ? FromJson(value) : value;
        }
    }

    private static MetadataValue FromJson(string text)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(text);
            return MetadataJson.Read(document.RootElement);
        }
        catch (JsonException)
        {
            // Somebody else's xtype: the text as it stands.
            return text;
        }
    }

    private VoField ReadField()
    {
        string arraysize = _xml.GetAttribute("arraysize") ?? "";
        var field = new VoField
        {
            Name = _xml.GetAttribute("name") ?? _xml.GetAttribute("ID"),
            Datatype = _xml.GetAttribute("datatype") ?? "char",
            Unit = _xml.GetAttribute("unit") ?? "",
            Ucd = _xml.GetAttribute("ucd") ?? "",
            Precision = _xml.GetAttribute("precision") ?? "",
            ElementCount = VoField.CountOf(arraysize) ?? throw Fault($"the arraysize \"{arraysize}\"", "a number, 8x4 or *", "correct the FIELD"),
        };
        if (field.ElementSize == 0)
        {
            throw Fault($"the datatype \"{field.Datatype}\"", "a type of the VOTable standard", "correct the FIELD");
        }

        if (_xml.IsEmptyElement)
        {
            return field;
        }

        using XmlReader inner = _xml.ReadSubtree();
        inner.Read();
        while (inner.Read())
        {
            if (inner.NodeType == XmlNodeType.Element && inner.LocalName == "VALUES")
            {
                field.Null = inner.GetAttribute("null") ?? "";
            }
            else if (inner.NodeType == XmlNodeType.Element && inner.LocalName == "DESCRIPTION")
            {
                field.Description = inner.ReadString();
            }
        }

        return field;
    }

    private Table ReadData(string name)
    {
        if (_fields.Count == 0)
        {
            throw Fault("DATA without a FIELD before", "at least one FIELD", "get the file again");
        }

        VoColumn[] columns = Columns();
        while (_xml.Read() && !(_xml.NodeType == XmlNodeType.EndElement && _xml.LocalName == "DATA"))
        {
            if (_xml.NodeType != XmlNodeType.Element)
            {
                continue;
            }

            switch (_xml.LocalName)
            {
                case "TABLEDATA":
                    return MakeTable(columns, ReadRows(columns), name);
                case "BINARY" or "BINARY2":
                    return MakeTable(columns, ReadBinary(columns, _xml.LocalName == "BINARY2"), name);
                case "FITS":
                    throw Fault("a FITS serialization", "TABLEDATA, BINARY or BINARY2", "give the FITS file itself");
            }
        }

        return MakeTable(columns, 0, name);
    }

    private int ReadRows(VoColumn[] columns)
    {
        int rows = 0;
        if (_xml.IsEmptyElement)
        {
            return 0;
        }

        while (_xml.Read() && !(_xml.NodeType == XmlNodeType.EndElement && _xml.LocalName == "TABLEDATA"))
        {
            if (_xml.NodeType == XmlNodeType.Element && _xml.LocalName == "TR")
            {
                ReadRow(columns);
                rows++;
            }
        }

        return rows;
    }

    private void ReadRow(VoColumn[] columns)
    {
        int line = Line;
        int count = 0;
        if (!_xml.IsEmptyElement)
        {
            _xml.Read();
            while (_xml.NodeType != XmlNodeType.EndElement || _xml.LocalName != "TR")
            {
                if (_xml.NodeType == XmlNodeType.Element && _xml.LocalName == "TD")
                {
                    AddCell(count < columns.Length ? columns[count] : null, line);
                    count++;
                }
                else if (!_xml.Read())
                {
                    break;
                }
            }
        }

        if (count != columns.Length)
        {
            string found = string.Create(CultureInfo.InvariantCulture, $"{count} TD elements in a row");
            string expected = string.Create(CultureInfo.InvariantCulture, $"{columns.Length}, one a FIELD");
            throw new TableFormatException(_source, line, found, expected, "correct the row");
        }
    }

    private void AddCell(VoColumn? column, int line)
    {
        string cell = _xml.ReadElementContentAsString();
        try
        {
            column?.AddText(cell);
        }
        catch (FormatException exception)
        {
            string shown = cell.Length > 40 ? string.Concat(cell.AsSpan(0, 40), "…") : cell;
            throw new TableFormatException(
                _source, line, $"\"{shown}\" in field {column!.Field.Name}", exception.Message, "correct the cell or leave it empty");
        }
    }

    private int ReadBinary(VoColumn[] columns, bool hasNullFlags)
    {
        if (!_xml.ReadToDescendant("STREAM", _xml.NamespaceURI) || _xml.GetAttribute("href") is not null)
        {
            throw Fault("a STREAM in another file or none", "a STREAM with base64 text", "get the table as TABLEDATA");
        }

        string encoding = _xml.GetAttribute("encoding") ?? "none";
        if (encoding != "base64")
        {
            throw Fault($"the encoding \"{encoding}\"", "base64", "get the table as TABLEDATA");
        }

        try
        {
            return VoBinary.Read(Convert.FromBase64String(_xml.ReadElementContentAsString()), columns, hasNullFlags, _source);
        }
        catch (FormatException)
        {
            throw Fault("text that is not base64", "base64", "get the file again");
        }
    }

    private VoColumn[] Columns() => _fields.ConvertAll(static field => new VoColumn(field)).ToArray();

    private Table MakeTable(VoColumn[] columns, int rows, string name)
    {
        string[] names = CsvHeader.MakeUnique(Array.ConvertAll(columns, static column => column.Field.Name));
        int elements = rows == 1 ? CommonLength(columns) : 0;
        var result = new TableColumn[columns.Length];
        for (int c = 0; c < result.Length; c++)
        {
            result[c] = elements > 0 ? columns[c].ToElements(names[c], elements) : columns[c].ToColumn(names[c]);
        }

        return new Table(result, _metadata, name);
    }

    /// <summary>The length that all arrays of a single row share; 0 where there are none or they differ.</summary>
    private static int CommonLength(VoColumn[] columns)
    {
        int common = 0;
        foreach (VoColumn column in columns)
        {
            if (column.Field.IsArray && (column.Lengths[0] == 0 || (common > 0 && column.Lengths[0] != common)))
            {
                return 0;
            }

            common = column.Field.IsArray ? column.Lengths[0] : common;
        }

        return common;
    }

    private TableFormatException Fault(string found, string expected, string cure) => new(_source, Line, found, expected, cure);
}
