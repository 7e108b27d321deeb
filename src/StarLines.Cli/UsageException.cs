using System;

namespace StarLines.Cli;

/// <summary>The command line asks for something that cannot be; the message is the sentence for the user.</summary>
internal sealed class UsageException(string message) : Exception(message);
