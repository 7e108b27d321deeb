using System;
using System.Globalization;

namespace StarLines.Runs;

/// <summary>What the tables say about the making of a run.</summary>
/// <param name="Program">Name and version of the program.</param>
/// <param name="CommandLine">The command line; leave out what changes no result, such as the number of jobs, where runs are to be compared.</param>
/// <param name="DateUtc">When, UTC.</param>
public sealed record RunContext(string Program, string CommandLine, DateTime DateUtc)
{
    private const string DateVariable = "SOURCE_DATE_EPOCH";

    /// <summary>The date of now, or that which the environment variable SOURCE_DATE_EPOCH fixes (seconds since 1970).</summary>
    public static DateTime Now() =>
        long.TryParse(Environment.GetEnvironmentVariable(DateVariable), NumberStyles.None, CultureInfo.InvariantCulture, out long seconds)
            ? DateTimeOffset.FromUnixTimeSeconds(seconds).UtcDateTime
            : DateTime.UtcNow;
}
