using System;

namespace StarLines.Fits;

/// <summary>A FITS stream is not what it claims to be; the message names the HDU, the keyword, what was found and what was expected.</summary>
public sealed class FitsFormatException : Exception
{
    /// <summary>Makes an exception without a message.</summary>
    public FitsFormatException()
    {
    }

    /// <summary>Makes an exception.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    public FitsFormatException(string message)
        : base(message)
    {
    }

    /// <summary>Makes an exception with its cause.</summary>
    /// <param name="message">What was found, what was expected and where.</param>
    /// <param name="innerException">The cause.</param>
    public FitsFormatException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
