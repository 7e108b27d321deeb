using System;

namespace StarLines.LineLists;

/// <summary>A file is not a line list; the message names the file, the line, the column, what was found and the cure.</summary>
public sealed class LineListFormatException : Exception
{
    /// <summary>Makes an exception without a message.</summary>
    public LineListFormatException()
    {
    }

    /// <summary>Makes an exception.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    public LineListFormatException(string message)
        : base(message)
    {
    }

    /// <summary>Makes an exception with its cause.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    /// <param name="innerException">The cause.</param>
    public LineListFormatException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
