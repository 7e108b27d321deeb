using System;

namespace StarLines.IO;

/// <summary>A file holds no spectrum that can be read without guessing; the message names the file, the HDU, what was found and the cure.</summary>
public sealed class SpectrumFormatException : Exception
{
    /// <summary>Makes an exception without a message.</summary>
    public SpectrumFormatException()
    {
    }

    /// <summary>Makes an exception.</summary>
    /// <param name="message">File, HDU, what was found and the cure.</param>
    public SpectrumFormatException(string message)
        : base(message)
    {
    }

    /// <summary>Makes an exception with its cause.</summary>
    /// <param name="message">File, HDU, what was found and the cure.</param>
    /// <param name="innerException">The cause.</param>
    public SpectrumFormatException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
