using System;

namespace StarLines.Runs;

/// <summary>A plan, a manifest or an input name is wrong; the message says where and the cure.</summary>
public sealed class RunPlanException : Exception
{
    /// <summary>Makes the exception.</summary>
    public RunPlanException()
    {
    }

    /// <summary>Makes the exception.</summary>
    /// <param name="message">What is wrong, where, and the cure.</param>
    public RunPlanException(string message)
        : base(message)
    {
    }

    /// <summary>Makes the exception.</summary>
    /// <param name="message">What is wrong, where, and the cure.</param>
    /// <param name="innerException">What was thrown below.</param>
    public RunPlanException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
