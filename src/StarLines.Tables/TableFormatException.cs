using System;
using System.Globalization;

namespace StarLines.Tables;

/// <summary>A stream is not the table it claims to be; the message names the source, the line, what was found, what was expected and the cure.</summary>
public sealed class TableFormatException : Exception
{
    /// <summary>Makes an exception without a message.</summary>
    public TableFormatException()
    {
    }

    /// <summary>Makes an exception.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    public TableFormatException(string message)
        : base(message)
    {
    }

    /// <summary>Makes an exception with its cause.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    /// <param name="innerException">The cause.</param>
    public TableFormatException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>Makes an exception that says where, what and how to mend it.</summary>
    /// <param name="sourceName">Name of the file or stream; may be empty.</param>
    /// <param name="lineNumber">Line, from 1; 0 where there is none.</param>
    /// <param name="found">What was found.</param>
    /// <param name="expected">What was expected.</param>
    /// <param name="cure">What to do about it.</param>
    public TableFormatException(string sourceName, int lineNumber, string found, string expected, string cure)
        : base(Compose(sourceName, lineNumber, found, expected, cure))
    {
        SourceName = sourceName;
        LineNumber = lineNumber;
        Found = found;
        Expected = expected;
        Cure = cure;
    }

    /// <summary>Name of the file or stream; may be empty.</summary>
    public string SourceName { get; } = "";

    /// <summary>Line, from 1; 0 where the format has no lines.</summary>
    public int LineNumber { get; }

    /// <summary>What was found.</summary>
    public string Found { get; } = "";

    /// <summary>What was expected.</summary>
    public string Expected { get; } = "";

    /// <summary>What to do about it.</summary>
    public string Cure { get; } = "";

    private static string Compose(string source, int line, string found, string expected, string cure)
    {
        string name = source.Length > 0 ? source : "the table";
        string place = line > 0 ? string.Create(CultureInfo.InvariantCulture, $"{name}, line {line}") : name;
        return $"{place}: found {found}, expected {expected}; {cure}.";
    }
}
