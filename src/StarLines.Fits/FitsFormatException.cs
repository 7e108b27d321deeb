using System;
using System.Globalization;

namespace StarLines.Fits;

/// <summary>A FITS stream is not what it claims to be; the message names the file, the HDU, the keyword, what was found, what was expected and the cure where there is one.</summary>
public sealed class FitsFormatException : Exception
{
    /// <summary>Makes an exception without a message.</summary>
    public FitsFormatException()
    {
    }

    /// <summary>Makes an exception.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    public FitsFormatException(string message)
        : base(message) => Problem = message;

    /// <summary>Makes an exception with its cause.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    /// <param name="innerException">The cause.</param>
    public FitsFormatException(string message, Exception? innerException)
        : base(message, innerException) => Problem = message;

    /// <summary>Makes an exception that knows its place.</summary>
    /// <param name="fileName">The name of the file or stream.</param>
    /// <param name="hduNumber">The HDU, 0 for the primary; null where the trouble lies before any HDU.</param>
    /// <param name="keyword">The keyword; null where none is concerned.</param>
    /// <param name="problem">What was found, what was expected and the cure, without the place.</param>
    /// <param name="innerException">The cause, if any.</param>
    public FitsFormatException(string fileName, int? hduNumber, string? keyword, string problem, Exception? innerException = null)
        : base(Compose(fileName, hduNumber, keyword, problem), innerException)
    {
        FileName = fileName;
        HduNumber = hduNumber;
        Keyword = keyword;
        Problem = problem;
    }

    /// <summary>The name of the file or stream, where known.</summary>
    public string? FileName { get; }

    /// <summary>The HDU, 0 for the primary, where known.</summary>
    public int? HduNumber { get; }

    /// <summary>The keyword, where one is concerned.</summary>
    public string? Keyword { get; }

    /// <summary>The message without the place.</summary>
    public string Problem { get; } = "";

    private static string Compose(string fileName, int? hduNumber, string? keyword, string problem)
    {
        string hdu = hduNumber is int number ? string.Create(CultureInfo.InvariantCulture, $", HDU {number}") : "";
        string word = string.IsNullOrEmpty(keyword) ? "" : $", keyword {keyword}";
        return $"{fileName}{hdu}{word}: {problem}";
    }
}
